// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/formula.h"

#include <fmt/format.h>

#include <array>
#include <charconv>
#include <cmath>
#include <optional>
#include <utility>
#include <vector>

#include "chem/atomic_weights.h"
#include "text/utf8.h"

namespace vialkeeper::chem {
namespace {

using text::textFault;
using text::TextFault;
using Atoms = std::map<AtomKind, double>;

constexpr std::size_t kLongest = 1000;
constexpr int kDeepest = 64;
constexpr double kMostAtoms = 1e6;

bool isDigit(char c) { return c >= '0' && c <= '9'; }
bool isUpper(char c) { return c >= 'A' && c <= 'Z'; }
bool isLower(char c) { return c >= 'a' && c <= 'z'; }

/// A character of the formula in plain ASCII with the byte of the original at which it stands,
/// so that a fault points into what was typed.
struct PlainText {
  std::string characters;
  std::vector<std::size_t> offsets;
};

struct Spelling {
  std::string_view written;
  char meant;
};

constexpr auto kSpellings = std::to_array<Spelling>({
    {"₀", '0'},
    {"₁", '1'},
    {"₂", '2'},
    {"₃", '3'},
    {"₄", '4'},
    {"₅", '5'},
    {"₆", '6'},
    {"₇", '7'},
    {"₈", '8'},
    {"₉", '9'},
    {"·", '*'},
    {"∙", '*'},
    {"⋅", '*'},
    {"•", '*'},
    {"−", '-'},
    {"–", '-'},
});

constexpr auto kSuperscripts = std::to_array<Spelling>({
    {"⁰", '0'},
    {"¹", '1'},
    {"²", '2'},
    {"³", '3'},
    {"⁴", '4'},
    {"⁵", '5'},
    {"⁶", '6'},
    {"⁷", '7'},
    {"⁸", '8'},
    {"⁹", '9'},
    {"⁺", '+'},
    {"⁻", '-'},
});

PlainText toPlain(std::string_view formula) {
  PlainText plain;
  bool inSuperscript = false;
  const auto push = [&plain](char c, std::size_t at) {
    plain.characters += c;
    plain.offsets.push_back(at);
  };
  const auto match = [&](const auto& spellings, std::size_t at) -> const Spelling* {
    for (const Spelling& s : spellings) {
      if (formula.substr(at).starts_with(s.written)) return &s;
    }
    return nullptr;
  };
  for (std::size_t at = 0; at < formula.size();) {
    if (const Spelling* raised = match(kSuperscripts, at)) {
      if (!inSuperscript) push('^', at);
      inSuperscript = true;
      push(raised->meant, at);
      at += raised->written.size();
      continue;
    }
    inSuperscript = false;
    const Spelling* other = match(kSpellings, at);
    push(other ? other->meant : formula[at], at);
    at += other ? other->written.size() : 1;
  }
  plain.offsets.push_back(formula.size());
  return plain;
}

class FormulaReader {
 public:
  explicit FormulaReader(std::string_view formula)
      : m_formula(formula), m_plain(toPlain(formula)), m_end(m_plain.characters.size()) {}

  std::expected<Composition, TextFault> read() {
    if (m_formula.empty()) return textFault(0, 0, "no formula here", "write one such as C8H9N");
    if (m_formula.size() > kLongest) {
      return textFault(kLongest, m_formula.size() - kLongest, "a formula longer than 1000 bytes",
                       "give a shorter one");
    }
    Composition composition;
    if (auto charge = takeCharge()) composition.charge = *charge;
    if (m_end == 0)
      return textFault(0, m_formula.size(), "a charge without atoms", "name the elements");
    while (true) {
      const auto part = readPart();
      if (!part) return std::unexpected(part.error());
      for (const auto& [kind, count] : *part) composition.atoms[kind] += count;
      if (m_at == m_end) break;
      ++m_at;  // readPart stops at the end or at a joining point
    }
    for (const auto& [kind, count] : composition.atoms) {
      if (count > kMostAtoms)
        return fault(0, m_end, "more than a million atoms", "check the numbers");
    }
    return composition;
  }

 private:
  using Reading = std::expected<Atoms, TextFault>;

  [[nodiscard]] char peek(std::size_t ahead = 0) const {
    return m_at + ahead < m_end ? m_plain.characters[m_at + ahead] : '\0';
  }

  [[nodiscard]] std::unexpected<TextFault> fault(std::size_t from, std::size_t to, std::string what,
                                                 std::string mend) const {
    const std::size_t begin = m_plain.offsets[std::min(from, m_plain.offsets.size() - 1)];
    const std::size_t end = m_plain.offsets[std::min(to, m_plain.offsets.size() - 1)];
    return textFault(begin, end - begin, std::move(what), std::move(mend));
  }

