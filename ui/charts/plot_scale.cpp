// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/charts/plot_scale.h"

#include <algorithm>
#include <cmath>

namespace vialkeeper::ui {

double niceStep(double span, int ticks) {
  const double raw = span / std::max(ticks, 1);
  if (!(raw > 0.0) || !std::isfinite(raw)) return 1.0;
  const double power = std::pow(10.0, std::floor(std::log10(raw)));
  for (const double factor : {1.0, 2.0, 5.0}) {
    if (factor * power >= raw * (1.0 - 1e-9)) return factor * power;
  }
  return 10.0 * power;
}

std::pair<double, double> roomyRange(const std::optional<std::pair<double, double>>& extent) {
  constexpr double kRoom = 0.06;
  if (!extent) return {0.0, 1.0};
  auto [low, high] = *extent;
  if (low == high) {
    const double half = low == 0.0 ? 0.5 : std::abs(low) * 0.1;
    return {low - half, high + half};
  }
  const bool nearZero = low >= 0.0 && low < 0.5 * high;
  const double room = kRoom * (high - low);
  return {nearZero ? 0.0 : low - room, high + room};
}

std::pair<double, double> within(std::pair<double, double> view, std::pair<double, double> all) {
  const double width = view.second - view.first;
  if (!(width < all.second - all.first)) return all;
  if (view.first < all.first) return {all.first, all.first + width};
  if (view.second > all.second) return {all.second - width, all.second};
  return view;
}

void extend(std::optional<std::pair<double, double>>& extent, double value) {
  if (std::isnan(value)) return;
  if (!extent) extent = {value, value};
  extent->first = std::min(extent->first, value);
  extent->second = std::max(extent->second, value);
}

}  // namespace vialkeeper::ui
