// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QAbstractItemModelTester>
#include <QSettings>
#include <QSignalSpy>
#include <QTest>
#include <catch2/catch.hpp>
#include <chrono>
#include <set>

#include "app/notebook/demo_bulk.h"
#include "app/notebook/find_runs.h"
#include "app/notebook/log_run.h"
#include "ui/models/qt_text.h"
#include "ui/models/run_list_model.h"
#include "ui/models/run_search.h"
#include "ui/workplace_fixture.h"

// The search of the window over notebooks on disk: what it finds is what the use case finds.
using namespace vialkeeper;

namespace {

struct SearchBench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::NotebookLink> link;
  std::unique_ptr<ui::RunSearch> search;

  explicit SearchBench(const QString& file) {
    auto notebook =
        fixture.workplace().files.open(ui::toUtf8(file), ui::NotebookFiles::Use::kWriting);
    REQUIRE(notebook);
    link = std::make_unique<ui::NotebookLink>(fixture.workplace(), *std::move(notebook), file,
                                              QStringLiteral("KW"));
    search = std::make_unique<ui::RunSearch>(*link);
    settle();
  }
  SearchBench() : SearchBench(demo()) {}

  static QString demo() {
    static tests::WorkplaceFixture demos;
    static int count = 0;
    const QString copy =
        ui::toQt(demos.folder().path("copy" + std::to_string(++count) + ".vialbook"));
    REQUIRE(QFile::copy(demos.demoFile(), copy));
    return copy;
  }

