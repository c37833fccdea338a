// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <span>
#include <string>
#include <string_view>

#include "app/notebook/find_query.h"

/// How a list of runs words what it shows of one.
namespace vialkeeper::app {

/// A share with its standard uncertainty, both to the uncertainty's first digit: `71 ± 2`,
/// `5.3 ± 0.2`, `71.4`. Empty where there is none.
[[nodiscard]] std::string percentText(std::optional<double> percent, std::optional<double> u);

/// A number with its unit, `440 nm`; empty where there is none.
[[nodiscard]] std::string measureText(std::optional<double> value, std::string_view unit);

/// The components in these roles with their loadings: `pivalic acid 10 %, water`.
[[nodiscard]] std::string componentsText(const FoundRun& found,
                                         std::span<const std::string_view> roles);

/// What is neither solvent nor limiting, in a few words: `4CzIPN 1 %, pivalic acid 10 %`.
[[nodiscard]] std::string contentsText(const FoundRun& found);

/// The title, or where the run has none what is in it.
[[nodiscard]] std::string titleText(const FoundRun& found);

}  // namespace vialkeeper::app
