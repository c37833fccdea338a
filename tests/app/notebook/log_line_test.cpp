// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/log_line.h"

#include <catch2/catch.hpp>

#include <algorithm>
#include <fstream>
#include <random>
#include <set>
#include <sstream>
#include <string>
#include <vector>

#include "app/notebook/log_line_corpus.h"
#include "app/notebook/log_line_kinds.h"
#include "text/utf8.h"

using namespace vialkeeper;
using app::ReadEntry;
using app::readLogLine;
namespace event_kind = app::event_kind;

namespace {

void checkRecord(const ReadEntry& read, const std::string& line) {
  REQUIRE(read.event.raw == line);
  REQUIRE(event_kind::isKnown(read.event.kind));
  REQUIRE(read.event.kind != event_kind::kAddendum);
  REQUIRE(!read.sentence.empty());
  REQUIRE(std::ranges::none_of(read.sentence,
                               [](char c) { return static_cast<unsigned char>(c) < 0x20; }));
  if (!read.doubt) return;
  REQUIRE(read.event.kind == event_kind::kObservation);
  REQUIRE(read.event.note == line);
  REQUIRE(read.doubt->offset <= line.size());
  REQUIRE(read.doubt->offset + read.doubt->length <= line.size());
  REQUIRE(!read.doubt->what.empty());
  REQUIRE(!read.doubt->mend.empty());
  const bool empty = !read.event.pressure_bar && !read.event.temperature_C &&
                     !read.event.volume_uL && !read.event.amount_mmol && !read.event.fraction &&
                     read.event.gas.empty() && read.event.pressureKind.empty() &&
                     read.photo.empty();
  REQUIRE(empty);
}

std::string randomLine(std::mt19937_64& random) {
  static const std::vector<std::string> kPieces = {
      "p",           "P ",       "T",      "lamp",   " on",
      "off",         "aliquot ", "gas ",   "sample", "h2 ",
      "vent",        "purge ",   "add ",   "added",  "collected ",
      "photo ",      "note ",    " ",      "  ",     "0.42",
      "0,42",        "35",       "1e3",    "-",      "\u2212",
      " bar",        "bar",      " C",     "°C",     " uL",
      "µL",          " mL",      "%",      " abs",   " g",
      "(a)",         "Ar",       " N2",    "H₂",     "acetonitrile",
      "1,4-dioxane", ";",        ",",      "=",      ":",
      "/",           "(",        "\"",     "\n",     "\t",
      "\u00A0",      "\u202E",   "\uFEFF", "mmol",   " at ",
      "of",          "to ",      "14:20",  "K",      "and ",
      "M",           "deg",      " C",     "ü",      "😀"};
  std::string line;
  const std::size_t count = random() % 9;
  for (std::size_t i = 0; i < count; ++i) {
    if (random() % 5 == 0) {
      line += static_cast<char>(random() % 256);
    } else {
      line += kPieces[random() % kPieces.size()];
    }
  }
  return line;
}

}  // namespace

TEST_CASE("the shorthand of the bench is read as its author means it", "[log]") {
  REQUIRE(kUnderstood.size() >= 80);
  for (const Understood& expected : kUnderstood) {
    INFO(expected.line);
    const ReadEntry read = readLogLine(expected.line);
    CHECK(read.event.kind == expected.kind);
    CHECK(read.event.raw == expected.line);
    CHECK(read.doubt.has_value() == (expected.sentence == nullptr));
    if (expected.sentence != nullptr) CHECK(read.sentence == expected.sentence);
  }
}

TEST_CASE("a shorthand that cannot be read is a doubt at the right character", "[log]") {
  for (const Doubted& expected : kDoubted) {
    INFO(expected.line);
    const std::string line = expected.line;
    const ReadEntry read = readLogLine(line);
    REQUIRE(read.doubt);
    INFO(text::pointedAt(*read.doubt, line) << "\n"
                                            << read.doubt->what << ": " << read.doubt->mend);
    CHECK(read.meant == expected.meant);
    CHECK(line.substr(0, read.doubt->offset) == expected.before);
    CHECK(line.substr(read.doubt->offset, read.doubt->length) == expected.pointed);
    CHECK(read.likelyText == expected.likelyText);
    CHECK(read.sentence.starts_with("text, not "));
    CHECK(read.doubt->mend.ends_with("put note in front to keep the line as text"));
    checkRecord(read, line);
  }
}

