// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <memory>
#include <optional>
#include <string>
#include <variant>
#include <vector>

#include "app/notebook/records.h"

/// A search as a tree of conditions: what the find language means, free of any text of it.
namespace vialkeeper::app {

/// A closed interval; an end that is missing is open.
struct Interval {
  std::optional<double> least;
  std::optional<double> most;
};

/// The run holds one of these substances, in this role if one is named, within this loading.
struct SubstanceCondition {
  std::string role;                   ///< empty: any role
  std::string written;                ///< the name as typed, for messages
  std::vector<RowNumber> substances;  ///< resolved before the search; empty matches nothing
  std::optional<Interval> loading_molPercent = {};
  std::optional<Interval> concentration_mol_L = {};
  bool anySubstance = false;  ///< whatever substance it is: `additive:*`
};

/// All of these words (or their beginnings) stand in observations, title, aim, conclusion or code.
struct WordsCondition {
  std::vector<std::string> words;  ///< a word of several parts is a phrase
  bool lastIsPrefix = false;       ///< as-you-type
  std::vector<bool> prefix = {};   ///< word by word, for `amb*`
};

/// A field of the run equals (texts: case ignored) or begins with the value.
struct TextFieldCondition {
  enum class Field { kCode, kSeries, kPerson, kState, kVial, kLamp, kAtmosphere } field;
  std::string value;
  bool isPrefix = false;  ///< begins with the value, else equals it
};

/// A number of the run lies within the interval.
struct MeasureCondition {
  enum class Measure {
    kYield,
    kConversion,
    kWavelength,
    kTemperature,
    kDuration,
    kLiquid,
    kLimiting,
    kDate  ///< creation by the local clock, its digits read as UTC [ms since 1970]
  } measure;
  Interval interval;
};

struct FindCondition;
using FindConditions = std::vector<FindCondition>;

/// All conditions hold.
struct AllOf {
  FindConditions conditions;
};
/// At least one holds.
struct AnyOf {
  FindConditions conditions;
};
/// The conditions do not all hold: the opposite of AllOf.
struct NoneOf {
  FindConditions conditions;
};

struct FindCondition {
  std::variant<SubstanceCondition, WordsCondition, TextFieldCondition, MeasureCondition, AllOf,
               AnyOf, NoneOf>
      data;
};

/// All runs that meet every condition; an empty list means all runs.
struct FindQuery {
  FindConditions conditions;
};

enum class FindOrder { kNewest, kOldest, kRank, kYield, kCode };

struct FindOptions {
  FindOrder order = FindOrder::kNewest;
  std::size_t limit = 200;  ///< most rows to return; 0: all
  bool count = true;        ///< whether to count all matches
  std::size_t skip = 0;     ///< rows of the order to leave out before the first: a further page
};

/// One found run with what a table of runs shows.
struct FoundRun {
  RunRecord run;
  std::vector<ComponentRecord> components;
};

struct FindResult {
  std::int64_t matches =
      0;  ///< of all, if they were counted; else the rows up to the last returned
  std::vector<FoundRun> runs;
};

}  // namespace vialkeeper::app
