// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/fold_name.h"

#include <algorithm>
#include <array>
#include <cstddef>
#include <utility>

#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

// The plain letter of each code point from U+00C0 and from U+1E00; `.` where there is none.
// Derived from the decompositions of the Unicode Character Database; ø, đ, ħ, ł and their like,
// which do not decompose, are given the letter that they are typed as without them.
constexpr char32_t kLatinFrom = 0xC0;
constexpr std::string_view kLatin =
    "aaaaaa.ceeeeiiiidnooooo.ouuuuy..aaaaaa.ceeeeiiiidnooooo.ouuuuy.y"
    "aaaaaaccccccccddddeeeeeeeeeegggggggghhhhiiiiiiiiii..jjkkklllllll"
    "lllnnnnnnnnnoooooo..rrrrrrssssssssttttttuuuuuuuuuuuuwwyyyzzzzzzs";
constexpr char32_t kLatinAdditionalFrom = 0x1E00;
constexpr std::string_view kLatinAdditional =
    "aabbbbbbccddddddddddeeeeeeeeeeffgghhhhhhhhhhiiiikkkkkkllllllllmm"
    "mmmmnnnnnnnnoooooooopppprrrrrrrrssssssssssttttttttuuuuuuuuuuvvvv"
    "wwwwwwwwwwxxxxyyzzzzzzhtwy.s....aaaaaaaaaaaaaaaaaaaaaaaaeeeeeeee"
    "eeeeeeeeiiiioooooooooooooooooooooooouuuuuuuuuuuuuuyyyyyyyy......";

constexpr char32_t kAlpha = 0x3B1;
constexpr std::array<std::string_view, 25> kGreek = {
    "alpha", "beta",   "gamma",   "delta", "epsilon", "zeta",    "eta",  "theta", "iota",
    "kappa", "lambda", "u",       "nu",    "xi",      "omicron", "pi",   "rho",   "sigma",
    "sigma", "tau",    "upsilon", "phi",   "chi",     "psi",     "omega"};

// What is spelt with more letters than one, and the Greek letters that stand elsewhere.
constexpr auto kSpelt = std::to_array<std::pair<char32_t, std::string_view>>({
    {U'Æ', "ae"},
    {U'æ', "ae"},
    {U'Þ', "th"},
    {U'þ', "th"},
    {U'ß', "ss"},
    {U'ẞ', "ss"},
    {U'Ĳ', "ij"},
    {U'ĳ', "ij"},
    {U'Œ', "oe"},
    {U'œ', "oe"},
    {U'\u00B5', "u"},
    {U'\u03D1', "theta"},
    {U'\u03D5', "phi"},
    {U'\u03F5', "epsilon"},
});

bool isWithin(char32_t value, char32_t first, char32_t last) {
  return value >= first && value <= last;
}

bool isBlank(char32_t value) {
  return value <= 0x20 || isWithin(value, 0x7F, 0xA0) || isWithin(value, 0x2000, 0x200F) ||
         isWithin(value, 0x2028, 0x202F) || isWithin(value, 0x205F, 0x206F) || value == 0x3000 ||
         value == 0xFEFF;
}

bool isHyphen(char32_t value) {
  return value == '-' || value == 0xAD || isWithin(value, 0x2010, 0x2015) || value == 0x2043 ||
         value == 0x2212 || value == 0xFE58 || value == 0xFE63 || value == 0xFF0D;
}

/// The apostrophe, what keyboards and typesetting put in its place, and the prime.
bool isApostrophe(char32_t value) {
  return value == '\'' || value == '`' || value == 0xB4 || value == 0x2BC ||
         isWithin(value, 0x2018, 0x201B) || value == 0x2032;
}

bool isCombining(char32_t value) { return isWithin(value, 0x300, 0x36F); }

/// The letter of `plain` for a value of its stretch; 0 where there is none.
char plainLetter(char32_t value, char32_t from, std::string_view plain) {
  if (value < from || value - from >= plain.size()) return '\0';
  const char letter = plain[value - from];
  return letter == '.' ? '\0' : letter;
}

/// Capital Cyrillic letters; other scripts have no case that matters to a substance's name.
char32_t lowered(char32_t value) {
  if (isWithin(value, 0x410, 0x42F)) return value + 0x20;
  return isWithin(value, 0x400, 0x40F) ? value + 0x50 : value;
}

void appendFolded(std::string& folded, char32_t value) {
  if (isBlank(value) || isHyphen(value) || isApostrophe(value) || isCombining(value)) return;
  if (isWithin(value, 'A', 'Z')) value += 0x20;
  if (value < 0x80) {
    folded += static_cast<char>(value);
    return;
  }
  for (const auto& [from, plain] :
       {std::pair{kLatinFrom, kLatin}, std::pair{kLatinAdditionalFrom, kLatinAdditional}}) {
    if (const char letter = plainLetter(value, from, plain)) {
      folded += letter;
      return;
    }
  }
  const auto spelt =
      std::ranges::find(kSpelt, value, &std::pair<char32_t, std::string_view>::first);
  if (spelt != kSpelt.end()) {
    folded += spelt->second;
    return;
  }
  const char32_t greek = isWithin(value, kAlpha - 0x20, kAlpha + 24 - 0x20) ? value + 0x20 : value;
  if (isWithin(greek, kAlpha, kAlpha + kGreek.size() - 1)) {
    folded += kGreek[greek - kAlpha];
    return;
  }
  text::appendUtf8(folded, lowered(value));
}

}  // namespace

std::string foldName(std::string_view name) {
  std::string folded;
  folded.reserve(name.size());
  for (std::size_t at = 0; at < name.size();) {
    const auto [value, length] = text::codePointAt(name, at);
    // A byte that begins no character stays as it is, so that broken names are told apart.
    if (length == 1 && static_cast<unsigned char>(name[at]) >= 0x80) {
      folded += name[at];
    } else {
      appendFolded(folded, value);
    }
    at += length;
  }
  return folded;
}

}  // namespace vialkeeper::app
