// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "units/iso_time.h"

#include <fmt/format.h>

#include <optional>

#include "text/utf8.h"

namespace vialkeeper::units {
namespace {

using text::textFault;
using text::TextFault;
using namespace std::chrono;

constexpr const char* kForm = "write it as 2026-03-04T14:20:05+01:00";

struct Cursor {
  std::string_view text;
  std::size_t at = 0;

  bool skip(char c) {
    if (at >= text.size() || text[at] != c) return false;
    ++at;
    return true;
  }
  /// Exactly `count` digits.
  std::optional<int> digits(std::size_t count) {
    if (at + count > text.size()) return std::nullopt;
    int value = 0;
    for (std::size_t i = at; i < at + count; ++i) {
      if (text[i] < '0' || text[i] > '9') return std::nullopt;
      value = value * 10 + (text[i] - '0');
    }
    at += count;
    return value;
  }
};

using Unread = std::unexpected<TextFault>;

Unread unreadable(const Cursor& cursor) {
  return textFault(cursor.at, cursor.text.size() - cursor.at,
                   "this is no date and time of ISO 8601", kForm);
}

std::expected<year_month_day, TextFault> scanDate(Cursor& cursor) {
  const std::size_t begin = cursor.at;
  const auto y = cursor.digits(4);
  const bool dash1 = y && cursor.skip('-');
  const auto m = dash1 ? cursor.digits(2) : std::nullopt;
  const bool dash2 = m && cursor.skip('-');
  const auto d = dash2 ? cursor.digits(2) : std::nullopt;
  if (!d) return textFault(cursor.at, 1, "this is no date of ISO 8601", "write it as 2026-03-04");
  const year_month_day date{year{*y}, month{static_cast<unsigned>(*m)},
                            day{static_cast<unsigned>(*d)}};
  if (!date.ok()) {
    return textFault(begin, cursor.at - begin, "there is no such day in the calendar",
                     "check month and day");
  }
  return date;
}

/// Time of day since midnight; the fraction of a second is kept to the millisecond.
std::expected<milliseconds, TextFault> scanTimeOfDay(Cursor& cursor) {
  const std::size_t begin = cursor.at;
  const auto h = cursor.digits(2);
  const auto m = h && cursor.skip(':') ? cursor.digits(2) : std::nullopt;
  if (!m) return unreadable(cursor);
  int s = 0;
  int ms = 0;
  if (cursor.skip(':')) {
    const auto whole = cursor.digits(2);
    if (!whole) return unreadable(cursor);
    s = *whole;
    if (cursor.skip('.')) {
      int scale = 100;
      std::size_t places = 0;
      while (const auto digit = cursor.digits(1)) {
        ms += *digit * scale;
        scale /= 10;
        ++places;
      }
      if (places == 0) return unreadable(cursor);
    }
  }
  if (*h > 23 || *m > 59 || s > 59) {
    return textFault(begin, cursor.at - begin, "there is no such time of day",
                     "write 00:00:00 to 23:59:59");
  }
  return hours{*h} + minutes{*m} + seconds{s} + milliseconds{ms};
}

std::expected<minutes, TextFault> scanOffset(Cursor& cursor) {
  if (cursor.skip('Z')) return minutes{0};
  const std::size_t begin = cursor.at;
  const bool east = cursor.skip('+');
  if (!east && !cursor.skip('-')) {
    return textFault(begin, cursor.text.size() - begin, "the offset from UTC is missing",
                     "end with Z or an offset such as +01:00");
  }
  const auto h = cursor.digits(2);
  if (h) (void)cursor.skip(':');
  const auto m = h ? cursor.digits(2) : std::nullopt;
  if (!m || *h > 14 || *m > 59) {
    return textFault(begin, cursor.text.size() - begin, "this is no offset from UTC",
                     "write an offset such as +01:00");
  }
  const minutes offset = hours{*h} + minutes{*m};
  return east ? offset : -offset;
}

}  // namespace

std::expected<Moment, TextFault> readIsoTime(std::string_view text) {
  Cursor cursor{text};
  const auto date = scanDate(cursor);
  if (!date) return std::unexpected(date.error());
  if (!cursor.skip('T') && !cursor.skip(' ')) return unreadable(cursor);
  const auto time = scanTimeOfDay(cursor);
  if (!time) return std::unexpected(time.error());
  const auto offset = scanOffset(cursor);
  if (!offset) return std::unexpected(offset.error());
  if (cursor.at != text.size()) return unreadable(cursor);
  return Moment{sys_days{*date} + *time - *offset, *offset};
}

std::expected<year_month_day, TextFault> readIsoDate(std::string_view text) {
  Cursor cursor{text};
  auto date = scanDate(cursor);
  if (date && cursor.at != text.size()) {
    return textFault(cursor.at, text.size() - cursor.at, "more follows after the date",
                     "write it as 2026-03-04");
  }
  return date;
}

std::string toIsoText(const Moment& moment) {
  const auto local = moment.utc + moment.offset;
  const auto midnight = floor<days>(local);
  const year_month_day date{midnight};
  const hh_mm_ss time{local - midnight};
  std::string text =
      fmt::format("{:04}-{:02}-{:02}T{:02}:{:02}:{:02}", static_cast<int>(date.year()),
                  static_cast<unsigned>(date.month()), static_cast<unsigned>(date.day()),
                  time.hours().count(), time.minutes().count(), time.seconds().count());
  if (time.subseconds().count() != 0) text += fmt::format(".{:03}", time.subseconds().count());
  const auto offset = abs(moment.offset);
  return text + fmt::format("{}{:02}:{:02}", moment.offset < minutes{0} ? '-' : '+',
                            offset / hours{1}, (offset % hours{1}).count());
}

}  // namespace vialkeeper::units
