// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/notebook_fixture.h"

#include <fmt/format.h>

#include <catch2/catch.hpp>

#include "app/notebook/log_run.h"
#include "db/audited_writer.h"
#include "db/canonical_json.h"
#include "db/connection.h"
#include "db/sqlite_notebook.h"

namespace vialkeeper::tests {
namespace {

template <class T>
T required(text::Checked<T> checked) {
  if (!checked) {
    for (const text::Fault& fault : checked.error()) UNSCOPED_INFO(toLine(fault));
  }
  REQUIRE(checked);
  return *std::move(checked);
}

/// A run without structures, written as the use cases would.
app::RunRecord smallRun(app::RowNumber plan, const units::Moment& at) {
  app::RunRecord run;
  run.code = "KW-0001";
  run.person = "KW";
  run.title = "Indoline dehydrogenation, invented";
  run.created = at;
  run.plan = plan;
  run.limitingKey = "amine";
  run.limiting_mmol = 0.2;
  run.liquid_mL = 2.0;
  run.temperature_C = 35.0;
  return run;
}

}  // namespace

units::Moment SteppingClock::now() {
  using namespace std::chrono;
  return {sys_days{year{2026} / 3 / 4} + seconds{++m_seconds}, minutes{60}};
}

void makeSmallNotebook(const std::string& file, int entries) {
  const auto notebook = required(db::createNotebook(file));
  SteppingClock clock;
  const app::Desk desk{*notebook, clock, "KW"};
  const auto done =
      notebook->act(desk.action("create"), [&](app::Writing& writing) -> text::Checked<void> {
        REQUIRE(writing.addPerson({.code = "KW", .name = "invented"}));
        app::SubstanceRecord substance;
        substance.name = "indoline";
        substance.formula = "C8H9N";
        substance.cas = "496-15-1";
        const auto n = writing.addSubstance(substance);
        const auto plan = writing.addAttachment("format = \"vialkeeper-plan/1\"\n# invented\n");
        app::ComponentRecord component;
        component.key = "amine";
        component.role = "substrate";
        component.name = "indoline";
        component.substance = *n;
        component.planned_mmol = 0.2;
        component.planned_molPercent = 100.0;
        const std::vector<app::ComponentRecord> components{component};
        REQUIRE(writing.addRun(smallRun(*plan, clock.now()), components));
        return {};
      });
  REQUIRE(done);
  for (int i = 0; i < entries; ++i) {
    required(app::logLine(desk, runOf(*notebook),
                          {.line = fmt::format("note deep amber, steady bubbles, entry {}", i)}));
  }
}

std::unique_ptr<app::Notebook> opened(const std::string& file) {
  return required(db::openNotebook(file, db::OpenFor::kWriting, "test"));
}

app::RunRecord runOf(app::Notebook& notebook, const std::string& code) {
  return required(app::runOfCode(notebook, code));
}

std::string findings(app::Notebook& notebook) {
  std::string lines;
  for (const app::Finding& finding : required(notebook.verify({})).findings)
    lines += finding.where + ": " + finding.what + "\n";
  return lines;
}

std::string contentOf(const std::string& file) {
  try {
    db::Connection connection(file, db::Access::kReadOnly, false);
    std::string content;
    std::vector<std::string> tables = db::auditedTables();
    tables.emplace_back("revision");
    for (const std::string& table : tables) {
      for (const db::Row& row :
           connection.rows(fmt::format("SELECT * FROM {} NOT INDEXED ORDER BY 1", table))) {
        content += table + canonicalRow(row) + "\n";
        for (const auto& [column, cell] : row.cells()) {
          if (const auto* blob = std::get_if<db::Blob>(&cell))
            content += db::toHex(db::sha256(blob->bytes));
        }
      }
    }
    return content;
  } catch (const std::exception&) {
    return "unreadable";
  }
}

}  // namespace vialkeeper::tests
