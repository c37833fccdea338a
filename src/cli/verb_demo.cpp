// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>
#include <fmt/ranges.h>

#include <CLI/CLI.hpp>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/demo_campaign.h"
#include "app/notebook/demo_people.h"
#include "cli/json_text.h"
#include "cli/notebook_session.h"
#include "cli/verb.h"
#include "db/sqlite_notebook.h"

namespace vialkeeper::cli {
namespace {

std::string answer(const std::string& file, const app::DemoSummary& summary,
                   const CommonOptions& common) {
  if (common.json) {
    return toJsonText({{"file", file},
                       {"people", app::kDemoPeople},
                       {"runs", summary.runs},
                       {"events", summary.events},
                       {"datasets", summary.datasets},
                       {"notices", nlohmann::ordered_json::array()}});
  }
  return fmt::format(
      "{}: {} invented runs by {}, {} log entries, {} datasets\nAll of it is invented; none of it "
      "was measured.\n",
      file, summary.runs, fmt::join(app::kDemoPeople, ", "), summary.events, summary.datasets);
}

/// A demonstration that is half there is of no use: it is there whole or not at all.
VerbResult runDemo(int runs, const CommonOptions& common) {
  const auto file = bookFile(common);
  if (!file) return std::unexpected(file.error());
  if (runs < 1) {
    return std::unexpected(text::Faults{
        usageFault("--runs", "a demonstration has at least one run", "ask for 1 or more")});
  }
  app::DemoSummary summary;
  const auto made = db::makeNotebook(*file, [&](app::Notebook& notebook) -> text::Checked<void> {
    const auto filled = app::makeDemo(notebook, {.runs = runs});
    if (!filled) return std::unexpected(filled.error());
    summary = *filled;
    return {};
  });
  if (!made) return std::unexpected(made.error());
  return answer(*file, summary, common);
}

}  // namespace

Verb demoVerb(CLI::App& program) {
  auto runs = std::make_shared<int>(app::kDemoCampaignRuns);
  CLI::App* parser =
      program.add_subcommand("demo", "Make a notebook of invented runs, to look around in");
  parser->add_option("--runs", *runs,
                     fmt::format("how many runs; {} are the campaign, more are filled up in bulk",
                                 app::kDemoCampaignRuns));
  return {parser, [runs](const CommonOptions& common) { return runDemo(*runs, common); }};
}

}  // namespace vialkeeper::cli
