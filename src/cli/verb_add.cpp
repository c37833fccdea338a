// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/run_plan.h"
#include "app/text_files.h"
#include "cli/json_text.h"
#include "cli/notebook_session.h"
#include "cli/record_json.h"
#include "cli/verb.h"
#include "text/utf8.h"

namespace vialkeeper::cli {
namespace {

struct AddOptions {
  std::string source;  ///< a plan file, or the code of the run to clone
  std::vector<std::string> set;
  std::string title;
  std::string aim;
};

text::Checked<std::vector<app::PlanOverride>> overridesOf(const std::vector<std::string>& set) {
  std::vector<app::PlanOverride> overrides;
  text::Faults faults;
  for (const std::string& each : set) {
    const std::size_t equals = each.find('=');
    if (equals == std::string::npos || equals == 0) {
      faults.push_back(usageFault("--set", fmt::format("{} sets nothing", text::quoted(each)),
                                  "write for example --set component.acid.mol_percent=10"));
    } else {
      overrides.push_back({each.substr(0, equals), each.substr(equals + 1)});
    }
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return overrides;
}

std::string answer(const app::AddedRun& added, const CommonOptions& common) {
  if (common.json) {
    return toJsonText({{"run", toJson(added.run)},
                       {"new_substances", added.newSubstances},
                       {"notices", noticesJson(added.notices)}});
  }
  std::string text =
      fmt::format("{}: {}\n", added.run.code,
                  added.run.title.empty() ? "untitled" : text::oneLine(added.run.title));
  for (const std::string& name : added.newSubstances)
    text += fmt::format("  new on the shelf: {}\n", text::oneLine(name));
  for (const text::Notice& notice : added.notices)
    text += fmt::format("! {}{}\n", notice.at.empty() ? "" : notice.at + ": ",
                        text::oneLine(notice.text));
  return text;
}

VerbResult runAdd(const AddOptions& options, const CommonOptions& common) {
  auto overrides = overridesOf(options.set);
  if (!overrides) return std::unexpected(overrides.error());
  auto planText = app::readFile(options.source);
  if (!planText) return std::unexpected(planText.error());
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  const auto added = app::addRun(session->desk(), {.planText = *std::move(planText),
                                                   .planFile = options.source,
                                                   .overrides = *std::move(overrides),
                                                   .title = options.title,
                                                   .aim = options.aim});
  if (!added) return std::unexpected(added.error());
  return answer(*added, common);
}

VerbResult runClone(const AddOptions& options, const CommonOptions& common) {
  const auto overrides = overridesOf(options.set);
  if (!overrides) return std::unexpected(overrides.error());
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  const auto original = app::runOfCode(session->notebook(), options.source);
  if (!original) return std::unexpected(original.error());
  const auto added = app::cloneRun(session->desk(), *original, *overrides, options.title);
  if (!added) return std::unexpected(added.error());
  return answer(*added, common);
}

void addCommon(CLI::App& parser, AddOptions& options) {
  parser
      .add_option("--set", options.set,
                  "a field that is set otherwise: component.acid.mol_percent=10")
      ->take_all();
  parser.add_option("--title", options.title, "in place of the plan's title");
}

}  // namespace

Verb addVerb(CLI::App& program) {
  auto options = std::make_shared<AddOptions>();
  CLI::App* parser = program.add_subcommand("add", "Add a run from a plan or a template");
  parser->add_option("PLAN", options->source, "a plan file")->required();
  parser->add_option("--aim", options->aim, "what the run is for");
  addCommon(*parser, *options);
  return {parser, [options](const CommonOptions& common) { return runAdd(*options, common); }};
}

Verb cloneVerb(CLI::App& program) {
  auto options = std::make_shared<AddOptions>();
  CLI::App* parser = program.add_subcommand("clone", "Add a run with the plan of another");
  parser->add_option("RUN", options->source, "the code of a run, KW-0042")->required();
  addCommon(*parser, *options);
  return {parser, [options](const CommonOptions& common) { return runClone(*options, common); }};
}

}  // namespace vialkeeper::cli
