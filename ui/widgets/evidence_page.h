// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/dataset_preview.h"
#include "ui/models/evidence_import.h"
#include "ui/models/evidence_model.h"
#include "ui/models/open_run.h"

class QComboBox;
class QLabel;
class QProgressBar;
class QPushButton;
class QTableView;

namespace vialkeeper::ui {

class EvidencePreview;

/// Datasets and files of the open run, previewed and saved out again.
class EvidencePage : public QWidget {
  Q_OBJECT

 public:
  explicit EvidencePage(OpenRun& run, QWidget* parent = nullptr);

  /// Imports a table of numbers as the kind that is chosen.
  void importFile(const QString& file);
  void chooseFile();
  /// Writes the raw file of the item that is shown, byte for byte.
  [[nodiscard]] text::Checked<void> saveRaw(const QString& file) const;
  [[nodiscard]] EvidenceImport& import() { return m_import; }
  [[nodiscard]] EvidenceModel& model() { return m_model; }
  [[nodiscard]] QTableView& list() { return *m_list; }
  [[nodiscard]] QComboBox& kind() { return *m_kind; }
  /// What is previewed; nothing while it is being read.
  [[nodiscard]] const EvidenceContentPtr& shown() const { return m_shown; }

 protected:
  void dragEnterEvent(QDragEnterEvent* event) override;
  void dropEvent(QDropEvent* event) override;
  void showEvent(QShowEvent* event) override;

 private:
  void layOut();
  void wire();
  void followRun();
  void followImport();
  void preview(int row);
  void showContent(EvidenceContentPtr content);
  void chooseRawFile();
  void say(const QString& words, bool fault);

  OpenRun& m_run;
  EvidenceModel m_model;
  EvidenceImport m_import;
  EvidenceContentPtr m_shown;
  int m_asked = 0;  ///< counts previews, so that an older one does not overtake a newer
  QString m_wantedCode;
  QPushButton* m_choose;
  QComboBox* m_kind;
  QProgressBar* m_progress;
  QPushButton* m_cancel;
  QLabel* m_message;
  QTableView* m_list;
  QPushButton* m_save;
  EvidencePreview* m_preview;
};

}  // namespace vialkeeper::ui
