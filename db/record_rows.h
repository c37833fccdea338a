// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <functional>
#include <string>

#include "app/notebook/records.h"
#include "db/row.h"

/// Records to rows and back: the one place that knows which field is which column.
/// A row to write lacks `n`, `id` and `version`, which the writer sets.
namespace vialkeeper::db {

/// Gives the initials of a person's number, or the number of initials.
using PersonCode = std::function<std::string(std::int64_t)>;
using PersonNumber = std::function<std::int64_t(const std::string&)>;

[[nodiscard]] app::Person personOf(const Row& row);
[[nodiscard]] Row rowOf(const app::Person& person);

/// Without its synonyms, which have a table of their own.
[[nodiscard]] app::SubstanceRecord substanceOf(const Row& row);
[[nodiscard]] Row rowOf(const app::SubstanceRecord& substance);

[[nodiscard]] app::ShelfCard cardOf(app::ShelfKind kind, const Row& row);
[[nodiscard]] Row rowOf(const app::ShelfCard& card);

[[nodiscard]] app::RunRecord runOf(const Row& row, const PersonCode& code);
[[nodiscard]] Row rowOf(const app::RunRecord& run, const PersonNumber& number);

[[nodiscard]] app::ComponentRecord componentOf(const Row& row, const PersonCode& code);
[[nodiscard]] Row rowOf(const app::ComponentRecord& component, const PersonNumber& number);

[[nodiscard]] app::EventRecord eventOf(const Row& row, const PersonCode& code);
[[nodiscard]] Row rowOf(const app::EventRecord& event, const PersonNumber& number);

/// Columns as the JSON that the file keeps.
[[nodiscard]] app::DatasetRecord datasetOf(const Row& row);
[[nodiscard]] Row rowOf(const app::DatasetRecord& dataset);

[[nodiscard]] app::RevisionRecord revisionOf(const Row& row);

/// A moment from its two columns.
[[nodiscard]] units::Moment momentOf(const Row& row, const std::string& name);
void setMoment(Row& row, const std::string& name, const units::Moment& moment);

}  // namespace vialkeeper::db
