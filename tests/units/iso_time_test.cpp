// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "units/iso_time.h"

#include <catch2/catch.hpp>

#include <random>

using namespace vialkeeper;
using namespace std::chrono;
using units::Moment;
using units::readIsoTime;
using units::toIsoText;

TEST_CASE("the examples of RFC 3339 are read as it explains them", "[units][published]") {
  // RFC 3339, section 5.8.
  const auto first = readIsoTime("1985-04-12T23:20:50.52Z");
  REQUIRE(first);
  CHECK(first->utc == sys_days{1985y / April / 12} + 23h + 20min + 50s + 520ms);
  CHECK(first->offset == 0min);

  const auto pacific = readIsoTime("1996-12-19T16:39:57-08:00");
  const auto utc = readIsoTime("1996-12-20T00:39:57Z");
  REQUIRE(pacific);
  REQUIRE(utc);
  CHECK(pacific->utc == utc->utc);
  CHECK(pacific->offset == -8h);

  const auto netherlands = readIsoTime("1937-01-01T12:00:27.87+00:20");
  REQUIRE(netherlands);
  CHECK(netherlands->utc == sys_days{1937y / January / 1} + 11h + 40min + 27s + 870ms);
}

TEST_CASE("the leap seconds of RFC 3339 are refused, for no civil clock shows them",
          "[units][published]") {
  // RFC 3339, section 5.8: 1990-12-31T23:59:60Z and its Pacific twin.
  for (const char* typed : {"1990-12-31T23:59:60Z", "1990-12-31T15:59:60-08:00"}) {
    const auto read = readIsoTime(typed);
    REQUIRE_FALSE(read);
    CHECK(read.error().offset == 11);
    CHECK(read.error().length == 8);
  }
}

TEST_CASE("known moments have the Unix time that POSIX gives them", "[units][published]") {
  // POSIX.1-2017, 4.16: the epoch; 2^31 - 1 s is 2038-01-19T03:14:07Z; 10^9 s is
  // 2001-09-09T01:46:40Z.
  const auto seconds = [](const char* typed) {
    return duration_cast<std::chrono::seconds>(readIsoTime(typed)->utc.time_since_epoch()).count();
  };
  CHECK(seconds("1970-01-01T00:00Z") == 0);
  CHECK(seconds("2001-09-09T01:46:40Z") == 1000000000);
  CHECK(seconds("2038-01-19T03:14:07Z") == 2147483647);
  CHECK(seconds("2000-02-29T00:00:00Z") == 951782400);
}

TEST_CASE("a time may lack seconds and have a blank for its T", "[units]") {
  const auto full = readIsoTime("2026-03-04T14:20:00+01:00");
  REQUIRE(full);
  for (const char* typed : {"2026-03-04T14:20+01:00", "2026-03-04 14:20+01:00",
                            "2026-03-04T14:20:00.000+0100", "2026-03-04T14:20:00.0009+01:00"}) {
    INFO(typed);
    REQUIRE(readIsoTime(typed));
    CHECK(*readIsoTime(typed) == *full);
  }
}

TEST_CASE("a time without offset, out of the calendar or with more behind is refused", "[units]") {
  for (const char* typed : {"",
                            "2026-03-04",
                            "2026-03-04T14:20",
                            "2026-03-04T14:20:05",
                            "2026-02-29T00:00Z",
                            "2026-13-01T00:00Z",
                            "2026-00-10T00:00Z",
                            "2026-04-31T00:00Z",
                            "2026-03-04T24:00Z",
                            "2026-03-04T23:60Z",
                            "2026-03-04T1:20Z",
                            "26-03-04T14:20Z",
                            "2026-3-4T14:20Z",
                            "2026-03-04T14:20:05.Z",
                            "2026-03-04T14:20:05+1",
                            "2026-03-04T14:20:05+01",
                            "2026-03-04T14:20:05+15:00",
                            "2026-03-04T14:20:05+01:60",
                            "2026-03-04T14:20:05Zx",
                            "2026-03-04T14:20:05 CET",
                            "2026/03/04T14:20Z",
                            "2100-02-29T00:00Z"}) {
    INFO(typed);
    const auto read = readIsoTime(typed);
    REQUIRE_FALSE(read);
    CHECK(read.error().offset <= std::string_view(typed).size());
  }
  CHECK(readIsoTime("2026-03-04T14:20:05").error().what == "the offset from UTC is missing");
  CHECK(readIsoTime("2026-02-30T00:00Z").error().what == "there is no such day in the calendar");
}

TEST_CASE("a day is read alone", "[units]") {
  CHECK(*units::readIsoDate("2024-02-29") == year_month_day{2024y / February / 29});
  for (const char* typed :
       {"2023-02-29", "2024-02-29T00:00Z", "20240229", "2024-2-29", " 2024-02-29", ""}) {
    INFO(typed);
    CHECK_FALSE(units::readIsoDate(typed));
  }
}

TEST_CASE("a moment written out is read back as itself, 3000 times", "[units][identity]") {
  std::mt19937_64 random(9);
  const auto from = sys_days{1900y / January / 1}.time_since_epoch();
  const auto to = sys_days{2200y / January / 1}.time_since_epoch();
  std::uniform_int_distribution<long long> when(milliseconds(from).count(),
                                                milliseconds(to).count());
  std::uniform_int_distribution<int> offset(-14 * 60, 14 * 60);
  for (int round = 0; round < 3000; ++round) {
    const Moment moment{sys_time<milliseconds>{milliseconds{when(random)}},
                        minutes{offset(random)}};
    INFO(toIsoText(moment));
    const auto read = readIsoTime(toIsoText(moment));
    REQUIRE(read);
    REQUIRE(*read == moment);
  }
  CHECK(toIsoText(*readIsoTime("2026-03-04T14:20:05+01:00")) == "2026-03-04T14:20:05+01:00");
  CHECK(toIsoText(*readIsoTime("2026-03-04T14:20:05.25-03:30")) == "2026-03-04T14:20:05.250-03:30");
}