  /// Waits until the newest text is answered.
  void settle() {
    REQUIRE(QTest::qWaitFor([this] { return !search->isBusy(); }, 20'000));
  }
  void type(const QString& text) {
    search->setText(text);
    settle();
  }
  [[nodiscard]] std::vector<app::RowNumber> numbers() const {
    std::vector<app::RowNumber> list;
    for (const app::FoundRun& each : search->runs()) list.push_back(each.run.n);
    return list;
  }
  [[nodiscard]] std::vector<app::RowNumber> expected(const std::string& text) {
    const auto found = app::findRuns(link->notebook(), text, {}, true);
    REQUIRE(found);
    std::vector<app::RowNumber> list;
    for (const app::FoundRun& each : found->runs) list.push_back(each.run.n);
    return list;
  }
};

/// A notebook of so many plain runs, made once.
QString bulkFile(std::int64_t runs) {
  static tests::WorkplaceFixture folder;
  const std::string file = folder.folder().path("bulk" + std::to_string(runs) + ".vialbook");
  if (!QFile::exists(ui::toQt(file))) {
    auto notebook = folder.workplace().files.create(file);
    REQUIRE(notebook);
    REQUIRE(app::fillWithRuns(**notebook, runs, {}));
  }
  return ui::toQt(file);
}

}  // namespace

TEST_CASE("every beginning of a search finds what the use case finds for it", "[ui][identity]") {
  SearchBench bench;
  CHECK(bench.search->matches() == bench.search->total());
  const QString typed =
      QStringLiteral("photocatalyst:4CzIPN acid:\"pivalic acid\" 5..20 mol% yield>60");
  for (qsizetype length = 1; length <= typed.size(); ++length) {
    const QString text = typed.left(length);
    const std::string utf8 = ui::toUtf8(text);
    bench.type(text);
    INFO(utf8);
    if (!app::findRuns(bench.link->notebook(), utf8, {}, true)) {
      CHECK(bench.search->fault());
      continue;
    }
    CHECK_FALSE(bench.search->fault());
    CHECK(bench.numbers() == bench.expected(utf8));
  }
  CHECK(bench.search->matches() > 0);
  CHECK(bench.search->matches() < bench.search->total());
}

TEST_CASE("of a fast series of texts the last is answered", "[ui][identity]") {
  SearchBench bench(bulkFile(450));
  const QString typed = QStringLiteral("amber film above");
  QSignalSpy answers(bench.search.get(), &ui::RunSearch::found);
  for (int round = 0; round < 20; ++round) {
    for (qsizetype length = 0; length <= typed.size(); ++length)
      bench.search->setText(typed.left(length));
  }
  bench.settle();
  CHECK(answers.count() < 20);
  CHECK(bench.search->text() == typed);
  CHECK(bench.numbers() == bench.expected(ui::toUtf8(typed)));
}

TEST_CASE("whatever is typed is answered or refused with a sentence", "[ui][identity]") {
  SearchBench bench;
  const auto before = bench.link->notebook().summary();
  QStringList texts{QStringLiteral("yield>"),
                    QStringLiteral("yield>x"),
                    QStringLiteral("\""),
                    QStringLiteral("***"),
                    QStringLiteral("*"),
                    QStringLiteral("(((("),
                    QStringLiteral("))"),
                    QStringLiteral("not"),
                    QStringLiteral("or or"),
                    QStringLiteral("'; DROP TABLE run; --"),
                    QStringLiteral("\" OR 1=1 --"),
                    QStringLiteral("NEAR(amber film, 2)"),
                    QStringLiteral("title:amber AND ^film"),
                    QStringLiteral("{amber} : film"),
                    QStringLiteral("ratio:3"),
                    QStringLiteral("yield:1e999"),
                    QStringLiteral("structure:C1CC"),
                    QStringLiteral("structure:"),
                    QString::fromUtf8("\u202e\u0000\u200b"),
                    QString(QChar(0xD800)),
                    QString(10'000, QLatin1Char('a')),
                    QString(5'000, QLatin1Char('(')),
                    QString(200'000, QLatin1Char('"')),
                    QStringLiteral("a ").repeated(3'000)};
  for (const QString& text : texts) {
    bench.type(text);
    INFO(ui::toUtf8(text.left(60)));
    if (const auto& fault = bench.search->fault()) {
      CHECK_FALSE(fault->sentence.isEmpty());
      CHECK(fault->sentence.size() < 2'000);
      CHECK(fault->from >= 0);
      CHECK(fault->from + fault->length <= text.size());
    }
  }
  bench.type({});
  CHECK_FALSE(bench.search->fault());
  const auto after = bench.link->notebook().summary();
  REQUIRE((before && after));
  CHECK(after->runs == before->runs);
  CHECK(after->revisions == before->revisions);
}

TEST_CASE("a fault points at its character behind letters of several bytes", "[ui][identity]") {
  SearchBench bench;
  bench.type(QString::fromUtf8("\"µÅ🧪\" yield>x "));
  REQUIRE(bench.search->fault());
  const auto fault = *bench.search->fault();
  bench.type(QStringLiteral("\"abcd\" yield>x "));
  REQUIRE(bench.search->fault());
  CHECK(fault == *bench.search->fault());
  // What was found before stays in sight.
  CHECK_FALSE(bench.search->runs().empty());
}

TEST_CASE("a name that no substance has finds nothing and says so", "[ui][identity]") {
  SearchBench bench;
  bench.type(QStringLiteral("acid:pivalicc "));
  CHECK(bench.search->matches() == 0);
  REQUIRE(QTest::qWaitFor([&] { return !bench.search->hint().isEmpty(); }, 5'000));
  bench.type(QStringLiteral("acid:\"pivalic acid\" "));
  CHECK(bench.search->matches() > 0);
  CHECK(bench.search->hint().isEmpty());
}

TEST_CASE("what another connection changes appears in the list", "[ui][identity]") {
  tests::WorkplaceFixture fixture;
  auto link = fixture.link();
  fixture.addRun(*link);
  ui::RunSearch search(*link);
  ui::RunListModel model(search);
  QAbstractItemModelTester tester(&model, QAbstractItemModelTester::FailureReportingMode::Fatal);
  REQUIRE(QTest::qWaitFor([&] { return model.rowCount() == 1; }, 5'000));
  const QPersistentModelIndex first = model.index(0, 0);
  {
    const auto other = fixture.other();
    const auto run = other->run(1);
    REQUIRE(run);
    REQUIRE(app::cloneRun({*other, fixture.clock(), "MR"}, *run, {}, "Another"));
  }
  CHECK(model.rowCount() == 1);
  link->lookForChanges();
  REQUIRE(QTest::qWaitFor([&] { return model.rowCount() == 2; }, 5'000));
  // The run that was there is still the same row to whoever holds it.
  CHECK(first.row() == 1);
  CHECK(model.index(0, 1).data().toString() == QStringLiteral("Another"));
  CHECK(search.countText() == QStringLiteral("2 runs"));
}

TEST_CASE("a run that is irradiating says so in word and sign", "[ui][identity]") {
  tests::WorkplaceFixture fixture;
  auto link = fixture.link();
  const app::RowNumber run = fixture.addRun(*link);
  ui::RunSearch search(*link);
  ui::RunListModel model(search);
  REQUIRE(QTest::qWaitFor([&] { return model.rowCount() == 1; }, 5'000));
  CHECK_FALSE(model.index(0, 0).data(ui::RunListModel::kIsRunningRole).toBool());
  REQUIRE(app::logLine(link->desk(), *link->notebook().run(run), {.line = "lamp on"}));
  link->lookForChanges();
  REQUIRE(QTest::qWaitFor(
      [&] { return model.index(0, 0).data(ui::RunListModel::kIsRunningRole).toBool(); }, 5'000));
  CHECK(model.index(0, 0).data(Qt::AccessibleTextRole).toString() ==
        QStringLiteral("KW-0001, irradiating"));
}

TEST_CASE("runs come in pages and each once", "[ui][identity]") {
  SearchBench bench(bulkFile(450));
  ui::RunListModel model(*bench.search);
  for (const auto order : {app::FindOrder::kNewest, app::FindOrder::kOldest, app::FindOrder::kYield,
                           app::FindOrder::kCode, app::FindOrder::kRank}) {
    bench.search->setOrder(order);
    bench.settle();
    CHECK(bench.search->matches() == 450);
    CHECK(model.rowCount() == 200);
    while (model.canFetchMore({})) {
      model.fetchMore({});
      bench.settle();
    }
    const auto numbers = bench.numbers();
    CHECK(model.rowCount() == 450);
    CHECK(std::set(numbers.begin(), numbers.end()).size() == 450);
    const auto whole = bench.link->notebook().find({}, {.order = order, .limit = 0});
    REQUIRE(whole);
    for (std::size_t i = 0; i < numbers.size(); ++i) CHECK(whole->runs[i].run.n == numbers[i]);
  }
  // The tester fetches for itself.
  bench.search->setOrder(app::FindOrder::kNewest);
  QAbstractItemModelTester tester(&model, QAbstractItemModelTester::FailureReportingMode::Fatal);
  bench.settle();
}

TEST_CASE("the list stays sound while texts, orders and columns change", "[ui][identity]") {
  QSettings().remove(QStringLiteral("runs/columns"));
  SearchBench bench;
  ui::RunListModel model(*bench.search);
  QAbstractItemModelTester tester(&model, QAbstractItemModelTester::FailureReportingMode::Fatal);
  CHECK(model.columns() == ui::defaultRunColumns());
  for (const ui::RunColumn column : ui::allRunColumns()) model.setShown(column, true);
  CHECK(model.columnCount() == ui::allRunColumns().size());
  for (int row = 0; row < model.rowCount(); ++row) {
    for (int column = 0; column < model.columnCount(); ++column)
      CHECK_FALSE(model.index(row, column).data(Qt::AccessibleTextRole).toString().isEmpty());
  }
  bench.type(QStringLiteral("pivalic"));
  bench.search->setOrder(app::FindOrder::kYield);
  bench.settle();
  for (const ui::RunColumn column : ui::allRunColumns()) model.setShown(column, false);
  CHECK(model.columnCount() == 1);
  // The choice is there the next time.
  CHECK(ui::RunListModel(*bench.search).columns() == model.columns());
  model.showDefaultColumns();
}

TEST_CASE("a search that is given up does not keep its window waiting", "[ui][identity]") {
  SearchBench bench(bulkFile(450));
  const auto start = std::chrono::steady_clock::now();
  for (int i = 0; i < 20; ++i) {
    ui::RunSearch search(*bench.link);
    search.setText(QStringLiteral("structure:OC=O not yield>60"));
  }
  CHECK(std::chrono::steady_clock::now() - start < std::chrono::seconds(5));
}
