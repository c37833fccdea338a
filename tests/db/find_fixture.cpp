// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/find_fixture.h"

#include <fmt/format.h>

#include <array>
#include <chrono>
#include <fstream>
#include <sstream>

namespace vialkeeper::testing {
namespace {

constexpr std::array<std::string_view, 12> kRoles = {
    "substrate", "photocatalyst", "cocatalyst", "additive", "acid",    "base",
    "solvent",   "standard",      "quencher",   "gas",      "product", "other"};
constexpr std::array<std::string_view, 3> kPeople = {"KW", "KWL", "AB"};
constexpr std::array<std::string_view, 5> kSeries = {"", "acid additives", "Acid Additives",
                                                     "nickel screen", "same excess"};
constexpr std::array<std::string_view, 28> kWords = {
    "film",   "grey", "amber",  "ambient", "black",  "turned",  "slowly",
    "grün",   "grun", "résidu", "residu",  "4CzIPN", "4-CzIPN", "clear",
    "cloudy", "leak", "septum", "pivalic", "acid",   "Ni(bpy)", "C++",
    "NEAR",   "AND",  "or",     "3:1",     "0.42",   "bar",     "it's"};
constexpr std::int64_t kSubstances = 40;

void bind(SQLite::Statement& statement, const std::vector<db::Cell>& cells) {
  int at = 0;
  for (const db::Cell& cell : cells) {
    ++at;
    if (const auto* number = std::get_if<std::int64_t>(&cell)) statement.bind(at, *number);
    if (const auto* real = std::get_if<double>(&cell)) statement.bind(at, *real);
    if (const auto* text = std::get_if<std::string>(&cell)) statement.bind(at, *text);
  }
}

/// Binds values one after the other.
class Binder {
 public:
  explicit Binder(SQLite::Statement& statement) : m_statement(statement) {}
  Binder& operator()(std::int64_t value) { return m_statement.bind(++m_at, value), *this; }
  Binder& operator()(double value) { return m_statement.bind(++m_at, value), *this; }
  Binder& operator()(const std::string& value) { return m_statement.bind(++m_at, value), *this; }
  Binder& orNull(const std::string& value) { return value.empty() ? null() : (*this)(value); }
  Binder& orNull(const std::optional<double>& value) { return value ? (*this)(*value) : null(); }

 private:
  Binder& null() { return m_statement.bind(++m_at), *this; }
  SQLite::Statement& m_statement;
  int m_at = 0;
};

class Inventor {
 public:
  explicit Inventor(std::uint64_t seed) : m_random(seed) {}

  SampleRun run(std::int64_t n) {
    SampleRun sample;
    app::RunRecord& run = sample.run;
    run.n = n;
    run.person = kPeople[below(kPeople.size())];
    run.code = fmt::format("{}-{:04}", run.person, n);
    run.state = static_cast<app::RunState>(below(6));
    run.series = kSeries[below(kSeries.size())];
    run.created = {std::chrono::sys_time<std::chrono::milliseconds>(std::chrono::milliseconds(
                       1'767'225'600'000 + static_cast<std::int64_t>(below(90ULL * 86'400'000)))),
                   std::chrono::minutes(static_cast<int>(below(5)) * 330 - 660)};
    run.vial = maybe() ? "10 mL crimp vial" : "";
    run.lamp = maybe() ? "LED 440" : "LED 365";
    run.atmosphere = maybe() ? "N2" : "Ar";
    run.wavelength_nm = number(365, 3, 40);
    run.temperature_C = number(20, 20, 1);
    run.duration_h = number(1, 24, 1);
    run.limiting_mmol = 0.05 * static_cast<double>(1 + below(8));
    run.liquid_mL = 0.5 * static_cast<double>(1 + below(8));
    run.yield_percent = number(0, 100, 1);
    run.conversion_percent = number(0, 100, 1);
    const std::size_t components = 3 + below(7);
    for (std::size_t i = 0; i < components; ++i)
      sample.components.push_back(component(static_cast<int>(i)));
    for (int i = 0; i < 4; ++i) sample.texts.push_back(words(below(7)));
    return sample;
  }