TEST_CASE("note in front makes text of every line", "[log]") {
  for (const Doubted& doubted : kDoubted) {
    INFO(doubted.line);
    const ReadEntry read = readLogLine(std::string("note ") + doubted.line);
    CHECK(!read.doubt);
    CHECK(read.event.kind == event_kind::kObservation);
    CHECK(read.event.note == doubted.line);
  }
}

TEST_CASE("what was read fills the event in the units of its columns", "[log]") {
  const auto pressure = readLogLine("p 420 mbar 308.15 K ; slow").event;
  CHECK(pressure.pressure_bar == 0.42);
  CHECK(pressure.pressureKind == "gauge");
  CHECK(pressure.temperature_C == 35.0);
  CHECK(pressure.note == "slow");
  const auto aliquot = readLogLine("aliquot 50 uL S3; cloudy").event;
  CHECK(aliquot.volume_uL == 50.0);
  CHECK(aliquot.note == "S3; cloudy");
  CHECK(readLogLine("gas 0,25 mL").event.volume_uL == 250.0);
  CHECK(readLogLine("h2 12.3 %").event.fraction == 12.3 / 100.0);
  CHECK(readLogLine("headspace 0.123").event.fraction == 0.123);
  const auto added = readLogLine("add 0.2 mL acetonitrile; cold").event;
  CHECK(added.volume_uL == 200.0);
  CHECK(added.note == "acetonitrile");
  CHECK(added.raw == "add 0.2 mL acetonitrile; cold");
  const auto gas = readLogLine("add gas 100 umol hydrogen").event;
  CHECK(gas.amount_mmol == 0.1);
  CHECK(gas.gas == "H2");
  CHECK(!gas.volume_uL);
  const auto collected = readLogLine("collected 4.2 mL 21 C 1008 mbar").event;
  CHECK(collected.volume_uL == 4200.0);
  CHECK(collected.temperature_C == 21.0);
  CHECK(collected.pressure_bar == 1.008);
  CHECK(collected.pressureKind == "abs");
  CHECK(readLogLine("vent").event.pressureKind.empty());
  CHECK(readLogLine("purge").event.gas.empty());
  const auto photo = readLogLine("photo day 2/vial 3.jpg");
  CHECK(photo.photo == "day 2/vial 3.jpg");
  CHECK(photo.event.attachmentName == "vial 3.jpg");
  CHECK(readLogLine("photo ../x.png").event.attachmentName == "x.png");
}

TEST_CASE("an observation is kept word for word", "[log]") {
  for (const std::string line : {"  two blanks, a tab\t", "Ünïcödé and \u202Ebidi", "line\nbreak",
                                 "=SUM(A1)", "'; DROP TABLE event;--"}) {
    const ReadEntry read = readLogLine(line);
    CHECK(!read.doubt);
    CHECK(read.event.note == line);
    checkRecord(read, line);
  }
  const std::string nul("a\0b", 3);
  CHECK(readLogLine(nul).event.note == nul);
}

TEST_CASE("nothing at all is a doubt, not an event", "[log]") {
  for (const std::string line : {"", " ", "\t\n", "\u00A0\uFEFF"}) {
    const ReadEntry read = readLogLine(line);
    REQUIRE(read.doubt);
    CHECK(read.meant.empty());
    checkRecord(read, line);
  }
}

TEST_CASE("while a line is typed the doubt says that it is unfinished", "[log]") {
  for (const char* line : {"p", "p ", "p 0.42", "p 0.42 bar 35", "lamp ", "aliquot", "aliquot 50 ",
                           "add 0.2 mL ", "photo ", "collected 4.2 mL"}) {
    INFO(line);
    CHECK(readLogLine(line).isUnfinished());
  }
  for (const char* line :
       {"p 0.42 bra", "p 0.42 bar", "vent", "clear", "0.42 bar", "p 0.42 35 C"}) {
    INFO(line);
    CHECK(!readLogLine(line).isUnfinished());
  }
}

