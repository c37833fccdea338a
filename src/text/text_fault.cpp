// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "text/text_fault.h"

#include <fmt/format.h>

#include <algorithm>

#include "text/utf8.h"

namespace vialkeeper::text {

std::string whatWithPosition(const TextFault& fault, std::string_view text) {
  return fmt::format("{} (character {})", fault.what, characterIndex(text, fault.offset) + 1);
}

std::string pointedAt(const TextFault& fault, std::string_view text) {
  const std::size_t end = std::min(fault.offset + fault.length, text.size());
  const std::size_t before = characterIndex(text, fault.offset);
  const std::size_t marked = std::max<std::size_t>(characterIndex(text, end) - before, 1);
  return fmt::format("{}\n{}{}", text, std::string(before, ' '), std::string(marked, '^'));
}

}  // namespace vialkeeper::text
