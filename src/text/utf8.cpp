// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "text/utf8.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>

namespace vialkeeper::text {
namespace {

unsigned char byteAt(std::string_view text, std::size_t offset) {
  return static_cast<unsigned char>(text[offset]);
}

bool isContinuation(std::string_view text, std::size_t offset) {
  return offset < text.size() && (byteAt(text, offset) & 0xC0U) == 0x80U;
}

/// Length of the well-formed sequence at `offset`, 0 where it is malformed.
/// Source: The Unicode Standard, table 3-7 (well-formed UTF-8 byte sequences).
std::size_t sequenceLength(std::string_view text, std::size_t offset) {
  const unsigned char lead = byteAt(text, offset);
  if (lead < 0x80U) return 1;
  if (lead < 0xC2U || lead > 0xF4U) return 0;
  const std::size_t length = lead < 0xE0U ? 2 : lead < 0xF0U ? 3 : 4;
  for (std::size_t i = 1; i < length; ++i) {
    if (!isContinuation(text, offset + i)) return 0;
  }
  const unsigned char second = byteAt(text, offset + 1);
  const bool overlong = (lead == 0xE0U && second < 0xA0U) || (lead == 0xF0U && second < 0x90U);
  const bool surrogate = lead == 0xEDU && second > 0x9FU;
  const bool tooLarge = lead == 0xF4U && second > 0x8FU;
  return overlong || surrogate || tooLarge ? 0 : length;
}

/// Characters that reorder or hide text: shown by number in messages.
bool isInvisibleControl(char32_t value) {
  return value < 0x20 || (value >= 0x7F && value < 0xA0) || (value >= 0x200B && value <= 0x200F) ||
         (value >= 0x2028 && value <= 0x202E) || (value >= 0x2060 && value <= 0x2069) ||
         value == 0xFEFF;
}

std::string escaped(char32_t value) {
  switch (value) {
    case '\n':
      return "\\n";
    case '\r':
      return "\\r";
    case '\t':
      return "\\t";
    default:
      break;
  }
  const auto number = static_cast<unsigned>(value);
  return value < 0x100 ? fmt::format("\\x{:02X}", number) : fmt::format("\\u{:04X}", number);
}

}  // namespace

std::optional<std::size_t> firstInvalidUtf8(std::string_view text) {
  for (std::size_t offset = 0; offset < text.size();) {
    const std::size_t length = sequenceLength(text, offset);
    if (length == 0) return offset;
    offset += length;
  }
  return std::nullopt;
}

CodePoint codePointAt(std::string_view text, std::size_t offset) {
  const std::size_t length = std::max<std::size_t>(sequenceLength(text, offset), 1);
  constexpr std::array<unsigned, 5> kLeadMask = {0, 0x7F, 0x1F, 0x0F, 0x07};
  char32_t value = byteAt(text, offset) & kLeadMask[length];
  for (std::size_t i = 1; i < length; ++i)
    value = (value << 6U) | (byteAt(text, offset + i) & 0x3FU);
  return {value, length};
}

std::size_t characterIndex(std::string_view text, std::size_t offset) {
  const std::string_view before = text.substr(0, offset);
  return static_cast<std::size_t>(std::ranges::count_if(
      before, [](char c) { return (static_cast<unsigned char>(c) & 0xC0U) != 0x80U; }));
}

void appendUtf8(std::string& text, char32_t value) {
  const auto push = [&text](char32_t byte) { text.push_back(static_cast<char>(byte)); };
  if (value < 0x80) {
    push(value);
  } else if (value < 0x800) {
    push(0xC0 | (value >> 6U));
    push(0x80 | (value & 0x3FU));
  } else if (value < 0x10000) {
    push(0xE0 | (value >> 12U));
    push(0x80 | ((value >> 6U) & 0x3FU));
    push(0x80 | (value & 0x3FU));
  } else {
    push(0xF0 | (value >> 18U));
    push(0x80 | ((value >> 12U) & 0x3FU));
    push(0x80 | ((value >> 6U) & 0x3FU));
    push(0x80 | (value & 0x3FU));
  }
}

std::string oneLine(std::string_view text) {
  std::string line;
  for (std::size_t offset = 0; offset < text.size();) {
    const std::size_t length = sequenceLength(text, offset);
    if (length == 0) {
      line += fmt::format("\\x{:02X}", static_cast<unsigned>(byteAt(text, offset)));
      ++offset;
      continue;
    }
    const char32_t value = codePointAt(text, offset).value;
    if (isInvisibleControl(value)) {
      line += escaped(value);
    } else {
      line += text.substr(offset, length);
    }
    offset += length;
  }
  return line;
}

std::string_view trimmed(std::string_view text) {
  const std::size_t first = text.find_first_not_of(" \t");
  if (first == std::string_view::npos) return {};
  return text.substr(first, text.find_last_not_of(" \t") - first + 1);
}

std::string quoted(std::string_view text) {
  constexpr std::size_t kLongest = 40;
  std::size_t end = 0;
  for (std::size_t shown = 0; end < text.size() && shown < kLongest; ++shown) {
    end += std::max<std::size_t>(sequenceLength(text, end), 1);
  }
  const bool cut = end < text.size();
  return "'" + oneLine(text.substr(0, end)) + (cut ? "…'" : "'");
}

std::string asciiLowered(std::string_view text) {
  std::string lowered(text);
  std::ranges::transform(lowered, lowered.begin(), [](char c) {
    return c >= 'A' && c <= 'Z' ? static_cast<char>(c + 32) : c;
  });
  return lowered;
}

}  // namespace vialkeeper::text
