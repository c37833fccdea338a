// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "ui/models/balance_reading.h"
#include "ui/models/qt_text.h"

// Lines as balances and keyboard wedges send them. The forms are general ones: marks, blanks, sign,
// figures, unit, line end.
using namespace vialkeeper;

namespace {

std::string read(const char* line, const char* unit = "mg") {
  return ui::toUtf8(ui::readBalanceLine(QString::fromUtf8(line), QString::fromUtf8(unit)).text);
}

}  // namespace

TEST_CASE("what a balance puts around a number is taken out, the figures stay", "[ui][identity]") {
  const auto [line, expected] = GENERATE(table<const char*, const char*>({
      {"3.12 mg", "3.12 mg"},
      {"3.12mg", "3.12 mg"},
      {"+  3.12 mg", "3.12 mg"},
      {"3,12 mg", "3,12 mg"},
      {"N +003.12 mg", "3.12 mg"},
      {"N     +    3.12 mg\r\n", "3.12 mg"},
      {"G 12.0 mg", "12.0 mg"},
      {"S S      3.12 mg", "3.12 mg"},
      {"ST,NT, +0003.12 mg", "3.12 mg"},
      {"\x02 3.12 mg\x03", "3.12 mg"},
      {"\xEF\xBB\xBF\x33.12\xC2\xA0mg", "3.12 mg"},
      {"0.00312 g", "0.00312 g"},
      {"0003 mg", "3 mg"},
      {"0 mg", "0 mg"},
      {"- 0.05 mg", "-0.05 mg"},
      {"200 \xC2\xB5L", "200 \xC2\xB5L"},
  }));
  INFO(line);
  CHECK(read(line) == expected);
}

TEST_CASE("a bare number gets the unit of the target and says so", "[ui][identity]") {
  const auto bare = ui::readBalanceLine(QStringLiteral("+003.12"), QStringLiteral("mg"));
  CHECK(bare.text == QStringLiteral("3.12 mg"));
  CHECK(bare.unitAdded);
  const auto own = ui::readBalanceLine(QStringLiteral("0.00312 g"), QStringLiteral("mg"));
  CHECK(own.text == QStringLiteral("0.00312 g"));
  CHECK_FALSE(own.unitAdded);
  CHECK(read("3.12", "") == "3.12");
}

TEST_CASE("a line that is no reading stays whole for the core to refuse", "[ui][identity]") {
  for (const char* line :
       {"three mg", "3.12 mg 4.5 mg", "QR 3.12 mg", "1e999 mg", "", "mg", "12:30"}) {
    INFO(line);
    CHECK(read(line) == QString::fromUtf8(line).simplified().toStdString());
  }
}

TEST_CASE("a balance that was not at rest is told apart", "[ui][identity]") {
  CHECK(ui::readBalanceLine(QStringLiteral("S D   3.12 mg"), {}).unsteady);
  CHECK(ui::readBalanceLine(QStringLiteral("US,NT, 3.12 mg"), {}).unsteady);
  CHECK(ui::readBalanceLine(QStringLiteral("3.12 mg ?"), {}).unsteady);
  CHECK_FALSE(ui::readBalanceLine(QStringLiteral("S S   3.12 mg"), {}).unsteady);
}
