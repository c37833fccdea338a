// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "db/sqlite_notebook.h"
#include "db/work_desk.h"
#include "support/sample_plan.h"

namespace vialkeeper::tests {

WorkDesk::WorkDesk() : m_notebook(good(db::createNotebook(file()))) {}

app::RunRecord WorkDesk::addRun() {
  return good(app::addRun(desk(), {.planText = samplePlanText(), .planFile = "sample.toml"})).run;
}

app::ComponentRecord WorkDesk::component(const std::string& key) {
  for (app::ComponentRecord& record : good(m_notebook->components(run().n))) {
    if (record.key == key) return std::move(record);
  }
  FAIL("no component " << key);
  return {};
}

}  // namespace vialkeeper::tests
