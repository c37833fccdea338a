// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/find_condition_sql.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "app/notebook/find_scan.h"
#include "text/utf8.h"

namespace vialkeeper::db {
namespace {

using app::FindCondition;
using app::Interval;
using app::MeasureCondition;
using app::SubstanceCondition;
using app::TextFieldCondition;
using app::WordsCondition;

/// SQLite's comparisons of text end at a NUL, and no text of the notebook holds one.
std::string withoutNul(std::string_view text) {
  std::string kept(text);
  std::erase(kept, '\0');
  return kept;
}

/// The expression within the interval; one that is open at both ends asks that there is a value.
SqlText withinSql(const std::string& expression, const Interval& interval) {
  if (!interval.least && !interval.most) return {expression + " IS NOT NULL"};
  SqlText sql;
  if (interval.least) sql += SqlText{expression + " >= ?", {*interval.least}};
  if (interval.least && interval.most) sql += " AND ";
  if (interval.most) sql += SqlText{expression + " <= ?", {*interval.most}};
  return sql;
}

/// A list of any length as one value: SQLite's number of parameters is limited.
SqlText amongSql(const std::string& expression, const std::vector<app::RowNumber>& numbers) {
  if (numbers.size() == 1) return {expression + " = ?", {std::int64_t{numbers.front()}}};
  return {expression + " IN (SELECT value FROM json_each(?))",
          {fmt::format("[{}]", fmt::join(numbers, ","))}};
}

SqlText roleSql(const std::string& role, const std::string& column) {
  if (role == "catalyst") return {column + " IN ('photocatalyst', 'cocatalyst')"};
  // An acid or base is an additive to whoever looks for one.
  if (role == "additive") return {column + " IN ('additive', 'acid', 'base')"};
  return {column + " = ?", {withoutNul(role)}};
}

/// Loading and concentration, each led by AND.
SqlText amountsSql(const SubstanceCondition& condition, const std::string& alias) {
  SqlText sql;
  if (condition.loading_molPercent) {
    sql += " AND ";
    sql += withinSql(alias + ".loading_mol_percent", *condition.loading_molPercent);
  }
  if (condition.concentration_mol_L) {
    sql += " AND ";
    sql += withinSql(fmt::format("coalesce({0}.charged_mol_l, {0}.planned_mol_l)", alias),
                     *condition.concentration_mol_L);
  }
  return sql;
}

bool isIndexed(const SubstanceCondition& condition) {
  return condition.substances.size() == 1 && condition.role != "catalyst";
}

/// Looks into the components of one run.
SqlText probeSql(const SubstanceCondition& condition, const SqlPlace& place) {
  SqlText sql{fmt::format("EXISTS (SELECT 1 FROM component p WHERE p.run_n = {}", place.run)};
  // The unary + keeps to the run's few components where no index leads to the one.
  const bool byIndex = !condition.anySubstance && isIndexed(condition) && !condition.role.empty();
  const std::string plus = byIndex ? "" : "+";
  if (!condition.role.empty()) {
    sql += " AND ";
    sql += roleSql(condition.role, plus + "p.role");
  }
  if (!condition.anySubstance) {
    sql += " AND ";
    sql += amongSql(plus + "p.substance_n", condition.substances);
  }
  sql += amountsSql(condition, "p");
  sql += ")";
  return sql;
}

SqlText substanceSql(const SubstanceCondition& condition, const SqlPlace& place) {
  if (!condition.anySubstance && condition.substances.empty()) return {"0"};
  // Of any role and substance there is no stretch of an index.
  if (place.isProbed || (condition.anySubstance && condition.role.empty()))
    return probeSql(condition, place);
  SqlText sql{fmt::format("{}{} IN (SELECT p.run_n FROM component p WHERE ", place.isLed ? "+" : "",
                          place.run)};
  sql += componentSql(condition, "p");
  sql += ")";
  return sql;
}

SqlText wordsSql(const WordsCondition& words, const SqlPlace& place) {
  const std::string match = matchText(words);
  if (match.empty()) return {"1"};
  return {fmt::format("{}{} IN (SELECT rowid FROM run_search WHERE run_search MATCH ?)",
                      place.isLed ? "+" : "", place.run),
          {match}};
}

SqlText textFieldSql(const TextFieldCondition& condition) {
  using Field = TextFieldCondition::Field;
  const std::string value = withoutNul(condition.value);
  const auto compared = [&](const std::string& column) -> SqlText {
    if (!condition.isPrefix) return {column + " = ? COLLATE NOCASE", {value}};
    const auto letters = static_cast<std::int64_t>(text::characterIndex(value, value.size()));
    return {fmt::format("substr({}, 1, ?) = ? COLLATE NOCASE", column), {letters, value}};
  };
  switch (condition.field) {
    case Field::kCode:
      return compared("r.code");
    case Field::kState:
      return compared("r.state");
    case Field::kSeries:
      return compared("ifnull(r.series, '')");
    case Field::kVial:
      return compared("ifnull(r.vial, '')");
    case Field::kLamp:
      return compared("ifnull(r.lamp, '')");
    case Field::kAtmosphere:
      return compared("ifnull(r.atmosphere, '')");
    case Field::kPerson:
      break;
  }
  SqlText sql{"r.person_n IN (SELECT n FROM person WHERE "};
  sql += compared("code");
  sql += ")";
  return sql;
}

/// The local clock's day by the offset, and before that by the index over UTC, half a day wider.
SqlText dateSql(const Interval& interval) {
  constexpr double kWidestOffset_ms = 15.0 * 3'600'000.0;
  Interval wide;
  if (interval.least) wide.least = *interval.least - kWidestOffset_ms;
  if (interval.most) wide.most = *interval.most + kWidestOffset_ms;
  SqlText sql = withinSql("r.created_ms", wide);
  sql += " AND ";
  sql += withinSql("(r.created_ms + 60000 * r.created_offset_min)", interval);
  return sql;
}

SqlText measureSql(const MeasureCondition& condition) {
  using Measure = MeasureCondition::Measure;
  switch (condition.measure) {
    case Measure::kYield:
      return withinSql("r.yield_percent", condition.interval);
    case Measure::kConversion:
      return withinSql("r.conversion_percent", condition.interval);
    case Measure::kWavelength:
      return withinSql("r.wavelength_nm", condition.interval);
    case Measure::kTemperature:
      return withinSql("r.temperature_c", condition.interval);
    case Measure::kDuration:
      return withinSql("r.duration_h", condition.interval);
    case Measure::kLiquid:
      return withinSql("r.liquid_ml", condition.interval);
    case Measure::kLimiting:
      return withinSql("r.limiting_mmol", condition.interval);
    case Measure::kDate:
      break;
  }
  return dateSql(condition.interval);
}

/// Joined as a balanced tree, for SQLite limits the depth of an expression.
SqlText joined(std::span<const FindCondition* const> conditions, std::string_view with,
               const SqlPlace& place) {
  SqlText sql{"("};
  if (conditions.size() == 1) {
    sql += conditionSql(*conditions.front(), place);
  } else {
    const std::size_t half = conditions.size() / 2;
    sql += joined(conditions.first(half), with, place);
    sql += with;
    sql += joined(conditions.subspan(half), with, place);
  }
  sql += ")";
  return sql;
}

std::vector<const FindCondition*> pointersTo(const app::FindConditions& conditions) {
  std::vector<const FindCondition*> pointers;
  for (const FindCondition& each : conditions) pointers.push_back(&each);
  return pointers;
}

struct ConditionWriter {
  const SqlPlace& place;

