// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QAbstractItemModelTester>
#include <catch2/catch.hpp>

#include "ui/models/charge_table_model.h"
#include "ui/models/charge_trail.h"
#include "ui/models/qt_text.h"
#include "ui/workplace_fixture.h"

// The charge as a table, against the notebook file itself.
using namespace vialkeeper;
using Model = ui::ChargeTableModel;

namespace {

struct Bench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::NotebookLink> link = fixture.link();
  ui::ActionHistory history;
  ui::OpenRun run{*link, history};
  ui::ChangeReason reason{run};
  Model model{run, reason};
  QAbstractItemModelTester tester{&model, QAbstractItemModelTester::FailureReportingMode::Fatal};

  Bench() { REQUIRE(run.open(fixture.addRun(*link))); }

  [[nodiscard]] QModelIndex cell(const std::string& key, int column) const {
    REQUIRE(model.rowOf(key) >= 0);
    return model.index(model.rowOf(key), column);
  }
  [[nodiscard]] std::string shown(const std::string& key, int column) const {
    return cell(key, column).data().toString().toStdString();
  }
  bool type(const std::string& key, int column, const char* typed) {
    return model.setData(cell(key, column), QString::fromUtf8(typed), Qt::EditRole);
  }
  [[nodiscard]] QStringList faults(const std::string& key) const {
    return cell(key, 0).data(Model::kFaultsRole).toStringList();
  }
  [[nodiscard]] std::size_t changes() const {
    return link->notebook().history(run.run().n)->size();
  }
};

}  // namespace

TEST_CASE("the table shows what is written, what follows from it and what to weigh",
          "[ui][identity]") {
  Bench bench;
  REQUIRE(bench.model.rowCount() == 6);
  CHECK(bench.shown("nickel", Model::kComponent) == "nickel(II) bromide glyme");
  CHECK(bench.shown("nickel", Model::kAmount) == "5 mol%");
  CHECK(bench.shown("nickel", Model::kMillimoles) == "0.0100");
  CHECK(bench.shown("nickel", Model::kRatio) == "5.00 mol%");
  CHECK(bench.shown("nickel", Model::kTarget) == "3.18 mg");
  CHECK(bench.shown("nickel", Model::kWeighed).empty());
  CHECK(bench.cell("nickel", 0)
            .data(Model::kSecondLineRole)
            .toString()
            .startsWith(QStringLiteral("cocatalyst · solid, 97 %")));
  CHECK_FALSE(bench.cell("nickel", 0).data(Model::kNoticesRole).toStringList().isEmpty());
  CHECK(bench.shown("mecn", Model::kAmount) == "9 parts");
  CHECK(bench.shown("mecn", Model::kMillimoles).empty());
}

TEST_CASE("only what a person writes can be edited", "[ui][identity]") {
  Bench bench;
  for (int column = 0; column < Model::kColumns; ++column) {
    const bool editable = (bench.model.flags(bench.cell("acid", column)) & Qt::ItemIsEditable) != 0;
    CHECK(editable == (column == Model::kAmount || column == Model::kWeighed));
  }
}

TEST_CASE("an amount is taken in every way people write it, and the other columns follow",
          "[ui][identity]") {
  const auto [typed, shown, mmol] = GENERATE(table<const char*, const char*, const char*>({
      {"7 mol%", "7 mol%", "0.0140"},
      {"0.2 equiv", "0.2 equiv", "0.0400"},
      {"0.02 mmol", "0.02 mmol", "0.0200"},
      {"0,03 mmol", "0.03 mmol", "0.0300"},
      {"300 uL", "300 µL", "0.0300"},
      {"20 mM", "20 mM", "0.0400"},
      {"15", "15 mol%", "0.0300"},
  }));
  INFO(typed);
  Bench bench;
  REQUIRE(bench.type("acid", Model::kAmount, typed));
  CHECK(bench.shown("acid", Model::kAmount) == shown);
  CHECK(bench.shown("acid", Model::kMillimoles) == mmol);
  CHECK(bench.faults("acid").isEmpty());
}

TEST_CASE("a mass is an amount where something is weighed", "[ui][identity]") {
  Bench bench;
  REQUIRE(bench.type("nickel", Model::kAmount, "4.0 mg"));
  CHECK(bench.shown("nickel", Model::kTarget) == "4.00 mg");
}

