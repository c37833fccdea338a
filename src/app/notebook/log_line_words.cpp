// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/log_line_words.h"

#include <algorithm>
#include <array>
#include <span>
#include <string>
#include <utility>

#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

using units::Kind;
using Pair = std::pair<std::string_view, std::string_view>;

// No-break, thin and narrow spaces, then marks that nobody sees: zero-width space and joiners,
// direction marks, word joiner, byte-order mark.
constexpr auto kBlanks =
    std::to_array<std::string_view>({" ", "\t", "\u00A0", "\u2009", "\u202F", "\u200B", "\u200C",
                                     "\u200D", "\u200E", "\u200F", "\u2060", "\uFEFF"});

constexpr auto kGases = std::to_array<Pair>({{"h2", "H2"},
                                             {"n2", "N2"},
                                             {"o2", "O2"},
                                             {"ar", "Ar"},
                                             {"co2", "CO2"},
                                             {"co", "CO"},
                                             {"ch4", "CH4"},
                                             {"air", "air"},
                                             {"hydrogen", "H2"},
                                             {"nitrogen", "N2"},
                                             {"oxygen", "O2"},
                                             {"argon", "Ar"},
                                             {"methane", "CH4"}});

constexpr auto kPressureKinds = std::to_array<Pair>({{"gauge", "gauge"},
                                                     {"gage", "gauge"},
                                                     {"g", "gauge"},
                                                     {"(g)", "gauge"},
                                                     {"(gauge)", "gauge"},
                                                     {"abs", "abs"},
                                                     {"abs.", "abs"},
                                                     {"absolute", "abs"},
                                                     {"a", "abs"},
                                                     {"(a)", "abs"},
                                                     {"(abs)", "abs"}});

// The longer first, so that `(g)` is not taken for a unit that ends in `)`.
constexpr auto kPressureEndings = std::to_array<Pair>({{"(gauge)", "gauge"},
                                                       {"(abs)", "abs"},
                                                       {"(g)", "gauge"},
                                                       {"(a)", "abs"},
                                                       {"g", "gauge"},
                                                       {"a", "abs"}});

constexpr auto kJoints = std::to_array<std::string_view>(
    {"at", "of", "with", "to", "under", "for", "t", "temp", "temperature", "p", "pressure"});

constexpr auto kSpellings = std::to_array<Pair>({{"oC", "degC"},
                                                 {"ºC", "degC"},
                                                 {"ºc", "degC"},
                                                 {"°c", "degC"},
                                                 {"deg C", "degC"},
                                                 {"° C", "degC"},
                                                 {"º C", "degC"},
                                                 {"vol%", "%"},
                                                 {"vol %", "%"},
                                                 {"vol-%", "%"}});

// Units of which only one can be meant where letters' case is lost; concentrations are not among
// them.
constexpr auto kAnyCase =
    std::to_array<Kind>({Kind::kVolume, Kind::kPressure, Kind::kTemperature, Kind::kAmount,
                         Kind::kMass, Kind::kDuration, Kind::kPercent});

bool isDigit(char c) { return c >= '0' && c <= '9'; }

bool isDigitAt(std::string_view text, std::size_t at) {
  return at < text.size() && isDigit(text[at]);
}

bool isDecimalAt(std::string_view text, std::size_t at) {
  return at < text.size() && (text[at] == '.' || text[at] == ',') && isDigitAt(text, at + 1);
}

std::optional<std::string_view> lookedUp(std::span<const Pair> pairs, std::string_view word) {
  const auto found = std::ranges::find(pairs, word, &Pair::first);
  return found == pairs.end() ? std::nullopt : std::optional(found->second);
}

/// Lower case, with subscript digits as digits and either µ as u.
std::string plain(std::string_view word) {
  std::string folded;
  for (std::size_t at = 0; at < word.size();) {
    const std::string_view rest = word.substr(at);
    if (rest.starts_with("\u2082") || rest.starts_with("\u2084")) {
      folded += rest.starts_with("\u2082") ? '2' : '4';
      at += 3;
    } else if (rest.starts_with("\u00B5") || rest.starts_with("\u03BC")) {
      folded += 'u';
      at += 2;
    } else {
      folded += word[at++];
    }
  }
  return text::asciiLowered(folded);
}

const units::Unit* unitInAnyCase(std::string_view symbol) {
  // A capital M is mega: nobody means it in a vial, but it is not ours to call it milli.
  if (symbol.starts_with('M')) return nullptr;
  const std::string wanted = plain(symbol);
  const auto lowered = [](char c) { return c >= 'A' && c <= 'Z' ? static_cast<char>(c + 32) : c; };
  const auto all = units::allUnits();
  const auto found = std::ranges::find_if(all, [&](const units::Unit& unit) {
    return std::ranges::find(kAnyCase, unit.kind) != kAnyCase.end() &&
           std::ranges::equal(unit.symbol, wanted, {}, lowered);
  });
  return found == all.end() ? nullptr : &*found;
}

