// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <algorithm>

#include "app/plan_charge.h"
#include "app/sheet_content.h"
#include "app/sheet_parts.h"
#include "charge/trail.h"

namespace vialkeeper::app {
namespace {

std::string joined(const std::vector<std::string>& parts, const char* between) {
  std::string text;
  for (const std::string& part : parts) text += (text.empty() ? "" : between) + part;
  return text;
}

/// Codes of all components, each once, in order.
std::string hazardCodes(const charge::Plan& plan) {
  std::vector<std::string> codes;
  for (const charge::ComponentPlan& component : plan.components) {
    codes.insert(codes.end(), component.hazards.begin(), component.hazards.end());
  }
  std::ranges::sort(codes);
  const auto repeated = std::ranges::unique(codes);
  codes.erase(repeated.begin(), repeated.end());
  return joined(codes, " ");
}

}  // namespace

LabelContent vialLabel(const PlannedRun& run) {
  std::vector<std::string> contents;
  std::vector<std::string> solvents;
  for (std::size_t i = 0; i < run.plan.components.size(); ++i) {
    const charge::ComponentPlan& component = run.plan.components[i];
    if (component.isSolvent()) {
      solvents.push_back(component.name);
    } else {
      const std::string ratio = ratioText(component, run.charge.components[i]);
      contents.push_back(ratio.empty() ? component.name
                                       : fmt::format("{} {}", component.name, ratio));
    }
  }
  std::vector<std::string> gases;
  for (const charge::EvolvedGas& gas : run.plan.gases) gases.push_back(speciesText(gas.species));
  LabelContent label{
      .code = sheetCode(run),
      .title = run.plan.title,
      .qrText = run.plan.code.empty() ? "plan " + planMark(run.planText) : run.plan.code,
      .lines = {joined(contents, ", "), joined(solvents, "/")},
      .conditions = lightText(run.plan.irradiation),
      .hazards = hazardCodes(run.plan),
      .caution = gases.empty() ? "" : fmt::format("gives off {}: pressure", joined(gases, ", ")),
      .person = run.plan.chemist,
      .date = run.plan.date};
  if (run.plan.seal) label.lines.back() += " under " + atmosphereText(*run.plan.seal);
  return label;
}

}  // namespace vialkeeper::app
