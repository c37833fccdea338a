// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/find_language.h"

#include <fmt/format.h>

#include <algorithm>
#include <utility>

#include "app/notebook/find_range.h"
#include "text/utf8.h"
#include "units/toml_section.h"

namespace vialkeeper::app {
namespace {

using text::textFault;
using text::TextFault;
using units::Kind;
using Measure = MeasureCondition::Measure;

template <class T>
using Reading = std::expected<T, TextFault>;

constexpr std::size_t kLongest = 10'000;
constexpr int kMostConditions = 200;
constexpr int kDeepest = 32;

constexpr const char* kLiteralAdvice = "put it between quotation marks to search for the text";

/// The words of one list of conditions, which are looked for together.
struct GatheredWords {
  WordsCondition words;
  std::size_t position = 0;  ///< of the first among the conditions
};

class Parser {
 public:
  Parser(std::string_view text, const ParseOptions& options)
      : m_scanner{text}, m_asYouType(options.asYouType) {}

  Reading<ParsedQuery> parse() {
    auto conditions = parseAny();
    if (!conditions) return std::unexpected(conditions.error());
    if (!m_scanner.atEnd()) {
      return textFault(m_scanner.at, 1, "this parenthesis was never opened",
                       fmt::format("take it away, or {}", kLiteralAdvice));
    }
    m_scanner.at = 0;
    m_scanner.skipBlanks();
    if (conditions->empty() && !m_scanner.atEnd() && !m_asYouType) {
      return textFault(m_scanner.at, m_scanner.text.size() - m_scanner.at,
                       "this asks for nothing: there is no letter and no figure in it",
                       "write a word or a field, or nothing at all for every run");
    }
    return ParsedQuery{std::move(*conditions)};
  }

 private:
  /// Alternatives between `or`, as one condition; or the conditions themselves where there is but
  /// one.
  Reading<ParsedConditions> parseAny();
  /// Conditions side by side, up to `or`, a closing parenthesis or the end.
  Reading<ParsedConditions> parseAll();
  /// One condition, added to the list or to its words.
  Reading<void> parseOne(ParsedConditions& conditions, GatheredWords& words);
  Reading<void> parseNot(ParsedConditions& conditions);
  Reading<void> parseGroup(ParsedConditions& conditions);
  Reading<void> parseTerm(ParsedConditions& conditions, GatheredWords& words);
  Reading<void> parseField(const FindField& field, ParsedConditions& conditions);
  Reading<void> parseSubstance(const FindField& field, ParsedConditions& conditions);
  Reading<void> parseText(const FindField& field, ParsedConditions& conditions);
  Reading<void> parseMeasure(const FindField& field, ParsedConditions& conditions);
  Reading<void> parseWord(ParsedConditions& conditions, GatheredWords& words);
  Reading<WrittenLoading> parseLoading();
  /// The field whose name and `:` or sign of comparison stand here; the scanner then stands behind
  /// the `:` or at the sign. Nullptr where plain words stand.
  Reading<const FindField*> scanField();

  /// Whether what is missing at the end may still be typed.
  [[nodiscard]] bool isUnfinished() const { return m_asYouType && m_scanner.atEnd(); }
  /// Passes over a range that begins at `begin` if all that is wrong is that somebody still types
  /// it.
  bool passUnfinished(const FindScanner& begin) {
    if (!m_asYouType || !endsWithinRange(begin)) return false;
    m_scanner.at = m_scanner.text.size();
    return true;
  }
  Reading<void> countOne(std::size_t at);