TEST_CASE("a refused amount stays in its cell with its sentence and writes nothing",
          "[ui][identity]") {
  const auto* typed = GENERATE("5 bar", "five", "", "-2 mol%", "0 mg", "3 parts", "1e999 mg",
                               "\xF0\x9F\x92\xA7", "5 mol% 3 mg");
  INFO(typed);
  Bench bench;
  const std::size_t before = bench.changes();
  CHECK_FALSE(bench.type("acid", Model::kAmount, typed));
  CHECK(bench.shown("acid", Model::kAmount) == typed);
  CHECK(bench.faults("acid").size() == 1);
  CHECK_FALSE(bench.faults("acid").front().isEmpty());
  CHECK(bench.cell("acid", Model::kAmount).data(Model::kIsKeptRole).toBool());
  CHECK(bench.changes() == before);
  CHECK_FALSE(bench.history.canUndo());
  SECTION("until it is mended") {
    REQUIRE(bench.type("acid", Model::kAmount, "8 mol%"));
    CHECK(bench.shown("acid", Model::kAmount) == "8 mol%");
    CHECK(bench.faults("acid").isEmpty());
  }
  SECTION("or forgotten") {
    CHECK(bench.model.forget(bench.cell("acid", Model::kAmount)));
    CHECK(bench.shown("acid", Model::kAmount) == "10 mol%");
    CHECK(bench.faults("acid").isEmpty());
  }
}

TEST_CASE("a refused weighing stays in its cell and writes nothing", "[ui][identity]") {
  const auto* typed = GENERATE("3.1", "three mg", "3.1 bar", "-2 mg", "50 uL", "1e999 mg");
  INFO(typed);
  Bench bench;
  const std::size_t before = bench.changes();
  CHECK_FALSE(bench.type("nickel", Model::kWeighed, typed));
  CHECK(bench.shown("nickel", Model::kWeighed) == typed);
  CHECK(bench.faults("nickel").size() == 1);
  CHECK(bench.changes() == before);
}

TEST_CASE("a weighing is judged against its target", "[ui][identity]") {
  Bench bench;
  REQUIRE(bench.type("nickel", Model::kWeighed, "3.2 mg"));
  CHECK(bench.shown("nickel", Model::kWeighed) == "3.2 mg");
  CHECK(bench.shown("nickel", Model::kCharged) == "5.03 mol%");
  CHECK(bench.cell("nickel", Model::kCharged).data(Model::kSecondLineRole).toString() ==
        QStringLiteral("0.6 % above"));
  REQUIRE(bench.type("nickel", Model::kWeighed, ""));
  CHECK(bench.shown("nickel", Model::kWeighed).empty());
  bench.history.undo();
  CHECK(bench.shown("nickel", Model::kWeighed) == "3.2 mg");
}

TEST_CASE("a likely slip is asked about in the row before anything is written", "[ui][identity]") {
  Bench bench;
  const std::size_t before = bench.changes();
  CHECK_FALSE(bench.type("nickel", Model::kWeighed, "3.2 g"));
  const QModelIndex cell = bench.cell("nickel", Model::kWeighed);
  CHECK(
      cell.data(Model::kQuestionRole).toString().contains(QStringLiteral("did you mean 3.2 mg?")));
  CHECK(cell.data(Model::kLikelyRole).toString() == QStringLiteral("3.2 mg"));
  CHECK(bench.changes() == before);
  SECTION("it was the likely one") {
    bench.model.takeLikely(cell.row());
    CHECK(bench.shown("nickel", Model::kWeighed) == "3.2 mg");
  }
  SECTION("it was as typed") {
    bench.model.acceptTyped(cell.row());
    CHECK(bench.shown("nickel", Model::kWeighed) == "3.2 g");
  }
  CHECK(cell.data(Model::kQuestionRole).toString().isEmpty());
}

TEST_CASE("a component that is removed comes back by undo", "[ui][identity]") {
  Bench bench;
  bench.model.remove(bench.model.rowOf("acid"));
  CHECK(bench.model.rowOf("acid") == -1);
  CHECK(bench.model.rowCount() == 5);
  bench.history.undo();
  CHECK(bench.model.rowOf("acid") >= 0);
  bench.model.remove(bench.model.rowOf("amine"));
  CHECK(bench.model.rowOf("amine") >= 0);
  CHECK(bench.faults("amine").size() == 1);
}

