// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/find_sql.h"

#include <catch2/catch.hpp>

#include <algorithm>

#include "db/find_fixture.h"

using namespace vialkeeper;
using app::FindOrder;
using app::FindQuery;
using testing::SampleNotebook;
using testing::SampleRun;

namespace {

SampleNotebook& notebook() {
  static SampleNotebook sample(5'000, 20260301);
  return sample;
}

db::RowCounter counter() {
  return [](const db::SqlText& sql) { return notebook().numbers(sql).at(0); };
}

/// What the runs have to be put in order by, as `find_sql.h` says.
std::vector<std::int64_t> ordered(std::vector<const SampleRun*> runs, FindOrder order) {
  std::ranges::stable_sort(runs, [order](const SampleRun* a, const SampleRun* b) {
    switch (order) {
      case FindOrder::kOldest:
        return a->run.n < b->run.n;
      case FindOrder::kYield: {
        const double yieldA = a->run.yield_percent.value_or(-1.0);
        const double yieldB = b->run.yield_percent.value_or(-1.0);
        return yieldA != yieldB ? yieldA > yieldB : a->run.n > b->run.n;
      }
      case FindOrder::kCode:
        return a->run.code < b->run.code;
      default:
        return a->run.n > b->run.n;
    }
  });
  std::vector<std::int64_t> numbers;
  for (const SampleRun* run : runs) numbers.push_back(run->run.n);
  return numbers;
}

std::vector<std::int64_t> sorted(std::vector<std::int64_t> numbers) {
  std::ranges::sort(numbers);
  return numbers;
}

/// Asks in every order, with and without a limit and a counter, and compares with the evaluation by
/// hand.
void checkQuery(const FindQuery& query, std::size_t limit) {
  const auto expected = notebook().matches(query);
  for (const FindOrder order : {FindOrder::kNewest, FindOrder::kOldest, FindOrder::kRank,
                                FindOrder::kYield, FindOrder::kCode}) {
    for (const bool isCounted : {false, true}) {
      if (isCounted && order == FindOrder::kOldest) continue;  // the same but for the direction
      const db::FindSql all =
          db::findSql(query, {order, 0, true}, isCounted ? counter() : db::RowCounter());
      INFO(all.select.sql);
      const auto numbers = notebook().numbers(all.select);
      REQUIRE(notebook().numbers(all.count) ==
              std::vector{static_cast<std::int64_t>(expected.size())});
      if (order == FindOrder::kRank) {
        REQUIRE(sorted(numbers) == ordered(expected, FindOrder::kOldest));
      } else {
        REQUIRE(numbers == ordered(expected, order));
      }
      if (order != FindOrder::kNewest && order != FindOrder::kRank) continue;
      const auto first = notebook().numbers(
          db::findSql(query, {order, limit, true}, isCounted ? counter() : db::RowCounter())
              .select);
      REQUIRE(first.size() == std::min(limit, expected.size()));
      if (order != FindOrder::kRank)
        REQUIRE(std::equal(first.begin(), first.end(), numbers.begin()));
    }
  }
}

}  // namespace

TEST_CASE("every kind of condition finds what an evaluation by hand finds",
          "[db][find][independent]") {
  using namespace app;
  using Field = TextFieldCondition::Field;
  using Measure = MeasureCondition::Measure;
  const std::vector<FindCondition> kinds = {
      {SubstanceCondition{.role = "photocatalyst", .written = {}, .substances = {1}}},
      {SubstanceCondition{.role = "catalyst", .written = {}, .substances = {1}}},
      {SubstanceCondition{.role = "", .written = {}, .substances = {2}}},
      {SubstanceCondition{.role = "acid",
                          .written = {},
                          .substances = {1, 2, 3},
                          .loading_molPercent = Interval{5, 20}}},
      {SubstanceCondition{.role = "acid",
                          .written = {},
                          .substances = {1},
                          .loading_molPercent = Interval{{}, 20}}},
      {SubstanceCondition{.role = "acid",
                          .written = {},
                          .substances = {1},
                          .concentration_mol_L = Interval{0.05, {}}}},
      {SubstanceCondition{.role = "acid", .written = {}, .substances = {}}},
      {SubstanceCondition{.role = "acid", .written = {}, .substances = {}, .anySubstance = true}},
      {WordsCondition{{"turned", "film"}, false, {}}},
      {WordsCondition{{"turned black"}, false, {}}},
      {WordsCondition{{"amb"}, true, {}}},
      {WordsCondition{{"amb", "film"}, false, {true, false}}},
      {WordsCondition{{"grün"}, false, {}}},
      {WordsCondition{{"4-CzIPN"}, false, {}}},
      {TextFieldCondition{Field::kSeries, "ACID additives"}},
      {TextFieldCondition{Field::kSeries, "acid", true}},
      {TextFieldCondition{Field::kPerson, "KW"}},
      {TextFieldCondition{Field::kState, "closed"}},
      {MeasureCondition{Measure::kYield, {60, {}}}},
      {MeasureCondition{Measure::kYield, {}}},
      {MeasureCondition{Measure::kDate, {1'770'000'000'000.0, 1'771'000'000'000.0}}},
  };
  for (std::size_t i = 0; i < kinds.size(); ++i) {
    INFO("condition " << i);
    checkQuery({{kinds[i]}}, 20);
    checkQuery({{{NoneOf{{kinds[i]}}}}}, 20);
    if (i % 2 == 0) checkQuery({{kinds[i], kinds[(i + 5) % kinds.size()]}}, 20);
    if (i % 2 == 1) checkQuery({{{AnyOf{{kinds[i], kinds[(i + 7) % kinds.size()]}}}}}, 20);
  }
  checkQuery({}, 50);
  checkQuery({{{AnyOf{}}}}, 50);
}

TEST_CASE("random searches find what an evaluation by hand finds", "[db][find][independent]") {
  testing::RandomQueries queries(7);
  std::size_t some = 0;
  for (int round = 0; round < 320; ++round) {
    const FindQuery query = queries.query();
    INFO("query " << round);
    checkQuery(query, 1 + static_cast<std::size_t>(round) % 60);
    const std::size_t found = notebook().matches(query).size();
    if (found > 0 && found < notebook().runs().size()) ++some;
  }
  CHECK(some > 120);  // the searches tell runs apart
}

TEST_CASE("no text of a search reaches SQL or the full-text syntax", "[db][find][identity]") {
  using namespace app;
  const std::vector<std::string> hostile = {"' OR 1=1 --",
                                            "'; DROP TABLE run; --",
                                            "\"",
                                            "\"\"",
                                            "\" OR \"film",
                                            "\"film\" OR \"grey",
                                            "film\" NOT \"grey",
                                            "NEAR(film grey, 2)",
                                            "NEAR",
                                            "AND",
                                            "OR",
                                            "NOT",
                                            "film AND",
                                            "film OR grey",
                                            "*",
                                            "film*",
                                            "^film",
                                            "title:film",
                                            "title : film",
                                            "-film",
                                            "+film",
                                            "{title}:film",
                                            "(film",
                                            "film)",
                                            ":",
                                            "?",
                                            "?1",
                                            ":n",
                                            "@n",
                                            "$n",
                                            "%",
                                            "_",
                                            "\\",
                                            "%_\\",
                                            std::string("fi\0lm", 5),
                                            std::string(1, '\0'),
                                            "\xFF\xFE",
                                            "\xE2\x82",
                                            "\u202Efilm",
                                            "\u200B",
                                            "\n",
                                            "film\ngrey",
                                            "🧪",
                                            "--",
                                            "/*",
                                            "*/",
                                            ";",
                                            "' COLLATE BINARY --",
                                            "x'00'",
                                            "rank MATCH",
                                            std::string(20'000, 'a'),
                                            std::string(20'000, '"'),
                                            std::string(20'000, '(')};
  for (const std::string& text : hostile) {
    INFO(text.substr(0, 60));
    std::vector<FindCondition> conditions;
    conditions.push_back({SubstanceCondition{.role = text, .written = text, .substances = {1}}});
    conditions.push_back({SubstanceCondition{.role = text, .written = text, .substances = {1, 2}}});
    conditions.push_back({SubstanceCondition{
        .role = text, .written = text, .substances = {}, .anySubstance = true}});
    conditions.push_back({WordsCondition{{text}, false, {}}});
    conditions.push_back({WordsCondition{{text, text}, true, {true}}});
    for (int field = 0; field <= static_cast<int>(TextFieldCondition::Field::kAtmosphere);
         ++field) {
      for (const bool isPrefix : {false, true}) {
        conditions.push_back(
            {TextFieldCondition{static_cast<TextFieldCondition::Field>(field), text, isPrefix}});
      }
    }
    for (const FindCondition& condition : conditions) {
      for (const FindOrder order : {FindOrder::kNewest, FindOrder::kRank}) {
        const db::FindSql sql = db::findSql({{condition}}, {order, 0, true});
        // Nothing of the text is in the statement.
        REQUIRE(sql.select.sql.size() < 1'000);
        if (text.size() > 4) REQUIRE(sql.select.sql.find(text) == std::string::npos);
        REQUIRE(static_cast<std::int64_t>(notebook().numbers(sql.select).size()) ==
                notebook().numbers(sql.count).at(0));
      }
    }
  }
  for (const std::string& text :
       {std::string(10'000'000, 'a'), std::string(10'000'000, '"'), std::string(10'000'000, '%')}) {
    AnyOf any;
    any.conditions.push_back({WordsCondition{{text}, true, {}}});
    any.conditions.push_back({TextFieldCondition{TextFieldCondition::Field::kVial, text, true}});
    FindQuery query;
    query.conditions.push_back({std::move(any)});
    const bool isWord = text.front() == 'a';
    CHECK(notebook().numbers(db::findSql(query, {}).count).at(0) == (isWord ? 0 : 5'000));
  }
  CHECK(notebook().numbers({"SELECT count(*) FROM run"}).at(0) == 5'000);
  // Quoted, a word finds itself and nothing more.
  for (const char* word : {"NEAR", "AND", "C++", "it's", "3:1", "Ni(bpy)"}) {
    INFO(word);
    checkQuery({{{WordsCondition{{word}, false, {}}}}}, 10);
  }
}

TEST_CASE("long lists and deep trees stay within SQLite's limits", "[db][find]") {
  using namespace app;
  AnyOf any;
  for (int i = 0; i < 3'000; ++i)
    any.conditions.push_back(
        {MeasureCondition{MeasureCondition::Measure::kYield, {i + 0.5, i + 1.5}}});
  const auto numbers =
      notebook().numbers(db::findSql({{{any}}}, {FindOrder::kNewest, 0, true}).select);
  CHECK(numbers.size() == notebook().matches({{{any}}}).size());
  // All substances but the first, and many that there are not: more than SQLite has parameters.
  SubstanceCondition condition{.role = "acid", .written = {}, .substances = {}};
  for (std::int64_t n = 2; n < 50'000; ++n) condition.substances.push_back(n);
  const auto expected = std::ranges::count_if(notebook().runs(), [](const SampleRun& sample) {
    return std::ranges::any_of(sample.components, [](const ComponentRecord& component) {
      return component.role == "acid" && component.substance > 1;
    });
  });
  const FindQuery many{{{condition}}};
  CHECK(notebook().numbers(db::findSql(many, {FindOrder::kNewest, 0, true}).select).size() ==
        static_cast<std::size_t>(expected));
  FindCondition deep{MeasureCondition{MeasureCondition::Measure::kYield, {50, {}}}};
  for (int i = 0; i < 32; ++i) deep = {NoneOf{{deep}}};
  checkQuery({{deep}}, 10);
}

TEST_CASE("rank puts runs that say a word often before others", "[db][find]") {
  using namespace app;
  const FindQuery query{{{WordsCondition{{"septum"}, false, {}}}}};
  const auto ranked = notebook().numbers(db::findSql(query, {FindOrder::kRank, 5, true}).select);
  REQUIRE(ranked.size() == 5);
  const auto times = [](std::int64_t n) {
    std::size_t count = 0;
    for (const std::string& text : notebook().runs()[static_cast<std::size_t>(n) - 1].texts) {
      for (std::size_t at = text.find("septum"); at != std::string::npos;
           at = text.find("septum", at + 1))
        ++count;
    }
    return count;
  };
  CHECK(times(ranked.front()) >= 2);
}

TEST_CASE("a catalyst with its loading is looked up in its index", "[db][find]") {
  using namespace app;
  const FindCondition catalyst{SubstanceCondition{.role = "photocatalyst",
                                                  .written = {},
                                                  .substances = {1},
                                                  .loading_molPercent = Interval{1, 5}}};
  const FindCondition acid{SubstanceCondition{.role = "acid", .written = {}, .substances = {2}}};
  const FindCondition both{
      SubstanceCondition{.role = "catalyst", .written = {}, .substances = {1}}};
  const FindCondition several{
      SubstanceCondition{.role = "acid", .written = {}, .substances = {2, 3}}};
  const FindCondition words{WordsCondition{{"film"}, false, {}}};
  const auto holds = [](const std::vector<std::string>& plan, std::string_view text) {
    return std::ranges::any_of(
        plan, [&](const std::string& line) { return line.find(text) != std::string::npos; });
  };
  for (const FindQuery& query : std::vector<FindQuery>{{{catalyst}},
                                                       {{catalyst, acid}},
                                                       {{catalyst, words}},
                                                       {{both}},
                                                       {{several}},
                                                       {{both, several, words}},
                                                       {{{NoneOf{{catalyst}}}, acid}},
                                                       {{{AnyOf{{catalyst, acid}}}}}}) {
    for (const bool isCounted : {false, true}) {
      const db::FindSql sql = db::findSql(query, {FindOrder::kNewest, 100, true},
                                          isCounted ? counter() : db::RowCounter());
      for (const db::SqlText& each : {sql.select, sql.count}) {
        const auto plan = notebook().plan(each);
        INFO(each.sql);
        for (const std::string& line : plan) INFO(line);
        CHECK_FALSE(holds(plan, "SCAN c"));
        CHECK_FALSE(holds(plan, "SCAN p"));
      }
    }
  }
  const auto plan =
      notebook().plan(db::findSql({{catalyst}}, {FindOrder::kNewest, 100, true}).select);
  CHECK(holds(plan, "component_find (role=? AND substance_n=?"));
  CHECK_FALSE(holds(plan, "TEMP B-TREE"));  // already in order
  const auto withWords =
      notebook().plan(db::findSql({{catalyst, words}}, {FindOrder::kNewest, 100, true}).select);
  CHECK(holds(withWords, "SEARCH c USING COVERING INDEX component_find"));
  CHECK_FALSE(holds(withWords, "TEMP B-TREE"));
}