  /// The charge at the end, cut off from what is read as atoms.
  std::optional<int> takeCharge() {
    const std::string& c = m_plain.characters;
    if (m_end == 0 || (c[m_end - 1] != '+' && c[m_end - 1] != '-')) return std::nullopt;
    const int sign = c[m_end - 1] == '+' ? 1 : -1;
    std::size_t digits = m_end - 1;
    while (digits > 0 && isDigit(c[digits - 1])) --digits;
    const std::size_t count = m_end - 1 - digits;
    if (digits > 0 && c[digits - 1] == '^' && count <= 2) {
      const int size = count == 0 ? 1 : std::stoi(c.substr(digits, count));
      m_end = digits - 1;
      return sign * size;
    }
    if (endsInChargeDigit(digits, count)) {
      const int size = c[m_end - 2] - '0';
      m_end -= 2;
      return sign * size;
    }
    m_end -= 1;
    return sign;
  }

  /// Whether the last of `count` digits before the sign, which begin at `digits`, tells the charge.
  /// One digit does behind `]` or a lone element; of two the second does, if it is a likely charge
  /// and what precedes is not carbon or hydrogen, of which ten and more are common.
  [[nodiscard]] bool endsInChargeDigit(std::size_t digits, std::size_t count) const {
    const std::string_view c = m_plain.characters;
    if (digits == 0) return false;
    const char before = c[digits - 1];
    if (count == 1) return before == ']' || isOneElement(c.substr(0, digits));
    const char last = c[m_end - 2];
    return count == 2 && before != 'C' && before != 'H' && last >= '2' && last <= '4';
  }

  static bool isOneElement(std::string_view symbol) {
    return isElement(symbol) || symbol == "D" || symbol == "T";
  }

  /// Atoms up to a joining point or the end, times the factor in front.
  Reading readPart() {
    double factor = 1.0;
    const std::size_t begin = m_at;
    if (isDigit(peek()) && m_at == 0 && m_plain.characters.find_first_of("*.") == std::string::npos) {
      return fault(0, 1, "a number before the first element",
                   "an isotope stands in brackets, [13C]; leave out how many formula units there are");
    }
    if (isDigit(peek())) {
      const auto number = readFactor();
      if (!number) return std::unexpected(number.error());
      factor = *number;
    }
    Reading group = readGroup(0);
    if (!group) return group;
    if (group->empty()) {
      return fault(begin, m_at + 1, "no atoms here", "write elements such as C8H9N");
    }
    for (auto& [kind, count] : *group) count *= factor;
    return group;
  }

  /// `2`, `0.5`: the decimal point counts as one only where a digit stands on both sides.
  std::expected<double, TextFault> readFactor() {
    const std::size_t begin = m_at;
    while (isDigit(peek())) ++m_at;
    if (peek() == '.' && isDigit(peek(1))) {
      ++m_at;
      while (isDigit(peek())) ++m_at;
    }
    const std::string digits = m_plain.characters.substr(begin, m_at - begin);
    double value = 0.0;
    std::from_chars(digits.data(), digits.data() + digits.size(), value);
    if (value <= 0.0 || value > kMostAtoms) {
      return fault(begin, m_at, "a factor of zero or above a million", "check the number");
    }
    return value;
  }

  /// Elements and brackets until a closing bracket, a joining point or the end.
  Reading readGroup(int depth) {
    Atoms atoms;
    while (m_at < m_end) {
      const char c = peek();
      if (c == '*' || c == '.') {
        if (depth == 0) return atoms;
        return fault(m_at, m_at + 1, "a joining point inside brackets",
                     "close the bracket before it");
      }
      if (c == ')' || c == ']' || c == '}') {
        if (depth > 0) return atoms;
        return fault(m_at, m_at + 1, fmt::format("'{}' closes no bracket", c),
                     "remove it or open one");
      }
      Reading item = c == '(' || c == '[' || c == '{' ? readBracket(depth) : readElement(0);
      if (!item) return item;
      for (const auto& [kind, count] : *item) atoms[kind] += count;
    }
    return atoms;
  }

  Reading readBracket(int depth) {
    const std::size_t opened = m_at;
    const char open = peek();
    const char close = open == '(' ? ')' : open == '[' ? ']' : '}';
    if (depth + 1 > kDeepest)
      return fault(m_at, m_at + 1, "brackets nested too deeply", "simplify it");
    ++m_at;
    Atoms inside;
    if (isDigit(peek())) {
      const auto nuclide = readNuclide();
      if (!nuclide) return nuclide;
      inside = *nuclide;
    }
    const Reading rest = readGroup(depth + 1);
    if (!rest) return rest;
    for (const auto& [kind, count] : *rest) inside[kind] += count;
    if (peek() != close) {
      return fault(opened, opened + 1, fmt::format("'{}' is never closed", open),
                   fmt::format("close it with '{}'", close));
    }
    if (inside.empty()) return fault(opened, m_at + 1, "empty brackets", "remove them");
    ++m_at;
    return times(std::move(inside));
  }

  /// `13C` at the head of a bracket.
  Reading readNuclide() {
    const std::size_t begin = m_at;
    while (isDigit(peek())) ++m_at;
    int massNumber = 0;
    if (m_at - begin <= 3) massNumber = std::stoi(m_plain.characters.substr(begin, m_at - begin));
    if (massNumber < 1) return fault(begin, m_at, "a mass number that no nuclide has", "check it");
    return readElement(massNumber);
  }

