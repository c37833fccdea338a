// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/run_search.h"

#include <QLocale>
#include <iterator>
#include <unordered_set>

#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

QString counted(qint64 number) { return QLocale::c().toString(number); }

QString sentenceOf(const text::TextFault& fault) {
  QString sentence = toQt(fault.what);
  if (!fault.mend.empty()) sentence += QStringLiteral(": ") + toQt(fault.mend);
  return sentence + QLatin1Char('.');
}

/// So many of QString's units lie before that byte of the text's UTF-8.
qsizetype unitsBefore(const std::string& text, std::size_t byte) {
  return toQt(std::string_view(text).substr(0, byte)).size();
}

}  // namespace

RunSearch::RunSearch(NotebookLink& link, QObject* parent) : QObject(parent), m_link(link) {
  // The worker is stopped before this object goes, so what it posts finds it or is dropped.
  SearchWorker::Listener listener{
      [this](SearchAnswer answer) {
        auto kept = std::make_shared<SearchAnswer>(std::move(answer));
        QMetaObject::invokeMethod(
            this, [this, kept] { take(std::move(*kept)); }, Qt::QueuedConnection);
      },
      [this](quint64 number, const text::TextFault& fault) {
        QMetaObject::invokeMethod(
            this, [this, number, fault] { takeHint(number, fault); }, Qt::QueuedConnection);
      }};
  m_worker = std::make_unique<SearchWorker>(link.workplace().files, toUtf8(link.file()),
                                            std::move(listener));
  connect(&m_link, &NotebookLink::changed, this, &RunSearch::refresh);
  ask(Kind::kNew);
}

RunSearch::~RunSearch() { m_worker.reset(); }

QString RunSearch::countText() const {
  if (!wasAnswered()) return {};
  if (m_text.trimmed().isEmpty()) {
    return m_matches == 1 ? tr("1 run") : tr("%1 runs").arg(counted(m_matches));
  }
  return tr("%1 of %2 runs").arg(counted(m_matches), counted(m_total));
}

bool RunSearch::canFetchMore() const {
  return !isBusy() && !m_fault && static_cast<qint64>(m_runs.size()) < m_matches;
}

void RunSearch::setText(const QString& text) {
  if (text == m_text) return;
  m_text = text;
  emit textChanged();
  ask(Kind::kNew);
}

void RunSearch::setOrder(app::FindOrder order) {
  if (order == m_order) return;
  m_order = order;
  emit orderChanged();
  ask(Kind::kNew);
}

void RunSearch::fetchMore() {
  if (canFetchMore()) ask(Kind::kMore);
}

void RunSearch::refresh() {
  // A text that was not answered yet is asked again as the new one that it is.
  ask(isBusy() && m_kind == Kind::kNew ? Kind::kNew : Kind::kRefresh);
}

void RunSearch::ask(Kind kind) {
  const bool wasBusy = isBusy();
  m_kind = kind;
  SearchQuestion question{.number = ++m_asked, .text = toUtf8(m_text), .options = {}};
  question.options.order = m_order;
  question.options.limit = kPage;
  question.options.count = kind != Kind::kMore;
  if (kind == Kind::kRefresh) question.options.limit = std::max(kPage, m_runs.size());
  if (kind == Kind::kMore) question.options.skip = m_runs.size();
  question.wantsTotal = m_totalGeneration != m_link.generation();
  m_worker->ask(std::move(question));
  if (!wasBusy) emit busyChanged();
}

void RunSearch::take(SearchAnswer answer) {
  if (answer.number != m_asked) return;
  m_answered = answer.number;
  if (answer.total) {
    m_total = *answer.total;
    m_totalGeneration = m_link.generation();
  }
  if (!answer.result) {
    setHint({});
    setFault(faultOf(answer.result.error()));
  } else if (m_kind == Kind::kMore) {
    takeMore(std::move(answer.result->runs));
  } else {
    m_runs = std::move(answer.result->runs);
    m_matches = answer.result->matches;
    setHint({});
    setFault(std::nullopt);
    emit found(m_kind == Kind::kRefresh);
  }
  emit busyChanged();
}

void RunSearch::takeMore(std::vector<app::FoundRun> runs) {
  // What another program added meanwhile moves the pages: no run is shown twice.
  std::unordered_set<app::RowNumber> shown;
  for (const app::FoundRun& each : m_runs) shown.insert(each.run.n);
  std::erase_if(runs, [&](const app::FoundRun& each) { return shown.contains(each.run.n); });
  if (runs.empty()) {
    m_matches = static_cast<qint64>(m_runs.size());
    return;
  }
  const int first = static_cast<int>(m_runs.size());
  m_runs.insert(m_runs.end(), std::make_move_iterator(runs.begin()),
                std::make_move_iterator(runs.end()));
  emit moreFound(first);
}

void RunSearch::takeHint(quint64 number, const text::TextFault& fault) {
  if (number == m_asked) setHint(sentenceOf(fault));
}

SearchFault RunSearch::faultOf(const app::FindRefusal& refusal) const {
  if (!refusal.place) return {sentences(refusal.faults)};
  const std::string text = toUtf8(m_text);
  const text::TextFault& fault = *refusal.place;
  const qsizetype from = unitsBefore(text, fault.offset);
  return {sentenceOf(fault), from, unitsBefore(text, fault.offset + fault.length) - from};
}

void RunSearch::setFault(std::optional<SearchFault> fault) {
  if (fault == m_fault) return;
  m_fault = std::move(fault);
  emit faultChanged();
}

void RunSearch::setHint(const QString& hint) {
  if (hint == m_hint) return;
  m_hint = hint;
  emit hintChanged();
}

}  // namespace vialkeeper::ui
