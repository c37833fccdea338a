// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
// Measures the notebook file; each command prints one line.
//   bench_notebook fill FILE RUNS          a new notebook of so many invented runs: runs/s, bytes
//   bench_notebook find FILE QUERY COUNT   so many searches: p50 and p95 in ms, of the clock and of
//                                          the processor. In QUERY {pc}
//   {metal} {acid}
//                                          {additive} {word} {low} {high} are put in anew for each
//                                          search.
//   bench_notebook write QUERY COUNT       the same searches' texts with their places filled, one a
//                                          line: QUERY may be anything, such as SQL
//   bench_notebook log FILE COUNT          log entries with full durability, each into another of
//   the newest
//                                          open runs in turn: entries/s
//   bench_notebook fsync FOLDER COUNT      512 bytes appended and synced, without a database:
//   writes/s
#include <fcntl.h>
#include <fmt/format.h>
#include <unistd.h>

#include <algorithm>
#include <array>
#include <charconv>
#include <chrono>
#include <ctime>
#include <filesystem>
#include <iostream>
#include <string>
#include <vector>

#include "app/notebook/demo_bulk.h"
#include "app/notebook/demo_random.h"
#include "app/notebook/find_runs.h"
#include "app/notebook/log_run.h"
#include "db/sqlite_notebook.h"

