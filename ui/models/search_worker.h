// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QtGlobal>
#include <condition_variable>
#include <expected>
#include <functional>
#include <memory>
#include <mutex>
#include <optional>
#include <string>
#include <thread>

#include "app/notebook/find_runs.h"
#include "ui/models/notebook_files.h"

namespace vialkeeper::ui {

struct SearchQuestion {
  quint64 number = 0;
  std::string text;
  app::FindOptions options;
  bool wantsTotal = false;  ///< how many runs the notebook holds, too
};

struct SearchAnswer {
  quint64 number = 0;
  std::expected<app::FindResult, app::FindRefusal> result;
  std::optional<std::int64_t> total = {};
};

/// Searches in a thread of its own, over a connection of its own. Only the newest question is
/// answered: one that comes takes the place of one that waits and stops one that runs.
class SearchWorker {
 public:
  /// What is called, in the worker's thread, with answers, and with what may be amiss in a text
  /// that finds nothing: a name that no substance has, for example.
  struct Listener {
    std::function<void(SearchAnswer)> answered;
    std::function<void(quint64, text::TextFault)> hinted;
  };

  SearchWorker(NotebookFiles& files, std::string file, Listener listener);
  SearchWorker(const SearchWorker&) = delete;
  SearchWorker& operator=(const SearchWorker&) = delete;
  /// Stops what runs.
  ~SearchWorker();

  void ask(SearchQuestion question);

 private:
  void work();
  std::optional<SearchQuestion> next();
  void answer(const SearchQuestion& question);
  bool openNotebook(const SearchQuestion& question);
  /// Nothing newer was asked, and nobody wants the worker to stop.
  bool isStillWanted();
  SearchAnswer found(const SearchQuestion& question);
  void lookForHint(const SearchQuestion& question);

  NotebookFiles& m_files;
  const std::string m_file;
  const Listener m_listener;
  std::unique_ptr<app::Notebook> m_notebook;  ///< the worker's; others only interrupt it, locked

  std::mutex m_mutex;
  std::condition_variable m_wake;
  std::optional<SearchQuestion> m_waiting;
  app::Notebook* m_running = nullptr;
  bool m_stop = false;

  std::thread m_thread;  ///< last: it uses all of the above
};

}  // namespace vialkeeper::ui
