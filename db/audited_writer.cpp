// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/audited_writer.h"

#include <fmt/format.h>
#include <fmt/ranges.h>
#include <sodium.h>

#include "db/canonical_json.h"

namespace vialkeeper::db {
namespace {

/// One entry of a revision's `changes`. A changed row is told whole afterwards, and before in the
/// columns that were different; of a removed one, `after` is null and `before` the whole row.
std::string changeText(const std::string& table, std::int64_t n, const std::string& before,
                       const std::string& after) {
  return fmt::format(R"({{"after":{},"before":{},"n":{},"table":{}}})", after, before, n,
                     canonicalText(table));
}

/// The setting that holds the highest number of a row that was taken out of the table.
std::string removedSetting(const std::string& table) { return "removed " + table; }

std::string shownCell(const Cell& cell) {
  if (const auto* text = std::get_if<std::string>(&cell)) return "'" + text->substr(0, 60) + "'";
  if (const auto* whole = std::get_if<std::int64_t>(&cell)) return fmt::format("{}", *whole);
  if (const auto* real = std::get_if<double>(&cell)) return fmt::format("{}", *real);
  return std::holds_alternative<std::monostate>(cell) ? "nothing" : "other bytes";
}

}  // namespace

const std::vector<std::string>& auditedTables() {
  static const std::vector<std::string> tables = {
      "person",      "substance", "substance_name", "lot",     "stock",
      "vial_type",   "lamp",      "balance",        "pipette", "attachment",
      "run",         "component", "event",          "dataset", "dataset_block",
      "run_dataset", "analysis",  "signing_key",    "seal"};
  return tables;
}

AuditedWriter::AuditedWriter(Connection& connection, const app::Action& action)
    : m_connection(connection), m_action(action) {}

std::int64_t AuditedWriter::insert(const std::string& table, Row row) {
  const std::int64_t now_ms = m_action.author.at.utc.time_since_epoch().count();
  row.set("n",
          1 + m_connection.integer(
                  fmt::format("SELECT max(coalesce((SELECT max(n) FROM {}), 0), coalesce((SELECT "
                              "CAST(value AS INTEGER) FROM setting WHERE name = ?), 0))",
                              table),
                  {Cell{removedSetting(table)}}));
  row.set("id", Blob{newId(now_ms)});
  row.set("version", std::int64_t{1});
  std::vector<std::string> columns;
  std::vector<std::string> places;
  std::vector<Cell> cells;
  for (const auto& [column, cell] : row.cells()) {
    columns.push_back(column);
    places.emplace_back("?");
    cells.push_back(cell);
  }
  m_connection.run(fmt::format("INSERT INTO {} ({}) VALUES ({})", table, fmt::join(columns, ", "),
                               fmt::join(places, ", ")),
                   std::span<const Cell>(cells));
  const std::int64_t n = row.integer("n");
  m_changes.push_back(changeText(table, n, "null", canonicalRow(row)));
  return n;
}

text::Checked<void> AuditedWriter::update(const std::string& table, std::int64_t n,
                                          std::int64_t expectedVersion, const Row& changed) {
  const auto found =
      m_connection.rows(fmt::format("SELECT * FROM {} WHERE n = ?", table), {Cell{n}});
  if (found.empty()) return std::unexpected(gone(table, n));
  const Row& present = found.front();
  if (present.integer("version") != expectedVersion)
    return std::unexpected(conflict(table, present, changed));
  Row before;
  Row after = present;
  std::vector<std::string> assignments;
  std::vector<Cell> cells;
  for (const auto& [column, cell] : changed.cells()) {
    if (isSame(present[column], cell)) continue;
    before.set(column, present[column]);
    after.set(column, cell);
    assignments.push_back(column + " = ?");
    cells.push_back(cell);
  }
  if (assignments.empty()) return {};
  after.set("version", expectedVersion + 1);
  assignments.emplace_back("version = ?");
  cells.emplace_back(expectedVersion + 1);
  cells.emplace_back(n);
  m_connection.run(fmt::format("UPDATE {} SET {} WHERE n = ?", table, fmt::join(assignments, ", ")),
                   std::span<const Cell>(cells));
  m_changes.push_back(changeText(table, n, canonicalRow(before), canonicalRow(after)));
  return {};
}

text::Checked<void> AuditedWriter::remove(const std::string& table, std::int64_t n,
                                          std::int64_t expectedVersion) {
  const auto found =
      m_connection.rows(fmt::format("SELECT * FROM {} WHERE n = ?", table), {Cell{n}});
  if (found.empty()) return std::unexpected(gone(table, n));
  const Row& present = found.front();
  if (present.integer("version") != expectedVersion)
    return std::unexpected(conflict(table, present, {}));
  // A row is deleted only while it is named here; the triggers see to that.
  const std::string removing = "removing " + table;
  m_connection.run("INSERT INTO setting (name, value) VALUES (?, ?)",
                   {Cell{removing}, Cell{std::to_string(n)}});
  m_connection.run(fmt::format("DELETE FROM {} WHERE n = ?", table), {Cell{n}});
  m_connection.run("DELETE FROM setting WHERE name = ?", {Cell{removing}});
  m_connection.run(
      "INSERT INTO setting (name, value) VALUES (?1, ?2) ON CONFLICT (name) DO UPDATE SET value = "
      "CAST(max(CAST(value AS INTEGER), CAST(excluded.value AS INTEGER)) AS TEXT)",
      {Cell{removedSetting(table)}, Cell{std::to_string(n)}});
  m_changes.push_back(changeText(table, n, canonicalRow(present), "null"));
  return {};
}

text::Faults AuditedWriter::gone(const std::string& table, std::int64_t n) const {
  return {{.kind = text::FaultKind::kNotebook,
           .file = m_connection.file(),
           .what = fmt::format("{} {} is no longer there", table, n),
           .mend = "read it again"}};
}

text::Faults AuditedWriter::conflict(const std::string& table, const Row& present,
                                     const Row& changed) const {
  std::vector<std::string> differences;
  for (const auto& [column, cell] : changed.cells()) {
    if (isSame(present[column], cell)) continue;
    differences.push_back(fmt::format("{} is now {}, yours is {}", column,
                                      shownCell(present[column]), shownCell(cell)));
  }
  return {{.kind = text::FaultKind::kNotebook,
           .file = m_connection.file(),
           .field = fmt::format("{} {}", table, present.integer("n")),
           .what = fmt::format("it was changed elsewhere since it was read{}{}",
                               differences.empty() ? "" : ": ", fmt::join(differences, "; ")),
           .mend = "look at both and enter yours again if it should stand"}};
}

void AuditedWriter::finish() {
  if (m_changes.empty()) return;
  const auto last = m_connection.rows("SELECT seq, hash FROM revision ORDER BY seq DESC LIMIT 1");
  Row revision{
      {"seq", last.empty() ? std::int64_t{1} : last.front().integer("seq") + 1},
      {"at_ms", std::int64_t{m_action.author.at.utc.time_since_epoch().count()}},
      {"at_offset_min", std::int64_t{m_action.author.at.offset.count()}},
      {"person", m_action.author.person},
      {"action", m_action.name},
      {"run_n", referenceOrNull(m_run)},
      {"reason", textOrNull(m_action.reason)},
      {"changes", fmt::format("[{}]", fmt::join(m_changes, ","))},
      {"previous", Blob{last.empty() ? std::string(32, '\0') : last.front().bytes("hash")}}};
  revision.set("hash", Blob{revisionHash(revision)});
  std::vector<Cell> cells;
  for (const char* column : {"seq", "at_ms", "at_offset_min", "person", "action", "run_n", "reason",
                             "changes", "previous", "hash"}) {
    cells.push_back(revision[column]);
  }
  m_connection.run("INSERT INTO revision VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?, ?)",
                   std::span<const Cell>(cells));
  m_changes.clear();
}

std::string revisionHash(const Row& revision) {
  // The tag keeps these hashes apart from all others; the previous hash has a fixed length, so
  // nothing can move from one part to the next.
  Row content;
  for (const char* column :
       {"seq", "at_ms", "at_offset_min", "person", "action", "run_n", "reason", "changes"}) {
    content.set(column, revision[column]);
  }
  return sha256("vialkeeper-revision/1\n" + revision.bytes("previous") + canonicalRow(content));
}

std::string newId(std::int64_t utc_ms) {
  std::string id(16, '\0');
  randombytes_buf(id.data(), id.size());
  for (int i = 0; i < 6; ++i)
    id[static_cast<std::size_t>(i)] = static_cast<char>((utc_ms >> (8 * (5 - i))) & 0xFF);
  id[6] = static_cast<char>((id[6] & 0x0F) | 0x70);
  id[8] = static_cast<char>((id[8] & 0x3F) | 0x80);
  return id;
}

}  // namespace vialkeeper::db
