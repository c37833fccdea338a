// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "app/sheet_bench.h"

using namespace vialkeeper;
using namespace vialkeeper::tests;
using app::planMark;

// Source: draft-eastlake-fnv, appendix C, FNV-1a of 64 bits: "" cbf29ce484222325, "a"
// af63dc4c8601ec8c, "foobar" 85944171f73967e8; folded to 32 bits by the exclusive or of both
// halves.
TEST_CASE("the plan's mark is the folded FNV-1a of its text", "[app][mark][published]") {
  CHECK(planMark("") == "4fd0bfc1");
  CHECK(planMark("a") == "296230c0");
  CHECK(planMark("foobar") == "72ad2699");
}

// Printed sheets carry the mark; it must never change for a text. First output of this program,
// version 0.1.
TEST_CASE("the mark of a plan stays what was printed on paper", "[app][mark][regression]") {
  CHECK(planMark("format = \"vialkeeper-plan/1\"\n") == "f76869ea");
  CHECK(planMark("format = \"vialkeeper-plan/1\"\r\n") !=
        planMark("format = \"vialkeeper-plan/1\"\n"));
}

TEST_CASE("a run without a code is known by its mark, one with a code by that", "[app][mark]") {
  const auto marked = app::weighingSheet(planned(sheetPlan()));
  CHECK(marked.codeIsMark);
  CHECK(marked.code == "plan " + planMark(sheetPlan()));
  CHECK(marked.qrText == marked.code);
  const auto coded = app::weighingSheet(
      planned(replaced(sheetPlan(), "series = ", "code = \"VK-0042\"\nseries = ")));
  CHECK(!coded.codeIsMark);
  CHECK(coded.code == "VK-0042");
  CHECK(coded.qrText == "VK-0042");
}
