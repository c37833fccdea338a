// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <memory>
#include <nlohmann/json.hpp>
#include <optional>

#include "app/plan_charge.h"
#include "cli/charge_json.h"
#include "cli/charge_table.h"
#include "cli/json_text.h"
#include "cli/planned_source.h"
#include "cli/scale_options.h"
#include "cli/verb.h"

namespace vialkeeper::cli {
namespace {

struct ChargeOptions {
  std::string plan;
  std::optional<std::string> weighed;
  bool retarget = false;
  bool trail = false;
  ScaleOptions scale;
};

VerbResult runCharge(const ChargeOptions& options, const CommonOptions& common) {
  app::ChargeRequest request;
  text::Faults faults = readScale(options.scale, request);
  const bool ofNotebook = isRunCode(options.plan, common);
  if (options.retarget && !options.weighed && !ofNotebook) {
    faults.push_back(usageFault("--retarget", "there is nothing to follow without a weighing",
                                "add --weighed CSV with the limiting component in it"));
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  request.weighedFile = options.weighed;
  if (options.retarget) request.retarget = charge::Retarget::kYes;
  const auto run = plannedFrom(options.plan, request, common);
  if (!run) return std::unexpected(run.error());
  const bool weighed = request.weighedFile.has_value() || ofNotebook;
  return common.json ? toJsonText(toJson(*run, weighed))
                     : chargeTable(*run, weighed, options.trail);
}

}  // namespace

Verb chargeVerb(CLI::App& program) {
  auto options = std::make_shared<ChargeOptions>();
  CLI::App* parser = program.add_subcommand("charge", "What to weigh and pipette for a plan");
  parser->add_option("PLAN", options->plan, "a plan file, or with --book the code of a run")
      ->required();
  parser->add_option("--weighed", options->weighed,
                     "CSV of key,actual: what was weighed and pipetted");
  parser->add_flag("--retarget", options->retarget,
                   "let all else follow the limiting component as weighed");
  parser->add_flag("--trail", options->trail, "say where each number is from");
  addScaleOptions(*parser, options->scale);
  return {parser, [options](const CommonOptions& common) { return runCharge(*options, common); }};
}

}  // namespace vialkeeper::cli