TEST_CASE("an addendum is text whatever it says", "[log]") {
  const ReadEntry read = app::readAddendum("p 0.42 bar");
  CHECK(read.event.kind == "addendum");
  CHECK(read.event.note == "p 0.42 bar");
  CHECK(!read.event.pressure_bar);
  CHECK(!read.doubt);
  CHECK(app::readAddendum(" ").doubt);
}

TEST_CASE("the kinds of events are those of the log file, a photo and an addendum", "[log]") {
  CHECK(event_kind::kOfLogFile.size() == 13);
  CHECK(event_kind::isOfLogFile("liquid added"));
  CHECK(!event_kind::isOfLogFile("photo"));
  CHECK(event_kind::isKnown("photo"));
  CHECK(event_kind::isKnown("addendum"));
  CHECK(!event_kind::isKnown("sealed"));
  std::set<std::string> made;
  for (const Understood& expected : kUnderstood) made.insert(expected.kind);
  for (const auto kind : event_kind::kOfLogFile) CHECK(made.contains(std::string(kind)));
}

TEST_CASE("20,000 random lines are kept, read alike twice, and doubted within their bounds",
          "[log][identity]") {
  std::mt19937_64 random(20260304);
  std::size_t events = 0;
  std::size_t doubts = 0;
  for (int round = 0; round < 20000; ++round) {
    const std::string line = randomLine(random);
    const ReadEntry read = readLogLine(line);
    CAPTURE(line);
    checkRecord(read, line);
    const ReadEntry again = readLogLine(line);
    REQUIRE(again.sentence == read.sentence);
    REQUIRE(again.event.kind == read.event.kind);
    REQUIRE(again.event.note == read.event.note);
    REQUIRE(again.doubt.has_value() == read.doubt.has_value());
    events += read.event.kind != event_kind::kObservation ? 1U : 0U;
    doubts += read.doubt ? 1U : 0U;
  }
  CHECK(events > 200);
  CHECK(doubts > 2000);
}

TEST_CASE("every beginning of a shorthand is read without a silent observation",
          "[log][identity]") {
  for (const Understood& expected : kUnderstood) {
    const ReadEntry whole = readLogLine(expected.line);
    if (whole.event.kind == event_kind::kObservation) continue;
    const std::string line = expected.line;
    const std::size_t begin = std::min(line.find(' ', line.find_first_not_of(' ')), line.size());
    for (std::size_t length = begin; length < line.size(); ++length) {
      INFO(line.substr(0, length));
      const ReadEntry read = readLogLine(line.substr(0, length));
      checkRecord(read, line.substr(0, length));
      REQUIRE((read.doubt || read.event.kind != event_kind::kObservation));
    }
  }
}

TEST_CASE("long lines are read in a moment", "[log]") {
  std::string chain;
  while (chain.size() < 1'000'000) chain += "aliquot 50 uL ";
  CHECK(readLogLine(chain).doubt);
  const std::string text = "note " + std::string(1'000'000, 'x');
  CHECK(readLogLine(text).event.note.size() == 1'000'000);
  CHECK(readLogLine("add 0.2 mL " + std::string(1'000'000, 'x')).event.kind == "liquid added");
  CHECK(readLogLine(std::string(1'000'000, ' ')).doubt);
  CHECK(readLogLine("p " + std::string(1'000'000, '1') + " bar").doubt);
}

TEST_CASE("every line that the docs show is read as they say", "[log][docs]") {
  std::ifstream file(std::string(VIALKEEPER_SOURCE_DIR) + "/docs/log.md");
  REQUIRE(file);
  int lines = 0;
  int examples = 0;
  std::string row;
  while (std::getline(file, row)) {
    ++lines;
    // Rows of the tables: | `typed` | sentence |
    if (!row.starts_with("| `")) continue;
    const std::size_t end = row.find("` |");
    const std::string typed = row.substr(3, end - 3);
    std::string sentence = row.substr(end + 4);
    sentence = sentence.substr(0, sentence.rfind(" |"));
    INFO(typed);
    const ReadEntry read = readLogLine(typed);
    if (sentence.starts_with("asks: ")) {
      CHECK(read.doubt);
      if (read.doubt) CHECK(read.doubt->what == sentence.substr(6));
    } else {
      CHECK(!read.doubt);
      CHECK(read.sentence == sentence);
    }
    ++examples;
  }
  CHECK(lines <= 80);
  CHECK(examples >= 25);
}
