// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <optional>
#include <string>
#include <string_view>
#include <variant>
#include <vector>

#include "app/notebook/find_query.h"
#include "app/notebook/find_scan.h"
#include "text/text_fault.h"

/// The language of searches: `photocatalyst:4CzIPN additive:"pivalic acid" 5..20 mol% yield>60`.
/// docs/find.md tells it to those who use it.
namespace vialkeeper::app {

/// How much of a substance is asked for, as written behind its name.
struct WrittenLoading {
  std::optional<Interval> molPercent = {};
  std::optional<Interval> concentration_mol_L = {};
};

/// A substance by name or CAS number, not looked up yet.
struct SubstanceName {
  std::string role;        ///< empty: any role
  std::string written;     ///< empty with `isPrefix`: any substance
  bool isPrefix = false;   ///< names that begin so as well
  bool isFinished = true;  ///< false where somebody may be typing at its end
  WrittenLoading loading = {};
  TextRange place = {};
};

/// All substances that hold this structure.
struct StructurePattern {
  std::string smiles;
  WrittenLoading loading = {};
  TextRange place = {};
};

struct ParsedCondition;
using ParsedConditions = std::vector<ParsedCondition>;

/// All conditions hold.
struct ParsedAll {
  ParsedConditions conditions;
};
/// At least one holds.
struct ParsedAny {
  ParsedConditions conditions;
};
/// The conditions do not all hold.
struct ParsedNot {
  ParsedConditions conditions;
};

struct ParsedCondition {
  std::variant<SubstanceName, StructurePattern, WordsCondition, TextFieldCondition,
               MeasureCondition, ParsedAll, ParsedAny, ParsedNot>
      data;
};

/// A search as it was written; an empty list means all runs.
struct ParsedQuery {
  ParsedConditions conditions;
};

struct ParseOptions {
  /// The text is being typed: a word or name at its very end counts as a beginning, and what is not
  /// finished there (`yield>`, `additive:`, an open parenthesis or quotation mark) is no fault yet.
  bool asYouType = false;
};

/// Reads a search. Limits: 10,000 bytes, 200 conditions and words, 32 levels of parentheses and
/// `not`. Faults point at the place: an unknown field, a value that cannot be read, an operator
/// without its condition, a parenthesis or quotation mark without its twin, bytes that are no text.
[[nodiscard]] std::expected<ParsedQuery, text::TextFault> parseFind(
    std::string_view text, const ParseOptions& options = {});

/// What looking up substances needs from a notebook. An implementation that can fail keeps its
/// fault to itself, gives nothing, and is asked for the fault afterwards.
class SubstanceResolver {
 public:
  SubstanceResolver() = default;
  SubstanceResolver(const SubstanceResolver&) = delete;
  SubstanceResolver& operator=(const SubstanceResolver&) = delete;
  virtual ~SubstanceResolver() = default;

  /// By name or synonym, folded (fold_name.h).
  virtual std::vector<RowNumber> numbersByName(std::string_view folded) = 0;
  virtual std::vector<RowNumber> numbersByNameBeginning(std::string_view folded) = 0;
  virtual std::vector<RowNumber> numbersByCas(std::string_view cas) = 0;
  /// Those that hold the structure; the fault points into `smiles`.
  virtual std::expected<std::vector<RowNumber>, text::TextFault> numbersBySubstructure(
      std::string_view smiles) = 0;
  /// Every name and synonym as written, for near misses.
  virtual std::vector<std::string> names() = 0;
};

struct ResolveOptions {
  bool unknownMatchesNothing = false;  ///< a name of no substance is no fault: as-you-type
};

/// Looks the substances up. Faults: a name or CAS number of no substance, with the nearest names;
/// a structure that cannot be read. A structure that no substance holds matches nothing.
[[nodiscard]] std::expected<FindQuery, text::TextFault> resolveQuery(
    const ParsedQuery& parsed, SubstanceResolver& resolver, const ResolveOptions& options = {});

/// A field that may stand before `:`, or before a comparison.
struct FindField {
  enum class Kind { kRole, kStructure, kText, kMeasure } kind;
  std::string_view name;     ///< `additive`, `yield`
  std::string_view meaning;  ///< a few words, for completion
  TextFieldCondition::Field text = TextFieldCondition::Field::kCode;
  MeasureCondition::Measure measure = MeasureCondition::Measure::kYield;
};

/// Every field: roles first, then the others as documented.
[[nodiscard]] const std::vector<FindField>& findFields();

/// The field of this name, in any case, or nullptr.
[[nodiscard]] const FindField* findField(std::string_view name);

/// A value as it has to be written behind `field:` so that it is read back as it is.
[[nodiscard]] std::string asFindValue(std::string_view value);

}  // namespace vialkeeper::app
