// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "text/csv.h"

#include <catch2/catch.hpp>

#include <random>

using namespace vialkeeper;
using namespace std::string_literals;
using text::readCsv;
using Cells = std::vector<std::string>;

namespace {

/// The faults of a table that must not be readable.
text::Faults faultsOf(std::string_view bytes) {
  const auto table = readCsv(bytes, "t.csv");
  REQUIRE_FALSE(table);
  return table.error();
}

}  // namespace

TEST_CASE("a table is read as RFC 4180 prints it, quotes, commas and line breaks included",
          "[text][published]") {
  // RFC 4180, section 2, items 5 to 7: the three examples of quoted fields, under one header.
  const auto table = readCsv(
      "a,b,c\r\n\"aaa\",\"bbb\",\"ccc\"\r\n\"aaa\",\"b\r\nbb\",\"ccc\"\r\n\"aaa\",\"b\"\"bb\","
      "\"ccc\"\r\n",
      "t.csv");
  REQUIRE(table);
  CHECK(table->header.cells == Cells{"a", "b", "c"});
  REQUIRE(table->rows.size() == 3);
  CHECK(table->rows[0].cells == Cells{"aaa", "bbb", "ccc"});
  CHECK(table->rows[1].cells == Cells{"aaa", "b\r\nbb", "ccc"});
  CHECK(table->rows[2].cells == Cells{"aaa", "b\"bb", "ccc"});
}

TEST_CASE("the last line of a table may lack its line break", "[text][published]") {
  // RFC 4180, section 2, item 2.
  const auto table = readCsv("aaa,bbb,ccc\r\nzzz,yyy,xxx", "t.csv");
  REQUIRE(table);
  REQUIRE(table->rows.size() == 1);
  CHECK(table->rows[0].cells == Cells{"zzz", "yyy", "xxx"});
}

TEST_CASE("line ends of all systems, a byte-order mark and blanks round cells change nothing",
          "[text][identity]") {
  const auto plain = readCsv("key,actual\nnickel,3.1 mg\nacid,2 mg\n", "t.csv");
  REQUIRE(plain);
  for (const auto& variant : {"key,actual\r\nnickel,3.1 mg\r\nacid,2 mg\r\n"s,
                              "\xEF\xBB\xBFkey,actual\nnickel,3.1 mg\nacid,2 mg"s,
                              " key ,\tactual\n nickel\t, 3.1 mg \nacid ,2 mg\n"s,
                              "\n\nkey,actual\n\nnickel,3.1 mg\n  \nacid,2 mg\n\n"s,
                              "key,actual\n \"nickel\" , \"3.1 mg\" \n\"acid\",2 mg\n"s,
                              "key,actual\rnickel,3.1 mg\racid,2 mg\r"s}) {
    INFO(variant);
    const auto table = readCsv(variant, "t.csv");
    REQUIRE(table);
    CHECK(table->header.cells == plain->header.cells);
    REQUIRE(table->rows.size() == plain->rows.size());
    for (std::size_t i = 0; i < table->rows.size(); ++i)
      CHECK(table->rows[i].cells == plain->rows[i].cells);
  }
}

TEST_CASE("blanks inside quotation marks are part of the cell", "[text]") {
  const auto table = readCsv("a,b\n\" x \",y\n", "t.csv");
  REQUIRE(table);
  CHECK(table->rows[0].cells == Cells{" x ", "y"});
}

TEST_CASE("rows know the line on which they begin, behind empty lines and cells of several lines",
          "[text]") {
  const auto table = readCsv("a,b\n\nx,\"one\ntwo\nthree\"\ny,z\n\n\nu,v", "t.csv");
  REQUIRE(table);
  CHECK(table->header.line == 1);
  REQUIRE(table->rows.size() == 3);
  CHECK(table->rows[0].line == 3);
  CHECK(table->rows[0].cells[1] == "one\ntwo\nthree");
  CHECK(table->rows[1].line == 6);
  CHECK(table->rows[2].line == 9);
}

TEST_CASE("too few and too many cells are told for every row with its line", "[text]") {
  const auto faults = faultsOf("a,b\n1\n1,2\n1,2,3\n1,2,\n");
  REQUIRE(faults.size() == 3);
  CHECK(faults[0].line == 2);
  CHECK(faults[0].what == "1 cell where the header has 2");
  CHECK(faults[1].line == 4);
  CHECK(faults[1].what == "3 cells where the header has 2");
  CHECK(faults[2].line == 5);
}

TEST_CASE("an open quotation mark is told on the line where it opens", "[text]") {
  const auto faults = faultsOf("a,b\n1,2\n3,\"four\nfive,6\n");
  REQUIRE(faults.size() == 1);
  CHECK(faults[0].line == 3);
  CHECK(faults[0].what == "a quotation mark is never closed");
}

TEST_CASE("text beside a quoted cell and a stray quotation mark are faults of their lines",
          "[text]") {
  const auto faults = faultsOf("a,b\n\"1\"x,2\n3,4\"5\n");
  REQUIRE(faults.size() == 2);
  CHECK(faults[0].line == 2);
  CHECK(faults[0].what == "text follows a quoted cell");
  CHECK(faults[1].line == 3);
}

