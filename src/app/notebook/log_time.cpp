// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/log_time.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <optional>
#include <utility>
#include <vector>

#include "app/notebook/log_line_words.h"
#include "text/utf8.h"
#include "units/quantity_text.h"
#include "units/shown.h"

namespace vialkeeper::app {
namespace {

using namespace std::chrono;
using text::TextFault;
using text::textFault;
using units::Moment;

constexpr const char* kForms =
    "write it like 14:20, yesterday 17:05, 20 min ago or 2026-03-04T14:20+01:00";
constexpr hours kLate{24};
constexpr hours kFurthest{24 * 36525};

// Words for the units of time beside those of the unit table.
constexpr auto kTimeWords =
    std::to_array<std::pair<std::string_view, std::string_view>>({{"mins", "min"},
                                                                  {"minute", "min"},
                                                                  {"minutes", "min"},
                                                                  {"m", "min"},
                                                                  {"hour", "h"},
                                                                  {"hours", "h"},
                                                                  {"hr", "h"},
                                                                  {"hrs", "h"},
                                                                  {"sec", "s"},
                                                                  {"secs", "s"},
                                                                  {"second", "s"},
                                                                  {"seconds", "s"},
                                                                  {"day", "d"},
                                                                  {"days", "d"}});

bool isDigit(char c) { return c >= '0' && c <= '9'; }

/// Time since midnight of `9:05`, `14:20` or `14:20:30`, the whole of the text.
std::expected<seconds, TextFault> readTimeOfDay(std::string_view text, std::size_t begin,
                                                std::size_t end) {
  std::array<int, 3> parts{};
  std::size_t count = 0;
  std::size_t at = begin;
  while (at < end && count < parts.size()) {
    const std::size_t first = at;
    for (; at < end && at < first + 2 && isDigit(text[at]); ++at) {
      parts[count] = parts[count] * 10 + (text[at] - '0');
    }
    if (at == first || (count > 0 && at != first + 2)) {
      return textFault(first, end - first, "this is no time of day", kForms);
    }
    ++count;
    if (at == end) break;
    if (text[at] != ':') return textFault(at, end - at, "this is no time of day", kForms);
    ++at;
  }
  if (count < 2 || at != end || text[end - 1] == ':') {
    return textFault(std::min(at, end), end - std::min(at, end), "this is no time of day", kForms);
  }
  if (parts[0] > 23 || parts[1] > 59 || parts[2] > 59) {
    return textFault(begin, end - begin, "there is no such time of day", "write 0:00 to 23:59");
  }
  return hours{parts[0]} + minutes{parts[1]} + seconds{parts[2]};
}

/// A span as people write it, with blanks and the table's units put in; and where each byte came
/// from.
struct PlainSpan {
  std::string text;
  std::vector<std::size_t> from;

  void add(std::string_view piece, std::size_t origin, std::size_t written) {
    for (std::size_t i = 0; i < piece.size(); ++i) from.push_back(origin + std::min(i, written));
    text += piece;
  }
};

PlainSpan plainSpan(std::string_view text, std::size_t begin, std::size_t end) {
  PlainSpan plain;
  for (std::size_t at = begin; at < end;) {
    if (const std::size_t blank = blankLength(text, at)) {
      plain.add(" ", at, blank);
      at += blank;
      continue;
    }
    std::size_t next = numberEnd(text, at);
    if (next > at) {
      if (!plain.text.empty() && !plain.text.ends_with(' ')) plain.add(" ", at, 0);
      plain.add(text.substr(at, next - at), at, next - at);
      at = next;
      continue;
    }
    do ++next;
    while (next < end && blankLength(text, next) == 0 && !isDigit(text[next]));
    const std::string word =
        text::asciiLowered(text.substr(at, std::min<std::size_t>(next - at, 12)));
    const auto known =
        std::ranges::find(kTimeWords, word, &std::pair<std::string_view, std::string_view>::first);
    plain.add(known == kTimeWords.end() ? text.substr(at, next - at) : known->second, at,
              next - at);
    at = next;
  }
  return plain;
}

/// The span before `ago`.
std::expected<milliseconds, TextFault> readSpan(std::string_view text, std::size_t begin,
                                                std::size_t end) {
  const PlainSpan plain = plainSpan(text, begin, end);
  const auto span = units::readQuantity<units::Duration>(plain.text, units::Dialect::kPerson,
                                                         units::Range::kNonNegative);
  if (!span) {
    TextFault fault = span.error();
    const auto inText = [&](std::size_t place) {
      return place < plain.from.size() ? plain.from[place] : end;
    };
    const std::size_t last = inText(fault.offset + fault.length);
    fault.offset = inText(fault.offset);
    fault.length = fault.length == 0 ? 0 : std::max(last, fault.offset) - fault.offset;
    return std::unexpected(std::move(fault));
  }
  if (span->seconds() > duration<double>(kFurthest).count()) {
    return textFault(begin, end - begin, "more than 100 years ago", "check the figure");
  }
  return milliseconds{std::llround(span->seconds() * 1e3)};
}

std::string clockOf(const Moment& moment) {
  const auto local = moment.utc + moment.offset;
  const hh_mm_ss time{floor<seconds>(local - floor<days>(local))};
  std::string text = fmt::format("{:02}:{:02}", time.hours().count(), time.minutes().count());
  if (time.seconds().count() != 0) text += fmt::format(":{:02}", time.seconds().count());
  return text;
}

std::string spanOf(milliseconds span) {
  if (span >= days{2}) return fmt::format("{} d", floor<days>(span).count());
  // Whole minutes that are over, like a clock, not the nearest.
  const seconds whole = span >= hours{1} ? seconds{floor<minutes>(span)} : floor<seconds>(span);
  return units::shown(units::Duration::fromSeconds(static_cast<double>(whole.count())));
}

/// The day in words where it is this or the last, by the offset of now.
std::string dayAndTime(const Moment& at, const Moment& now) {
  if (at.offset != now.offset) return units::toIsoText(at);
  const auto gone = floor<days>(now.utc + now.offset) - floor<days>(at.utc + at.offset);
  if (gone == days{0}) return "today " + clockOf(at);
  if (gone == days{1}) return "yesterday " + clockOf(at);
  return units::toIsoText(at);
}

/// Reads one of the forms; what the forms have in common is checked behind.
class TimeReader {
 public:
  TimeReader(std::string_view text, const Moment& now) : m_text(text), m_now(now) {
    m_begin = skipBlanks(text, 0);
    m_end = std::max(trimmedEnd(text), m_begin);
  }