  Reading readElement(int massNumber) {
    const std::size_t begin = m_at;
    if (!isUpper(peek())) {
      std::size_t end = m_at + 1;  // a whole character, not a byte of it
      while (end < m_end && (m_plain.characters[end] & '\xC0') == '\x80') ++end;
      const std::string shown = m_plain.characters.substr(m_at, end - m_at);
      return fault(m_at, end, fmt::format("{} begins no element", text::quoted(shown)),
                   "elements begin with a capital letter");
    }
    std::size_t length = isLower(peek(1)) ? 2 : 1;
    std::string symbol = m_plain.characters.substr(m_at, length);
    const bool heavyHydrogen = symbol == "D" || symbol == "T";
    if (!heavyHydrogen && !isElement(symbol)) {
      return fault(begin, begin + length, fmt::format("'{}' is no element", symbol),
                   "check the spelling, capitals included");
    }
    m_at += length;
    AtomKind kind{symbol, massNumber};
    if (heavyHydrogen) kind = {"H", symbol == "D" ? 2 : 3};
    if (massNumber != 0 && massNumber != kind.massNumber) {
      return fault(begin, m_at, fmt::format("{} has the mass number {}", symbol, kind.massNumber),
                   "write the symbol alone, or H with its mass number");
    }
    return times({{kind, 1.0}});
  }

  /// The atoms times the count that follows, 1 where none does.
  Reading times(Atoms atoms) {
    const std::size_t begin = m_at;
    while (isDigit(peek())) ++m_at;
    if (m_at == begin) return atoms;
    double count = 0.0;
    const std::string digits = m_plain.characters.substr(begin, m_at - begin);
    std::from_chars(digits.data(), digits.data() + digits.size(), count);
    if (count <= 0.0 || count > kMostAtoms) {
      return fault(begin, m_at, "a count of zero or above a million", "check the number");
    }
    for (auto& [kind, number] : atoms) number *= count;
    return atoms;
  }

  std::string_view m_formula;
  PlainText m_plain;
  std::size_t m_end;
  std::size_t m_at = 0;
};

std::string toText(const AtomKind& kind) {
  if (kind.massNumber == 0) return kind.symbol;
  if (kind == AtomKind{"H", 2}) return "D";
  if (kind == AtomKind{"H", 3}) return "T";
  return fmt::format("[{}{}]", kind.massNumber, kind.symbol);
}

/// The formula with its charge, marked with `^` wherever a bare sign would be read otherwise
/// (azide, `N3^-`, is not N with three charges).
std::string withCharge(const std::string& hill, const Composition& composition) {
  if (composition.charge == 0) return hill;
  const char sign = composition.charge > 0 ? '+' : '-';
  const int size = std::abs(composition.charge);
  if (size > 1) return fmt::format("{}^{}{}", hill, size, sign);
  const auto bare = parseFormula(hill + sign);
  return bare && *bare == composition ? hill + sign : hill + '^' + sign;
}

}  // namespace

std::expected<Composition, TextFault> parseFormula(std::string_view formula) {
  if (const auto bad = text::firstInvalidUtf8(formula)) {
    return textFault(*bad, 1, "bytes that are not UTF-8", "type the formula again");
  }
  return FormulaReader(formula).read();
}

std::string toHillFormula(const Composition& composition) {
  bool hasCarbon = false;
  for (const auto& [kind, count] : composition.atoms) hasCarbon |= kind.symbol == "C";
  const auto rank = [hasCarbon](const AtomKind& kind) {
    if (!hasCarbon) return 2;
    return kind.symbol == "C" ? 0 : kind.symbol == "H" ? 1 : 2;
  };
  std::string hill;
  // The map is sorted by symbol, then mass number, which is the order within each rank.
  for (int pass = 0; pass <= 2; ++pass) {
    for (const auto& [kind, count] : composition.atoms) {
      if (rank(kind) != pass) continue;
      hill += toText(kind);
      if (count != 1.0) hill += fmt::format("{}", count);
    }
  }
  return withCharge(hill, composition);
}

std::expected<MolarMassEstimate, TextFault> molarMass(const Composition& composition) {
  double sum = 0.0;
  double variance = 0.0;
  for (const auto& [kind, count] : composition.atoms) {
    const auto weight = kind.massNumber == 0 ? standardAtomicWeight(kind.symbol)
                                             : nuclideMass(kind.symbol, kind.massNumber);
    if (!weight && kind.massNumber == 0) {
      return textFault(0, 0, fmt::format("{} has no standard atomic weight", kind.symbol),
                       "give the molar mass of the material instead");
    }
    if (!weight) {
      return textFault(
          0, 0, fmt::format("no mass is known for the nuclide {}{}", kind.massNumber, kind.symbol),
          "check the mass number, or give the molar mass of the material instead");
    }
    sum += count * weight->value;
    variance += std::pow(count * weight->standardUncertainty, 2);
  }
  return MolarMassEstimate{units::MolarMass::fromGramsPerMole(sum),
                           units::MolarMass::fromGramsPerMole(std::sqrt(variance))};
}

}  // namespace vialkeeper::chem
