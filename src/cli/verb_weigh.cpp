// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/weigh_run.h"
#include "cli/charge_json.h"
#include "cli/charge_table.h"
#include "cli/json_text.h"
#include "cli/notebook_session.h"
#include "cli/questions.h"
#include "cli/record_json.h"
#include "cli/verb.h"
#include "text/utf8.h"

namespace vialkeeper::cli {
namespace {

struct WeighOptions {
  std::string run;
  std::string key;
  std::string quantity;
  std::string reason;
  bool yes = false;
  bool retarget = false;
};

VerbResult runWeigh(const WeighOptions& options, const CommonOptions& common) {
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  const auto run = app::runOfCode(session->notebook(), options.run);
  if (!run) return std::unexpected(run.error());
  auto weighed = app::weighComponent(session->desk(), *run, options.key, options.quantity,
                                     options.yes, options.reason);
  if (!weighed) return std::unexpected(weighed.error());
  if (!weighed->questions.empty())
    return std::unexpected(questionsAsFaults(options.key, weighed->questions));
  if (options.retarget) {
    auto retargeted = app::loadRun(session->notebook(), weighed->sheet.run, charge::Retarget::kYes);
    if (!retargeted) return std::unexpected(retargeted.error());
    weighed->sheet = *std::move(retargeted);
  }
  if (!common.json) {
    const std::string table = chargeTable(weighed->sheet.planned, true, false);
    if (weighed->before.empty()) return table;
    return fmt::format("{}: {} → {}; the old record stays in the history\n\n{}", options.key,
                       text::oneLine(weighed->before), text::oneLine(options.quantity), table);
  }
  auto json = toJson(weighed->sheet.planned, true);
  json["run"] = run->code;
  json["recorded_before"] = textOrNullJson(weighed->before);
  return toJsonText(json);
}

}  // namespace

Verb weighVerb(CLI::App& program) {
  auto options = std::make_shared<WeighOptions>();
  CLI::App* parser =
      program.add_subcommand("weigh", "Record what was weighed or pipetted for a component");
  parser->add_option("RUN", options->run, "the code of a run, KW-0042")->required();
  parser->add_option("KEY", options->key, "the component's key")->required();
  parser->add_option("QUANTITY", options->quantity, "what the balance or pipette gave, \"26.9 mg\"")
      ->required();
  parser->add_option("--reason", options->reason, "why, where the run's state asks for it");
  parser->add_flag("--yes", options->yes, "the quantity is right though it looks like a slip");
  parser->add_flag("--retarget", options->retarget,
                   "show the targets that follow the limiting component as weighed");
  return {parser, [options](const CommonOptions& common) { return runWeigh(*options, common); }};
}

}  // namespace vialkeeper::cli
