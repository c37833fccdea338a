// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <string>
#include <string_view>
#include <vector>

#include "app/notebook/notebook.h"
#include "db/connection.h"
#include "db/row.h"
#include "text/fault.h"

namespace vialkeeper::db {

/// The tables whose every row is told in the trail, parents before children.
[[nodiscard]] const std::vector<std::string>& auditedTables();

/// Writes rows and remembers each change; finish() chains them into one revision. Lives within one
/// transaction and touches nothing but audited tables.
class AuditedWriter {
 public:
  AuditedWriter(Connection& connection, const app::Action& action);

  /// Adds a row, with a number and a UUIDv7 of its own.
  [[nodiscard]] std::int64_t insert(const std::string& table, Row row);

  /// Changes some columns of a row of which the caller has read `expectedVersion`.
  /// Fault: the notebook holds another version; the message shows what both would write.
  [[nodiscard]] text::Checked<void> update(const std::string& table, std::int64_t n,
                                           std::int64_t expectedVersion, const Row& changed);

  /// Takes a row out of which the caller has read `expectedVersion`; the trail keeps it whole, and
  /// its number is never given again. Fault as update's.
  [[nodiscard]] text::Checked<void> remove(const std::string& table, std::int64_t n,
                                           std::int64_t expectedVersion);

  /// The run to which the action belongs, for the trail.
  void concerns(std::int64_t run) { m_run = run; }

  /// Writes the revision; nothing where nothing was changed.
  void finish();

 private:
  [[nodiscard]] text::Faults gone(const std::string& table, std::int64_t n) const;
  [[nodiscard]] text::Faults conflict(const std::string& table, const Row& present,
                                      const Row& changed) const;

  Connection& m_connection;
  const app::Action& m_action;
  std::int64_t m_run = 0;
  std::vector<std::string> m_changes;
};

/// The hash of a revision: SHA-256 over a tag, the previous hash, and the revision's canonical
/// JSON.
[[nodiscard]] std::string revisionHash(const Row& revision);

/// A UUIDv7 (RFC 9562), 16 bytes: the time, then random bits.
[[nodiscard]] std::string newId(std::int64_t utc_ms);

}  // namespace vialkeeper::db
