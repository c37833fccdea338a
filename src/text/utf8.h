// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>

namespace vialkeeper::text {

/// Byte offset of the first sequence that is not well-formed UTF-8 (overlong forms, surrogates and
/// values above U+10FFFF included), or nothing where the whole text is well formed.
[[nodiscard]] std::optional<std::size_t> firstInvalidUtf8(std::string_view text);

/// The code point that begins at `offset`, with its length in bytes. The text must be valid UTF-8.
struct CodePoint {
  char32_t value;
  std::size_t length;
};
[[nodiscard]] CodePoint codePointAt(std::string_view text, std::size_t offset);

/// Number of code points before the byte `offset`, for telling people a character's position.
[[nodiscard]] std::size_t characterIndex(std::string_view text, std::size_t offset);

/// Appends one code point.
void appendUtf8(std::string& text, char32_t value);

/// The text with control characters, bidirectional controls and invalid bytes written out
/// (`\n`, `\x1B`, `\u202E`), so that it shows as one line that says what it is.
[[nodiscard]] std::string oneLine(std::string_view text);

/// The text without the blanks (space, tab) at both ends.
[[nodiscard]] std::string_view trimmed(std::string_view text);

/// The text between quotation marks for a message: at most 40 characters, then an ellipsis.
[[nodiscard]] std::string quoted(std::string_view text);

/// ASCII letters lowered, all else kept: for names compared without regard to case.
[[nodiscard]] std::string asciiLowered(std::string_view text);

}  // namespace vialkeeper::text
