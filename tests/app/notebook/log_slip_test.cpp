// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/log_slip.h"

#include <algorithm>
#include <catch2/catch.hpp>
#include <string>

#include "app/notebook/log_line.h"
#include "app/notebook/log_line_kinds.h"

using namespace vialkeeper;
using namespace vialkeeper::app;
using units::Pressure;
using units::Volume;

namespace {

/// An 11.6 mL vial with a bar in it, rated 2 bar, 2 mL of liquid, planned at 35 °C.
VialContext vial() {
  return {.vial = Volume::fromMillilitres(11.6),
          .displaced = Volume::fromMillilitres(0.15),
          .liquid = Volume::fromMillilitres(2.0),
          .ratedGauge = Pressure::fromBar(2.0),
          .planned = units::Temperature::fromCelsius(35.0),
          .created = *units::readIsoTime("2026-03-04T14:00:30+01:00")};
}

std::vector<LogSlip> slips(const std::string& line, const VialContext& context = vial()) {
  ReadEntry entry = readLogLine(line);
  INFO(line);
  REQUIRE_FALSE(entry.doubt);
  entry.event.at = context.created;
  return logSlips(context, entry.event);
}

/// `slip-pressure: 420 mbar`, one for each slip.
std::string told(const std::string& line, const VialContext& context = vial()) {
  std::string text;
  for (const LogSlip& slip : slips(line, context)) {
    text += (text.empty() ? "" : " ; ") + std::string(toText(slip.kind)) + ": " + slip.likelyText;
    CHECK_FALSE(slip.what.empty());
    CHECK((slip.likelyText.empty() ? slip.ask == "is the figure right?"
                                   : slip.ask == "did you mean " + slip.likelyText + "?"));
  }
  return text;
}

}  // namespace

TEST_CASE("what happens in a vial every day draws no question", "[log][slip]") {
  for (const char* line : {"p 0.42 bar 35 C",
                           "p 1.43 bar abs",
                           "p 2 bar",
                           "p -0.05 bar",
                           "T 35 C",
                           "T -78 C",
                           "T 250 C",
                           "aliquot 50 uL S3",
                           "aliquot 2 mL",
                           "gas 250 uL",
                           "vent",
                           "purge N2",
                           "add 0.2 mL acetonitrile",
                           "add 9.4 mL water",
                           "add gas 2 mL H2",
                           "add gas 10 mL H2 1.013 bar abs 21 C",
                           "collected 4.2 mL 21 C 1008 mbar",
                           "h2 12.3 %",
                           "headspace 0.123 1.43 bar abs",
                           "lamp on",
                           "note p 420 bar"}) {
    INFO(line);
    CHECK(told(line).empty());
  }
}

TEST_CASE("a pressure above the vial's rating is questioned with what was probably meant",
          "[log][slip]") {
  CHECK(told("p 420 bar") == "slip-pressure: 420 mbar");
  CHECK(told("p 0.42 bar 350 C") == "slip-temperature: 35 °C");
  CHECK(told("p 42 bar") == "slip-pressure: 42 kPa");
  CHECK(told("p 4,2 bar 35 C") == "slip-pressure: 0.42 bar");
  CHECK(told("p 1013 bar abs") == "slip-pressure: 1013 mbar");
  CHECK(told("p 101.3 bar abs") == "slip-pressure: 101.3 kPa");
  CHECK(told("headspace 0.123 143 bar abs") == "slip-pressure: 143 kPa");
  // A little above the rating is a danger, hardly a slip.
  CHECK(told("p 2.3 bar") == "slip-pressure: ");
  CHECK(slips("p 420 bar").front().what ==
        "420 bar gauge is above the vial's rating of 2.00 bar gauge");
}

TEST_CASE("without a rating only what no glass holds is questioned", "[log][slip]") {
  VialContext unrated = vial();
  unrated.ratedGauge.reset();
  CHECK(told("p 4.2 bar", unrated).empty());
  CHECK(told("p 10 bar", unrated).empty());
  CHECK(told("p 420 bar", unrated) == "slip-pressure: 420 mbar");
  CHECK(told("p 420 bar", VialContext{}) == "slip-pressure: 420 mbar");
}

TEST_CASE("a barometer is questioned outside of what air is anywhere", "[log][slip]") {
  CHECK(told("collected 4.2 mL 21 C 1008 bar") == "slip-pressure: 1008 mbar");
  CHECK(told("collected 4.2 mL 21 C 100.8 mbar") == "slip-pressure: 100.8 kPa");
  CHECK(told("collected 4.2 mL 21 C 800 mbar").empty());
}

TEST_CASE("temperatures outside -100 to 250 °C are questioned", "[log][slip]") {
  CHECK(told("T 308 C") == "slip-temperature: 308 K");
  CHECK(told("T 35 K") == "slip-temperature: 35 °C");
  CHECK(told("lamp on at 350 C") == "slip-temperature: 35 °C");
  CHECK(told("T 251 C") == "slip-temperature: 25.1 °C");
  CHECK(told("T -101 C") != "");
}

TEST_CASE("volumes are held against the liquid, the vial and the room that is left",
          "[log][slip]") {
  CHECK(told("aliquot 50 mL") == "slip-liquid-sample: 50 uL");
  CHECK(told("aliquot 0.2 L") == "slip-liquid-sample: 0.2 mL");
  CHECK(told("aliquot 2.2 mL") == "slip-liquid-sample: ");
  CHECK(told("gas 250 mL") == "slip-gas-sample: 250 uL");
  CHECK(told("gas 11.6 mL").empty());
  CHECK(told("add 9.5 mL water") == "slip-liquid-added: ");
  CHECK(told("add 200 mL water") == "slip-liquid-added: 200 uL");
  CHECK(told("add gas 2 L H2") == "slip-gas-amount: 2 mL");
  CHECK(told("collected 4.2 L 21 C") == "slip-gas-amount: 4.2 mL");
  VialContext nearlyEmpty = vial();
  nearlyEmpty.liquid = Volume::fromMicrolitres(40.0);
  CHECK(told("aliquot 50 uL", nearlyEmpty) == "slip-liquid-sample: ");
  // Nothing is known of the vial: only the liquid can be held against.
  CHECK(told("gas 250 mL", {.liquid = Volume::fromMillilitres(2.0)}).empty());
}

TEST_CASE("a time before the run was set up is questioned, to the minute", "[log][slip]") {
  EventRecord event = readLogLine("lamp on").event;
  event.at = *units::readIsoTime("2026-03-04T14:00+01:00");
  CHECK(logSlips(vial(), event).empty());
  event.at = *units::readIsoTime("2026-03-04T13:59+01:00");
  const auto asked = logSlips(vial(), event);
  REQUIRE(asked.size() == 1);
  CHECK(toText(asked.front().kind) == "slip-time");
  CHECK(asked.front().ask == "is the time right?");
}
