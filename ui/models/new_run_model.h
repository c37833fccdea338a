// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <QStringList>
#include <memory>
#include <optional>

#include "app/notebook/run_plan.h"
#include "ui/models/charge_preview.h"
#include "ui/models/run_sources.h"

namespace vialkeeper::ui {

/// A run that is being set up: what it starts from, its charge worked out in another thread, and
/// what is said of it.
class NewRunModel : public QObject {
  Q_OBJECT

 public:
  /// What a person says of the run beside its plan.
  struct Words {
    QString title;
    QString series;
    QString aim;
  };
  /// The field beside which a fault is shown.
  enum class Field { kSource, kTitle, kSeries };
  struct FieldFault {
    Field field;
    QString sentence;
  };

  explicit NewRunModel(NotebookLink& link, QObject* parent = nullptr);

  [[nodiscard]] RunSources& sources() { return m_sources; }
  [[nodiscard]] ChargePreview& preview() { return m_preview; }
  /// What the source says, to be gone over.
  [[nodiscard]] const Words& suggested() const { return m_suggested; }
  /// Notices of the charge and of the shelf, a sentence each: near misses, what is new on it.
  [[nodiscard]] const QStringList& notices() const { return m_notices; }
  /// `2.0 mL in a 10 mL crimp vial, 440 nm, 35 °C, 20 h`: the vial in a line or two.
  [[nodiscard]] QString vial() const { return m_vial; }
  [[nodiscard]] QString caution() const { return m_caution; }
  /// Why the source cannot be used; empty where it can.
  [[nodiscard]] QString sourceFault() const { return m_sourceFault; }
  [[nodiscard]] bool isWorking() const { return m_isWorking; }
  [[nodiscard]] bool hasSource() const { return m_wanted.has_value(); }

  /// Starts afresh.
  void reset();
  /// Takes a row of the sources; -1: none.
  void choose(int row);
  /// Adds the run. Faults, each with its field, else the run's number.
  [[nodiscard]] std::expected<app::RowNumber, std::vector<FieldFault>> create(const Words& words);

 signals:
  /// Another source was chosen: suggested() is of it.
  void chosen();
  /// The preview, its notices or its fault changed.
  void previewed();

 private:
  void startFrom(const RunSource& source);
  void previewWanted();
  void take(const text::Checked<app::RunPreview>& preview);
  void clearPreview();

  NotebookLink& m_link;
  RunSources m_sources;
  ChargePreview m_preview;
  std::optional<app::NewRun> m_wanted;
  Words m_suggested;
  QStringList m_notices;
  QString m_vial;
  QString m_caution;
  QString m_sourceFault;
  bool m_isWorking = false;
  quint64 m_choice = 0;
};

}  // namespace vialkeeper::ui
