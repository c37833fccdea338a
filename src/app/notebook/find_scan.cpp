// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/find_scan.h"

#include <algorithm>
#include <array>
#include <utility>

#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

using text::textFault;
using text::TextFault;

bool isBlank(char32_t value) {
  return value <= 0x20 || (value >= 0x7F && value <= 0xA0) ||
         (value >= 0x2000 && value <= 0x200F) || (value >= 0x2028 && value <= 0x202F) ||
         (value >= 0x205F && value <= 0x206F) || value == 0x3000 || value == 0xFEFF;
}

bool isLetter(char c) { return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z'); }

bool isDigit(char c) { return c >= '0' && c <= '9'; }

/// Signs beyond ASCII that hold neither letter nor digit and that people type or paste.
bool isSign(char32_t value) {
  if (value == 0xAA || value == 0xB5 || value == 0xBA) return false;  // ª µ º
  if (value == 0xB2 || value == 0xB3 || value == 0xB9 || (value >= 0xBC && value <= 0xBE))
    return false;  // ² ³ ¹ ¼
  if (value >= 0xA1 && value <= 0xBF) return true;
  return value == 0xD7 || value == 0xF7 || (value >= 0x2010 && value <= 0x205E) ||
         (value >= 0x2190 && value <= 0x23FF) || (value >= 0x3001 && value <= 0x3003);
}

}  // namespace

std::size_t FindScanner::blankLength() const {
  if (atEnd()) return 0;
  const auto [value, length] = text::codePointAt(text, at);
  return isBlank(value) ? length : 0;
}

void FindScanner::skipBlanks() {
  while (const std::size_t length = blankLength()) at += length;
}

bool FindScanner::atBoundary() const { return atEnd() || text[at] == ')' || blankLength() > 0; }

bool FindScanner::standsApart() const {
  if (atBoundary() || at == 0) return true;
  std::size_t before = at - 1;
  while (before > 0 && (static_cast<unsigned char>(text[before]) & 0xC0U) == 0x80U) --before;
  return isBlank(text::codePointAt(text, before).value);
}

std::size_t FindScanner::quoteLength() const {
  if (rest().starts_with('"')) return 1;
  for (const std::string_view curled : {"\u201C", "\u201D", "\u201E"}) {
    if (rest().starts_with(curled)) return curled.size();
  }
  return 0;
}

std::string_view FindScanner::letters() const {
  const std::string_view here = rest();
  return here.substr(
      0, static_cast<std::size_t>(std::ranges::find_if_not(here, isLetter) - here.begin()));
}

std::string_view FindScanner::keyword() const {
  const std::string_view word = letters();
  if (word.size() < 2 || word.size() > 3) return {};
  const FindScanner behind{text, at + word.size()};
  if (!behind.atBoundary() && !behind.rest().starts_with('(')) return {};
  const std::string lowered = text::asciiLowered(word);
  for (const std::string_view known : {"and", "or", "not"}) {
    if (lowered == known) return known;
  }
  return {};
}

Comparison FindScanner::comparison() {
  constexpr auto kSigns =
      std::to_array<std::pair<std::string_view, Comparison>>({{">=", Comparison::kAtLeast},
                                                              {"=>", Comparison::kAtLeast},
                                                              {"≥", Comparison::kAtLeast},
                                                              {"<=", Comparison::kAtMost},
                                                              {"=<", Comparison::kAtMost},
                                                              {"≤", Comparison::kAtMost},
                                                              {">", Comparison::kMore},
                                                              {"<", Comparison::kLess},
                                                              {"=", Comparison::kEqual}});
  for (const auto& [sign, meaning] : kSigns) {
    if (!rest().starts_with(sign)) continue;
    at += sign.size();
    skipBlanks();
    return meaning;
  }
  return Comparison::kNone;
}

bool FindScanner::skipDots() {
  FindScanner ahead = *this;
  ahead.skipBlanks();
  if (!ahead.rest().starts_with("..")) return false;
  ahead.at += 2;
  ahead.skipBlanks();
  at = ahead.at;
  return true;
}

std::expected<FindValue, TextFault> FindScanner::quotedValue(bool mayBeUnclosed) {
  FindValue value{.text = {}, .isQuoted = true, .place = {at, 0}};
  const std::size_t begin = at;
  at += quoteLength();
  while (!atEnd()) {
    const std::size_t mark = quoteLength();
    if (mark == 0) {
      if (text[at] != '\0') value.text += text[at];
      ++at;
      continue;
    }
    at += mark;
    // A mark written twice stands for itself.
    if (mark == 1 && rest().starts_with('"')) {
      value.text += '"';
      ++at;
      continue;
    }
    value.isFinished = true;
    break;
  }
  if (!value.isFinished && !mayBeUnclosed) {
    return textFault(begin, at - begin, "the quotation mark is never closed",
                     "write \" at the end of the words");
  }
  value.place.length = at - begin;
  return value;
}

void FindScanner::skipWord() {
  for (int open = 0; !atEnd() && blankLength() == 0; ++at) {
    if (text[at] == '(') ++open;
    if (text[at] == ')' && --open < 0) return;
  }
}

std::expected<FindValue, TextFault> FindScanner::value(bool mayBeUnclosed) {
  if (quoteLength() > 0) {
    auto quoted = quotedValue(mayBeUnclosed);
    if (quoted && rest().starts_with('*')) {
      quoted->isPrefix = true;
      ++at;
    }
    return quoted;
  }
  FindValue value{.text = {}, .place = {at, 0}};
  const std::size_t begin = at;
  skipWord();
  value.place.length = at - begin;
  value.text = text.substr(begin, at - begin);
  value.isFinished = !atEnd();
  while (value.text.ends_with('*')) {
    value.text.pop_back();
    value.isPrefix = true;
  }
  return value;
}

bool isSearchable(std::string_view word) {
  for (std::size_t at = 0; at < word.size();) {
    const auto [value, length] = text::codePointAt(word, at);
    if (value < 0x80 ? isLetter(word[at]) || isDigit(word[at]) : !isBlank(value) && !isSign(value))
      return true;
    at += length;
  }
  return false;
}

}  // namespace vialkeeper::app