TEST_CASE("what is being typed is read without being written", "[ui][identity]") {
  Bench bench;
  const std::size_t before = bench.changes();
  const auto good =
      bench.model.preview(bench.cell("nickel", Model::kAmount), QStringLiteral("6 mol%"));
  CHECK_FALSE(good.isFault);
  CHECK(good.text.contains(QStringLiteral("0.0120 mmol")));
  CHECK(bench.model.preview(bench.cell("nickel", Model::kAmount), QStringLiteral("6 bar")).isFault);
  CHECK(bench.model.preview(bench.cell("nickel", Model::kAmount), {}).text.isEmpty());
  const auto weighed =
      bench.model.preview(bench.cell("nickel", Model::kWeighed), QStringLiteral("3.2 mg"));
  CHECK(weighed.text.contains(QStringLiteral("within tolerance")));
  CHECK(bench.changes() == before);
}

TEST_CASE("a change after the charge waits for its reason", "[ui][identity]") {
  Bench bench;
  REQUIRE(bench.type("nickel", Model::kWeighed, "3.2 mg"));
  REQUIRE(bench.run.wantsReason(app::Deed::kChangePlan));
  CHECK_FALSE(bench.type("acid", Model::kAmount, "7 mol%"));
  CHECK(bench.reason.isAsked());
  CHECK(bench.shown("acid", Model::kAmount) == "7 mol%");
  SECTION("given") {
    bench.reason.give(QStringLiteral("  "));
    CHECK(bench.reason.isAsked());
    bench.reason.give(QStringLiteral("the bottle was empty"));
    CHECK_FALSE(bench.reason.isAsked());
    CHECK(bench.run.sheet().planned.plan.find("acid")->amount.asWritten == "7");
    CHECK(bench.faults("acid").isEmpty());
    REQUIRE(bench.type("acid", Model::kAmount, "8 mol%"));
  }
  SECTION("not given") {
    bench.reason.giveUp();
    CHECK(bench.shown("acid", Model::kAmount) == "10 mol%");
    CHECK(bench.faults("acid").isEmpty());
  }
}

TEST_CASE("a plan that somebody else changed is a conflict, not an overwrite", "[ui][identity]") {
  Bench bench;
  {
    const auto other = bench.fixture.other();
    app::Desk desk{*other, bench.fixture.clock(), "MR"};
    REQUIRE(app::editRun(desk, *other->run(bench.run.run().n), {app::AmountEdit{"acid", "3 mol%"}},
                         ""));
  }
  int conflicts = 0;
  QObject::connect(&bench.run, &ui::OpenRun::conflictFound,
                   [&](const ui::Conflict&) { ++conflicts; });
  CHECK_FALSE(bench.type("acid", Model::kAmount, "7 mol%"));
  CHECK(conflicts == 1);
  CHECK(bench.shown("acid", Model::kAmount) == "3 mol%");
}

TEST_CASE("every cell says what it is to a screen reader", "[ui][identity]") {
  Bench bench;
  for (int row = 0; row < bench.model.rowCount(); ++row) {
    for (int column = 0; column < Model::kColumns; ++column)
      CHECK_FALSE(bench.model.index(row, column).data(Qt::AccessibleTextRole).toString().isEmpty());
  }
}

TEST_CASE("every number answers where it is from", "[ui][identity]") {
  Bench bench;
  const auto target = ui::cellTrail(bench.run.sheet(), "nickel", Model::kTarget);
  REQUIRE(target.steps.size() >= 2);
  CHECK(target.steps.first().contains(QStringLiteral("5 mol% × 0.200 mmol")));
  CHECK(target.steps.at(1).contains(QStringLiteral("308.62 g/mol")));
  CHECK_FALSE(target.sources.isEmpty());
  REQUIRE(bench.type("nickel", Model::kWeighed, "3.2 mg"));
  const auto charged = ui::cellTrail(bench.run.sheet(), "nickel", Model::kCharged);
  CHECK(charged.steps.first().toStdString() ==
        "0.0101 mmol = 3.20 mg × 0.97 (assay) ÷ 308.62 g/mol");
  CHECK(charged.steps.at(1).contains(QStringLiteral("(indoline, as planned)")));
  CHECK(charged.sources.last().contains(QStringLiteral("3.2 mg was typed by KW")));
  CHECK_FALSE(ui::chargeNotices(bench.run.sheet()).isEmpty());
}