 private:
  std::uint64_t below(std::uint64_t n) { return m_random() % n; }
  bool maybe() { return below(2) == 0; }
  std::optional<double> number(double from, std::uint64_t count, double step) {
    if (below(4) == 0) return std::nullopt;
    return from + step * static_cast<double>(below(count));
  }
  app::ComponentRecord component(int position) {
    app::ComponentRecord component;
    component.position = position;
    component.role = kRoles[below(kRoles.size())];
    // Low numbers far more often, as with real shelves.
    component.substance = 1 + static_cast<std::int64_t>(below(1 + below(kSubstances)));
    component.planned_molPercent = number(1, 30, 1);
    if (maybe()) component.charged_molPercent = number(1, 30, 1.01);
    component.planned_mol_L = number(0.01, 20, 0.01);
    if (maybe()) component.charged_mol_L = number(0.01, 20, 0.0101);
    return component;
  }
  std::string words(std::uint64_t count) {
    std::string text;
    for (std::uint64_t i = 0; i < count; ++i)
      text += (i > 0 ? " " : "") + std::string(kWords[below(kWords.size())]);
    return text;
  }
  std::mt19937_64 m_random;
};

std::string migration() {
  std::ifstream file(VIALKEEPER_SOURCE_DIR "/db/migrations/0001_notebook.sql");
  std::stringstream text;
  text << file.rdbuf();
  return text.str();
}

}  // namespace

SampleNotebook::SampleNotebook(std::size_t runs, std::uint64_t seed)
    : m_database(":memory:", SQLite::OPEN_READWRITE | SQLite::OPEN_CREATE) {
  m_database.exec(migration());
  m_database.exec("PRAGMA foreign_keys = ON; BEGIN");
  m_database.exec(
      "INSERT INTO attachment(n, id, sha256, size, data) VALUES (1, x'01', x'01', 0, x'')");
  for (std::size_t i = 0; i < kPeople.size(); ++i) {
    m_database.exec(fmt::format(
        "INSERT INTO person(n, id, code) VALUES ({0}, randomblob(16), '{1}')", i + 1, kPeople[i]));
  }
  for (std::int64_t i = 1; i <= kSubstances; ++i) {
    m_database.exec(fmt::format(
        "INSERT INTO substance(n, id, name) VALUES ({0}, randomblob(16), 'substance {0}')", i));
  }
  Inventor inventor(seed);
  for (std::size_t i = 0; i < runs; ++i) {
    m_runs.push_back(inventor.run(static_cast<std::int64_t>(i) + 1));
    SampleRun& sample = m_runs.back();
    sample.tokens.push_back(tokensOf(sample.run.code));
    for (const std::string& text : sample.texts) sample.tokens.push_back(tokensOf(text));
    write(m_runs.back());
  }
  m_database.exec(
      "INSERT INTO run_search(run_search) VALUES('rebuild'); COMMIT; PRAGMA trusted_schema = OFF");
}

void SampleNotebook::write(const SampleRun& sample) {
  const app::RunRecord& run = sample.run;
  SQLite::Statement insertRun(
      m_database,
      "INSERT INTO run(n, id, code, person_n, state, title, series, created_ms, "
      "created_offset_min, plan_n, vial, lamp, atmosphere, "
      "wavelength_nm, temperature_c, duration_h, limiting_key, limiting_mmol, liquid_ml, "
      "yield_percent, conversion_percent) "
      "VALUES (?, randomblob(16), ?, (SELECT n FROM person WHERE code = ?), ?, ?, ?, ?, ?, 1, "
      "?, ?, ?, ?, ?, ?, 'amine', ?, ?, ?, ?)");
  constexpr std::array<const char*, 6> kStates = {"planned",   "charged", "irradiating",
                                                  "worked-up", "closed",  "sealed"};
  Binder bindRun(insertRun);
  bindRun(run.n)(run.code)(run.person)(kStates[static_cast<std::size_t>(run.state)])(
      sample.texts[0])
      .orNull(run.series)(std::int64_t{run.created.utc.time_since_epoch().count()})(
          std::int64_t{run.created.offset.count()})
      .orNull(run.vial)
      .orNull(run.lamp)
      .orNull(run.atmosphere)
      .orNull(run.wavelength_nm)
      .orNull(run.temperature_C)
      .orNull(run.duration_h)(run.limiting_mmol)(run.liquid_mL)
      .orNull(run.yield_percent)
      .orNull(run.conversion_percent);
  insertRun.exec();
  for (const app::ComponentRecord& component : sample.components) {
    SQLite::Statement insert(
        m_database,
        "INSERT INTO component(id, run_n, position, key, role, name, substance_n, "
        "planned_mol_percent, charged_mol_percent, "
        "loading_mol_percent, planned_mol_l, charged_mol_l) VALUES (randomblob(16), ?, ?, ?, ?, "
        "'x', ?, ?, ?, ?, ?, ?)");
    Binder bindComponent(insert);
    bindComponent(run.n)(std::int64_t{component.position})(fmt::format("c{}", component.position))(
        component.role)(component.substance)
        .orNull(component.planned_molPercent)
        .orNull(component.charged_molPercent)
        .orNull(component.loading_molPercent())
        .orNull(component.planned_mol_L)
        .orNull(component.charged_mol_L);
    insert.exec();
  }
  SQLite::Statement insertWords(m_database,
                                "INSERT INTO run_words(run_n, code, title, aim, conclusion, "
                                "observations) VALUES (?, ?, ?, ?, ?, ?)");
  Binder bindWords(insertWords);
  bindWords(run.n)(run.code)(sample.texts[0])(sample.texts[1])(sample.texts[2])(sample.texts[3]);
  insertWords.exec();
}

std::vector<std::int64_t> SampleNotebook::numbers(const db::SqlText& sql) {
  SQLite::Statement statement(m_database, sql.sql);
  bind(statement, sql.cells);
  std::vector<std::int64_t> numbers;
  while (statement.executeStep()) numbers.push_back(statement.getColumn(0).getInt64());
  return numbers;
}

std::vector<std::string> SampleNotebook::plan(const db::SqlText& sql) {
  SQLite::Statement statement(m_database, "EXPLAIN QUERY PLAN " + sql.sql);
  bind(statement, sql.cells);
  std::vector<std::string> lines;
  while (statement.executeStep()) lines.push_back(statement.getColumn(3).getString());
  return lines;
}

std::vector<const SampleRun*> SampleNotebook::matches(const app::FindQuery& query) const {
  std::vector<const SampleRun*> found;
  for (const SampleRun& sample : m_runs) {
    if (meets(sample, {app::AllOf{query.conditions}})) found.push_back(&sample);
  }
  return found;
}

app::FindQuery RandomQueries::query() {
  app::FindQuery query;
  const std::uint64_t conditions = std::array<std::uint64_t, 8>{0, 1, 1, 1, 1, 2, 2, 3}[below(8)];
  for (std::uint64_t i = 0; i < conditions; ++i) query.conditions.push_back(condition(3));
  return query;
}

app::FindCondition RandomQueries::condition(int depth) {
  switch (below(depth > 0 ? 9 : 6)) {
    case 0:
    case 1:
      return substance();
    case 2:
    case 3:
      return words();
    case 4:
      return textField();
    case 5:
      return measure();
    default:
      break;
  }
  app::FindConditions inner;
  const std::uint64_t conditions = below(4);
  for (std::uint64_t i = 0; i < conditions; ++i) inner.push_back(condition(depth - 1));
  switch (below(3)) {
    case 0:
      return {app::AllOf{std::move(inner)}};
    case 1:
      return {app::AnyOf{std::move(inner)}};
    default:
      return {app::NoneOf{std::move(inner)}};
  }
}

app::Interval RandomQueries::interval(double least, double most) {
  const auto between = [&] {
    return least + (most - least) * static_cast<double>(below(1000)) / 1000.0;
  };
  app::Interval interval;
  if (below(4) > 0) interval.least = between();
  if (below(4) > 0) interval.most = between();
  return interval;
}

app::FindCondition RandomQueries::substance() {
  app::SubstanceCondition condition;
  constexpr std::array<std::string_view, 4> kOther = {"", "", "catalyst", "no role"};
  condition.role = below(3) == 0 ? kOther[below(kOther.size())] : kRoles[below(kRoles.size())];
  condition.anySubstance = below(12) == 0;
  const std::uint64_t count = std::array<std::uint64_t, 6>{1, 1, 1, 1, 3, 0}[below(6)];
  for (std::uint64_t i = 0; i < count; ++i)
    condition.substances.push_back(1 + static_cast<std::int64_t>(below(kSubstances + 2)));
  if (below(3) == 0) condition.loading_molPercent = interval(0, 35);
  if (below(6) == 0) condition.concentration_mol_L = interval(0, 0.25);
  return {condition};
}

app::FindCondition RandomQueries::words() {
  constexpr std::array<std::string_view, 8> kHard = {
      "turned black", "4 czipn", "amb", "sep", "\"", "--", "film amb", "KW-00"};
  app::WordsCondition condition;
  const std::uint64_t count = 1 + below(3);
  for (std::uint64_t i = 0; i < count; ++i) {
    condition.words.emplace_back(below(3) == 0 ? kHard[below(kHard.size())]
                                               : kWords[below(kWords.size())]);
    if (below(2) == 0) condition.prefix.resize(i + 1, false), condition.prefix[i] = below(3) == 0;
  }
  condition.lastIsPrefix = below(3) == 0;
  return {condition};
}

app::FindCondition RandomQueries::textField() {
  using Field = app::TextFieldCondition::Field;
  constexpr std::array<std::pair<Field, std::string_view>, 15> kAsked = {
      {{Field::kCode, "kw-0012"},
       {Field::kCode, "KW-00"},
       {Field::kSeries, "acid additives"},
       {Field::kSeries, "NICKEL"},
       {Field::kSeries, ""},
       {Field::kPerson, "kw"},
       {Field::kPerson, "AB"},
       {Field::kState, "closed"},
       {Field::kState, "c"},
       {Field::kVial, "10 mL crimp vial"},
       {Field::kVial, "10%"},
       {Field::kLamp, "led 440"},
       {Field::kLamp, "LED"},
       {Field::kAtmosphere, "n2"},
       {Field::kAtmosphere, "' OR 1=1 --"}}};
  const auto& [field, value] = kAsked[below(kAsked.size())];
  return {app::TextFieldCondition{field, std::string(value), below(2) == 0}};
}

app::FindCondition RandomQueries::measure() {
  using Measure = app::MeasureCondition::Measure;
  switch (below(8)) {
    case 0:
      return {app::MeasureCondition{Measure::kYield, interval(0, 100)}};
    case 1:
      return {app::MeasureCondition{Measure::kConversion, interval(0, 100)}};
    case 2:
      return {app::MeasureCondition{Measure::kWavelength, interval(360, 450)}};
    case 3:
      return {app::MeasureCondition{Measure::kTemperature, interval(20, 40)}};
    case 4:
      return {app::MeasureCondition{Measure::kDuration, interval(0, 25)}};
    case 5:
      return {app::MeasureCondition{Measure::kLiquid, interval(0, 4)}};
    case 6:
      return {app::MeasureCondition{Measure::kLimiting, interval(0, 0.4)}};
    default:
      return {app::MeasureCondition{Measure::kDate,
                                    interval(1.7672256e12 - 1e8, 1.7672256e12 + 91.0 * 86.4e6)}};
  }
}

}  // namespace vialkeeper::testing
