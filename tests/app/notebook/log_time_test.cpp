// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/log_time.h"

#include <catch2/catch.hpp>

#include <random>
#include <string>
#include <vector>

using namespace vialkeeper;
using app::readLogTime;
using units::Moment;

namespace {

Moment moment(const char* iso) { return *units::readIsoTime(iso); }

const Moment kNow = moment("2026-03-04T14:20:30+01:00");

}  // namespace

TEST_CASE("the time of an entry is read against the moment of writing", "[log]") {
  struct Row {
    const char* text;
    const char* at;
    bool late;
    const char* sentence;
  };
  const std::vector<Row> rows = {
      {"now", "2026-03-04T14:20:30+01:00", false, "today 14:20:30"},
      {" NOW ", "2026-03-04T14:20:30+01:00", false, "today 14:20:30"},
      {"14:20", "2026-03-04T14:20:00+01:00", false, "today 14:20 (0 min 30 s ago)"},
      {"14:20:30", "2026-03-04T14:20:30+01:00", false, "today 14:20:30"},
      {"9:05", "2026-03-04T09:05:00+01:00", false, "today 09:05 (5 h 15 min ago)"},
      {"0:00", "2026-03-04T00:00:00+01:00", false, "today 00:00 (14 h 20 min ago)"},
      {"today 9:05", "2026-03-04T09:05:00+01:00", false, "today 09:05 (5 h 15 min ago)"},
      {"yesterday 17:05", "2026-03-03T17:05:00+01:00", false, "yesterday 17:05 (21 h 15 min ago)"},
      {"Yesterday  9:00", "2026-03-03T09:00:00+01:00", true, "yesterday 09:00 (29 h 20 min ago)"},
      {"20 min ago", "2026-03-04T14:00:30+01:00", false, "today 14:00:30 (20 min ago)"},
      {"20min ago", "2026-03-04T14:00:30+01:00", false, "today 14:00:30 (20 min ago)"},
      {"1 h 20 min ago", "2026-03-04T13:00:30+01:00", false, "today 13:00:30 (1 h 20 min ago)"},
      {"1h20min ago", "2026-03-04T13:00:30+01:00", false, "today 13:00:30 (1 h 20 min ago)"},
      {"1,5 hours ago", "2026-03-04T12:50:30+01:00", false, "today 12:50:30 (1 h 30 min ago)"},
      {"2 Hours 10 Minutes ago", "2026-03-04T12:10:30+01:00", false,
       "today 12:10:30 (2 h 10 min ago)"},
      {"90s ago", "2026-03-04T14:19:00+01:00", false, "today 14:19 (1 min 30 s ago)"},
      {"0 min ago", "2026-03-04T14:20:30+01:00", false, "today 14:20:30"},
      {"24 h ago", "2026-03-03T14:20:30+01:00", false, "yesterday 14:20:30 (24 h ago)"},
      {"24 h 1 s ago", "2026-03-03T14:20:29+01:00", true, "yesterday 14:20:29 (24 h ago)"},
      {"3 days ago", "2026-03-01T14:20:30+01:00", true, "2026-03-01T14:20:30+01:00 (3 d ago)"},
      {"2026-03-04T14:20+01:00", "2026-03-04T14:20:00+01:00", false,
       "today 14:20 (0 min 30 s ago)"},
      {"2026-03-04 13:20:30Z", "2026-03-04T13:20:30Z", false, "2026-03-04T13:20:30+00:00"},
      {"2026-02-01T08:00+01:00", "2026-02-01T08:00:00+01:00", true,
       "2026-02-01T08:00:00+01:00 (31 d ago)"},
  };
  for (const Row& row : rows) {
    INFO(row.text);
    const auto read = readLogTime(row.text, kNow);
    REQUIRE(read);
    CHECK(read->at == moment(row.at));
    CHECK(read->late == row.late);
    CHECK(read->sentence == row.sentence);
  }
}