  SqlText operator()(const SubstanceCondition& condition) const {
    return substanceSql(condition, place);
  }
  SqlText operator()(const WordsCondition& condition) const { return wordsSql(condition, place); }
  SqlText operator()(const TextFieldCondition& condition) const { return textFieldSql(condition); }
  SqlText operator()(const MeasureCondition& condition) const { return measureSql(condition); }
  SqlText operator()(const app::AllOf& all) const {
    return allOfSql(pointersTo(all.conditions), place);
  }
  SqlText operator()(const app::AnyOf& any) const {
    return any.conditions.empty() ? SqlText{"0"}
                                  : joined(pointersTo(any.conditions), " OR ", place);
  }
  SqlText operator()(const app::NoneOf& none) const {
    SqlText sql = allOfSql(pointersTo(none.conditions), place);
    sql += " IS NOT TRUE";
    return sql;
  }
};

}  // namespace

SqlText componentSql(const SubstanceCondition& condition, const std::string& alias) {
  SqlText sql;
  if (condition.anySubstance) {
    sql += roleSql(condition.role, alias + ".role");
    sql += amountsSql(condition, alias);
    return sql;
  }
  if (isIndexed(condition) && !condition.role.empty()) {
    sql += roleSql(condition.role, alias + ".role");
    sql += " AND ";
  }
  sql += amongSql(alias + ".substance_n", condition.substances);
  if (!isIndexed(condition) && !condition.role.empty()) {
    sql += " AND ";
    sql += roleSql(condition.role, alias + ".role");
  }
  sql += amountsSql(condition, alias);
  return sql;
}

SqlText conditionSql(const FindCondition& condition, const SqlPlace& place) {
  return std::visit(ConditionWriter{place}, condition.data);
}

SqlText allOfSql(std::span<const FindCondition* const> conditions, const SqlPlace& place) {
  return conditions.empty() ? SqlText{"1"} : joined(conditions, " AND ", place);
}

bool readsRun(const FindCondition& condition) {
  const auto anyReads = [](const app::FindConditions& conditions) {
    return std::ranges::any_of(conditions, readsRun);
  };
  if (const auto* all = std::get_if<app::AllOf>(&condition.data)) return anyReads(all->conditions);
  if (const auto* any = std::get_if<app::AnyOf>(&condition.data)) return anyReads(any->conditions);
  if (const auto* none = std::get_if<app::NoneOf>(&condition.data))
    return anyReads(none->conditions);
  return std::holds_alternative<TextFieldCondition>(condition.data) ||
         std::holds_alternative<MeasureCondition>(condition.data);
}

std::string matchText(const WordsCondition& words) {
  std::string match;
  for (std::size_t i = 0; i < words.words.size(); ++i) {
    const std::string word = withoutNul(words.words[i]);
    if (!app::isSearchable(word)) continue;
    if (!match.empty()) match += ' ';
    match += '"';
    for (const char c : word) {
      if (c == '"') match += '"';
      match += c;
    }
    match += '"';
    const bool isPrefix = (i < words.prefix.size() && words.prefix[i]) ||
                          (words.lastIsPrefix && i + 1 == words.words.size());
    if (isPrefix) match += '*';
  }
  return match;
}

}  // namespace vialkeeper::db
