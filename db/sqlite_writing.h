// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <set>

#include "app/notebook/notebook.h"
#include "db/audited_writer.h"
#include "db/connection.h"

namespace vialkeeper::db {

/// The writing half of a notebook, within one transaction that its maker holds.
class SqliteWriting final : public app::Writing {
 public:
  SqliteWriting(Connection& connection, AuditedWriter& writer)
      : m_connection(connection), m_writer(writer) {}

  text::Checked<app::RowNumber> addPerson(const app::Person& person) override;
  text::Checked<app::RowNumber> addSubstance(const app::SubstanceRecord& substance) override;
  text::Checked<void> changeSubstance(const app::SubstanceRecord& substance) override;
  text::Checked<app::RowNumber> addCard(const app::ShelfCard& card) override;
  text::Checked<void> changeCard(const app::ShelfCard& card) override;
  text::Checked<app::RowNumber> addAttachment(std::string_view bytes) override;
  text::Checked<std::string> nextRunCode(std::string_view person) override;
  text::Checked<app::RowNumber> addRun(const app::RunRecord& run,
                                       std::span<const app::ComponentRecord> components) override;
  text::Checked<void> changeRun(const app::RunRecord& run) override;
  text::Checked<void> changeComponent(const app::ComponentRecord& component) override;
  text::Checked<app::RowNumber> addComponent(const app::ComponentRecord& component) override;
  text::Checked<void> removeComponent(const app::ComponentRecord& component) override;
  text::Checked<app::RowNumber> addEvent(const app::EventRecord& event) override;
  text::Checked<std::string> nextDatasetCode() override;
  text::Checked<app::RowNumber> addDataset(const app::DatasetRecord& record,
                                           std::span<const std::vector<double>> values) override;
  text::Checked<void> linkDataset(app::RowNumber run, app::RowNumber dataset) override;
  text::Checked<app::RowNumber> addSigningKey(const app::SigningKey& key) override;
  text::Checked<app::RowNumber> addSeal(const app::SealRecord& seal) override;

  /// Brings the searchable words of the runs that were touched up to date: once, before the commit.
  void finish();

 private:
  [[nodiscard]] std::int64_t personNumber(const std::string& code);
  void addNames(app::RowNumber substance, const app::SubstanceRecord& record);
  /// Brings the searchable words of a run up to date with its record and observations.
  void refreshWords(app::RowNumber run);

  Connection& m_connection;
  AuditedWriter& m_writer;
  std::set<app::RowNumber> m_runsOfNewWords;
};

/// Values in one block of a dataset's column.
inline constexpr std::int64_t kBlockValues = 65536;

/// Doubles as little-endian bytes, and back.
[[nodiscard]] std::string packed(std::span<const double> values);
[[nodiscard]] std::vector<double> unpacked(std::string_view bytes);

}  // namespace vialkeeper::db
