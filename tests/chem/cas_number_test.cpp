// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/cas_number.h"

#include <catch2/catch.hpp>

#include <string>

using namespace vialkeeper;
using chem::checkCasNumber;

namespace {

/// Numbers in print with their check sums: cas.org (107-07-3, 33), newradargas.com (7732-18-5,
/// 105), a CAS client services mail (71-23-8, 38), harveyl888.github.io (64-17-5, 45), ccl.net
/// (67-64-1, 61; 106-97-8, 48), henrys-law.org (1333-74-0, 7782-44-7, 7727-37-9, 7440-59-7).
const std::vector<std::string> kPrinted = {"107-07-3",  "7732-18-5", "71-23-8",   "64-17-5",
                                           "67-64-1",   "106-97-8",  "1333-74-0", "7782-44-7",
                                           "7727-37-9", "7440-59-7", "50-00-0"};

}  // namespace

TEST_CASE("CAS numbers in print pass their check digit", "[chem][published]") {
  for (const std::string& number : kPrinted) {
    INFO(number);
    CHECK(checkCasNumber(number));
  }
}

TEST_CASE("bad CAS numbers in print are refused, each with its place", "[chem][published]") {
  // newradargas.com: wrong check digit, leading zeros, a one-digit block.
  const auto wrong = checkCasNumber("50-00-1");
  REQUIRE_FALSE(wrong);
  CHECK(wrong.error().what == "the check digit of this CAS number would be 0");
  CHECK(wrong.error().offset == 6);
  CHECK(wrong.error().length == 1);
  const auto zeros = checkCasNumber("0000050-00-0");
  REQUIRE_FALSE(zeros);
  CHECK(zeros.error().offset == 0);
  const auto block = checkCasNumber("50-0-0");
  REQUIRE_FALSE(block);
  CHECK(block.error().offset == 3);
  CHECK(block.error().length == 1);
}

TEST_CASE("what has not the form of a CAS number is refused", "[chem]") {
  for (const char* number :
       {"", "-", "--", "64-17", "64-17-", "64--5", "-17-5", "64-17-55", "12345678-18-5", "6-17-5",
        "64-17-5-1", "64-17-x", "64 17 5", " 64-17-5", "64-17-5 ", "64\u201117\u20115", "6417-5",
        "ab-cd-e", "64-175"}) {
    INFO(number);
    const auto checked = checkCasNumber(number);
    REQUIRE_FALSE(checked);
    CHECK(checked.error().offset + checked.error().length <= std::string_view(number).size());
  }
}

TEST_CASE("every wrong digit is found, and every swap of unequal neighbours within a group",
          "[chem][identity]") {
  // A digit's place is 1 to 9, and a change by d shows unless place x d is a multiple of 10: at the
  // even places a change by 5 and at place 5 an even change go unseen. Neighbours differ by 1 in
  // place, so every swap shows.
  for (const std::string& number : kPrinted) {
    int place = 0;
    for (std::size_t i = number.size() - 2; i-- > 0;) {
      if (number[i] == '-') continue;
      ++place;
      for (int change = 1; change <= 9; ++change) {
        std::string wrong = number;
        wrong[i] = static_cast<char>('0' + (number[i] - '0' + change) % 10);
        if (i == 0 && wrong[0] == '0') continue;
        const int difference = place * (wrong[i] - number[i]);
        INFO(number << " " << wrong);
        CHECK(checkCasNumber(wrong).has_value() == (difference % 10 == 0));
      }
      if (i == 0 || number[i - 1] == '-' || number[i - 1] == number[i]) continue;
      std::string swapped = number;
      std::swap(swapped[i - 1], swapped[i]);
      INFO(swapped);
      CHECK_FALSE(checkCasNumber(swapped));
    }
  }
}