TEST_CASE("a time that cannot be is refused at the right character", "[log]") {
  struct Row {
    const char* text;
    const char* pointed;
    const char* what;
  };
  const std::vector<Row> rows = {
      {"", "", "the time is missing"},
      {"  ", "", "the time is missing"},
      {"14:21", "14:21", "today 14:21 is still to come, for it is 14:20:30 now"},
      {"23:59", "23:59", "today 23:59 is still to come, for it is 14:20:30 now"},
      {"today 15:00", "today 15:00", "today 15:00 is still to come, for it is 14:20:30 now"},
      {"2026-03-05T00:00+01:00", "2026-03-05T00:00+01:00",
       "2026-03-05T00:00:00+01:00 is still to come, for it is 14:20:30 now"},
      {"yesterday", "", "the time of day is missing"},
      {"yesterday 25:00", "25:00", "there is no such time of day"},
      {"14:60", "14:60", "there is no such time of day"},
      {"14:2", "2", "this is no time of day"},
      {"14:20x", "x", "this is no time of day"},
      {"14:20 pm", " pm", "this is no time of day"},
      {"14:20:", "", "this is no time of day"},
      {"yesterday noon", "noon", "this is no time of day"},
      {"20 min", "", "ago is missing behind the time span"},
      {"20 bra ago", "bra", "unit 'bra' is not known here"},
      {"20 mg ago", "mg", "mg is a mass, but a time span is wanted"},
      {"1 h 20 bra ago", "bra", "unit 'bra' is not known here"},
      {"1h20bra ago", "bra", "unit 'bra' is not known here"},
      {"-5 min ago", "-5 min", "a negative value"},
      {"ago", "", "no number here"},
      {"some time ago", "some time", "no number here"},
      {"2026-03-04T14:20", "", "the offset from UTC is missing"},
      {"2026-02-30T14:20Z", "2026-02-30", "there is no such day in the calendar"},
      {"1900-01-01T00:00Z", "1900-01-01T00:00Z", "more than 100 years ago"},
      {"9999999 d ago", "9999999 d ", "more than 100 years ago"},
      {"1e300 h ago", "1e300 h ", "more than 100 years ago"},
      {"tomorrow", "tomorrow", "this time cannot be read"},
      {"3", "", "this time cannot be read"},
  };
  for (const Row& row : rows) {
    INFO(row.text);
    const std::string text = row.text;
    const auto read = readLogTime(text, kNow);
    REQUIRE(!read);
    CHECK(read.error().what == row.what);
    REQUIRE(read.error().offset + read.error().length <= text.size());
    CHECK(text::whatWithPosition(read.error(), text).starts_with(row.what));
    const std::string pointed = text.substr(read.error().offset, read.error().length);
    CHECK(pointed.substr(0, pointed.find_last_not_of(' ') + 1) ==
          std::string(row.pointed).substr(0, std::string(row.pointed).find_last_not_of(' ') + 1));
    CHECK(!read.error().mend.empty());
  }
}

TEST_CASE("a time of day that is still to come offers yesterday's", "[log]") {
  CHECK(readLogTime("17:05", kNow).error().mend ==
        "give an earlier time, or yesterday 17:05 if that is meant");
}

TEST_CASE("the day is that of the local offset", "[log]") {
  const Moment west = moment("2026-03-04T23:30:00-08:00");
  CHECK(readLogTime("23:00", west)->at == moment("2026-03-04T23:00:00-08:00"));
  CHECK(readLogTime("yesterday 23:45", west)->at == moment("2026-03-03T23:45:00-08:00"));
  const Moment east = moment("2026-01-01T00:10:00+13:00");
  CHECK(readLogTime("yesterday 23:59", east)->at == moment("2025-12-31T23:59:00+13:00"));
  CHECK(!readLogTime("23:59", east));
  CHECK(readLogTime("20 min ago", east)->at == moment("2025-12-31T23:50:00+13:00"));
}

TEST_CASE("random texts for a time never lie ahead of now and read alike twice",
          "[log][identity]") {
  std::mt19937_64 random(7);
  const std::vector<std::string> pieces = {
      "now", "today ",     "yesterday ", "14",     ":", "20",  "9",      " ", "min", " h", "ago",
      "-",   "2026-03-04", "T",          "+01:00", "Z", "1,5", "\u00A0", "ü", ".",   "e9", "days "};
  std::size_t understood = 0;
  for (int round = 0; round < 20000; ++round) {
    std::string text;
    const std::size_t count = random() % 8;
    for (std::size_t i = 0; i < count; ++i) {
      if (random() % 8 == 0) {
        text += static_cast<char>(random() % 256);
      } else {
        text += pieces[random() % pieces.size()];
      }
    }
    CAPTURE(text);
    const auto read = readLogTime(text, kNow);
    const auto again = readLogTime(text, kNow);
    REQUIRE(read.has_value() == again.has_value());
    if (read) {
      ++understood;
      REQUIRE(read->at.utc <= kNow.utc);
      REQUIRE(read->at == again->at);
      REQUIRE(read->late == (kNow.utc - read->at.utc > std::chrono::hours{24}));
    } else {
      REQUIRE(read.error().offset + read.error().length <= text.size());
    }
  }
  CHECK(understood > 100);
}
