// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/canonical_run.h"

#include <fmt/format.h>

#include "db/canonical_json.h"

namespace vialkeeper::db {
namespace {

struct Part {
  const char* name;
  const char* sql;  ///< with the run's number as ?1
};

// Each list sorted by name, as RFC 8785 wants an object's members.
constexpr Part kOwn[] = {
    {"attachments",
     "SELECT n, id, version, sha256, size, data FROM attachment WHERE n IN (SELECT plan_n FROM run "
     "WHERE n = ?1 UNION "
     "SELECT attachment_n FROM event WHERE run_n = ?1 AND kind <> 'addendum' UNION SELECT raw_n "
     "FROM dataset JOIN "
     "run_dataset ON dataset_n = dataset.n WHERE run_n = ?1) ORDER BY n"},
    {"components", "SELECT * FROM component WHERE run_n = ?1 ORDER BY position"},
    {"dataset_blocks",
     "SELECT * FROM dataset_block WHERE dataset_n IN (SELECT dataset_n FROM run_dataset WHERE "
     "run_n = ?1) ORDER BY n"},
    {"datasets",
     "SELECT * FROM dataset WHERE n IN (SELECT dataset_n FROM run_dataset WHERE run_n = ?1) ORDER "
     "BY n"},
    {"events", "SELECT * FROM event WHERE run_n = ?1 AND kind <> 'addendum' ORDER BY n"},
    {"run", "SELECT * FROM run WHERE n = ?1"},
};

constexpr Part kLinks[] = {
    {"lots",
     "SELECT * FROM lot WHERE n IN (SELECT lot_n FROM component WHERE run_n = ?1) ORDER BY n"},
    {"people",
     "SELECT * FROM person WHERE n IN (SELECT person_n FROM run WHERE n = ?1 UNION SELECT person_n "
     "FROM event WHERE "
     "run_n = ?1 AND kind <> 'addendum' UNION SELECT weighed_by_n FROM component WHERE run_n = ?1) "
     "ORDER BY n"},
    {"stocks",
     "SELECT * FROM stock WHERE n IN (SELECT stock_n FROM component WHERE run_n = ?1) ORDER BY n"},
    {"substances",
     "SELECT * FROM substance WHERE n IN (SELECT substance_n FROM component WHERE run_n = ?1) "
     "ORDER BY n"},
};

template <std::size_t count>
std::string partsText(Connection& connection, std::int64_t run, const Part (&parts)[count]) {
  std::string text = "{";
  for (const Part& part : parts) {
    std::string rows;
    for (const Row& row : connection.rows(part.sql, {Cell{run}}))
      rows += (rows.empty() ? "" : ",") + canonicalRow(row);
    text += fmt::format(R"({}"{}":[{}])", text.size() > 1 ? "," : "", part.name, rows);
  }
  return text + "}";
}

/// The last revision so far, by number and hash.
std::string chainText(Connection& connection) {
  const auto last = connection.rows("SELECT seq, hash FROM revision ORDER BY seq DESC LIMIT 1");
  if (last.empty()) return R"({"hash":"","seq":0})";
  return fmt::format(R"({{"hash":"{}","seq":{}}})", toHex(last.front().bytes("hash")),
                     last.front().integer("seq"));
}

}  // namespace

std::string ownRecordsText(Connection& connection, std::int64_t run) {
  return partsText(connection, run, kOwn);
}

std::string canonicalRunText(Connection& connection, std::int64_t run) {
  return fmt::format(R"({{"chain":{},"format":"vialkeeper-sealed-run/2","links":{},"own":{}}})",
                     chainText(connection), partsText(connection, run, kLinks),
                     ownRecordsText(connection, run));
}

}  // namespace vialkeeper::db
