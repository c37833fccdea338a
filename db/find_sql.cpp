// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/find_sql.h"

#include <fmt/format.h>

#include <algorithm>
#include <iterator>
#include <optional>

namespace vialkeeper::db {
namespace {

using app::FindCondition;
using app::FindOptions;
using app::FindOrder;
using app::SubstanceCondition;
using app::WordsCondition;

constexpr std::int64_t kFew = 5'000;  ///< up to here runs are asked one by one
constexpr std::int64_t kMostRanked = 2'000;

/// The conditions that all have to hold: those of AllOf beside the others, words gathered in one.
class Conjunction {
 public:
  explicit Conjunction(const app::FindConditions& conditions) {
    gather(conditions);
    m_match = matchText(m_words);
  }

  [[nodiscard]] const std::vector<const FindCondition*>& others() const { return m_others; }
  /// For MATCH; empty where no word has to stand in the run.
  [[nodiscard]] const std::string& match() const { return m_match; }

 private:
  void gather(const app::FindConditions& conditions) {
    for (const FindCondition& condition : conditions) {
      if (const auto* all = std::get_if<app::AllOf>(&condition.data)) {
        gather(all->conditions);
      } else if (const auto* words = std::get_if<WordsCondition>(&condition.data)) {
        gather(*words);
      } else {
        m_others.push_back(&condition);
      }
    }
  }

  void gather(const WordsCondition& words) {
    for (std::size_t i = 0; i < words.words.size(); ++i) {
      m_words.words.push_back(words.words[i]);
      m_words.prefix.push_back((i < words.prefix.size() && words.prefix[i]) ||
                               (words.lastIsPrefix && i + 1 == words.words.size()));
    }
  }

  std::vector<const FindCondition*> m_others;
  WordsCondition m_words;
  std::string m_match;
};

/// The condition that is looked up first; the runs it gives are asked for the rest.
struct Lead {
  const FindCondition* substance = nullptr;  ///< holds a SubstanceCondition
  bool byWords = false;
  std::int64_t rows = kFew;  ///< how many runs it gives, kFew meaning that or more