TEST_CASE("a repeated and a nameless column are told together", "[text]") {
  const auto faults = faultsOf("key,,key\n1,2,3\n");
  REQUIRE(faults.size() == 2);
  CHECK(faults[0].what == "a column without a name");
  CHECK(faults[1].field == "key");
  CHECK(faults[1].what == "this column stands twice");
}

TEST_CASE("a file without a header is refused", "[text]") {
  for (const auto& bytes : {""s, "\n \n\r\n"s, "\xEF\xBB\xBF"s}) {
    const auto faults = faultsOf(bytes);
    REQUIRE(faults.size() == 1);
    CHECK(faults[0].what == "the file holds no table");
  }
}

TEST_CASE("NUL, UTF-16 and broken UTF-8 are refused with their lines", "[text]") {
  const auto nul = faultsOf("a,b\n1,\0\n"s);
  REQUIRE(nul.size() == 1);
  CHECK(nul[0].line == 2);
  CHECK(nul[0].what.find("NUL") != std::string::npos);
  for (const auto& bytes : {"\xFF\xFE"
                            "a\0"s,
                            "\xFE\xFF\0a"s}) {
    const auto utf16 = faultsOf(bytes);
    REQUIRE(utf16.size() == 1);
    CHECK(utf16[0].what.find("UTF-16") != std::string::npos);
  }
  const auto latin1 = faultsOf("a,b\n1,2\n3,4 \xB5L\n");
  REQUIRE(latin1.size() == 1);
  CHECK(latin1[0].line == 3);
  CHECK(latin1[0].what.find("UTF-8") != std::string::npos);
}

TEST_CASE("comments before the header are kept where they are asked for, and cells elsewhere",
          "[text]") {
  const auto table = readCsv("# cat = 0.002 mol/L\n#second\na,b\n#3,4\n", "t.csv",
                             text::CsvComments::kBeforeHeader);
  REQUIRE(table);
  CHECK(table->comments == Cells{"cat = 0.002 mol/L", "second"});
  CHECK(table->header.line == 3);
  CHECK(table->rows[0].cells == Cells{"#3", "4"});
  const auto plain = readCsv("#a,b\n1,2\n", "t.csv");
  REQUIRE(plain);
  CHECK(plain->header.cells == Cells{"#a", "b"});
}

TEST_CASE("what toCsvCell writes is read back as it was, in 500 random tables",
          "[text][identity]") {
  std::mt19937_64 random(20260304);
  const std::vector<std::string> pieces = {"a",  "7",    ",",  "\"", "\n",          "\r\n",
                                           "\r", " ",    "\t", "#",  "µ",           "·",
                                           "'",  "\"\"", "",   "-",  "\xE2\x80\xAF"};
  const auto pick = [&random](std::size_t below) {
    return std::uniform_int_distribution<std::size_t>(0, below - 1)(random);
  };
  for (int round = 0; round < 500; ++round) {
    const std::size_t columns = 2 + pick(4);
    std::string bytes = "c0";
    for (std::size_t c = 1; c < columns; ++c) bytes += ",c" + std::to_string(c);
    bytes += "\n";
    std::vector<Cells> rows(1 + pick(6), Cells(columns));
    for (Cells& row : rows) {
      for (std::size_t c = 0; c < columns; ++c) {
        const std::size_t length = pick(6);
        for (std::size_t i = 0; i < length; ++i) row[c] += pieces[pick(pieces.size())];
        if (c > 0) bytes += ',';
        bytes += text::toCsvCell(row[c]);
      }
      bytes += pick(2) == 0 ? "\n" : "\r\n";
    }
    INFO(bytes);
    const auto table = readCsv(bytes, "t.csv");
    REQUIRE(table);
    REQUIRE(table->rows.size() == rows.size());
    for (std::size_t r = 0; r < rows.size(); ++r) REQUIRE(table->rows[r].cells == rows[r]);
  }
}

TEST_CASE("an empty cell alone in its row is a row only where it is quoted", "[text]") {
  const auto table = readCsv("only\n\"\"\n\nx\n", "t.csv");
  REQUIRE(table);
  REQUIRE(table->rows.size() == 2);
  CHECK(table->rows[0].cells == Cells{""});
}

TEST_CASE("no sequence of random bytes throws or reads a ragged table", "[text][identity]") {
  std::mt19937_64 random(77);
  const std::string alphabet = "ab,,\"\"\n\r \t#\xC2\xB5\xE2"s + '\0';
  std::uniform_int_distribution<std::size_t> letter(0, alphabet.size() - 1);
  std::size_t readable = 0;
  for (int round = 0; round < 5000; ++round) {
    std::string bytes = "a,b\n";
    const std::size_t length = random() % 30;
    for (std::size_t i = 0; i < length; ++i) bytes += alphabet[letter(random)];
    const auto table = readCsv(bytes, "t.csv");
    if (!table) {
      REQUIRE_FALSE(table.error().empty());
      continue;
    }
    ++readable;
    for (const auto& row : table->rows) REQUIRE(row.cells.size() == 2);
  }
  CHECK(readable > 50);
}
