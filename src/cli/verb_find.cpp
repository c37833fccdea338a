// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <algorithm>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/find_runs.h"
#include "app/notebook/run_text.h"
#include "cli/json_text.h"
#include "cli/notebook_session.h"
#include "cli/record_json.h"
#include "cli/text_table.h"
#include "cli/verb.h"
#include "text/csv.h"
#include "text/utf8.h"
#include "units/shown.h"

namespace vialkeeper::cli {
namespace {

struct FindWords {
  std::vector<std::string> query;
  std::string sort = "newest";
  std::int64_t limit = 200;
  bool csv = false;
};

constexpr auto kOrders = {
    std::pair{"newest", app::FindOrder::kNewest}, std::pair{"oldest", app::FindOrder::kOldest},
    std::pair{"rank", app::FindOrder::kRank}, std::pair{"yield", app::FindOrder::kYield},
    std::pair{"code", app::FindOrder::kCode}};

std::string tableText(const app::FindResult& result) {
  TextTable table;
  using enum TextTable::Align;
  for (const char* title : {"code", "state", "date", "title", "catalysts and additives"})
    table.addColumn(title, kLeft);
  table.addColumn("yield %", kRight);
  for (const app::FoundRun& found : result.runs) {
    table.addRow({found.run.code, std::string(toText(found.run.state)),
                  toIsoText(found.run.created).substr(0, 10), found.run.title, contentsText(found),
                  app::percentText(found.run.yield_percent, found.run.uYield_percent)});
  }
  const auto shown = static_cast<std::int64_t>(result.runs.size());
  const std::string count = shown < result.matches
                                ? fmt::format("{} of {} runs", shown, result.matches)
                                : fmt::format("{} {}", shown, shown == 1 ? "run" : "runs");
  return table.toText() + count + "\n";
}

/// A cell for a spreadsheet: one that would begin a formula there is kept as text by an apostrophe
/// (OWASP, CSV injection; from memory).
std::string safeCell(const std::string& cell) {
  const bool formula =
      !cell.empty() && std::string_view("=+-@\t\r").find(cell.front()) != std::string_view::npos;
  return text::toCsvCell(formula ? "'" + cell : cell);
}

std::string csvText(const app::FindResult& result) {
  std::string csv =
      "code,state,created,person,title,series,contents,yield_percent,u_yield_percent\r\n";
  const auto number = [](const std::optional<double>& value) {
    return value ? fmt::format("{}", *value) : std::string{};
  };
  for (const app::FoundRun& found : result.runs) {
    const app::RunRecord& run = found.run;
    csv += fmt::format("{},{},{},{},{},{},{},{},{}\r\n", safeCell(run.code), toText(run.state),
                       toIsoText(run.created), safeCell(run.person), safeCell(run.title),
                       safeCell(run.series), safeCell(contentsText(found)), number(run.yield_percent),
                       number(run.uYield_percent));
  }
  return csv;
}

std::string jsonText(const app::FindResult& result) {
  nlohmann::ordered_json runs = nlohmann::ordered_json::array();
  for (const app::FoundRun& found : result.runs) {
    auto run = toJson(found.run);
    run["components"] = nlohmann::ordered_json::array();
    for (const app::ComponentRecord& component : found.components)
      run["components"].push_back(toJson(component));
    runs.push_back(std::move(run));
  }
  return toJsonText({{"matches", result.matches},
                     {"runs", std::move(runs)},
                     {"notices", nlohmann::ordered_json::array()}});
}

VerbResult runFind(const FindWords& words, const CommonOptions& common) {
  const auto order = std::ranges::find(
      kOrders, words.sort, [](const auto& entry) { return std::string_view(entry.first); });
  if (order == kOrders.end()) {
    return std::unexpected(
        text::Faults{usageFault("--sort", fmt::format("{} is no order", text::quoted(words.sort)),
                                "choose newest, oldest, rank, yield or code")});
  }
  if (words.limit < 0) {
    return std::unexpected(
        text::Faults{usageFault("--limit", fmt::format("{} is less than nothing", words.limit),
                                "give how many runs to list, or 0 for all")});
  }
  if (words.csv && common.json) {
    return std::unexpected(text::Faults{usageFault(
        "--csv", "a list is written as CSV or as JSON, not as both", "leave out --csv or --json")});
  }
  auto session = NotebookSession::forReading(common);
  if (!session) return std::unexpected(session.error());
  std::string query;
  for (const std::string& word : words.query) query += (query.empty() ? "" : " ") + word;
  const auto result =
      app::findRuns(session->notebook(), query,
                    {.order = order->second, .limit = static_cast<std::size_t>(words.limit)});
  if (!result) return std::unexpected(result.error());
  if (common.json) return jsonText(*result);
  return words.csv ? csvText(*result) : tableText(*result);
}

Verb findLike(CLI::App& program, const char* name, const char* description, bool withQuery) {
  auto words = std::make_shared<FindWords>();
  CLI::App* parser = program.add_subcommand(name, description);
  if (withQuery)
    parser
        ->add_option("QUERY", words->query,
                     "for example: additive:\"pivalic acid\" 5..20 mol% yield>60")
        ->required();
  parser->add_option("--sort", words->sort, "newest (default), oldest, rank, yield, code");
  parser->add_option("--limit", words->limit, "most runs to list; 0 for all; default 200");
  parser->add_flag("--csv", words->csv, "a table for a spreadsheet");
  return {parser, [words](const CommonOptions& common) { return runFind(*words, common); }};
}

}  // namespace

Verb findVerb(CLI::App& program) {
  return findLike(program, "find", "Find runs (docs/find.md tells the language)", true);
}
Verb runsVerb(CLI::App& program) {
  return findLike(program, "runs", "List the runs, newest first", false);
}

}  // namespace vialkeeper::cli
