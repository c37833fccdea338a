// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/sd_file.h"

#include <catch2/catch.hpp>

namespace vialkeeper {
namespace {

TEST_CASE("an SD file is cut into records with their items", "[chem][sd-file][regression]") {
  const auto records = chem::readSdFile(
      "one\n  by hand\n\nbody\nM  END\n>  <Name>\nan acid\n\n> <CAS_Number> (1)\n64-19-7\n\n"
      "> <synonyms>\nAcOH\nethanoic acid\n\n$$$$\r\n"
      "two\r\n\r\n\r\nM  END\r\n> 25 <note>\r\na > b\r\n\r\n$$$$\n\n",
      "file.sdf");
  REQUIRE(records);
  REQUIRE(records->size() == 2);
  const chem::SdRecord& first = records->front();
  CHECK(first.number == 1);
  CHECK(first.line == 1);
  CHECK(first.title == "one");
  CHECK(first.molfile == "one\n  by hand\n\nbody\nM  END\n");
  CHECK(first.item("NAME") == "an acid");
  CHECK(first.item("cas number") == "64-19-7");
  CHECK(first.item("Synonyms") == "AcOH\nethanoic acid");
  CHECK(first.item("other").empty());
  const chem::SdRecord& second = records->back();
  CHECK(second.number == 2);
  CHECK(second.line == 17);
  CHECK(second.molfile == "two\n\n\nM  END\n");
  CHECK(second.item("note") == "a > b");
}

TEST_CASE("a last record needs no mark, and an empty first line is a title",
          "[chem][sd-file][regression]") {
  const auto records = chem::readSdFile("\n  x\n\nM  END", "file.sdf");
  REQUIRE(records);
  CHECK(records->front().title.empty());
  CHECK(records->front().molfile == "\n  x\n\nM  END\n");
}

TEST_CASE("what is no SD file is told with its record", "[chem][sd-file][regression]") {
  const auto cut = chem::readSdFile("one\nM  END\n$$$$\ntwo\nbody\n$$$$\nthree\n", "file.sdf");
  REQUIRE_FALSE(cut);
  REQUIRE(cut.error().size() == 2);
  CHECK(cut.error()[0].field == "record 2");
  CHECK(cut.error()[0].line == 4);
  CHECK(cut.error()[1].field == "record 3");
  CHECK_FALSE(chem::readSdFile("", "file.sdf"));
  CHECK_FALSE(chem::readSdFile("\n\n", "file.sdf"));
  CHECK_FALSE(chem::readSdFile("a\xFF\nM  END\n", "file.sdf"));
}

}  // namespace
}  // namespace vialkeeper
