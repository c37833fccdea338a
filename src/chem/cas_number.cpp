// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/cas_number.h"

#include <fmt/format.h>

#include <algorithm>

namespace vialkeeper::chem {
namespace {

bool isDigits(std::string_view part) {
  return !part.empty() && std::ranges::all_of(part, [](char c) { return c >= '0' && c <= '9'; });
}

}  // namespace

std::expected<void, text::TextFault> checkCasNumber(std::string_view number) {
  constexpr const char* kForm = "write it as on the bottle, for example 64-17-5";
  const std::size_t dash1 = number.find('-');
  const std::size_t dash2 = dash1 == std::string_view::npos ? dash1 : number.find('-', dash1 + 1);
  if (dash2 == std::string_view::npos) {
    return text::textFault(0, number.size(), "a CAS number has three groups of digits", kForm);
  }
  const std::string_view head = number.substr(0, dash1);
  const std::string_view middle = number.substr(dash1 + 1, dash2 - dash1 - 1);
  const std::string_view check = number.substr(dash2 + 1);
  if (!isDigits(head) || head.size() < 2 || head.size() > 7 || head.front() == '0') {
    return text::textFault(0, head.size(),
                           "the first group of a CAS number has 2 to 7 digits, the first not zero",
                           kForm);
  }
  if (!isDigits(middle) || middle.size() != 2) {
    return text::textFault(dash1 + 1, middle.size(),
                           "the second group of a CAS number has 2 digits", kForm);
  }
  if (!isDigits(check) || check.size() != 1) {
    return text::textFault(dash2 + 1, check.size(), "the last group of a CAS number is one digit",
                           kForm);
  }
  int sum = 0;
  int place = 1;
  for (const std::string_view group : {middle, head}) {
    for (auto digit = group.rbegin(); digit != group.rend(); ++digit)
      sum += (*digit - '0') * place++;
  }
  if (sum % 10 == check.front() - '0') return {};
  return text::textFault(dash2 + 1, 1,
                         fmt::format("the check digit of this CAS number would be {}", sum % 10),
                         "compare the number with the bottle, a digit is wrong or two are swapped");
}

}  // namespace vialkeeper::chem
