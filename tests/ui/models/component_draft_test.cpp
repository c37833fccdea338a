// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QAbstractItemModelTester>
#include <catch2/catch.hpp>

#include "app/notebook/substance_cards.h"
#include "ui/models/component_draft.h"
#include "ui/models/component_search.h"
#include "ui/models/qt_text.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;

namespace {

struct Bench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::NotebookLink> link = fixture.link();
  ui::ActionHistory history;
  ui::OpenRun run{*link, history};
  ui::ChangeReason reason{run};
  ui::ComponentSearch search{*link};
  ui::ComponentDraft draft{run, reason};
  QAbstractItemModelTester tester{&search, QAbstractItemModelTester::FailureReportingMode::Fatal};

  Bench() { REQUIRE(run.open(fixture.addRun(*link))); }

  const charge::ComponentPlan* component(const std::string& name) const {
    for (const auto& each : run.sheet().planned.plan.components)
      if (each.name == name) return &each;
    return nullptr;
  }
};

}  // namespace

TEST_CASE("a substance of the shelf is found by name, CAS number and structure", "[ui][identity]") {
  Bench bench;
  for (const auto* typed : {"pival", "75-98-9", "CC(C)(C)C(O)=O"}) {
    INFO(typed);
    bench.search.setText(QString::fromUtf8(typed));
    REQUIRE(bench.search.rowCount() >= 2);
    CHECK(bench.search.substance(0)->name == "pivalic acid");
    CHECK_FALSE(bench.search.substance(bench.search.rowCount() - 1));
  }
  bench.search.setText(QStringLiteral("nothing of that name"));
  CHECK(bench.search.rowCount() == 1);
  bench.search.setText({});
  CHECK(bench.search.rowCount() == 0);
}

TEST_CASE("a component from the shelf is added, and taken out again by undo", "[ui][identity]") {
  Bench bench;
  REQUIRE(app::addSubstanceCard(
      bench.link->desk(),
      {.name = "benzoic acid", .synonyms = {"BzOH"}, .smiles = "OC(=O)c1ccccc1"}));
  bench.search.setText(QStringLiteral("bzoh"));
  REQUIRE(bench.search.substance(0));
  bench.draft.takeFromShelf(*bench.search.substance(0));
  bench.draft.setRole(QStringLiteral("additive"));
  bench.draft.setAmount(QStringLiteral("0.5 equiv"));
  INFO(bench.draft.reading().toStdString());
  CHECK_FALSE(bench.draft.isFaulty());
  CHECK(bench.draft.reading().contains(QStringLiteral("0.100 mmol")));
  QString key;
  QObject::connect(&bench.draft, &ui::ComponentDraft::added, [&](const QString& k) { key = k; });
  bench.draft.add();
  CHECK_FALSE(key.isEmpty());
  REQUIRE(bench.component("benzoic acid"));
  bench.history.undo();
  CHECK_FALSE(bench.component("benzoic acid"));
}

TEST_CASE("a substance that is new is described in place", "[ui][identity]") {
  Bench bench;
  bench.draft.startNew(QStringLiteral("benzoic acid"));
  CHECK(bench.draft.name() == QStringLiteral("benzoic acid"));
  bench.draft.describe(QStringLiteral("benzoic acid"), QStringLiteral("OC(=O)c1ccccc1"), {}, {});
  bench.draft.setRole(QStringLiteral("acid"));
  bench.draft.setAmount(QStringLiteral("10 mol%"));
  INFO(bench.draft.reading().toStdString());
  REQUIRE_FALSE(bench.draft.isFaulty());
  bench.draft.add();
  REQUIRE(bench.component("benzoic acid"));
  CHECK(bench.component("benzoic acid")->role == charge::Role::kAcid);
}

TEST_CASE("what was typed is taken for what it reads as", "[ui][identity]") {
  Bench bench;
  bench.draft.startNew(QStringLiteral("65-85-0"));
  CHECK(bench.draft.cas() == QStringLiteral("65-85-0"));
  bench.draft.startNew(QStringLiteral("OC(=O)c1ccccc1"));
  CHECK(bench.draft.smiles() == QStringLiteral("OC(=O)c1ccccc1"));
  bench.draft.startNew(QStringLiteral("4-tert-butyl benzoic acid"));
  CHECK(bench.draft.name() == QStringLiteral("4-tert-butyl benzoic acid"));
}

TEST_CASE("a description or an amount that is wrong says so and adds nothing", "[ui][identity]") {
  Bench bench;
  const std::size_t before = bench.link->notebook().history(bench.run.run().n)->size();
  bench.draft.startNew(QStringLiteral("benzoic acid"));
  SECTION("structure") {
    bench.draft.describe(QStringLiteral("benzoic acid"), QStringLiteral("C1CC"), {}, {});
  }
  SECTION("CAS number") {
    bench.draft.describe(QStringLiteral("benzoic acid"), QStringLiteral("OC(=O)c1ccccc1"), {},
                         QStringLiteral("65-85-1"));
  }
  SECTION("amount") {
    bench.draft.describe(QStringLiteral("benzoic acid"), QStringLiteral("OC(=O)c1ccccc1"), {}, {});
    bench.draft.setAmount(QStringLiteral("5 bar"));
  }
  CHECK(bench.draft.isFaulty());
  CHECK_FALSE(bench.draft.reading().isEmpty());
  bench.draft.add();
  CHECK(bench.draft.isFaulty());
  CHECK(bench.link->notebook().history(bench.run.run().n)->size() == before);
}
