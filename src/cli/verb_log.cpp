// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <algorithm>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/log_run.h"
#include "cli/json_text.h"
#include "cli/moment_text.h"
#include "cli/notebook_session.h"
#include "cli/questions.h"
#include "cli/record_json.h"
#include "cli/verb.h"
#include "text/utf8.h"

namespace vialkeeper::cli {
namespace {

struct LogOptions {
  std::string run;
  int event = 0;
  std::optional<int> withdrawn;  ///< the number of an entry to take back
  std::vector<std::string> text;
  std::optional<std::string> at;
  std::string reason;
  bool yes = false;
};

app::LogRequest requestOf(const LogOptions& options) {
  std::string line;
  for (const std::string& word : options.text) line += (line.empty() ? "" : " ") + word;
  return {.line = line, .at = options.at, .accepted = options.yes, .reason = options.reason};
}

/// What the verb does: a new entry, one in the place of another, or one that takes another back.
enum class Deed { kLog, kCorrect, kWithdraw };

text::Checked<app::LoggedEntry> done(const LogOptions& options, const app::Desk& desk,
                                     const app::RunRecord& run, Deed deed) {
  if (deed == Deed::kWithdraw)
    return app::withdrawEntry(desk, run, *options.withdrawn, options.reason);
  if (deed == Deed::kCorrect)
    return app::correctEvent(desk, run, options.event, requestOf(options));
  return app::logLine(desk, run, requestOf(options));
}

VerbResult write(const LogOptions& options, const CommonOptions& common, Deed deed) {
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  const auto run = app::runOfCode(session->notebook(), options.run);
  if (!run) return std::unexpected(run.error());
  const auto logged = done(options, session->desk(), *run, deed);
  if (!logged) return std::unexpected(logged.error());
  if (!logged->questions.empty())
    return std::unexpected(questionsAsFaults("entry", logged->questions));
  const auto events = app::numberedEvents(session->notebook(), *run);
  if (!events) return std::unexpected(events.error());
  const auto entry = std::ranges::find(*events, logged->event.n,
                                       [](const app::NumberedEvent& each) { return each.event.n; });
  text::Notices notices;
  if (logged->late)
    notices.push_back(
        {"late-entry", "the entry is written down more than a day after it happened", "at"});
  if (common.json) {
    return toJsonText({{"run", run->code},
                       {"read_as", logged->sentence},
                       {"event", toJson(*entry, *events)},
                       {"notices", noticesJson(notices)}});
  }
  std::string answer = fmt::format("{} entry {}: {}, {}\n", run->code, entry->number,
                                   text::oneLine(logged->sentence), minuteText(logged->event.at));
  for (const text::Notice& notice : notices) answer += "! " + notice.text + "\n";
  return answer;
}

/// Either a line or a number to withdraw.
VerbResult logOrWithdraw(const LogOptions& options, const CommonOptions& common) {
  if (!options.withdrawn && options.text.empty()) {
    return std::unexpected(text::Faults{
        usageFault("TEXT", "this is missing", "say what happened, or --withdraw an entry")});
  }
  if (options.withdrawn && (!options.text.empty() || options.at)) {
    return std::unexpected(
        text::Faults{usageFault("--withdraw", "a withdrawal has no text and no time of its own",
                                "say why with --reason, or use correct")});
  }
  return write(options, common, options.withdrawn ? Deed::kWithdraw : Deed::kLog);
}

void addCommon(CLI::App& parser, LogOptions& options) {
  parser.add_option("TEXT", options.text, "for example: p 0.42 bar 35 C (docs/log.md)");
  parser.add_option("--at", options.at,
                    "when it happened: 14:20, 20 min ago, 2026-03-04T14:20+01:00");
  parser.add_option("--reason", options.reason, "why, where the run's state asks for it");
  parser.add_flag("--yes", options.yes,
                  "keep a line that cannot be read as an observation, a likely slip as it is");
}

}  // namespace

Verb logVerb(CLI::App& program) {
  auto options = std::make_shared<LogOptions>();
  CLI::App* parser = program.add_subcommand("log", "Log what happens to a vial");
  parser->add_option("RUN", options->run, "the code of a run, KW-0042")->required();
  addCommon(*parser, *options);
  parser->add_option("--withdraw", options->withdrawn,
                     "in place of TEXT: the number of an entry that is taken back");
  return {parser,
          [options](const CommonOptions& common) { return logOrWithdraw(*options, common); }};
}

Verb correctVerb(CLI::App& program) {
  auto options = std::make_shared<LogOptions>();
  CLI::App* parser =
      program.add_subcommand("correct", "Put a new entry in the place of a wrong one");
  parser->add_option("RUN", options->run, "the code of a run, KW-0042")->required();
  parser->add_option("EVENT", options->event, "the entry's number, as show tells it")->required();
  addCommon(*parser, *options);
  parser->get_option("TEXT")->required();
  return {parser, [options](const CommonOptions& common) {
            return write(*options, common, Deed::kCorrect);
          }};
}

}  // namespace vialkeeper::cli
