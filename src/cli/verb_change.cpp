// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <memory>
#include <nlohmann/json.hpp>
#include <optional>

#include "app/notebook/edit_run.h"
#include "app/text_files.h"
#include "cli/charge_table.h"
#include "cli/json_text.h"
#include "cli/notebook_session.h"
#include "cli/record_json.h"
#include "cli/verb.h"
#include "text/utf8.h"

namespace vialkeeper::cli {
namespace {

using Json = nlohmann::ordered_json;

struct ChangeOptions {
  std::string run;
  std::optional<std::string> planFile;
  std::vector<std::string> set;
  std::vector<std::string> amounts;
  std::vector<std::string> removed;
  std::string reason;
};

/// `KEY=VALUE` in its two halves; a fault goes into the list.
std::optional<std::pair<std::string, std::string>> halves(const char* option,
                                                          const std::string& written,
                                                          const char* example,
                                                          text::Faults& faults) {
  const std::size_t equals = written.find('=');
  if (equals != std::string::npos && equals != 0)
    return std::pair{written.substr(0, equals), written.substr(equals + 1)};
  faults.push_back(usageFault(option, fmt::format("{} sets nothing", text::quoted(written)),
                              fmt::format("write for example {} {}", option, example)));
  return std::nullopt;
}

/// The whole text first, then what is taken out, then single fields.
text::Checked<std::vector<app::PlanEdit>> editsOf(const ChangeOptions& options) {
  std::vector<app::PlanEdit> edits;
  text::Faults faults;
  if (options.planFile) {
    auto planText = app::readFile(*options.planFile);
    if (planText) {
      edits.emplace_back(app::WholePlan{*std::move(planText)});
    } else {
      faults = planText.error();
    }
  }
  for (const std::string& key : options.removed) edits.emplace_back(app::ComponentRemoval{key});
  for (const std::string& each : options.set) {
    if (auto set = halves("--set", each, "vial.volume=\"20 mL\"", faults))
      edits.emplace_back(app::PlanOverride{std::move(set->first), std::move(set->second)});
  }
  for (const std::string& each : options.amounts) {
    if (auto amount = halves("--amount", each, "acid=\"5 mol%\"", faults))
      edits.emplace_back(app::AmountEdit{std::move(amount->first), std::move(amount->second)});
  }
  if (edits.empty() && faults.empty()) {
    faults.push_back(
        usageFault("", "nothing is to be changed", "give --set, --amount, --remove or --plan"));
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return edits;
}

VerbResult runChange(const ChangeOptions& options, const CommonOptions& common) {
  const auto edits = editsOf(options);
  if (!edits) return std::unexpected(edits.error());
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  const auto run = app::runOfCode(session->notebook(), options.run);
  if (!run) return std::unexpected(run.error());
  const auto changed = app::editRun(session->desk(), *run, *edits, options.reason);
  if (!changed) return std::unexpected(changed.error());
  const app::RunSheet& sheet = changed->sheet;
  if (common.json) {
    Json components = Json::array();
    for (const app::ComponentRecord& component : sheet.components)
      components.push_back(toJson(component));
    return toJsonText({{"run", toJson(sheet.run)},
                       {"components", std::move(components)},
                       {"new_substances", changed->newSubstances},
                       {"notices", noticesJson(changed->notices)}});
  }
  std::string text = chargeTable(sheet.planned, sheet.weighed, false);
  for (const std::string& name : changed->newSubstances)
    text += fmt::format("  new on the shelf: {}\n", text::oneLine(name));
  for (const text::Notice& notice : changed->notices)
    text += fmt::format("! {}\n", text::oneLine(notice.text));
  return text;
}

}  // namespace

Verb changeVerb(CLI::App& program) {
  auto options = std::make_shared<ChangeOptions>();
  CLI::App* parser = program.add_subcommand("change", "Change the plan of a run");
  parser->add_option("RUN", options->run, "the code of a run, KW-0042")->required();
  parser->add_option("--set", options->set, "a field: vial.volume=\"20 mL\"")->take_all();
  parser
      ->add_option("--amount", options->amounts,
                   "a component's amount, its basis from the unit: acid=\"5 mol%\"")
      ->take_all();
  parser->add_option("--remove", options->removed, "the key of a component to take out")
      ->take_all();
  parser->add_option("--plan", options->planFile, "a plan file in place of the whole text");
  parser->add_option("--reason", options->reason, "why, where the run's state asks for it");
  return {parser, [options](const CommonOptions& common) { return runChange(*options, common); }};
}

}  // namespace vialkeeper::cli
