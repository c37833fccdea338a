// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractListModel>
#include <string>
#include <vector>

#include "app/notebook/records.h"
#include "ui/models/notebook_link.h"

namespace vialkeeper::ui {

/// Something that a new run may start from.
struct RunSource {
  enum class Kind { kRun, kTemplate, kFile };
  Kind kind = Kind::kTemplate;
  QString title;
  QString where;              ///< `KW-0042, 2026-03-04`; `template`; the file's name
  std::string planText = {};  ///< empty of a run: it is read when the run is chosen
  std::string planFile = {};  ///< named in faults
  app::RunRecord run = {};    ///< n = 0 where it is none
};

/// What a new run may start from: what was offered last on top, then the newest runs, then the
/// templates of the program; cut down to what holds the typed words.
class RunSources : public QAbstractListModel {
  Q_OBJECT

 public:
  enum Role { kWhereRole = Qt::UserRole };

  explicit RunSources(NotebookLink& link, QObject* parent = nullptr);

  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  [[nodiscard]] const RunSource& source(int row) const;

  /// Reads the newest runs again; what was offered and typed goes.
  void reload();
  /// Words of the title, or the code of any run.
  void setFilter(const QString& typed);
  /// Puts a run on top. Fault: it is not there.
  text::Checked<void> offerRun(app::RowNumber run);
  /// Puts a plan file on top. Fault: it cannot be read.
  text::Checked<void> offerFile(const QString& file);

 private:
  void offer(RunSource source);
  void show();

  NotebookLink& m_link;
  std::vector<RunSource> m_offered;
  std::vector<RunSource> m_runs;
  std::vector<RunSource> m_templates;
  std::vector<RunSource> m_byCode;  ///< the run whose code is typed
  QString m_typed;
  std::vector<const RunSource*> m_shown;
};

}  // namespace vialkeeper::ui
