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

#include "app/notebook/log_line_kinds.h"
#include "text/utf8.h"
#include "units/quantity_text.h"

using namespace vialkeeper;
using app::readLogLine;
using app::ReadEntry;
namespace event_kind = app::event_kind;

namespace {

/// A line and the sentence that says how it is read; all are invented.
struct Understood {
  const char* line;
  const char* kind;
  const char* sentence;
};

const std::vector<Understood> kUnderstood = {
    {"lamp on", "lamp on", "lamp on"},
    {"Lamp ON", "lamp on", "lamp on"},
    {"lampoff", "lamp off", "lamp off"},
    {"lamp: off", "lamp off", "lamp off"},
    {"light on", "lamp on", "lamp on"},
    {"  lamp on  ", "lamp on", "lamp on"},
    {"lamp on at 30 C", "lamp on", "lamp on at 30 °C"},
    {"lamp on; fan at half speed", "lamp on", "lamp on: 'fan at half speed'"},
    {"p 0.42 bar 35 C", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"p0.42bar 35C", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"p0.42bar35C", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"P 0,42 bar 35,5 °C", "pressure", "pressure 0.42 bar gauge at 35.5 °C"},
    {"p 0,42 BAR, 35 c", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"p=0.42 bar, T=35 °C", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"p: 0.42 bar @ 35 C", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"pressure 0.42 bar gauge at 35 C", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"p 1.43 bar abs 35 C", "pressure", "pressure 1.43 bar abs at 35 °C"},
    {"p 35 C 1.43 bar absolute", "pressure", "pressure 1.43 bar abs at 35 °C"},
    {"p 1.43 bar a", "pressure", "pressure 1.43 bar abs"},
    {"p 1.43 bara", "pressure", "pressure 1.43 bar abs"},
    {"p 1.43 bar(a) 35 C", "pressure", "pressure 1.43 bar abs at 35 °C"},
    {"p abs 1.43 bar", "pressure", "pressure 1.43 bar abs"},
    {"p 0.42 barg", "pressure", "pressure 0.42 bar gauge"},
    {"p 0.42 bar g 35C", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"p 420 mbar", "pressure", "pressure 0.42 bar gauge"},
    {"p 42 kPa 308.15 K", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"p 6.1 psig", "pressure", "pressure 0.42058 bar gauge"},
    {"p -0.05 bar", "pressure", "pressure -0.05 bar gauge"},
    {"p \u22120.05 bar", "pressure", "pressure -0.05 bar gauge"},
    {"p .42 bar", "pressure", "pressure 0.42 bar gauge"},
    {"p\u00A00.42\u202Fbar\u00A035\u2009C", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"\uFEFFp 0.42 bar", "pressure", "pressure 0.42 bar gauge"},
    {"p 0.42 bar 35 C.", "pressure", "pressure 0.42 bar gauge at 35 °C"},
    {"p 0.42 bar; needle slow", "pressure", "pressure 0.42 bar gauge: 'needle slow'"},
    {"T 35 C", "temperature", "temperature 35 °C"},
    {"T35C", "temperature", "temperature 35 °C"},
    {"temp 308.15 K", "temperature", "temperature 35 °C"},
    {"temp. 35 oC", "temperature", "temperature 35 °C"},
    {"temperature 35 deg C", "temperature", "temperature 35 °C"},
    {"T = -78 °C", "temperature", "temperature -78 °C"},
    {"aliquot 50 uL", "liquid sample", "liquid sample 50 µL"},
    {"aliquot 50 µL", "liquid sample", "liquid sample 50 µL"},
    {"aliquot 50 μl", "liquid sample", "liquid sample 50 µL"},
    {"Aliquot 0,05 ML", "observation", nullptr},  // a capital M is asked about
    {"aliquot50uL S3", "liquid sample", "liquid sample 50 µL: 'S3'"},
    {"aliquot of 50 uL for NMR", "liquid sample", "liquid sample 50 µL: 'for NMR'"},
    {"aliquot for NMR 50 uL", "liquid sample", "liquid sample 50 µL: 'for NMR'"},
    {"aliquot 50 uL at 35 C into 1 mL CDCl3", "liquid sample", "liquid sample 50 µL at 35 °C: 'into 1 mL CDCl3'"},
    {"sample 50 uL", "liquid sample", "liquid sample 50 µL"},
    {"liquid sample 0.1 mL", "liquid sample", "liquid sample 100 µL"},
    {"gas 250 uL", "gas sample", "gas sample 250 µL"},
    {"gas 250 UL", "gas sample", "gas sample 250 µL"},
    {"gas sample 0.25 mL GC run 12", "gas sample", "gas sample 250 µL: 'GC run 12'"},
    {"sample gas 250 uL", "gas sample", "gas sample 250 µL"},
    {"gas 2 mL", "gas sample", "gas sample 2 mL"},
    {"h2 12.3 %", "headspace", "headspace 12.3 % H2"},
    {"H2 12,3%", "headspace", "headspace 12.3 % H2"},
    {"H₂ 12.3 vol%", "headspace", "headspace 12.3 % H2"},
    {"headspace 0.123", "headspace", "headspace 12.3 % H2"},
    {"headspace 0.123 H2 at 1.43 bar abs", "headspace", "headspace 12.3 % H2 at 1.43 bar abs"},
    {"h2 12.3% 0.42 bar g 35 C", "headspace", "headspace 12.3 % H2 at 0.42 bar gauge and 35 °C"},
    {"h2 0 %", "headspace", "headspace 0 % H2"},
    {"vent", "vent", "vent to ambient"},
    {"Vented", "vent", "vent to ambient"},
    {"vent Ar", "vent", "vent to ambient under Ar"},
    {"vent under argon", "vent", "vent to ambient under Ar"},
    {"vent to air", "vent", "vent to ambient under air"},
    {"vent to 1.02 bar abs", "vent", "vent to 1.02 bar abs"},
    {"vent; hissed for 3 s", "vent", "vent to ambient: 'hissed for 3 s'"},
    {"purge N2", "purge", "purge with N2"},
    {"purged with nitrogen for 10 min", "purge", "purge with N2: '10 min'"},
    {"purge", "purge", "purge with the gas of the seal"},
    {"add 0.2 mL acetonitrile", "liquid added", "liquid added: 200 µL acetonitrile"},
    {"added 0.2 mL of MeCN", "liquid added", "liquid added: 200 µL MeCN"},
    {"add MeCN 0.2 mL", "liquid added", "liquid added: 200 µL MeCN"},
    {"add 1.5 mL 1,4-dioxane", "liquid added", "liquid added: 1.5 mL 1,4-dioxane"},
    {"add 0.1 mL 2-MeTHF", "liquid added", "liquid added: 100 µL 2-MeTHF"},
    {"add 0.1 mL 2 M HCl in ether", "liquid added", "liquid added: 100 µL 2 M HCl in ether"},
    {"liquid added 100 uL water", "liquid added", "liquid added: 100 µL water"},
    {"add liquid 100 uL N,N-dimethylformamide", "liquid added", "liquid added: 100 µL N,N-dimethylformamide"},
    {"add gas 2 mL H2", "gas added", "gas added: 2 mL H2"},
    {"add 2 mL hydrogen", "gas added", "gas added: 2 mL H2"},
    {"gas added 0.1 mmol CO", "gas added", "gas added: 0.1 mmol CO"},
    {"add gas 2 mL CH₄ 1.013 bar abs 21 C", "gas added", "gas added: 2 mL CH4 at 1.013 bar abs and 21 °C"},
    {"collected 4.2 mL 21 C", "collected", "collected over water 4.2 mL at 21 °C, barometer at ambient"},
    {"collected 4,2 mL over water at 21 °C, barometer 1008 mbar", "collected",
     "collected over water 4.2 mL at 21 °C, barometer 1.008 bar abs"},
    {"photo vial 3.jpg", "photo", "photo 'vial 3.jpg'"},
    {"photo \"pictures/a b.png\"", "photo", "photo 'a b.png'"},
    {"note p 0.42 bar", "observation", "observation: 'p 0.42 bar'"},
    {"note: lamp looked dim", "observation", "observation: 'lamp looked dim'"},
    {"observation clear yellow", "observation", "observation: 'clear yellow'"},
    {"clear yellow, slight ppt", "observation", "observation: 'clear yellow, slight ppt'"},
    {"pH 4.3 by paper", "observation", "observation: 'pH 4.3 by paper'"},
    {"p-TsOH forgotten", "observation", "observation: 'p-TsOH forgotten'"},
    {"gas-tight syringe leaks", "observation", "observation: 'gas-tight syringe leaks'"},
    {"venting slowly", "observation", "observation: 'venting slowly'"},
    {"photos taken by KW", "observation", "observation: 'photos taken by KW'"},
    {"5 mL flask broken", "observation", "observation: '5 mL flask broken'"},
    {"bent needle", "observation", "observation: 'bent needle'"},
    {"2 h later still clear", "observation", "observation: '2 h later still clear'"},
};

/// A line that is not silently taken as text, and the characters that the doubt points at.
struct Doubted {
  const char* line;
  const char* meant;
  const char* pointed;  ///< the offending part; empty: something is missing
  const char* before;   ///< what stands before it
  bool likelyText = false;
};

const std::vector<Doubted> kDoubted = {
    {"p 0.42 bra", "pressure", "bra", "p 0.42 "},
    {"p 0,42 bra 35 C", "pressure", "bra", "p 0,42 "},
    {"p\u00A00.42\u00A0bra", "pressure", "bra", "p\u00A00.42\u00A0"},
    {"p 0.42", "pressure", "", "p 0.42"},
    {"p", "pressure", "", "p"},
    {"p 0.42 bar 35", "pressure", "", "p 0.42 bar 35"},
    {"p 0.42 bar 35 x", "pressure", "x", "p 0.42 bar 35 "},
    {"p 0.42 bar abss", "pressure", "abss", "p 0.42 bar "},
    {"p 0.42 bar 0.44 bar", "pressure", "0.44 bar", "p 0.42 bar "},
    {"p 1.2.3 bar", "pressure", ".", "p 1.2"},
    {"p 0.42 Mbar", "pressure", "Mbar", "p 0.42 "},
    {"p 0.42 mL", "pressure", "mL", "p 0.42 "},
    {"p ~0.42 bar", "pressure", "~0.42", "p "},
    {"p 1.43 bara gauge", "pressure", "gauge", "p 1.43 bara "},
    {"p -3 bar", "pressure", "-3 bar", "p "},
    {"p 0 bar abs", "pressure", "0 bar", "p "},
    {"pressure dropping", "pressure", "dropping", "pressure ", true},
    {"T 35", "temperature", "", "T 35"},
    {"T -300 C", "temperature", "-300 C", "T "},
    {"t 20 min", "temperature", "min", "t 20 "},
    {"temp probe slipped", "temperature", "probe", "temp ", true},
    {"lamp", "lamp on", "", "lamp"},
    {"lamp onn", "lamp on", "onn", "lamp "},
    {"lamp flickers badly since noon", "lamp on", "flickers badly since noon", "lamp ", true},
    {"lamp on 14:20", "lamp on", "14:20", "lamp on "},
    {"lmap on", "lamp on", "lmap", ""},
    {"aliqout 50 uL", "liquid sample", "aliqout", ""},
    {"aliquot", "liquid sample", "", "aliquot"},
    {"aliquot 50", "liquid sample", "", "aliquot 50"},
    {"aliquot 50 u", "liquid sample", "u", "aliquot 50 "},
    {"aliquot 0.05 ML", "liquid sample", "ML", "aliquot 0.05 "},
    {"aliquot fifty uL", "liquid sample", "fifty uL", "aliquot "},
    {"aliquot 0 uL", "liquid sample", "0 uL", "aliquot "},
    {"aliquot -5 uL", "liquid sample", "-5 uL", "aliquot "},
    {"aliquot 50 uL and 20 uL gas", "liquid sample", "and 20 uL gas", "aliquot 50 uL "},
    {"aliquot 50 uL gas 250 uL vent", "liquid sample", "gas 250 uL vent", "aliquot 50 uL "},
    {"aliquot 50 uL then vent", "liquid sample", "then vent", "aliquot 50 uL "},
    {"sample looks yellow", "liquid sample", "looks yellow", "sample ", true},
    {"liquid turned red", "liquid sample", "turned red", "liquid ", true},
    {"gas evolution at the stir bar", "gas sample", "evolution at the stir bar", "gas ", true},
    {"gas 250 mg", "gas sample", "mg", "gas 250 "},
    {"h2 12.3", "headspace", "12.3", "h2 "},
    {"h2 120 %", "headspace", "120 %", "h2 "},
    {"h2 12 umol", "headspace", "umol", "h2 12 "},
    {"headspace 12 % N2", "headspace", "N2", "headspace 12 % "},
    {"headspace 12 % 1.43 bar", "headspace", "", "headspace 12 % 1.43 bar"},
    {"vent xenon", "vent", "xenon", "vent "},
    {"vent Ar N2", "vent", "N2", "vent Ar "},
    {"vent to 1.02 bar", "vent", "", "vent to 1.02 bar"},
    {"vent through the long needle", "vent", "through", "vent ", true},
    {"ventt Ar", "vent", "ventt", ""},
    {"purge N22", "purge", "N22", "purge "},
    {"add 0.2 mL", "liquid added", "", "add 0.2 mL"},
    {"add 0.2 mll acetonitrile", "liquid added", "mll", "add 0.2 "},
    {"add 0.2 mL/min MeCN", "liquid added", "mL/min", "add 0.2 "},
    {"added 5 mg TEMPO", "liquid added", "mg", "added 5 "},
    {"add 0.2 mL MeCN 21 C", "liquid added", "21 C", "add 0.2 mL MeCN "},
    {"add acetonitrile", "liquid added", "acetonitrile", "add ", true},
    {"add some 0.2 mL MeCN", "liquid added", "MeCN", "add some 0.2 mL "},
    {"add gas 2 mL", "gas added", "", "add gas 2 mL"},
    {"add gas H2", "gas added", "", "add gas H2"},
    {"add gas 2 mL air", "gas added", "air", "add gas 2 mL "},
    {"collected 4.2 mL", "collected", "", "collected 4.2 mL"},
    {"collected 4.2 mL 21 C 0.1 bar gauge", "collected", "gauge", "collected 4.2 mL 21 C 0.1 bar "},
    {"photo", "photo", "", "photo"},
    {"photo pictures/", "photo", "pictures/", "photo "},
    {"note", "observation", "", "note"},
    {"0.42 bar 35 C", "pressure", "", ""},
    {"35 C", "temperature", "", ""},
    {"50 uL", "liquid sample", "", ""},
    {"12.3 %", "headspace", "", ""},
};

void checkRecord(const ReadEntry& read, const std::string& line) {
  REQUIRE(read.event.raw == line);
  REQUIRE(event_kind::isKnown(read.event.kind));
  REQUIRE(read.event.kind != event_kind::kAddendum);
  REQUIRE(!read.sentence.empty());
  REQUIRE(std::ranges::none_of(read.sentence, [](char c) { return static_cast<unsigned char>(c) < 0x20; }));
  if (!read.doubt) return;
  REQUIRE(read.event.kind == event_kind::kObservation);
  REQUIRE(read.event.note == line);
  REQUIRE(read.doubt->offset <= line.size());
  REQUIRE(read.doubt->offset + read.doubt->length <= line.size());
  REQUIRE(!read.doubt->what.empty());
  REQUIRE(!read.doubt->mend.empty());
  const bool empty = !read.event.pressure_bar && !read.event.temperature_C && !read.event.volume_uL &&
                     !read.event.amount_mmol && !read.event.fraction && read.event.gas.empty() &&
                     read.event.pressureKind.empty() && read.photo.empty();
  REQUIRE(empty);
}

std::string randomLine(std::mt19937_64& random) {
  static const std::vector<std::string> kPieces = {
      "p", "P ", "T", "lamp", " on", "off", "aliquot ", "gas ", "sample", "h2 ", "vent", "purge ", "add ", "added", "collected ",
      "photo ", "note ", " ", "  ", "0.42", "0,42", "35", "1e3", "-", "\u2212", " bar", "bar", " C", "°C", " uL", "µL", " mL", "%", " abs",
      " g", "(a)", "Ar", " N2", "H₂", "acetonitrile", "1,4-dioxane", ";", ",", "=", ":", "/", "(", "\"", "\n", "\t", "\u00A0", "\u202E",
      "\uFEFF", "mmol", " at ", "of", "to ", "14:20", "K", "and ", "M", "deg", " C", "ü", "😀"};
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
    INFO(text::pointedAt(*read.doubt, line) << "\n" << read.doubt->what << ": " << read.doubt->mend);
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
  for (const std::string line : {"  two blanks, a tab\t", "Ünïcödé and \u202Ebidi", "line\nbreak", "=SUM(A1)", "'; DROP TABLE event;--"}) {
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
  for (const char* line : {"p", "p ", "p 0.42", "p 0.42 bar 35", "lamp ", "aliquot", "aliquot 50 ", "add 0.2 mL ", "photo ", "collected 4.2 mL"}) {
    INFO(line);
    CHECK(readLogLine(line).isUnfinished());
  }
  for (const char* line : {"p 0.42 bra", "p 0.42 bar", "vent", "clear", "0.42 bar", "p 0.42 35 C"}) {
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

TEST_CASE("20,000 random lines are kept, read alike twice, and doubted within their bounds", "[log][identity]") {
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

TEST_CASE("every beginning of a shorthand is read without a silent observation", "[log][identity]") {
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
