// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/sqlite_writing.h"

#include <fmt/format.h>

#include <algorithm>
#include <bit>
#include <charconv>
#include <cstring>
#include <stdexcept>

#include "app/notebook/fold_name.h"
#include "app/notebook/shelf_fields.h"
#include "db/canonical_json.h"
#include "db/record_rows.h"

namespace vialkeeper::db {
namespace {

static_assert(std::endian::native == std::endian::little,
              "blocks are written as the machine holds them");

std::unexpected<text::Faults> fault(std::string what, std::string mend) {
  return std::unexpected(text::Faults{{.what = std::move(what), .mend = std::move(mend)}});
}

/// The number behind the last hyphen of `KW-0042`; 0 where there is none.
int numberOf(const std::string& code) {
  int number = 0;
  const std::size_t dash = code.rfind('-');
  if (dash == std::string::npos) return 0;
  std::from_chars(code.data() + dash + 1, code.data() + code.size(), number);
  return number;
}

}  // namespace

std::string packed(std::span<const double> values) {
  std::string bytes(values.size_bytes(), '\0');
  std::memcpy(bytes.data(), values.data(), values.size_bytes());
  return bytes;
}

std::vector<double> unpacked(std::string_view bytes) {
  std::vector<double> values(bytes.size() / sizeof(double));
  std::memcpy(values.data(), bytes.data(), values.size() * sizeof(double));
  return values;
}

std::int64_t SqliteWriting::personNumber(const std::string& code) {
  const std::int64_t n = m_connection.integer("SELECT n FROM person WHERE code = ?", {Cell{code}});
  return n != 0 ? n : m_writer.insert("person", rowOf(app::Person{.code = code}));
}

text::Checked<app::RowNumber> SqliteWriting::addPerson(const app::Person& person) {
  if (m_connection.integer("SELECT n FROM person WHERE code = ?", {Cell{person.code}}) != 0) {
    return fault(fmt::format("the initials {} are taken", person.code), "choose others");
  }
  return m_writer.insert("person", rowOf(person));
}

void SqliteWriting::addNames(app::RowNumber substance, const app::SubstanceRecord& record) {
  std::vector<std::string> names{record.name};
  names.insert(names.end(), record.synonyms.begin(), record.synonyms.end());
  for (const std::string& name : names) {
    const std::string folded = app::foldName(name);
    const auto known = m_connection.integer(
        "SELECT count(*) FROM substance_name WHERE substance_n = ? AND name = ?",
        {Cell{substance}, Cell{name}});
    if (known == 0) {
      (void)m_writer.insert("substance_name",
                            {{"substance_n", substance}, {"name", name}, {"folded", folded}});
    }
  }
}

text::Checked<app::RowNumber> SqliteWriting::addSubstance(const app::SubstanceRecord& substance) {
  const app::RowNumber n = m_writer.insert("substance", rowOf(substance));
  addNames(n, substance);
  return n;
}

text::Checked<void> SqliteWriting::changeSubstance(const app::SubstanceRecord& substance) {
  auto changed = m_writer.update("substance", substance.n, substance.version, rowOf(substance));
  if (!changed) return changed;
  for (const Row& row :
       m_connection.rows("SELECT n, version, name FROM substance_name WHERE substance_n = ?",
                         {Cell{substance.n}})) {
    const std::string name = row.text("name");
    if (name == substance.name ||
        std::ranges::find(substance.synonyms, name) != substance.synonyms.end())
      continue;
    if (auto gone = m_writer.remove("substance_name", row.integer("n"), row.integer("version"));
        !gone)
      return gone;
  }
  addNames(substance.n, substance);
  return {};
}

text::Checked<app::RowNumber> SqliteWriting::addCard(const app::ShelfCard& card) {
  const app::ShelfKindInfo& info = app::shelfKind(card.kind);
  if (m_connection.integer(fmt::format("SELECT n FROM {} WHERE name = ?", info.table),
                           {Cell{card.name}}) != 0) {
    return fault(fmt::format("there is a {} called {} already", info.word, card.name),
                 "choose another name");
  }
  return m_writer.insert(std::string(info.table), rowOf(card));
}

text::Checked<void> SqliteWriting::changeCard(const app::ShelfCard& card) {
  return m_writer.update(std::string(app::shelfKind(card.kind).table), card.n, card.version,
                         rowOf(card));
}

text::Checked<app::RowNumber> SqliteWriting::addAttachment(std::string_view bytes) {
  const std::string digest = sha256(bytes);
  const auto known =
      m_connection.integer("SELECT n FROM attachment WHERE sha256 = ?", {Cell{Blob{digest}}});
  if (known != 0) return known;
  return m_writer.insert("attachment", {{"sha256", Blob{digest}},
                                        {"size", static_cast<std::int64_t>(bytes.size())},
                                        {"data", Blob{std::string(bytes)}}});
}

text::Checked<std::string> SqliteWriting::nextRunCode(std::string_view person) {
  // Codes of one person have one length, so the greatest text is the greatest number, up to 9999.
  int last = 0;
  for (const Row& row : m_connection.rows(
           "SELECT code FROM run WHERE code GLOB ? ORDER BY length(code) DESC, code DESC LIMIT 1",
           {Cell{fmt::format("{}-[0-9]*", person)}})) {
    last = numberOf(row.text("code"));
  }
  return fmt::format("{}-{:04}", person, last + 1);
}

text::Checked<app::RowNumber> SqliteWriting::addRun(
    const app::RunRecord& run, std::span<const app::ComponentRecord> components) {
  const auto number = [this](const std::string& code) { return personNumber(code); };
  if (m_connection.integer("SELECT n FROM run WHERE code = ?", {Cell{run.code}}) != 0) {
    return fault(fmt::format("there is a run {} already", run.code),
                 "leave the code out, the next free one is taken");
  }
  const app::RowNumber n = m_writer.insert("run", rowOf(run, number));
  m_writer.concerns(n);
  for (app::ComponentRecord component : components) {
    component.run = n;
    (void)m_writer.insert("component", rowOf(component, number));
  }
  refreshWords(n);
  return n;
}

text::Checked<void> SqliteWriting::changeRun(const app::RunRecord& run) {
  m_writer.concerns(run.n);
  const auto number = [this](const std::string& code) { return personNumber(code); };
  auto changed = m_writer.update("run", run.n, run.version, rowOf(run, number));
  if (changed) refreshWords(run.n);
  return changed;
}

text::Checked<void> SqliteWriting::changeComponent(const app::ComponentRecord& component) {
  m_writer.concerns(component.run);
  const auto number = [this](const std::string& code) { return personNumber(code); };
  return m_writer.update("component", component.n, component.version, rowOf(component, number));
}

text::Checked<app::RowNumber> SqliteWriting::addComponent(const app::ComponentRecord& component) {
  m_writer.concerns(component.run);
  const auto number = [this](const std::string& code) { return personNumber(code); };
  return m_writer.insert("component", rowOf(component, number));
}

text::Checked<void> SqliteWriting::removeComponent(const app::ComponentRecord& component) {
  m_writer.concerns(component.run);
  return m_writer.remove("component", component.n, component.version);
}

text::Checked<app::RowNumber> SqliteWriting::addEvent(const app::EventRecord& event) {
  m_writer.concerns(event.run);
  if (event.supersedes != 0) {
    const auto other = m_connection.integer("SELECT n FROM event WHERE supersedes_n = ?",
                                            {Cell{event.supersedes}});
    if (other != 0)
      return fault("this entry has been corrected already", "correct the newer entry");
  }
  const auto number = [this](const std::string& code) { return personNumber(code); };
  const app::RowNumber n = m_writer.insert("event", rowOf(event, number));
  const bool words = event.kind == "observation" || event.kind == "addendum" ||
                     !event.note.empty() || event.supersedes != 0;
  if (words) refreshWords(event.run);
  return n;
}

text::Checked<std::string> SqliteWriting::nextDatasetCode() {
  const auto rows = m_connection.rows("SELECT code FROM dataset ORDER BY n DESC LIMIT 1");
  return fmt::format("DS-{:04}", rows.empty() ? 1 : numberOf(rows.front().text("code")) + 1);
}

text::Checked<app::RowNumber> SqliteWriting::addDataset(
    const app::DatasetRecord& record, std::span<const std::vector<double>> values) {
  if (values.size() != record.columns.size())
    throw std::logic_error("addDataset: columns and values differ");
  const app::RowNumber n = m_writer.insert("dataset", rowOf(record));
  for (std::size_t c = 0; c < values.size(); ++c) {
    if (static_cast<std::int64_t>(values[c].size()) != record.rows) {
      throw std::logic_error("addDataset: a column of another length");
    }
    const std::span<const double> column = values[c];
    for (std::int64_t block = 0; block * kBlockValues < record.rows; ++block) {
      const auto begin = static_cast<std::size_t>(block * kBlockValues);
      const auto part = column.subspan(
          begin, std::min(static_cast<std::size_t>(kBlockValues), column.size() - begin));
      (void)m_writer.insert("dataset_block", {{"dataset_n", n},
                                              {"column_index", static_cast<std::int64_t>(c)},
                                              {"block_index", block},
                                              {"count", static_cast<std::int64_t>(part.size())},
                                              {"data", Blob{packed(part)}}});
    }
  }
  return n;
}

text::Checked<void> SqliteWriting::linkDataset(app::RowNumber run, app::RowNumber dataset) {
  m_writer.concerns(run);
  const auto known = m_connection.integer(
      "SELECT n FROM run_dataset WHERE run_n = ? AND dataset_n = ?", {Cell{run}, Cell{dataset}});
  if (known != 0)
    return fault("this dataset is linked to the run already", "nothing is to be done");
  (void)m_writer.insert("run_dataset", {{"run_n", run}, {"dataset_n", dataset}});
  return {};
}

text::Checked<app::RowNumber> SqliteWriting::addSigningKey(const app::SigningKey& key) {
  return m_writer.insert("signing_key", {{"person_n", personNumber(key.person)},
                                         {"public_key", Blob{key.publicKey}},
                                         {"sealed_secret", Blob{key.sealedSecret}},
                                         {"salt", Blob{key.salt}},
                                         {"nonce", Blob{key.nonce}},
                                         {"operations", key.operations},
                                         {"memory_bytes", key.memory_bytes}});
}

text::Checked<app::RowNumber> SqliteWriting::addSeal(const app::SealRecord& seal) {
  m_writer.concerns(seal.run);
  Row row{{"run_n", seal.run},           {"meaning", seal.meaning},
          {"signing_key_n", seal.key},   {"canonical", seal.canonical},
          {"sha256", Blob{seal.sha256}}, {"signature", Blob{seal.signature}}};
  setMoment(row, "signed", seal.signedAt);
  return m_writer.insert("seal", row);
}

void SqliteWriting::refreshWords(app::RowNumber run) {
  std::string observations;
  for (const Row& row :
       m_connection.rows("SELECT raw, note, kind FROM event WHERE run_n = ? AND (kind IN "
                         "('observation', 'addendum') OR note IS NOT NULL) AND kind <> 'withdrawn' "
                         "AND n NOT IN (SELECT supersedes_n FROM event WHERE run_n = ? AND "
                         "supersedes_n IS NOT NULL) ORDER BY at_ms, n",
                         {Cell{run}, Cell{run}})) {
    const std::string note = row.text("note");
    observations += (observations.empty() ? "" : "\n") + (note.empty() ? row.text("raw") : note);
  }
  const std::string columns = "run_n, code, title, aim, conclusion, observations";
  // The index forgets a text only if it is told the very words that it holds.
  m_connection.run(
      "INSERT INTO run_search(run_search, rowid, code, title, aim, conclusion, observations) "
      "SELECT 'delete', " +
          columns + " FROM run_words WHERE run_n = ?",
      {Cell{run}});
  m_connection.run("INSERT OR REPLACE INTO run_words (" + columns +
                       ") "
                       "SELECT n, code, coalesce(title, ''), coalesce(aim, ''), "
                       "coalesce(conclusion, ''), ? FROM run WHERE n = ?",
                   {Cell{observations}, Cell{run}});
  m_connection.run(
      "INSERT INTO run_search(rowid, code, title, aim, conclusion, observations) "
      "SELECT " +
          columns + " FROM run_words WHERE run_n = ?",
      {Cell{run}});
}

}  // namespace vialkeeper::db