std::optional<LogUnit> exactLogUnit(std::string_view symbol) {
  if (symbol.empty() || symbol.size() > 16) return std::nullopt;
  if (const auto* unit = units::findUnit(symbol, units::Dialect::kPerson)) return LogUnit{unit, {}};
  if (const auto other = lookedUp(kSpellings, symbol)) {
    return LogUnit{units::findUnit(*other, units::Dialect::kPerson), {}};
  }
  if (const auto* unit = unitInAnyCase(symbol)) return LogUnit{unit, {}};
  const std::string lowered = text::asciiLowered(symbol);
  for (const auto& [ending, kind] : kPressureEndings) {
    if (!lowered.ends_with(ending)) continue;
    const std::string_view base = symbol.substr(0, symbol.size() - ending.size());
    const auto* unit = units::findUnit(base, units::Dialect::kPerson);
    if (unit == nullptr) unit = unitInAnyCase(base);
    if (unit != nullptr && unit->kind == Kind::kPressure) return LogUnit{unit, kind};
  }
  return std::nullopt;
}

/// A word of the log's own, which is never the unit of the number before it.
bool isLogWord(std::string_view word) {
  if (word == "a" || word == "g") return false;
  return isJoint(word) || gasNamed(word) || pressureKindNamed(word);
}

/// Takes the line to pieces, one after the other.
class Tokenizer {
 public:
  Tokenizer(std::string_view line, std::size_t from) : m_line(line), m_at(from) {
    m_end = trimmedEnd(line);
  }

  LogTokens run() {
    LogTokens found;
    found.end = std::min(m_at, m_end);
    for (skip(); m_at < m_end && m_line[m_at] != ';'; skip()) {
      found.tokens.push_back(numberEnd(m_line, m_at) > m_at ? number() : word());
      found.end = m_at;
    }
    if (m_at < m_end) {
      const std::size_t begin = std::min(skipBlanks(m_line, m_at + 1), m_end);
      found.remark = m_line.substr(begin, m_end - begin);
    }
    return found;
  }

 private:
  /// Blanks and the signs that only separate.
  void skip() {
    while (m_at < m_end) {
      if (const std::size_t blank = blankLength(m_line, m_at)) {
        m_at += blank;
      } else if (isSeparator(m_line[m_at]) || (m_line[m_at] == '/' && wordEnd(m_at) == m_at + 1)) {
        ++m_at;
      } else {
        return;
      }
    }
  }

  static bool isSeparator(char c) { return c == ',' || c == '@' || c == '='; }

  std::size_t wordEnd(std::size_t at) const {
    while (at < m_end && blankLength(m_line, at) == 0 && !isSeparator(m_line[at]) &&
           m_line[at] != ';')
      ++at;
    return at;
  }

  LogToken word() {
    LogToken token;
    token.begin = m_at;
    m_at = token.end = std::max(wordEnd(m_at), m_at + 1);
    return token;
  }

  LogToken number() {
    LogToken token;
    token.isNumber = true;
    token.begin = m_at;
    token.numberEnd = token.unitBegin = token.unitEnd = token.end = numberEnd(m_line, m_at);
    m_at = token.end;
    const std::size_t begin = std::min(skipBlanks(m_line, m_at), m_end);
    const bool another = numberEnd(m_line, begin) > begin;
    const std::size_t end = wordEnd(begin);
    if (another || end == begin || isLogWord(m_line.substr(begin, end - begin))) return token;
    // `vial 3 / 35 C`: a stroke by itself separates.
    if (m_line.substr(begin, end - begin) == "/") return token;
    token.unitBegin = begin;
    takeUnit(token, end);
    m_at = token.end = token.unitEnd;
    return token;
  }

  /// The word as the unit, lengthened by a second one (`deg C`) or without what is stuck to it
  /// (`bar35C`).
  void takeUnit(LogToken& token, std::size_t end) const {
    const std::size_t begin = token.unitBegin;
    token.unitEnd = end;
    const std::size_t next = std::min(skipBlanks(m_line, end), m_end);
    const std::size_t nextEnd = wordEnd(next);
    if (next > end && nextEnd - begin <= 16) {
      const std::string joined = std::string(m_line.substr(begin, end - begin)) + " " +
                                 std::string(m_line.substr(next, nextEnd - next));
      if (lookedUp(kSpellings, joined)) {
        token.unit = logUnit(joined);
        token.unitEnd = nextEnd;
        return;
      }
    }
    token.unit = logUnit(m_line.substr(begin, end - begin));
    for (std::size_t cut = begin + 1; !token.unit && cut < std::min(end, begin + 8); ++cut) {
      const bool stroke = m_line[cut] == '/' && isDigitAt(m_line, cut + 1);
      if (!isDigit(m_line[cut]) && !stroke && m_line[cut - 1] != '%') continue;
      token.unit = logUnit(m_line.substr(begin, cut - begin));
      if (token.unit) token.unitEnd = cut;
    }
  }

