// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
// Measures the desktop without a display; each command prints one line or two.
//   bench_desktop start FILE NS   from NS (CLOCK_MONOTONIC, taken before the process was started)
//   to
//                                 the window painted with the runs of the notebook in its table
//   bench_desktop keys FILE       from each keystroke in the filter line to its runs painted: p50
//   and
//                                 p95 over a set of searches typed letter by letter, and the memory
//   bench_desktop texts           the texts of those keystrokes, one a line
#include <fmt/format.h>

#include <QApplication>
#include <QElapsedTimer>
#include <QLineEdit>
#include <QStandardPaths>
#include <QTableView>
#include <algorithm>
#include <chrono>
#include <cstdlib>
#include <fstream>
#include <iostream>
#include <string>
#include <vector>

#include "app/system_clock.h"
#include "db/signing.h"
#include "db/sqlite_notebook.h"
#include "ui/models/run_search.h"
#include "ui/widgets/main_window.h"
#include "ui/widgets/theme.h"
#include "ui/widgets/workspace.h"

namespace {

using namespace vialkeeper;

constexpr qint64 kMost_ms = 30'000;

class BenchFiles final : public ui::NotebookFiles {
 public:
  text::Checked<std::unique_ptr<app::Notebook>> open(const std::string& file, Use use) override {
    return db::openNotebook(
        file, use == Use::kWriting ? db::OpenFor::kWriting : db::OpenFor::kReading, "bench");
  }
  text::Checked<std::unique_ptr<app::Notebook>> create(const std::string& file) override {
    return db::createNotebook(file);
  }
};

/// Searches as people type them, each letter by letter.
const QStringList& searches() {
  static const QStringList list{
      QStringLiteral("photocatalyst:4CzIPN additive:\"pivalic acid\" 5..20 mol%"),
      QStringLiteral("amber film"),
      QStringLiteral("bubbles slower"),
      QStringLiteral("pivalic acid"),
      QStringLiteral("yield>60"),
      QStringLiteral("acid:\"benzoic acid\" yield>60"),
      QStringLiteral("state:closed septum"),
      QStringLiteral("indoline 10 mol%"),
  };
  return list;
}

QStringList keystrokes() {
  QStringList texts;
  for (const QString& search : searches())
    for (qsizetype length = 1; length <= search.size(); ++length) texts += search.left(length);
  return texts;
}

double memory_MB() {
  std::ifstream status("/proc/self/status");
  for (std::string line; std::getline(status, line);)
    if (line.starts_with("VmRSS:")) return std::stod(line.substr(6)) / 1024.0;
  return 0.0;
}

/// The window on a notebook, shown, with everything that is in it to be found.
struct Bench {
  BenchFiles files;
  app::SystemClock clock;
  db::SodiumSigner signer;
  ui::MainWindow window{{files, clock, signer}};
  QLineEdit* filter = nullptr;
  QTableView* table = nullptr;
  ui::RunSearch* search = nullptr;

  bool open(const QString& file) {
    window.openNotebook(file);
    window.setVisible(true);
    if (window.workspace() == nullptr) return false;
    filter = window.findChild<QLineEdit*>(QStringLiteral("filterLine"));
    table = window.findChild<QTableView*>(QStringLiteral("runsTable"));
    search = &window.workspace()->runSearch();
    return settle();
  }
  /// Until the newest text is answered and painted.
  bool settle() {
    QElapsedTimer waited;
    waited.start();
    while (search->isBusy() && waited.elapsed() < kMost_ms)
      QCoreApplication::processEvents(QEventLoop::WaitForMoreEvents, 100);
    table->viewport()->repaint();
    return !search->isBusy();
  }
};

int start(const QString& file, long long begun_ns) {
  Bench bench;
  if (!bench.open(file) || bench.table->model()->rowCount() == 0) {
    std::cerr << "the window shows no run\n";
    return 1;
  }
  const long long now_ns = std::chrono::steady_clock::now().time_since_epoch().count();
  std::cout << fmt::format(
      "start: {:.0f} ms to {} runs in the table, {} in the notebook, {:.0f} MB\n",
      static_cast<double>(now_ns - begun_ns) * 1e-6, bench.table->model()->rowCount(),
      bench.search->total(), memory_MB());
  return 0;
}

int keys(const QString& file) {
  Bench bench;
  if (!bench.open(file)) return 1;
  std::vector<std::pair<double, QString>> times_ms;
  for (const QString& text : keystrokes()) {
    QElapsedTimer timer;
    timer.start();
    bench.filter->setText(text);
    if (!bench.settle()) {
      std::cerr << "no answer to " << text.toStdString() << '\n';
      return 1;
    }
    times_ms.emplace_back(static_cast<double>(timer.nsecsElapsed()) * 1e-6, text);
  }
  std::ranges::sort(times_ms);
  const auto percentile = [&times_ms](std::size_t p) {
    return times_ms[std::min(times_ms.size() - 1, times_ms.size() * p / 100)].first;
  };
  std::cout << fmt::format("keys: p50 {:.1f} ms, p95 {:.1f} ms, {} keystrokes, {:.0f} MB\n",
                           percentile(50), percentile(95), times_ms.size(), memory_MB());
  for (std::size_t i = times_ms.size() - 3; i < times_ms.size(); ++i)
    std::cout << fmt::format("  slowest {:.1f} ms: {}\n", times_ms[i].first,
                             times_ms[i].second.toStdString());
  return 0;
}

}  // namespace

int main(int argc, char** argv) {
  setenv("QT_QPA_PLATFORM", "offscreen", 0);
  QApplication application(argc, argv);
  QCoreApplication::setApplicationName(QStringLiteral("vialkeeper-bench"));
  QStandardPaths::setTestModeEnabled(true);
  ui::Theme::instance().apply(application, ui::Theme::Choice::kLight);
  const QStringList words = QCoreApplication::arguments();
  if (words.size() == 4 && words[1] == QStringLiteral("start"))
    return start(words[2], words[3].toLongLong());
  if (words.size() == 3 && words[1] == QStringLiteral("keys")) return keys(words[2]);
  if (words.size() == 2 && words[1] == QStringLiteral("texts")) {
    for (const QString& text : keystrokes()) std::cout << text.toStdString() << '\n';
    return 0;
  }
  std::cerr << "usage: bench_desktop start FILE NS | keys FILE | texts\n";
  return 2;
}