namespace {

using namespace vialkeeper;
using Steady = std::chrono::steady_clock;

constexpr std::uint64_t kSeed = 20260302;
constexpr std::uint64_t kStream = 2'000'000;
constexpr std::int64_t kWarming = 5;

double secondsSince(Steady::time_point start) {
  return std::chrono::duration<double>(Steady::now() - start).count();
}

int fail(const text::Faults& faults) {
  for (const text::Fault& fault : faults) std::cerr << text::toLine(fault) << '\n';
  return 1;
}

class WallClock final : public app::Clock {
 public:
  [[nodiscard]] units::Moment now() override {
    return {std::chrono::floor<std::chrono::milliseconds>(std::chrono::system_clock::now()),
            std::chrono::minutes(0)};
  }
};

int fill(const std::string& file, std::int64_t runs) {
  auto notebook = db::createNotebook(file);
  if (!notebook) return fail(notebook.error());
  const auto start = Steady::now();
  const auto summary = app::fillWithRuns(**notebook, runs, {});
  if (!summary) return fail(summary.error());
  const double took_s = secondsSince(start);
  std::cout << fmt::format("fill: {} runs, {} events in {:.2f} s, {:.0f} runs/s, {} bytes\n",
                           summary->runs, summary->events, took_s,
                           static_cast<double>(summary->runs) / took_s,
                           std::filesystem::file_size(file));
  return 0;
}

void replaceAll(std::string& text, std::string_view what, const std::string& by) {
  for (std::size_t at = text.find(what); at != std::string::npos;
       at = text.find(what, at + by.size())) {
    text.replace(at, what.size(), by);
  }
}

/// The query with its places filled; names from the whole shelf, used and hardly used ones alike.
std::string varied(std::string query, app::DemoRandom& random) {
  const app::DemoVocabulary& vocabulary = app::demoVocabulary();
  // {'pc'} and the like are for SQL, without the search language's quotation marks.
  const auto quoted = [&random](const std::vector<std::string>& names) {
    return fmt::format("\"{}\"", random.pick(names));
  };
  constexpr auto kLow = std::to_array<double>({0.5, 1, 2, 5, 10});
  const double low = random.pick(kLow);
  const auto named = [&](const char* place, const std::vector<std::string>& names) {
    const std::string name = quoted(names);
    replaceAll(query, fmt::format("{{'{}'}}", place),
               fmt::format("'{}'", name.substr(1, name.size() - 2)));
    replaceAll(query, fmt::format("{{{}}}", place), name);
  };
  named("pc", vocabulary.photocatalysts);
  named("metal", vocabulary.cocatalysts);
  named("acid", vocabulary.acids);
  named("additive", vocabulary.additives);
  replaceAll(query, "{word}", random.pick(vocabulary.words));
  replaceAll(query, "{low}", fmt::format("{:g}", low));
  replaceAll(query, "{high}", fmt::format("{:g}", 2.0 * low));
  return query;
}

int find(const std::string& file, const std::string& query, std::int64_t count) {
  auto notebook = db::openNotebook(file, db::OpenFor::kReading, "bench");
  if (!notebook) return fail(notebook.error());
  app::DemoRandom random(kSeed, kStream);
  std::vector<double> times_ms;
  std::vector<double> cpu_ms;
  std::int64_t matches = 0;
  for (std::int64_t i = -kWarming; i < count; ++i) {  // the first few warm the caches
    const std::string text = varied(query, random);
    const auto start = Steady::now();
    const std::clock_t cpuStart = std::clock();
    const auto found = app::findRuns(**notebook, text, {});
    const double worked_ms = 1e3 * static_cast<double>(std::clock() - cpuStart) / CLOCKS_PER_SEC;
    const double took_ms = 1e3 * secondsSince(start);
    if (!found) return fail(found.error());
    if (i < 0) continue;
    times_ms.push_back(took_ms);
    cpu_ms.push_back(worked_ms);
    matches += found->matches;
  }
  std::ranges::sort(times_ms);
  std::ranges::sort(cpu_ms);
  const auto percentile = [](const std::vector<double>& times, std::size_t p) {
    return times[std::min(times.size() - 1, times.size() * p / 100)];
  };
  std::cout << fmt::format(
      "find: p50 {:.2f} ms, p95 {:.2f} ms, most {:.2f} ms, cpu50 {:.2f} ms, cpu95 {:.2f} ms, {} "
      "searches, {:.1f} matches on average\n",
      percentile(times_ms, 50), percentile(times_ms, 95), times_ms.back(), percentile(cpu_ms, 50),
      percentile(cpu_ms, 95), count, static_cast<double>(matches) / static_cast<double>(count));
  return 0;
}

/// The texts that find() would ask for, in the same order and with the same chances.
int write(const std::string& query, std::int64_t count) {
  app::DemoRandom random(kSeed, kStream);
  for (std::int64_t i = -kWarming; i < count; ++i) std::cout << varied(query, random) << '\n';
  return 0;
}

int log(const std::string& file, std::int64_t count) {
  auto notebook = db::openNotebook(file, db::OpenFor::kWriting, "bench");
  if (!notebook) return fail(notebook.error());
  const auto newest = (*notebook)->find({}, {.limit = 2000});
  if (!newest) return fail(newest.error());
  std::vector<app::RunRecord> open;
  for (const app::FoundRun& found : newest->runs) {
    if (found.run.state < app::RunState::kClosed) open.push_back(found.run);
  }
  if (open.empty()) {
    std::cerr << "none of the 2000 newest runs is open\n";
    return 1;
  }
  WallClock clock;
  const auto start = Steady::now();
  for (std::int64_t i = 0; i < count; ++i) {
    const app::RunRecord& run = open[static_cast<std::size_t>(i) % open.size()];
    const std::string line =
        i % 2 == 0 ? "p 0.42 bar 35 C" : fmt::format("amber, steady bubbles, look {}", i);
    if (const auto logged = app::logLine({**notebook, clock, run.person}, run, {.line = line});
        !logged)
      return fail(logged.error());
  }
  const double took_s = secondsSince(start);
  std::cout << fmt::format("log: {} entries in {:.2f} s, {:.0f} entries/s\n", count, took_s,
                           static_cast<double>(count) / took_s);
  return 0;
}

int sync(const std::string& folder, std::int64_t count) {
  const std::string file = folder + "/bench_notebook.fsync";
  const int handle = ::open(file.c_str(), O_WRONLY | O_CREAT | O_EXCL | O_APPEND, 0600);
  if (handle < 0) {
    std::cerr << file << " cannot be made\n";
    return 1;
  }
  const std::string bytes(512, 'x');
  bool sound = true;
  const auto start = Steady::now();
  for (std::int64_t i = 0; i < count && sound; ++i) {
    sound = ::write(handle, bytes.data(), bytes.size()) == static_cast<ssize_t>(bytes.size()) &&
            ::fsync(handle) == 0;
  }
  const double took_s = secondsSince(start);
  ::close(handle);
  std::filesystem::remove(file);
  if (!sound) {
    std::cerr << "the disk reported an error\n";
    return 1;
  }
  std::cout << fmt::format("fsync: {} writes in {:.2f} s, {:.0f} writes/s\n", count, took_s,
                           static_cast<double>(count) / took_s);
  return 0;
}

}  // namespace

int main(int argc, char** argv) {
  const std::vector<std::string> words(argv + 1, argv + argc);
  std::int64_t count = 0;
  const bool counted =
      !words.empty() &&
      std::from_chars(words.back().data(), words.back().data() + words.back().size(), count).ec ==
          std::errc() &&
      count > 0;
  if (counted && words.size() == 3 && words[0] == "fill") return fill(words[1], count);
  if (counted && words.size() == 4 && words[0] == "find") return find(words[1], words[2], count);
  if (counted && words.size() == 3 && words[0] == "write") return write(words[1], count);
  if (counted && words.size() == 3 && words[0] == "log") return log(words[1], count);
  if (counted && words.size() == 3 && words[0] == "fsync") return sync(words[1], count);
  std::cerr << "usage: bench_notebook fill FILE RUNS | find FILE QUERY COUNT | write QUERY COUNT | "
               "log FILE COUNT | "
               "fsync FOLDER COUNT\n";
  return 2;
}