  [[nodiscard]] const SubstanceCondition& condition() const {
    return std::get<SubstanceCondition>(substance->data);
  }
  /// One stretch of an index, which gives the runs in their order.
  [[nodiscard]] bool isInOrder() const {
    return substance != nullptr && condition().substances.size() == 1;
  }
};

SqlText countingSql(std::string_view from, const SqlText& where) {
  SqlText sql{fmt::format("SELECT count(*) FROM (SELECT 1 FROM {} WHERE ", from)};
  sql += where;
  sql += fmt::format(" LIMIT {})", kFew);
  return sql;
}

/// Without a count: solvents and gases are in nearly every run, additives and the like in few.
std::int64_t likelyRows(const SubstanceCondition& condition) {
  static constexpr std::string_view kEverywhere[] = {"solvent", "gas"};
  static constexpr std::string_view kCommon[] = {
      "", "substrate", "product", "photocatalyst", "catalyst", "standard"};
  const bool isNarrowed = condition.loading_molPercent || condition.concentration_mol_L;
  if (std::ranges::find(kEverywhere, condition.role) != std::end(kEverywhere)) return 100 * kFew;
  if (std::ranges::find(kCommon, condition.role) != std::end(kCommon))
    return (isNarrowed ? 5 : 10) * kFew;
  return isNarrowed ? kFew : 2 * kFew;
}

Lead chooseLead(const Conjunction& all, const RowCounter& counter) {
  std::optional<Lead> best;
  // A condition by itself leads, whatever it finds.
  const RowCounter rowsOf =
      all.others().size() + (all.match().empty() ? 0 : 1) > 1 ? counter : RowCounter();
  const auto offer = [&best](Lead lead) {
    if (!best || lead.rows < best->rows) best = lead;
  };
  for (const FindCondition* each : all.others()) {
    const auto* substance = std::get_if<SubstanceCondition>(&each->data);
    if (substance == nullptr || substance->anySubstance || substance->substances.empty()) continue;
    const std::int64_t rows =
        rowsOf ? rowsOf(countingSql("component c", componentSql(*substance, "c")))
               : likelyRows(*substance);
    offer({.substance = each, .rows = rows});
  }
  if (!all.match().empty()) {
    const std::int64_t rows =
        rowsOf ? rowsOf(countingSql("run_search", {"run_search MATCH ?", {all.match()}}))
               : 7 * kFew;
    offer({.byWords = true, .rows = rows});
  }
  return best.value_or(Lead{.rows = 100 * kFew});
}

/// Adds " WHERE …" or " AND …" for what the lead does not say itself.
SqlText restSql(const Conjunction& all, const Lead& lead, const SqlPlace& place) {
  std::vector<const FindCondition*> rest = all.others();
  std::erase(rest, lead.substance);
  SqlText sql = allOfSql(rest, place);
  if (!lead.byWords && !all.match().empty()) {
    sql += fmt::format(" AND {}{} IN (SELECT rowid FROM run_search WHERE run_search MATCH ?)",
                       place.isLed ? "+" : "", place.run);
    sql.cells.emplace_back(all.match());
  }
  return sql;
}

bool restReadsRun(const Conjunction& all) {
  return std::ranges::any_of(all.others(),
                             [](const FindCondition* each) { return readsRun(*each); });
}

/// A statement's middle: FROM and WHERE, and what names a run there.
struct Source {
  SqlText text;
  std::string_view run;
  bool mayRepeat = false;  ///< a run may come twice
};

Source sourceByComponent(const Conjunction& all, const Lead& lead) {
  Source source{.text = {}, .run = "c.run_n", .mayRepeat = true};
  // CROSS JOIN: SQLite keeps the order of the tables.
  source.text += restReadsRun(all) ? " FROM component c CROSS JOIN run r ON r.n = c.run_n WHERE "
                                   : " FROM component c WHERE ";
  source.text += componentSql(lead.condition(), "c");
  source.text += " AND ";
  source.text +=
      restSql(all, lead, {.run = source.run, .isLed = true, .isProbed = lead.rows < kFew});
  return source;
}

Source sourceByWords(const Conjunction& all, const Lead& lead) {
  Source source{.text = {}, .run = "run_search.rowid"};
  source.text += restReadsRun(all) ? " FROM run_search CROSS JOIN run r ON r.n = run_search.rowid"
                                   : " FROM run_search";
  source.text += SqlText{" WHERE run_search MATCH ? AND ", {all.match()}};
  source.text +=
      restSql(all, lead, {.run = source.run, .isLed = true, .isProbed = lead.rows < kFew});
  return source;
}

/// From the runs themselves; a lead, if there is one, is gathered first and each of its runs looked
/// up.
Source sourceByRun(const Conjunction& all, const Lead& lead) {
  Source source{.text = {" FROM run r WHERE "}, .run = "r.n"};
  const bool isLed = lead.byWords || lead.substance != nullptr;
  if (lead.byWords) {
    source.text += SqlText{"r.n IN (SELECT rowid FROM run_search WHERE run_search MATCH ?) AND ",
                           {all.match()}};
  } else if (isLed) {
    source.text += conditionSql(*lead.substance, {.run = "r.n"});
    source.text += " AND ";
  }
  source.text +=
      restSql(all, lead, {.run = "r.n", .isLed = isLed, .isProbed = isLed && lead.rows < kFew});
  return source;
}

SqlText limited(SqlText sql, const FindOptions& options) {
  if (options.limit == 0 && options.skip == 0) return sql;
  const std::int64_t most = options.limit == 0 ? -1 : static_cast<std::int64_t>(options.limit);
  sql += SqlText{" LIMIT ?", {most}};
  if (options.skip > 0) sql += SqlText{" OFFSET ?", {static_cast<std::int64_t>(options.skip)}};
  return sql;
}

SqlText selectInOrder(const Source& source, std::string_view order, const FindOptions& options) {
  SqlText sql{fmt::format("SELECT {}{} AS n", source.mayRepeat ? "DISTINCT " : "", source.run)};
  sql += source.text;
  sql += fmt::format(" ORDER BY {}", order);
  return limited(std::move(sql), options);
}

/// The newest hits by their words' weight; what is older follows where more is asked for.
SqlText selectByRank(const Source& source, const FindOptions& options) {
  const auto newest = [&source](std::string_view columns, std::string_view limit) {
    SqlText sql{fmt::format("SELECT {} AS n, {}", source.run, columns)};
    sql += source.text;
    sql += fmt::format(" ORDER BY {} DESC {}", source.run, limit);
    return sql;
  };
  SqlText sql{"SELECT n FROM (SELECT * FROM ("};
  sql += newest("bm25(run_search) AS score, 0 AS tier", fmt::format("LIMIT {}", kMostRanked));
  sql += ")";
  if (options.limit == 0 || options.skip + options.limit > static_cast<std::size_t>(kMostRanked)) {
    sql += " UNION ALL SELECT * FROM (";
    sql += newest("0.0 AS score, 1 AS tier", fmt::format("LIMIT -1 OFFSET {}", kMostRanked));
    sql += ")";
  }
  sql += ") ORDER BY tier, score, n DESC";
  return limited(std::move(sql), options);
}

SqlText countSql(const Source& source) {
  SqlText sql{source.mayRepeat ? fmt::format("SELECT count(DISTINCT {})", source.run)
                               : "SELECT count(*)"};
  sql += source.text;
  return sql;
}

}  // namespace

FindSql findSql(const app::FindQuery& query, const FindOptions& options, const RowCounter& rowsOf) {
  const Conjunction all(query.conditions);
  Lead lead = chooseLead(all, rowsOf);
  if (options.order == FindOrder::kRank && !all.match().empty()) {
    // The weights come with the words' own index only.
    const Lead words{.byWords = true, .rows = lead.byWords ? lead.rows : kFew};
    const Source source = sourceByWords(all, words);
    return {selectByRank(source, options), countSql(source)};
  }
  if (options.order == FindOrder::kYield || options.order == FindOrder::kCode) {
    const Source source = sourceByRun(all, lead);
    // A number is put in order as one: KW-10000 follows KW-9999.
    const std::string_view order = options.order == FindOrder::kYield
                                       ? "r.yield_percent DESC, r.n DESC"
                                       : "rtrim(r.code, '0123456789'), length(r.code), r.code";
    return {selectInOrder(source, order, options), countSql(source)};
  }
  const Source source = lead.byWords       ? sourceByWords(all, lead)
                        : lead.isInOrder() ? sourceByComponent(all, lead)
                                           : sourceByRun(all, lead);
  const std::string order =
      fmt::format("{} {}", source.run, options.order == FindOrder::kOldest ? "ASC" : "DESC");
  return {selectInOrder(source, order, options), countSql(source)};
}

}  // namespace vialkeeper::db
