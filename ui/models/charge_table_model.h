// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractTableModel>
#include <map>
#include <utility>
#include <vector>

#include "ui/models/change_reason.h"
#include "ui/models/charge_row.h"
#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// The charge of the open run, one row a component. What is typed into a cell goes to the run at
/// once; what is refused stays in its cell with its sentence until it is mended or forgotten.
class ChargeTableModel : public QAbstractTableModel {
  Q_OBJECT

 public:
  enum Column { kComponent, kAmount, kMillimoles, kRatio, kTarget, kWeighed, kCharged, kColumns };
  enum Role {
    kSecondLineRole = Qt::UserRole + 1,  ///< small, below the text
    kToneRole,                           ///< of the text, a Tone
    kNoticesRole,                        ///< of the row, a QStringList
    kFaultsRole,    ///< what was refused in the row, a QStringList of sentences
    kQuestionRole,  ///< asked about the row's weighing; empty: none
    kLikelyRole,    ///< what was probably meant, `26.9 mg`; may be empty with a question
    kIsKeptRole,    ///< the cell shows a text that was not taken
  };

  /// What a text that is being typed would mean.
  struct Reading {
    QString text;
    bool isFault = false;
  };

  ChargeTableModel(OpenRun& run, ChangeReason& reason, QObject* parent = nullptr);

  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] int columnCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  [[nodiscard]] QVariant headerData(int section, Qt::Orientation orientation,
                                    int role) const override;
  [[nodiscard]] Qt::ItemFlags flags(const QModelIndex& index) const override;
  bool setData(const QModelIndex& index, const QVariant& value, int role) override;

  /// Empty for an empty text, and where nothing would change.
  [[nodiscard]] Reading preview(const QModelIndex& index, const QString& typed) const;
  /// The weighing that is asked about is what was meant.
  void acceptTyped(int row);
  /// It is the likely one that was meant.
  void takeLikely(int row);
  /// Shows again what the run holds. False: nothing was kept there.
  bool forget(const QModelIndex& index);
  bool forgetRow(int row);
  void remove(int row);
  void clearWeighing(int row);

  [[nodiscard]] std::string keyOf(int row) const;
  /// -1: there is no such component.
  [[nodiscard]] int rowOf(const std::string& key) const;
  [[nodiscard]] const std::vector<ChargeRow>& rows() const { return m_rows; }

 private:
  struct Kept {
    QString typed;
    QString sentence;
    std::vector<app::SlipQuestion> questions = {};
    bool waits = false;  ///< for a reason
  };
  using Place = std::pair<std::string, int>;

  void follow();
  [[nodiscard]] bool isHere(const QModelIndex& index) const;
  void forgetWaiting();
  [[nodiscard]] QString shown(const ChargeRow& row, int column) const;
  [[nodiscard]] QString secondLine(const ChargeRow& row, int column) const;
  [[nodiscard]] Tone tone(const ChargeRow& row, int column) const;
  [[nodiscard]] QStringList faultsOf(const ChargeRow& row) const;
  [[nodiscard]] QString spoken(const ChargeRow& row, int column) const;
  [[nodiscard]] const Kept* kept(const std::string& key, int column) const;
  bool editAmount(const std::string& key, const QString& typed);
  bool weigh(const std::string& key, const QString& typed, bool accepted);
  void removeComponent(const std::string& key);
  void clear(const std::string& key);
  bool keep(const Place& place, Kept kept);
  bool take(const Place& place, const QString& typed, const Outcome& outcome);
  void tellRow(const std::string& key);
  [[nodiscard]] QString nameOf(const std::string& key) const;

  OpenRun& m_run;
  ChangeReason& m_reason;
  std::vector<ChargeRow> m_rows;
  std::map<Place, Kept> m_kept;
};

}  // namespace vialkeeper::ui
