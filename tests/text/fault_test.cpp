// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "text/fault.h"

#include <catch2/catch.hpp>

#include <algorithm>
#include <random>

using namespace vialkeeper;
using text::Fault;
using text::toLine;

TEST_CASE("a fault's line has as many parts of its place as are known", "[text]") {
  CHECK(toLine(Fault{.file = "p.toml",
                     .line = 7,
                     .field = "vial.volume",
                     .what = "zero",
                     .mend = "give more"}) == "p.toml:7:vial.volume: zero: give more");
  CHECK(toLine(Fault{.file = "p.toml", .what = "too large", .mend = "check it"}) ==
        "p.toml: too large: check it");
  CHECK(toLine(Fault{.kind = text::FaultKind::kUsage,
                     .field = "--scale-to",
                     .what = "no number",
                     .mend = "m"}) == "--scale-to: no number: m");
  CHECK(toLine(Fault{.what = "w", .mend = "m"}) == "w: m");
  CHECK(toLine(Fault{.what = "w"}) == "w");
}

TEST_CASE("a fault is one line whatever its parts hold", "[text][identity]") {
  std::mt19937_64 random(11);
  const auto noise = [&random] {
    std::string bytes;
    const std::size_t length = random() % 20;
    for (std::size_t i = 0; i < length; ++i) bytes += static_cast<char>(random() % 256);
    return bytes + "\n\r\v\f\x1B\u0085\u2028\u2029";
  };
  for (int round = 0; round < 500; ++round) {
    const std::string line = toLine(
        Fault{.file = noise(), .line = 3, .field = noise(), .what = noise(), .mend = noise()});
    REQUIRE(std::ranges::none_of(
        line, [](char c) { return static_cast<unsigned char>(c) < 0x20 || c == '\x7F'; }));
    REQUIRE(line.find("\u0085") == std::string::npos);
    REQUIRE(line.find("\u2028") == std::string::npos);
    REQUIRE(line.find("\u2029") == std::string::npos);
  }
}
