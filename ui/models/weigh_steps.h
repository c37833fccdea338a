// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <QStringList>
#include <optional>
#include <string>
#include <vector>

#include "ui/models/balance_reading.h"
#include "ui/models/change_reason.h"
#include "ui/models/charge_row.h"
#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// A target before and after the re-target.
struct TargetChange {
  QString name;
  QString before;
  QString after;
};

/// One line of the overview of what is weighed.
struct WeighStep {
  QString name;
  QString target;
  QString actual;  ///< empty: not yet
  bool isOn = false;
};

/// Weighing one component after the other, in the order of addition: which one is on, what the line
/// being typed would mean for it, and recording it.
class WeighSteps : public QObject {
  Q_OBJECT

 public:
  WeighSteps(OpenRun& run, ChangeReason& reason, QObject* parent = nullptr);

  /// Starts at the first component that nothing is recorded for, else at the first one.
  void start();
  /// Starts at this component.
  void startAt(const std::string& key);
  [[nodiscard]] bool isEmpty() const { return m_order.empty(); }
  [[nodiscard]] int count() const { return static_cast<int>(m_order.size()); }
  [[nodiscard]] int position() const { return m_at; }
  [[nodiscard]] std::string key() const;
  /// `3 of 7`
  [[nodiscard]] QString progress() const;
  /// `2 recorded`, `all recorded`
  [[nodiscard]] QString recorded() const;
  /// The component that is on, with the targets that are shown: re-targeted ones after retarget().
  [[nodiscard]] ChargeRow row() const;
  [[nodiscard]] std::vector<WeighStep> overview() const;
  /// The one after it, or empty.
  [[nodiscard]] QString nextName() const;

  /// What is in the field now.
  void setTyped(const QString& line);
  [[nodiscard]] const QString& typed() const { return m_typed; }
  /// What is understood: `3.12 mg`, or why it is not, or what is asked about it.
  [[nodiscard]] QString understood() const { return m_understood; }
  /// `0.6 % above, within tolerance`
  [[nodiscard]] QString deviation() const { return m_deviation; }
  [[nodiscard]] Tone tone() const { return m_tone; }
  /// Asked before it is recorded; empty: nothing.
  [[nodiscard]] QString question() const { return m_question; }
  [[nodiscard]] QString likely() const { return m_likely; }

  [[nodiscard]] bool isRetargeted() const { return m_retargeted.has_value(); }
  [[nodiscard]] const std::vector<TargetChange>& targetChanges() const { return m_changes; }
  /// Why there can be no re-target; empty after one.
  [[nodiscard]] QString retargetFault() const { return m_retargetFault; }

 public slots:
  void next();
  void previous();
  /// Records what is in the field; when that is done, goes on to the next one.
  void record();
  /// The quantity that is asked about is what was meant.
  void accept();
  /// The likely one was.
  void takeLikely();
  void retarget();

 signals:
  /// Another component is on; the field is to be emptied.
  void moved();
  /// Anything else that is shown.
  void changed();
  /// A quantity is in the notebook: `indoline: 24.1 mg`.
  void written(const QString& what);

 private:
  void follow();
  void go(int to);
  void judge();
  void recordTyped(const QString& line, bool accepted);
  void takeOutcome(const QString& text, const Outcome& outcome);
  void ask(const std::vector<app::SlipQuestion>& questions);
  void say(const QString& understood, Tone tone);
  void workOutTargets();
  [[nodiscard]] const app::RunSheet& sheet() const {
    return m_retargeted ? *m_retargeted : m_run.sheet();
  }
  [[nodiscard]] bool isRecorded(const std::string& key) const;

  OpenRun& m_run;
  ChangeReason& m_reason;
  std::vector<std::string> m_order;
  int m_at = 0;
  std::optional<app::RunSheet> m_retargeted;
  std::vector<TargetChange> m_changes;
  QString m_retargetFault;
  QString m_typed;
  QString m_understood;
  QString m_deviation;
  QString m_question;
  QString m_likely;
  Tone m_tone = Tone::kQuiet;
};

}  // namespace vialkeeper::ui
