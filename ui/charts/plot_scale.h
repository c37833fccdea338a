// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <utility>

/// Ranges and steps of an axis as a person would choose them. Pure.
namespace vialkeeper::ui {

/// A step of 1, 2 or 5 times a power of ten, at least `span / ticks`.
[[nodiscard]] double niceStep(double span, int ticks);

/// The range that an axis shows for data of this extent: with some room, and from zero where the
/// data come near it. Nothing: 0 to 1.
[[nodiscard]] std::pair<double, double> roomyRange(
    const std::optional<std::pair<double, double>>& extent);

/// A view of the same width moved into `all`; all of it where the view is wider.
[[nodiscard]] std::pair<double, double> within(std::pair<double, double> view,
                                               std::pair<double, double> all);

/// Widens an extent so that it holds a value too.
void extend(std::optional<std::pair<double, double>>& extent, double value);

}  // namespace vialkeeper::ui
