// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <expected>
#include <string>
#include <string_view>
#include <utility>

namespace vialkeeper::text {

/// What is wrong with one short text, pointing at the offending characters.
struct TextFault {
  std::size_t offset = 0;  ///< byte at which the trouble begins
  std::size_t length = 0;  ///< bytes it spans; 0 where something is missing at `offset`
  std::string what;        ///< what is wrong, without a full stop
  std::string mend;        ///< what to do about it, without a full stop
};

/// A text fault as the failed half of an `expected`.
[[nodiscard]] inline std::unexpected<TextFault> textFault(std::size_t offset, std::size_t length,
                                                          std::string what, std::string mend) {
  return std::unexpected(TextFault{offset, length, std::move(what), std::move(mend)});
}

/// The fault's `what` with the position in characters, counted from 1:
/// `unit 'mgg' is not known (character 6)`.
[[nodiscard]] std::string whatWithPosition(const TextFault& fault, std::string_view text);

/// Two lines for a terminal: the text, and below it carets under the offending characters.
[[nodiscard]] std::string pointedAt(const TextFault& fault, std::string_view text);

}  // namespace vialkeeper::text
