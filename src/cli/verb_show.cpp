// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/log_run.h"
#include "app/notebook/run_plan.h"
#include "cli/charge_json.h"
#include "cli/charge_table.h"
#include "cli/json_text.h"
#include "cli/moment_text.h"
#include "cli/notebook_session.h"
#include "cli/record_json.h"
#include "cli/text_table.h"
#include "cli/verb.h"
#include "text/utf8.h"

namespace vialkeeper::cli {
namespace {

struct Shown {
  app::RunRecord run;
  std::vector<app::ComponentRecord> components;
  std::vector<app::NumberedEvent> events;
  std::vector<app::DatasetRecord> datasets;
  std::vector<app::SealRecord> seals;
  std::vector<app::RevisionRecord> history;
};

template <class T>
bool take(text::Checked<T> from, T& into, text::Faults& faults) {
  if (from) {
    into = *std::move(from);
  } else {
    faults = from.error();
  }
  return faults.empty();
}

text::Checked<Shown> gather(app::Notebook& notebook, const std::string& code) {
  Shown shown;
  text::Faults faults;
  const bool all = take(app::runOfCode(notebook, code), shown.run, faults) &&
                   take(notebook.components(shown.run.n), shown.components, faults) &&
                   take(app::numberedEvents(notebook, shown.run), shown.events, faults) &&
                   take(notebook.datasetsOf(shown.run.n), shown.datasets, faults) &&
                   take(notebook.seals(shown.run.n), shown.seals, faults) &&
                   take(notebook.history(shown.run.n), shown.history, faults);
  if (!all) return std::unexpected(std::move(faults));
  return shown;
}

nlohmann::ordered_json historyJson(const std::vector<app::RevisionRecord>& history) {
  auto list = nlohmann::ordered_json::array();
  for (const app::RevisionRecord& revision : history) {
    list.push_back({{"revision", revision.seq},
                    {"at", toIsoText(revision.at)},
                    {"person", revision.person},
                    {"action", revision.action},
                    {"reason", textOrNullJson(revision.reason)},
                    {"changes", nlohmann::ordered_json::parse(revision.changes, nullptr, false)}});
  }
  return list;
}

std::string jsonText(const Shown& shown, bool withHistory) {
  nlohmann::ordered_json json = {{"run", toJson(shown.run)}};
  json["components"] = nlohmann::ordered_json::array();
  for (const auto& component : shown.components) json["components"].push_back(toJson(component));
  json["events"] = nlohmann::ordered_json::array();
  for (const auto& entry : shown.events) json["events"].push_back(toJson(entry, shown.events));
  json["datasets"] = nlohmann::ordered_json::array();
  for (const auto& dataset : shown.datasets) json["datasets"].push_back(toJson(dataset));
  json["seals"] = nlohmann::ordered_json::array();
  for (const auto& seal : shown.seals) {
    json["seals"].push_back(
        {{"person", seal.person}, {"meaning", seal.meaning}, {"at", toIsoText(seal.signedAt)}});
  }
  if (withHistory) json["history"] = historyJson(shown.history);
  json["notices"] = nlohmann::ordered_json::array();
  return toJsonText(json);
}

std::string eventLine(const app::NumberedEvent& entry) {
  const app::EventRecord& event = entry.event;
  const bool late = event.at.utc != event.logged.utc;
  std::string line = fmt::format("{:>4}  {}  {:<13}  {}", entry.number, minuteText(event.at),
                                 event.kind, text::oneLine(event.raw));
  if (event.supersededBy != 0) line += "  (corrected)";
  if (late) line += fmt::format("  (written down {})", minuteText(event.logged));
  return line + fmt::format("  {}\n", event.person);
}

std::string peopleText(const Shown& shown, bool withHistory) {
  const app::RunRecord& run = shown.run;
  std::string text =
      fmt::format("{}  {}  {}\n", run.code, toText(run.state), text::oneLine(run.title));
  text += fmt::format("{} by {}", minuteText(run.created), run.person);
  if (!run.series.empty()) text += ", series " + text::oneLine(run.series);
  text += "\n";
  if (!run.aim.empty()) text += "aim: " + text::oneLine(run.aim) + "\n";
  if (run.yield_percent) text += fmt::format("yield {:.3g} %\n", *run.yield_percent);
  if (run.conversion_percent) text += fmt::format("conversion {:.3g} %\n", *run.conversion_percent);
  if (!run.conclusion.empty()) text += "conclusion: " + text::oneLine(run.conclusion) + "\n";
  TextTable table;
  using enum TextTable::Align;
  for (const char* title : {"key", "role", "component"}) table.addColumn(title, kLeft);
  for (const char* title : {"mmol", "mol%", "recorded", "mol% as charged"})
    table.addColumn(title, kRight);
  const auto number = [](const std::optional<double>& value) {
    return value ? fmt::format("{:.4g}", *value) : std::string{};
  };
  for (const app::ComponentRecord& component : shown.components) {
    table.addRow({component.key, component.role, component.name, number(component.planned_mmol),
                  number(component.planned_molPercent), component.actualText,
                  number(component.charged_molPercent)});
  }
  text += "\n" + table.toText();
  if (!shown.events.empty()) text += "\n";
  for (const app::NumberedEvent& entry : shown.events) text += eventLine(entry);
  for (const app::DatasetRecord& dataset : shown.datasets) {
    text += fmt::format("\n{}  {}  {} rows from {}", dataset.code, dataset.kind, dataset.rows,
                        text::oneLine(dataset.rawName));
  }
  if (!shown.datasets.empty()) text += "\n";
  for (const app::SealRecord& seal : shown.seals) {
    text += fmt::format("\nsigned by {} as {} on {}\n", seal.person, seal.meaning,
                        toIsoText(seal.signedAt));
  }
  if (!withHistory) return text;
  text += "\n";
  for (const app::RevisionRecord& revision : shown.history) {
    text +=
        fmt::format("revision {}  {}  {}  {}{}\n", revision.seq, toIsoText(revision.at),
                    revision.person, revision.action,
                    revision.reason.empty() ? "" : "  because " + text::oneLine(revision.reason));
  }
  return text;
}

struct ShowOptions {
  std::string run;
  bool history = false;
};

VerbResult runShow(const ShowOptions& options, const CommonOptions& common) {
  auto session = NotebookSession::forReading(common);
  if (!session) return std::unexpected(session.error());
  const auto shown = gather(session->notebook(), options.run);
  if (!shown) return std::unexpected(shown.error());
  return common.json ? jsonText(*shown, options.history) : peopleText(*shown, options.history);
}

}  // namespace

Verb showVerb(CLI::App& program) {
  auto options = std::make_shared<ShowOptions>();
  CLI::App* parser = program.add_subcommand("show", "Everything about a run");
  parser->add_option("RUN", options->run, "the code of a run, KW-0042")->required();
  parser->add_flag("--history", options->history,
                   "also every change: who, when, what, before and after");
  return {parser, [options](const CommonOptions& common) { return runShow(*options, common); }};
}

}  // namespace vialkeeper::cli
