// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/search_worker.h"

#include <utility>

namespace vialkeeper::ui {
namespace {

constexpr const char* kInterrupted = "interrupted";

bool wasInterrupted(const SearchAnswer& answer) {
  return !answer.result && !answer.result.error().faults.empty() &&
         answer.result.error().faults.front().field == kInterrupted;
}

}  // namespace

SearchWorker::SearchWorker(NotebookFiles& files, std::string file, Listener listener)
    : m_files(files),
      m_file(std::move(file)),
      m_listener(std::move(listener)),
      m_thread([this] { work(); }) {}

SearchWorker::~SearchWorker() {
  {
    const std::lock_guard lock(m_mutex);
    m_stop = true;
    if (m_running != nullptr) m_running->interrupt();
  }
  m_wake.notify_one();
  m_thread.join();
}

void SearchWorker::ask(SearchQuestion question) {
  {
    const std::lock_guard lock(m_mutex);
    m_waiting = std::move(question);
    if (m_running != nullptr) m_running->interrupt();
  }
  m_wake.notify_one();
}

std::optional<SearchQuestion> SearchWorker::next() {
  std::unique_lock lock(m_mutex);
  m_running = nullptr;
  m_wake.wait(lock, [this] { return m_stop || m_waiting; });
  if (m_stop) return std::nullopt;
  m_running = m_notebook.get();
  return std::exchange(m_waiting, std::nullopt);
}

bool SearchWorker::isStillWanted() {
  const std::lock_guard lock(m_mutex);
  return !m_stop && !m_waiting;
}

void SearchWorker::work() {
  while (const auto question = next()) {
    if (openNotebook(*question)) answer(*question);
  }
}

bool SearchWorker::openNotebook(const SearchQuestion& question) {
  if (m_notebook) return true;
  auto opened = m_files.open(m_file, NotebookFiles::Use::kReading);
  if (!opened) {
    m_listener.answered(
        {question.number, std::unexpected(app::FindRefusal{std::nullopt, opened.error()})});
    return false;
  }
  const std::lock_guard lock(m_mutex);
  m_notebook = *std::move(opened);
  m_running = m_notebook.get();
  return true;
}

SearchAnswer SearchWorker::found(const SearchQuestion& question) {
  SearchAnswer answer{question.number,
                      app::findRunsPointing(*m_notebook, question.text, question.options, true)};
  if (!answer.result || !question.wantsTotal) return answer;
  if (const auto all = m_notebook->find({}, {.limit = 1})) answer.total = all->matches;
  return answer;
}

void SearchWorker::answer(const SearchQuestion& question) {
  SearchAnswer given = found(question);
  // An interruption that was meant for the question before is none of this one's.
  while (wasInterrupted(given) && isStillWanted()) given = found(question);
  if (!isStillWanted()) return;
  const bool foundNothing = given.result && given.result->matches == 0;
  m_listener.answered(std::move(given));
  if (foundNothing && !question.text.empty()) lookForHint(question);
}

void SearchWorker::lookForHint(const SearchQuestion& question) {
  const auto strict = app::findRunsPointing(*m_notebook, question.text, {.limit = 1});
  if (!strict && strict.error().place && isStillWanted())
    m_listener.hinted(question.number, *strict.error().place);
}

}  // namespace vialkeeper::ui
