// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "text/utf8.h"

#include <catch2/catch.hpp>

#include <random>

#include "text/text_fault.h"

using namespace vialkeeper;
using namespace std::string_literals;
using text::firstInvalidUtf8;
using text::oneLine;

TEST_CASE("every code point but the surrogates is written and read back", "[text][identity]") {
  for (char32_t value = 0; value <= 0x10FFFF; value += value < 0x3000 ? 1 : 61) {
    std::string bytes;
    text::appendUtf8(bytes, value);
    const bool surrogate = value >= 0xD800 && value <= 0xDFFF;
    REQUIRE(firstInvalidUtf8(bytes).has_value() == surrogate);
    if (surrogate) continue;
    const auto point = text::codePointAt(bytes, 0);
    REQUIRE(point.value == value);
    REQUIRE(point.length == bytes.size());
  }
}

TEST_CASE("code points have the bytes that the Unicode Standard prints", "[text][published]") {
  // The Unicode Standard, table 3-4 (examples of the encoding forms): 004D, 0430, 4E8C, 10302.
  const auto bytesOf = [](char32_t value) {
    std::string bytes;
    text::appendUtf8(bytes, value);
    return bytes;
  };
  CHECK(bytesOf(0x004D) == "\x4D");
  CHECK(bytesOf(0x0430) == "\xD0\xB0");
  CHECK(bytesOf(0x4E8C) == "\xE4\xBA\x8C");
  CHECK(bytesOf(0x10302) == "\xF0\x90\x8C\x82");
}

TEST_CASE("overlong forms, surrogates, stray and cut sequences are not UTF-8",
          "[text][published]") {
  // The Unicode Standard, table 3-7 and the ill-formed examples of D92.
  for (const auto& bad :
       {"\xC0\xAF"s, "\xC1\xBF"s, "\xE0\x9F\xBF"s, "\xF0\x8F\xBF\xBF"s, "\xED\xA0\x80"s,
        "\xED\xBF\xBF"s, "\xF4\x90\x80\x80"s, "\xF5\x80\x80\x80"s, "\x80"s, "\xBF"s, "\xC2"s,
        "\xE2\x82"s, "\xF0\x9F\x92"s, "\xC2\x41"s, "\xFE"s, "\xFF"s}) {
    INFO(oneLine(bad));
    CHECK(firstInvalidUtf8(bad) == 0U);
    CHECK(firstInvalidUtf8("abµ" + bad) == 4U);
  }
  CHECK_FALSE(firstInvalidUtf8(
      "\xC2\x80 \xE0\xA0\x80 \xED\x9F\xBF \xEE\x80\x80 \xF0\x90\x80\x80 \xF4\x8F\xBF\xBF"));
}

TEST_CASE("characters are counted, not bytes", "[text]") {
  CHECK(text::characterIndex("5 µL", 0) == 0);
  CHECK(text::characterIndex("5 µL", 2) == 2);
  CHECK(text::characterIndex("5 µL", 4) == 3);
}

TEST_CASE("whatever is shown as one line is one line of visible, valid text", "[text][identity]") {
  CHECK(oneLine("a\nb\r\tc") == "a\\nb\\r\\tc");
  CHECK(oneLine("\x1B[31m") == "\\x1B[31m");
  CHECK(oneLine("\u202Egpj.exe") == "\\u202Egpj.exe");
  CHECK(oneLine("\xFF") == "\\xFF");
  CHECK(oneLine("\u0085\u2028\u200B\uFEFF") == "\\x85\\u2028\\u200B\\uFEFF");
  CHECK(oneLine("µ · Ω 你好") == "µ · Ω 你好");
  std::mt19937_64 random(5);
  for (int round = 0; round < 3000; ++round) {
    std::string bytes;
    const std::size_t length = random() % 12;
    for (std::size_t i = 0; i < length; ++i) bytes += static_cast<char>(random() % 256);
    const std::string line = oneLine(bytes);
    REQUIRE_FALSE(firstInvalidUtf8(line));
    for (const char c : line) REQUIRE((static_cast<unsigned char>(c) >= 0x20 && c != '\x7F'));
    REQUIRE(oneLine(line) == line);
  }
}

TEST_CASE("trimming cuts blanks and tabs at the ends only", "[text]") {
  CHECK(text::trimmed(" \t a b \t") == "a b");
  CHECK(text::trimmed(" \t ").empty());
  CHECK(text::trimmed("a\n") == "a\n");
}

TEST_CASE("a long text is quoted to forty characters, never through a character", "[text]") {
  std::string forty;
  for (int i = 0; i < 40; ++i) forty += "µ";
  CHECK(text::quoted(forty) == "'" + forty + "'");
  CHECK(text::quoted(forty + "x") == "'" + forty + "…'");
  CHECK(text::quoted("") == "''");
}

TEST_CASE("a fault points at characters, with a caret for each", "[text]") {
  const text::TextFault fault{
      .offset = 5, .length = 3, .what = "unit 'qux' is not known", .mend = ""};
  const std::string typed = "5 µ qux";  // the unit begins at byte 5
  CHECK(whatWithPosition(fault, typed) == "unit 'qux' is not known (character 5)");
  CHECK(pointedAt(fault, typed) == "5 µ qux\n    ^^^");
  const text::TextFault missing{
      .offset = 2, .length = 0, .what = "the unit is missing", .mend = ""};
  CHECK(pointedAt(missing, "12") == "12\n  ^");
}
