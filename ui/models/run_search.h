// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <memory>
#include <optional>
#include <vector>

#include "app/notebook/find_query.h"
#include "ui/models/notebook_link.h"
#include "ui/models/search_worker.h"

namespace vialkeeper::ui {

/// What is wrong with the text of a search, and where.
struct SearchFault {
  QString sentence;
  qsizetype from = -1;   ///< place in the text; -1 where the text is not at fault
  qsizetype length = 0;  ///< 0 where something is missing at `from`

  bool operator==(const SearchFault&) const = default;
};

/// The search of the window: its text, what it found, and how. The work is done by another
/// connection in another thread; only the newest text is ever answered. What was found stays until
/// another text is answered, also beside a fault.
class RunSearch : public QObject {
  Q_OBJECT

 public:
  static constexpr std::size_t kPage = 200;

  explicit RunSearch(NotebookLink& link, QObject* parent = nullptr);
  ~RunSearch() override;

  [[nodiscard]] NotebookLink& link() { return m_link; }
  [[nodiscard]] QString text() const { return m_text; }
  [[nodiscard]] app::FindOrder order() const { return m_order; }
  [[nodiscard]] bool isBusy() const { return m_asked != m_answered; }
  [[nodiscard]] bool wasAnswered() const { return m_answered > 0; }

  [[nodiscard]] const std::vector<app::FoundRun>& runs() const { return m_runs; }
  /// All runs that match, fetched or not.
  [[nodiscard]] qint64 matches() const { return m_matches; }
  /// All runs of the notebook.
  [[nodiscard]] qint64 total() const { return m_total; }
  [[nodiscard]] const std::optional<SearchFault>& fault() const { return m_fault; }
  /// Why there may be nothing: a name that no substance has.
  [[nodiscard]] QString hint() const { return m_hint; }
  /// `14 of 1,208 runs`
  [[nodiscard]] QString countText() const;

  [[nodiscard]] bool canFetchMore() const;

 public slots:
  void setText(const QString& text);
  void setOrder(vialkeeper::app::FindOrder order);
  void fetchMore();
  /// Asks again, for as many runs as are there.
  void refresh();

 signals:
  void textChanged();
  void orderChanged();
  /// Other runs were found, or the same ones as they are now; `isSameQuestion`: only the notebook
  /// changed since.
  void found(bool isSameQuestion);
  /// Runs were added from `first` on.
  void moreFound(int first);
  void faultChanged();
  void hintChanged();
  void busyChanged();

 private:
  enum class Kind { kNew, kRefresh, kMore };

  void ask(Kind kind);
  void take(SearchAnswer answer);
  void takeHint(quint64 number, const text::TextFault& fault);
  void takeMore(std::vector<app::FoundRun> runs);
  void setFault(std::optional<SearchFault> fault);
  void setHint(const QString& hint);
  [[nodiscard]] SearchFault faultOf(const app::FindRefusal& refusal) const;

  NotebookLink& m_link;
  QString m_text;
  app::FindOrder m_order = app::FindOrder::kNewest;
  std::vector<app::FoundRun> m_runs;
  qint64 m_matches = 0;
  qint64 m_total = 0;
  qint64 m_totalGeneration = -1;
  std::optional<SearchFault> m_fault;
  QString m_hint;
  quint64 m_asked = 0;
  quint64 m_answered = 0;
  Kind m_kind = Kind::kNew;  ///< of the newest question
  std::unique_ptr<SearchWorker> m_worker;
};

}  // namespace vialkeeper::ui
