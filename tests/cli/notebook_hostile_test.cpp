// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>
#include <string>
#include <vector>

#include "cli/notebook_bench.h"

using namespace vialkeeper::tests;

namespace {

/// Texts that have broken other programs.
const std::vector<std::string>& hostileTexts() {
  static const std::vector<std::string> texts = {"'; DROP TABLE run; --",
                                                 "\" OR 1=1 --",
                                                 "x' UNION SELECT * FROM person --",
                                                 "%_*?[a-z]",
                                                 "NEAR(a b, 2)",
                                                 "a AND NOT b OR (c",
                                                 "title : x",
                                                 "^start",
                                                 "\"open",
                                                 "*",
                                                 "()",
                                                 "-",
                                                 "{}",
                                                 "=cmd|' /C calc'!A0",
                                                 "+1+1",
                                                 "@SUM(1)",
                                                 "\xE2\x80\xAE"
                                                 "abc",
                                                 "a\xE2\x80\x8B"
                                                 "b",
                                                 "\xF0\x9F\xA7\xAA",
                                                 "../../etc/passwd",
                                                 "%n%s%x",
                                                 "{0}{1}",
                                                 "<b>&amp;",
                                                 "\\",
                                                 "\t tab"};
  return texts;
}

bool isOrderly(const Ran& ran) {
  const bool status = ran.status >= 0 && ran.status <= 3;
  return status && (ran.status == 0) == ran.err.empty() && (ran.status == 0 || ran.out.empty());
}

}  // namespace

TEST_CASE("hostile texts are kept or refused in every field, and the notebook stays sound",
          "[cli][safety]") {
  Book book;
  for (const std::string& text : hostileTexts()) {
    INFO(text);
    CHECK(isOrderly(book.verb(
        {"shelf", "add", "substance", "s " + text, "--formula", "C8H9N", "--note", text})));
    CHECK(isOrderly(book.verb({"shelf", "add", "vial", "v " + text, "--set", "volume=11.6 mL",
                               "--set", "note=" + text})));
    CHECK(isOrderly(book.verb({"shelf", "show", text})));
    CHECK(isOrderly(
        book.verb({"result", "KW-0001", "--title", text, "--aim", text, "--conclusion", text})));
    CHECK(isOrderly(book.verb({"log", "KW-0001", "note " + text})));
    CHECK(isOrderly(book.verb({"log", "KW-0001", text})));
    CHECK(isOrderly(book.verb({"find", text})));
    CHECK(isOrderly(book.verb({"find", "title " + text + " acid:" + text})));
    CHECK(isOrderly(book.verb({"show", text})));
    CHECK(isOrderly(book.verb({"clone", "KW-0001", "--set", "title=" + text})));
    CHECK(isOrderly(book.verb({"weigh", "KW-0001", text, text})));
  }
  const Ran verified = book.verb({"verify"});
  INFO(verified.err);
  CHECK(verified.status == 0);
  CHECK(book.verb({"runs", "--json"}).json()["matches"].get<int>() >= 1);
}

TEST_CASE("what a person typed comes back to the letter", "[cli][safety]") {
  Book book;
  for (const std::string& text : hostileTexts()) {
    const Ran logged = book.verb({"log", "KW-0001", "note " + text, "--json"});
    INFO(text << logged.err);
    REQUIRE(logged.status == 0);
    CHECK(logged.json()["event"]["raw"] == "note " + text);
  }
}

TEST_CASE("a note of ten megabytes is kept, bytes that are no text are refused", "[cli][safety]") {
  Book book;
  const std::string large = "note " + std::string(10 << 20, 'x');
  REQUIRE(book.verb({"log", "KW-0001", large}).status == 0);
  CHECK(book.verb({"show", "KW-0001", "--json"}).json()["events"][0]["raw"] == large);
  for (const std::string& bad :
       {std::string("note \xFF\xFE"), std::string("note a\0b", 8), std::string("note \xC3")}) {
    const Ran refused = book.verb({"log", "KW-0001", bad});
    CHECK(refused.status == 1);
    CHECK(refused.out.empty());
  }
  CHECK(book.verb({"verify"}).status == 0);
}

TEST_CASE("cells that a spreadsheet would run are led by an apostrophe", "[cli][safety]") {
  Book book;
  for (const std::string& title :
       {std::string("=1+1"), std::string("+cmd"), std::string("-2"), std::string("@SUM(A1)")}) {
    REQUIRE(book.verb({"result", "KW-0001", "--title", title}).status == 0);
    const Ran csv = book.verb({"runs", "--csv"});
    INFO(csv.out);
    CHECK(csv.out.find(",'" + title) != std::string::npos);
  }
}

TEST_CASE("an export stays in its folder whatever a raw file is called", "[cli][safety]") {
  Book book;
  const std::string photo = book.folder().write("..evil.jpg", "not a picture");
  REQUIRE(book.verb({"log", "KW-0001", "photo " + photo}).status == 0);
  REQUIRE(book.verb({"export", "KW-0001", "--to", book.folder().path("out")}).status == 0);
  CHECK(bytesOf(book.folder().path("out/KW-0001/files/file-2..evil.jpg")) == "not a picture");
  CHECK(book.verb({"export", "../KW-0001", "--to", book.folder().path("other")}).status == 1);
}