  std::expected<LogTime, TextFault> run() const {
    const auto at = readMoment();
    if (!at) return std::unexpected(at.error());
    if (at->utc > m_now.utc) return stillToCome(*at);
    const milliseconds back = m_now.utc - at->utc;
    if (back > kFurthest)
      return textFault(m_begin, m_end - m_begin, "more than 100 years ago", "check the year");
    LogTime read{.at = *at, .late = back > kLate, .sentence = dayAndTime(*at, m_now)};
    if (back >= seconds{1}) read.sentence += fmt::format(" ({} ago)", spanOf(back));
    return read;
  }

 private:
  std::expected<Moment, TextFault> readMoment() const {
    const std::string_view trimmed = m_text.substr(m_begin, m_end - m_begin);
    if (trimmed.empty()) return textFault(m_begin, 0, "the time is missing", kForms);
    const std::string lowered = text::asciiLowered(trimmed.substr(0, 64));
    if (lowered == "now") return m_now;
    if (lowered.starts_with("today")) return onDay(days{0}, 5);
    if (lowered.starts_with("yesterday")) return onDay(days{1}, 9);
    if (lowered == "ago" || (trimmed.size() <= 64 && lowered.ends_with("ago"))) {
      const auto span = readSpan(m_text, m_begin, m_end - 3);
      if (!span) return std::unexpected(span.error());
      return Moment{m_now.utc - *span, m_now.offset};
    }
    const std::size_t digits = std::min(trimmed.find_first_not_of("0123456789"), trimmed.size());
    if (digits == 4 && trimmed.substr(4).starts_with('-')) return readIso(trimmed);
    if (digits == 0) return textFault(m_begin, m_end - m_begin, "this time cannot be read", kForms);
    if (digits <= 2 && trimmed.substr(digits).starts_with(':')) return onDay(days{0}, 0);
    return bareSpan(digits);
  }

  std::expected<Moment, TextFault> onDay(days back, std::size_t wordLength) const {
    const std::size_t begin = std::min(skipBlanks(m_text, m_begin + wordLength), m_end);
    if (begin == m_end) return textFault(m_end, 0, "the time of day is missing", kForms);
    const auto time = readTimeOfDay(m_text, begin, m_end);
    if (!time) return std::unexpected(time.error());
    const auto midnight = floor<days>(m_now.utc + m_now.offset) - back;
    return Moment{midnight + *time - m_now.offset, m_now.offset};
  }

  std::expected<Moment, TextFault> readIso(std::string_view trimmed) const {
    auto read = units::readIsoTime(trimmed);
    if (read) return *read;
    TextFault fault = read.error();
    fault.offset = std::min(fault.offset + m_begin, m_end);
    fault.length = std::min(fault.length, m_end - fault.offset);
    return std::unexpected(std::move(fault));
  }

  /// `20 min` without `ago`, or something else that begins with a figure.
  std::expected<Moment, TextFault> bareSpan(std::size_t digits) const {
    if (m_end - m_begin <= 64 && readSpan(m_text, m_begin, m_end)) {
      return textFault(m_end, 0, "ago is missing behind the time span", "write it like 20 min ago");
    }
    return textFault(m_begin + digits, m_end - m_begin - digits, "this time cannot be read",
                     kForms);
  }

  std::unexpected<TextFault> stillToCome(const Moment& at) const {
    return textFault(
        m_begin, m_end - m_begin,
        fmt::format("{} is still to come, for it is {} now", dayAndTime(at, m_now), clockOf(m_now)),
        at.utc - m_now.utc <= hours{24} && at.offset == m_now.offset
            ? fmt::format("give an earlier time, or yesterday {} if that is meant", clockOf(at))
            : std::string("give the time at which it happened"));
  }

  std::string_view m_text;
  const Moment& m_now;
  std::size_t m_begin = 0;
  std::size_t m_end = 0;
};

}  // namespace

std::expected<LogTime, text::TextFault> readLogTime(std::string_view text, const Moment& now) {
  return TimeReader(text, now).run();
}

}  // namespace vialkeeper::app
