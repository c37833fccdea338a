// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/compare_runs.h"
#include "app/notebook/run_results.h"
#include "cli/json_text.h"
#include "cli/notebook_session.h"
#include "cli/record_json.h"
#include "cli/text_table.h"
#include "cli/verb.h"

namespace vialkeeper::cli {
namespace {

struct ResultOptions {
  std::string run;
  app::ResultRequest request;
};

VerbResult runResult(const ResultOptions& options, const CommonOptions& common) {
  const app::ResultRequest& asked = options.request;
  if (!asked.yield && !asked.conversion && !asked.conclusion && !asked.aim && !asked.title && !asked.state) {
    return std::unexpected(text::Faults{usageFault("result", "nothing is given to record",
                                                   "add --yield, --conversion, --conclusion, --aim, --title or --state")});
  }
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  const auto run = app::runOfCode(session->notebook(), options.run);
  if (!run) return std::unexpected(run.error());
  const auto changed = app::recordResult(session->desk(), *run, options.request);
  if (!changed) return std::unexpected(changed.error());
  if (common.json)
    return toJsonText({{"run", toJson(*changed)}, {"notices", nlohmann::ordered_json::array()}});
  return fmt::format(
      "{}: {}{}\n", changed->code, toText(changed->state),
      changed->yield_percent ? fmt::format(", yield {:.3g} %", *changed->yield_percent) : "");
}

nlohmann::ordered_json differencesJson(const std::vector<app::Difference>& differences) {
  auto list = nlohmann::ordered_json::array();
  for (const app::Difference& difference : differences)
    list.push_back({{"what", difference.what}, {"values", difference.values}});
  return list;
}

VerbResult runCompare(const std::vector<std::string>& codes, const CommonOptions& common) {
  if (codes.size() < 2) {
    return std::unexpected(text::Faults{
        usageFault("RUN", "one run alone cannot be compared", "name two runs or more")});
  }
  auto session = NotebookSession::forReading(common);
  if (!session) return std::unexpected(session.error());
  std::vector<app::RunRecord> runs;
  text::Faults faults;
  for (const std::string& code : codes) {
    auto run = app::runOfCode(session->notebook(), code);
    if (run) {
      runs.push_back(*std::move(run));
    } else {
      faults.insert(faults.end(), run.error().begin(), run.error().end());
    }
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  const auto comparison = app::compareRuns(session->notebook(), runs);
  if (!comparison) return std::unexpected(comparison.error());
  if (common.json) {
    return toJsonText({{"runs", codes},
                       {"inputs", differencesJson(comparison->inputs)},
                       {"outcomes", differencesJson(comparison->outcomes)},
                       {"same_inputs", comparison->sameInputs},
                       {"notices", nlohmann::ordered_json::array()}});
  }
  TextTable table;
  table.addColumn("what differs", TextTable::Align::kLeft);
  for (const app::RunRecord& run : runs) table.addColumn(run.code, TextTable::Align::kRight);
  for (const auto* differences : {&comparison->inputs, &comparison->outcomes}) {
    for (const app::Difference& difference : *differences) {
      std::vector<std::string> cells{difference.what};
      cells.insert(cells.end(), difference.values.begin(), difference.values.end());
      table.addRow(std::move(cells));
    }
  }
  return table.toText() + fmt::format("{} inputs are the same\n", comparison->sameInputs);
}

}  // namespace

Verb resultVerb(CLI::App& program) {
  auto options = std::make_shared<ResultOptions>();
  CLI::App* parser =
      program.add_subcommand("result", "Record results, the conclusion, and the run's next state");
  app::ResultRequest& request = options->request;
  parser->add_option("RUN", options->run, "the code of a run, KW-0042")->required();
  parser->add_option("--yield", request.yield, "\"71 %\" or \"71 ± 2 %\"");
  parser->add_option("--conversion", request.conversion, "the same");
  parser->add_option("--conclusion", request.conclusion, "what was learnt");
  parser->add_option("--aim", request.aim, "what the run is for");
  parser->add_option("--title", request.title, "a new title");
  parser->add_option("--state", request.state,
                     "planned, charged, irradiating, worked-up, closed (docs/run-life.md)");
  parser->add_option("--reason", request.reason, "why, where the run's state asks for it");
  return {parser, [options](const CommonOptions& common) { return runResult(*options, common); }};
}

Verb compareVerb(CLI::App& program) {
  auto codes = std::make_shared<std::vector<std::string>>();
  CLI::App* parser = program.add_subcommand("compare", "In what runs differ");
  parser->add_option("RUN", *codes, "the codes of two runs or more")->required();
  return {parser, [codes](const CommonOptions& common) { return runCompare(*codes, common); }};
}

}  // namespace vialkeeper::cli