  std::string_view m_line;
  std::size_t m_at;
  std::size_t m_end = 0;
};

}  // namespace

std::size_t blankLength(std::string_view text, std::size_t at) {
  if (at >= text.size()) return 0;
  const char lead = text[at];
  if (lead == ' ' || lead == '\t') return 1;
  // All others begin with the lead byte of U+0080 or above.
  if (static_cast<unsigned char>(lead) < 0xC2) return 0;
  const auto found = std::ranges::find_if(
      kBlanks, [&](std::string_view blank) { return text.substr(at).starts_with(blank); });
  return found == kBlanks.end() ? 0 : found->size();
}

std::size_t skipBlanks(std::string_view text, std::size_t at) {
  while (at < text.size()) {
    const std::size_t blank = blankLength(text, at);
    if (blank == 0) break;
    at += blank;
  }
  return at;
}

std::size_t trimmedEnd(std::string_view text) {
  std::size_t end = text.size();
  for (bool more = true; more && end > 0;) {
    more = text[end - 1] == '\n' || text[end - 1] == '\r';
    if (more) --end;
    for (const std::string_view blank : kBlanks) {
      if (!text.substr(0, end).ends_with(blank)) continue;
      end -= blank.size();
      more = true;
    }
  }
  return end;
}

std::size_t numberEnd(std::string_view text, std::size_t at) {
  std::size_t end = at;
  if (text.substr(end).starts_with('-') || text.substr(end).starts_with('+')) {
    ++end;
  } else if (text.substr(end).starts_with("\u2212")) {
    end += 3;
  }
  if (!isDigitAt(text, end) && !isDecimalAt(text, end)) return at;
  while (isDigitAt(text, end) || isDecimalAt(text, end)) ++end;
  std::size_t exponent = end;
  if (exponent < text.size() && (text[exponent] == 'e' || text[exponent] == 'E')) {
    ++exponent;
    if (exponent < text.size() && (text[exponent] == '-' || text[exponent] == '+')) ++exponent;
    if (isDigitAt(text, exponent)) end = exponent;
    while (isDigitAt(text, end)) ++end;
  }
  return end;
}

LogTokens logTokens(std::string_view line, std::size_t from) { return Tokenizer(line, from).run(); }

std::optional<LogUnit> logUnit(std::string_view symbol) {
  auto found = exactLogUnit(symbol);
  if (!found && symbol.ends_with('.')) found = exactLogUnit(symbol.substr(0, symbol.size() - 1));
  return found;
}

std::expected<units::ReadQuantity, text::TextFault> readToken(std::string_view line,
                                                              const LogToken& token,
                                                              std::initializer_list<Kind> kinds,
                                                              units::Range range) {
  const std::size_t numberLength = token.numberEnd - token.begin;
  std::string written(line.substr(token.begin, numberLength));
  if (token.hasUnit()) {
    written += ' ';
    written += token.unit ? token.unit->unit->symbol
                          : line.substr(token.unitBegin, token.unitEnd - token.unitBegin);
  }
  auto read = units::readQuantityOf(kinds, written, units::Dialect::kPerson, range);
  if (read) return read;
  // From the text that was read back to the line: the blank and the unit's spelling may differ.
  const auto inLine = [&](std::size_t place) {
    if (place <= numberLength) return token.begin + place;
    return std::min(token.unitBegin + (place - numberLength - 1), token.unitEnd);
  };
  text::TextFault fault = read.error();
  const std::size_t end = fault.offset + fault.length >= written.size()
                              ? token.end
                              : inLine(fault.offset + fault.length);
  fault.offset = inLine(fault.offset);
  fault.length = fault.length == 0 ? 0 : std::max(end, fault.offset) - fault.offset;
  return std::unexpected(std::move(fault));
}

double inUnit(const units::ReadQuantity& read, std::string_view target) {
  const units::Unit* from = units::findUnit(read.symbol, units::Dialect::kPerson);
  const units::Unit* to = units::findUnit(target, units::Dialect::kPerson);
  return read.number * (from->numerator * to->denominator) / (from->denominator * to->numerator);
}

std::optional<std::string_view> gasNamed(std::string_view word) {
  return word.size() > 12 ? std::nullopt : lookedUp(kGases, plain(word));
}

std::optional<std::string_view> pressureKindNamed(std::string_view word) {
  return word.size() > 12 ? std::nullopt : lookedUp(kPressureKinds, plain(word));
}

bool isJoint(std::string_view word) {
  return word.size() <= 12 && std::ranges::find(kJoints, plain(word)) != kJoints.end();
}

}  // namespace vialkeeper::app