  FindScanner m_scanner;
  bool m_asYouType;
  int m_conditions = 0;
  int m_depth = 0;
};

Reading<void> Parser::countOne(std::size_t at) {
  if (++m_conditions <= kMostConditions) return {};
  return textFault(at, m_scanner.text.size() - at,
                   fmt::format("more than {} conditions", kMostConditions),
                   "search for fewer things at once");
}

Reading<ParsedConditions> Parser::parseAny() {
  std::vector<ParsedConditions> alternatives;
  for (bool isLater = false;; isLater = true) {
    m_scanner.skipBlanks();
    const std::size_t begin = m_scanner.at;
    auto conditions = parseAll();
    if (!conditions) return conditions;
    const bool isOr = m_scanner.keyword() == "or";
    const bool isEmpty = m_scanner.at == begin;
    if (isEmpty && (isOr || isLater) && (isOr || !isUnfinished())) {
      return textFault(begin, isOr ? 2 : 0, "'or' has no condition on one side",
                       fmt::format("write one before and one behind it, or {}", kLiteralAdvice));
    }
    // A dash alone says nothing, and nothing is no alternative: it would be all runs.
    if (!conditions->empty()) alternatives.push_back(std::move(*conditions));
    if (!isOr) break;
    m_scanner.at += 2;
  }
  if (alternatives.empty()) return ParsedConditions{};
  if (alternatives.size() == 1) return std::move(alternatives.front());
  ParsedAny any;
  for (ParsedConditions& conditions : alternatives) {
    if (conditions.size() == 1) {
      any.conditions.push_back(std::move(conditions.front()));
    } else {
      any.conditions.push_back({ParsedAll{std::move(conditions)}});
    }
  }
  ParsedConditions whole;
  whole.push_back({std::move(any)});
  return whole;
}

Reading<ParsedConditions> Parser::parseAll() {
  ParsedConditions conditions;
  GatheredWords gathered;
  bool isPending = false;  // an `and` waits for its second condition
  std::size_t andAt = 0;
  bool isFirst = true;
  while (true) {
    m_scanner.skipBlanks();
    const std::string_view keyword = m_scanner.keyword();
    const bool isAnd = keyword == "and";
    const bool isOver = m_scanner.atEnd() || m_scanner.text[m_scanner.at] == ')' || keyword == "or";
    if ((isAnd && (isFirst || isPending)) || (isOver && isPending && !isUnfinished())) {
      return textFault(isAnd ? m_scanner.at : andAt, 3, "'and' has no condition on one side",
                       fmt::format("write one before and one behind it, or {}", kLiteralAdvice));
    }
    if (isOver) break;
    isFirst = false;
    isPending = isAnd;
    if (isAnd) {
      andAt = m_scanner.at;
      m_scanner.at += 3;
      continue;
    }
    if (auto one = parseOne(conditions, gathered); !one) return std::unexpected(one.error());
  }
  if (!gathered.words.words.empty()) {
    const auto place = conditions.begin() + static_cast<std::ptrdiff_t>(gathered.position);
    conditions.insert(place, {std::move(gathered.words)});
  }
  return conditions;
}

Reading<void> Parser::parseOne(ParsedConditions& conditions, GatheredWords& words) {
  const std::size_t begin = m_scanner.at;
  const bool isNot = m_scanner.keyword() == "not";
  if (!isNot && !m_scanner.rest().starts_with('(')) {
    if (auto counted = countOne(begin); !counted) return counted;
    return parseTerm(conditions, words);
  }
  if (++m_depth > kDeepest) {
    return textFault(begin, 1,
                     fmt::format("more than {} levels of parentheses and 'not'", kDeepest),
                     fmt::format("write it with fewer, or {}", kLiteralAdvice));
  }
  auto parsed = isNot ? parseNot(conditions) : parseGroup(conditions);
  --m_depth;
  return parsed;
}

Reading<void> Parser::parseNot(ParsedConditions& conditions) {
  const std::size_t begin = m_scanner.at;
  m_scanner.at += 3;
  m_scanner.skipBlanks();
  if (isUnfinished()) return {};
  const bool isOver = m_scanner.atEnd() || m_scanner.text[m_scanner.at] == ')';
  if (isOver || m_scanner.keyword() == "or" || m_scanner.keyword() == "and") {
    return textFault(begin, 3, "'not' has no condition behind it",
                     fmt::format("write what the runs must not have, or {}", kLiteralAdvice));
  }
  ParsedNot negated;
  GatheredWords words;
  if (auto one = parseOne(negated.conditions, words); !one) return one;
  if (!words.words.words.empty()) negated.conditions.push_back({std::move(words.words)});
  // What is left out, a dash or what is still being typed, has no opposite.
  if (!negated.conditions.empty()) conditions.push_back({std::move(negated)});
  return {};
}

Reading<void> Parser::parseGroup(ParsedConditions& conditions) {
  const std::size_t begin = m_scanner.at;
  ++m_scanner.at;
  m_scanner.skipBlanks();
  if (m_scanner.rest().starts_with(')')) {
    return textFault(begin, m_scanner.at + 1 - begin, "nothing stands between the parentheses",
                     fmt::format("write conditions there, or {}", kLiteralAdvice));
  }
  auto inner = parseAny();
  if (!inner) return std::unexpected(inner.error());
  if (m_scanner.atEnd()) {
    if (!m_asYouType) {
      return textFault(begin, 1, "this parenthesis is never closed",
                       fmt::format("write ) at its end, or {}", kLiteralAdvice));
    }
  } else {
    ++m_scanner.at;
  }
  if (inner->size() == 1) {
    conditions.push_back(std::move(inner->front()));
  } else if (!inner->empty()) {
    conditions.push_back({ParsedAll{std::move(*inner)}});
  }
  return {};
}

Reading<const FindField*> Parser::scanField() {
  const std::size_t begin = m_scanner.at;
  const std::string_view name = m_scanner.letters();
  if (name.empty()) return nullptr;
  FindScanner behind{m_scanner.text, begin + name.size()};
  const FindField* field = findField(name);
  const bool isColon = behind.rest().starts_with(':');
  const bool isAddress = behind.rest().starts_with("://");
  const bool isMeasure = field != nullptr && field->kind == FindField::Kind::kMeasure;
  if (isMeasure) behind.skipBlanks();
  FindScanner sign = behind;
  const Comparison comparison = sign.comparison();
  if (isAddress || (!isColon && comparison == Comparison::kNone)) return nullptr;
  if (field == nullptr) {
    // `A>B` and `a=b` may be anybody's text; `yeild>60` is a slip.
    if (!isColon && (sign.atEnd() || sign.text[sign.at] < '0' || sign.text[sign.at] > '9'))
      return nullptr;
    std::vector<std::string> known;
    for (const FindField& each : findFields()) known.emplace_back(each.name);
    const auto nearest = units::nearestName(text::asciiLowered(name), known);
    return textFault(
        begin, name.size(), fmt::format("there is no field {}", text::quoted(name)),
        nearest ? fmt::format("did you mean {}? Or {}", *nearest, kLiteralAdvice) : kLiteralAdvice);
  }
  if (!isMeasure && !isColon && comparison != Comparison::kEqual) {
    return textFault(begin, sign.at - begin, fmt::format("{} has no size to compare", field->name),
                     fmt::format("write {}: and what it is", field->name));
  }
  m_scanner.at = isColon || !isMeasure ? behind.at + 1 : behind.at;
  return field;
}

Reading<void> Parser::parseTerm(ParsedConditions& conditions, GatheredWords& words) {
  const std::size_t begin = m_scanner.at;
  const auto field = scanField();
  if (!field) return std::unexpected(field.error());
  if (*field != nullptr) {
    m_scanner.skipBlanks();
    if (isUnfinished()) return {};
    if (m_scanner.atEnd() || m_scanner.text[m_scanner.at] == ')') {
      return textFault(begin, m_scanner.at - begin,
                       fmt::format("nothing follows {}", (*field)->name),
                       fmt::format("write what is looked for behind it, or {}", kLiteralAdvice));
    }
    return parseField(**field, conditions);
  }
  const auto dates = scanDates(m_scanner, true);
  if (!dates) return std::unexpected(dates.error());
  if (*dates) {
    conditions.push_back({MeasureCondition{Measure::kDate, **dates}});
    return {};
  }
  if (const auto stray = strayLoading(m_scanner)) {
    return textFault(stray->offset, stray->length, "how much of which substance",
                     fmt::format("write it behind a role and a name, such as acid:\"pivalic acid\" "
                                 "{}, or {}",
                                 loadingRange().example, kLiteralAdvice));
  }
  return parseWord(conditions, words);
}

Reading<void> Parser::parseField(const FindField& field, ParsedConditions& conditions) {
  switch (field.kind) {
    case FindField::Kind::kRole:
    case FindField::Kind::kStructure:
      return parseSubstance(field, conditions);
    case FindField::Kind::kText:
      return parseText(field, conditions);
    case FindField::Kind::kMeasure:
      return parseMeasure(field, conditions);
  }
  return {};
}

Reading<void> Parser::parseSubstance(const FindField& field, ParsedConditions& conditions) {
  const FindScanner before = m_scanner;
  const auto value = m_scanner.value(m_asYouType);
  if (!value) return std::unexpected(value.error());
  if (text::trimmed(value->text).empty() && !(value->isPrefix && !value->isQuoted)) {
    if (isUnfinished()) return {};
    return textFault(value->place.offset, value->place.length, "a name without letters",
                     "write the substance's name");
  }
  auto loading = parseLoading();
  if (!loading) return std::unexpected(loading.error());
  if (field.kind == FindField::Kind::kStructure) {
    // A `*` is an atom there.
    const std::string smiles =
        value->isQuoted ? value->text
                        : std::string(before.text.substr(value->place.offset, value->place.length));
    conditions.push_back({StructurePattern{smiles, *loading, value->place}});
    return {};
  }
  conditions.push_back({SubstanceName{.role = field.name == "any" ? "" : std::string(field.name),
                                      .written = value->text,
                                      .isPrefix = value->isPrefix,
                                      .isFinished = value->isFinished || !m_asYouType,
                                      .loading = *loading,
                                      .place = value->place}});
  return {};
}

Reading<WrittenLoading> Parser::parseLoading() {
  const FindScanner before = m_scanner;
  const auto range = scanRange(m_scanner, loadingRange());
  if (!range) {
    if (!passUnfinished(before)) return std::unexpected(range.error());
    return WrittenLoading{};
  }
  if (!*range) return WrittenLoading{};
  if ((*range)->kind == Kind::kConcentration)
    return WrittenLoading{.concentration_mol_L = (*range)->interval};
  return WrittenLoading{.molPercent = (*range)->interval};
}

Reading<void> Parser::parseText(const FindField& field, ParsedConditions& conditions) {
  const auto value = m_scanner.value(m_asYouType);
  if (!value) return std::unexpected(value.error());
  TextFieldCondition condition{field.text, std::string(text::trimmed(value->text)),
                               value->isPrefix};
  if (m_asYouType && !value->isFinished) condition.isPrefix = true;
  if (field.text == TextFieldCondition::Field::kState) {
    std::ranges::replace(condition.value, ' ', '-');
    std::vector<std::string> known;
    for (int state = 0; state <= static_cast<int>(RunState::kSealed); ++state) {
      known.emplace_back(toText(static_cast<RunState>(state)));
    }
    const std::string lowered = text::asciiLowered(condition.value);
    const bool isKnown = std::ranges::any_of(known, [&](const std::string& state) {
      return condition.isPrefix ? state.starts_with(lowered) : state == lowered;
    });
    if (!isKnown) {
      const auto nearest = units::nearestName(lowered, known);
      return textFault(value->place.offset, value->place.length,
                       fmt::format("there is no state {}", text::quoted(value->text)),
                       nearest ? fmt::format("did you mean {}?", *nearest)
                               : fmt::format("a run is {}", fmt::join(known, ", ")));
    }
  }
  conditions.push_back({std::move(condition)});
  return {};
}

Reading<void> Parser::parseMeasure(const FindField& field, ParsedConditions& conditions) {
  const FindScanner before = m_scanner;
  const auto read = [&]() -> ScanResult<Interval> {
    if (field.measure == Measure::kDate) return scanDates(m_scanner, false);
    const auto range = scanRange(m_scanner, rangeOf(field.measure));
    if (!range) return std::unexpected(range.error());
    return (*range)->interval;
  }();
  if (!read) {
    if (!passUnfinished(before)) return std::unexpected(read.error());
    return {};
  }
  conditions.push_back({MeasureCondition{field.measure, **read}});
  return {};
}

Reading<void> Parser::parseWord(ParsedConditions& conditions, GatheredWords& gathered) {
  const auto value = m_scanner.value(m_asYouType);
  if (!value) return std::unexpected(value.error());
  if (!isSearchable(value->text)) return {};
  WordsCondition& words = gathered.words;
  if (words.words.empty()) gathered.position = conditions.size();
  words.words.push_back(value->text);
  words.prefix.push_back(value->isPrefix || (m_asYouType && !value->isFinished));
  return {};
}

}  // namespace

std::expected<ParsedQuery, TextFault> parseFind(std::string_view text,
                                                const ParseOptions& options) {
  if (text.size() > kLongest) {
    std::size_t offset = kLongest;
    while (offset > 0 && (static_cast<unsigned char>(text[offset]) & 0xC0U) == 0x80U) --offset;
    return textFault(offset, text.size() - offset,
                     fmt::format("a search of more than {} bytes", kLongest),
                     "search for fewer things at once");
  }
  if (const auto invalid = text::firstInvalidUtf8(text)) {
    return textFault(*invalid, 1, "a byte that is no text in UTF-8", "type the words anew");
  }
  return Parser(text, options).parse();
}

}  // namespace vialkeeper::app
