// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/run_text.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "units/shown.h"

namespace vialkeeper::app {
namespace {

void append(std::string& text, const ComponentRecord& component) {
  if (!text.empty()) text += ", ";
  text += component.name;
  if (const auto loading = component.loading_molPercent())
    text += fmt::format(" {} %", units::toSignificant(*loading, 2));
}

/// How many decimals show the first digit that is not zero.
int decimalsOf(double u) { return std::clamp(static_cast<int>(-std::floor(std::log10(u))), 0, 6); }

}  // namespace

std::string percentText(std::optional<double> percent, std::optional<double> u) {
  if (!percent) return {};
  if (!u || !(*u > 0.0) || !std::isfinite(*u)) return fmt::format("{:.3g}", *percent);
  const int decimals = decimalsOf(*u);
  return fmt::format("{:.{}f} ± {:.{}f}", *percent, decimals, *u, decimals);
}

std::string measureText(std::optional<double> value, std::string_view unit) {
  return value ? fmt::format("{:g} {}", *value, unit) : std::string();
}

std::string componentsText(const FoundRun& found, std::span<const std::string_view> roles) {
  std::string text;
  for (const ComponentRecord& component : found.components) {
    if (std::ranges::find(roles, component.role) == roles.end()) continue;
    // Of solvents and of what all else is counted by, a loading says nothing.
    if (component.role == "solvent" || component.key == found.run.limitingKey) {
      text += (text.empty() ? "" : ", ") + component.name;
    } else {
      append(text, component);
    }
  }
  return text;
}

std::string contentsText(const FoundRun& found) {
  std::string text;
  for (const ComponentRecord& component : found.components) {
    if (component.role != "solvent" && component.key != found.run.limitingKey)
      append(text, component);
  }
  return text;
}

std::string titleText(const FoundRun& found) {
  return found.run.title.empty() ? contentsText(found) : found.run.title;
}

}  // namespace vialkeeper::app
