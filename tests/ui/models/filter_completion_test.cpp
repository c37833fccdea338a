// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QAbstractItemModelTester>
#include <QSettings>
#include <QTest>
#include <catch2/catch.hpp>

#include "app/notebook/find_language.h"
#include "ui/models/filter_completion.h"
#include "ui/models/qt_text.h"
#include "ui/models/saved_filters.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;

namespace {

QStringList labels(const ui::FilterCompletion& completion) {
  QStringList list;
  for (int row = 0; row < completion.rowCount(); ++row)
    list += completion.index(row).data().toString();
  return list;
}

struct CompletionBench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::NotebookLink> link = fixture.link();
  std::unique_ptr<ui::FilterCompletion> completion;

  CompletionBench() {
    fixture.addRun(*link);
    completion = std::make_unique<ui::FilterCompletion>(*link);
    REQUIRE(QTest::qWaitFor([this] { return completion->isLoaded(); }, 10'000));
  }
  void at(const QString& text) { completion->complete(text, text.size()); }
};

}  // namespace

TEST_CASE("fields and what the notebook holds are proposed where they may stand",
          "[ui][identity]") {
  CompletionBench bench;
  QAbstractItemModelTester tester(bench.completion.get(),
                                  QAbstractItemModelTester::FailureReportingMode::Fatal);
  bench.at(QStringLiteral("photoc"));
  REQUIRE(bench.completion->rowCount() > 0);
  CHECK(bench.completion->taken(0).text == QStringLiteral("photocatalyst:"));
  bench.at(QStringLiteral("yield>60 acid:piv"));
  REQUIRE(labels(*bench.completion).contains(QStringLiteral("pivalic acid")));
  const auto taken = bench.completion->taken(0);
  CHECK(taken.text == QStringLiteral("yield>60 acid:\"pivalic acid\" "));
  CHECK(taken.cursor == taken.text.size());
  CHECK(app::parseFind(ui::toUtf8(taken.text)));
}

TEST_CASE("nothing is proposed where no word is begun, unless all is asked for", "[ui][identity]") {
  CompletionBench bench;
  bench.at({});
  CHECK(bench.completion->rowCount() == 0);
  bench.at(QStringLiteral("yield>60 "));
  CHECK(bench.completion->rowCount() == 0);
  bench.completion->complete({}, 0, true);
  CHECK(bench.completion->rowCount() > 3);
}

TEST_CASE("a proposal within the line leaves what is around it", "[ui][identity]") {
  CompletionBench bench;
  const QString text = QString::fromUtf8("\"µm\" acid:piv yield>60");
  bench.completion->complete(text, text.indexOf(QStringLiteral(" yield")));
  REQUIRE(bench.completion->rowCount() > 0);
  const auto taken = bench.completion->taken(0);
  CHECK(taken.text == QString::fromUtf8("\"µm\" acid:\"pivalic acid\" yield>60"));
  CHECK(taken.text.mid(taken.cursor) == QStringLiteral("yield>60"));
}

TEST_CASE("a filter that is kept is there the next time", "[ui][identity]") {
  QSettings().remove(QStringLiteral("filters"));
  ui::SavedFilters filters;
  QAbstractItemModelTester tester(&filters, QAbstractItemModelTester::FailureReportingMode::Fatal);
  CHECK(filters.save(QStringLiteral("good & quick"), QStringLiteral("yield>60 duration<20 h")));
  CHECK(filters.save(QStringLiteral("Blanks"), QStringLiteral("not acid:*")));
  CHECK(filters.save(QStringLiteral("Blanks"), QStringLiteral("not acid:* not base:*")));
  CHECK_FALSE(filters.save(QStringLiteral(" "), QStringLiteral("x")));
  CHECK_FALSE(filters.save(QStringLiteral("x"), {}));
  const ui::SavedFilters again;
  REQUIRE(again.rowCount() == 2);
  CHECK(again.filters()[0].name == QStringLiteral("Blanks"));
  CHECK(again.filters()[0].text == QStringLiteral("not acid:* not base:*"));
  CHECK(again.nameOf(QStringLiteral("yield>60 duration<20 h")) == QStringLiteral("good & quick"));
  filters.remove(QStringLiteral("Blanks"));
  CHECK(ui::SavedFilters().rowCount() == 1);
  filters.remove(QStringLiteral("good & quick"));
}
