// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QAbstractItemModelTester>
#include <QTest>
#include <catch2/catch.hpp>
#include <set>

#include "app/run_templates.h"
#include "charge/plan_reader.h"
#include "ui/models/new_run_model.h"
#include "ui/models/qt_text.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;

namespace {

struct NewRunBench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::NotebookLink> link = fixture.link();
  ui::NewRunModel model{*link};

  void start() { model.reset(); }
  void choose(int row) {
    model.choose(row);
    REQUIRE(QTest::qWaitFor([this] { return !model.isWorking(); }, 30'000));
  }
  int rowOf(const QString& title) {
    for (int row = 0; row < model.sources().rowCount(); ++row)
      if (model.sources().source(row).title == title) return row;
    FAIL("no source " << title.toStdString());
    return -1;
  }
};

const QString kPivalic = QStringLiteral("Indoline dehydrogenation, pivalic acid 10 mol%");

}  // namespace

TEST_CASE("every template of the program can be read and has a title of its own",
          "[ui][identity]") {
  REQUIRE(app::runTemplates().size() >= 10);
  std::set<std::string> titles;
  for (const text::EmbeddedFile& file : app::runTemplates()) {
    const auto plan = charge::readPlan(std::string(file.contents), std::string(file.name));
    INFO(file.name);
    REQUIRE(plan);
    CHECK(titles.insert(plan->title).second);
  }
}

TEST_CASE("a run from a template is what its preview showed", "[ui][identity]") {
  NewRunBench bench;
  QAbstractItemModelTester sources(&bench.model.sources(),
                                   QAbstractItemModelTester::FailureReportingMode::Fatal);
  QAbstractItemModelTester preview(&bench.model.preview(),
                                   QAbstractItemModelTester::FailureReportingMode::Fatal);
  bench.start();
  bench.choose(bench.rowOf(kPivalic));
  CHECK(bench.model.sourceFault().isEmpty());
  CHECK(bench.model.suggested().title == kPivalic);
  CHECK(bench.model.suggested().series == QStringLiteral("acid additives"));
  CHECK(bench.model.preview().rowCount() == 6);
  CHECK(bench.model.notices().join(QString()).contains(QStringLiteral("New on the shelf")));
  CHECK(bench.link->notebook().summary()->runs == 0);
  const auto made = bench.model.create(
      {QStringLiteral("Mine"), QStringLiteral("a series"), QStringLiteral("whether it works")});
  REQUIRE(made);
  const auto run = bench.link->notebook().run(*made);
  REQUIRE(run);
  CHECK(run->title == "Mine");
  CHECK(run->series == "a series");
  CHECK(run->aim == "whether it works");
  CHECK(run->person == "KW");
  CHECK(bench.link->notebook().components(*made)->size() == 6);
}

TEST_CASE("a run from an earlier one remembers it, found by its code", "[ui][identity]") {
  NewRunBench bench;
  const app::RowNumber original = bench.fixture.addRun(*bench.link);
  bench.start();
  bench.model.sources().setFilter(QStringLiteral(" kw-0001 "));
  REQUIRE(bench.model.sources().rowCount() >= 1);
  CHECK(bench.model.sources().source(0).run.n == original);
  bench.choose(0);
  CHECK(bench.model.notices().join(QString()).contains(QStringLiteral("New on the shelf")) ==
        false);
  const auto made = bench.model.create(bench.model.suggested());
  REQUIRE(made);
  CHECK(bench.link->notebook().run(*made)->clonedFrom == original);
}

TEST_CASE("what cannot be made is refused beside its field and nothing is written",
          "[ui][identity]") {
  NewRunBench bench;
  bench.start();
  using Field = ui::NewRunModel::Field;
  const auto refused = [&](const ui::NewRunModel::Words& words) {
    const auto made = bench.model.create(words);
    REQUIRE_FALSE(made);
    REQUIRE_FALSE(made.error().empty());
    CHECK_FALSE(made.error().front().sentence.isEmpty());
    return made.error().front().field;
  };
  CHECK(refused({QStringLiteral("x"), {}, {}}) == Field::kSource);
  bench.choose(0);
  CHECK(refused({QStringLiteral("  "), {}, {}}) == Field::kTitle);
  CHECK(refused({QStringLiteral("x"), QStringLiteral("two\nlines"), {}}) == Field::kSeries);
  const std::string bad = bench.fixture.folder().write("bad.toml", "format = \"no plan\"");
  REQUIRE(bench.model.sources().offerFile(ui::toQt(bad)));
  bench.choose(0);
  CHECK_FALSE(bench.model.sourceFault().isEmpty());
  CHECK(refused({QStringLiteral("x"), {}, {}}) == Field::kSource);
  CHECK_FALSE(bench.model.sources().offerFile(QStringLiteral("/nowhere/plan.toml")));
  bench.link->setPerson({});
  CHECK(refused({QStringLiteral("x"), {}, {}}) == Field::kSource);
  CHECK(bench.link->notebook().summary()->revisions == 0);
}
