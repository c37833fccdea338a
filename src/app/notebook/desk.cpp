// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/desk.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

constexpr std::array<std::string_view, 6> kStates = {"planned",   "charged", "irradiating",
                                                     "worked-up", "closed",  "sealed"};

/// The people whom the initials are likely meant for: those most like them first, a few at most.
std::string likeliest(std::vector<Person> people, std::string_view initials) {
  constexpr std::size_t kOffered = 5;
  std::ranges::stable_sort(people, {}, [initials](const Person& person) {
    std::size_t same = 0;
    for (std::size_t i = 0; i < std::min(initials.size(), person.code.size()); ++i)
      same += initials[i] == person.code[i] ? 1 : 0;
    return std::max(initials.size(), person.code.size()) - same;
  });
  std::string list;
  const std::size_t count = std::min(people.size(), kOffered);
  for (std::size_t i = 0; i < count; ++i) {
    if (i > 0) list += i + 1 == count ? " or " : ", ";
    list += people[i].code;
  }
  return list;
}

}  // namespace

bool areInitials(std::string_view text) {
  return !text.empty() && text.size() <= 8 && std::ranges::all_of(text, [](char c) {
    return (c >= 'A' && c <= 'Z') || (c >= '0' && c <= '9');
  }) && text.front() >= 'A';
}

std::string_view toText(RunState state) { return kStates[static_cast<std::size_t>(state)]; }

std::optional<RunState> runStateFromText(std::string_view text) {
  const auto found = std::ranges::find(kStates, text);
  if (found == kStates.end()) return std::nullopt;
  return static_cast<RunState>(found - kStates.begin());
}

std::unexpected<text::Faults> askedFault(std::string field, std::string what, std::string mend) {
  return std::unexpected(
      text::Faults{{.field = std::move(field), .what = std::move(what), .mend = std::move(mend)}});
}

Checked<std::string> whoWorks(Notebook& notebook, const std::optional<std::string>& given,
                              Newcomer newcomer) {
  if (given && !areInitials(*given)) {
    return askedFault("--person", fmt::format("{} are no initials", text::quoted(*given)),
                      "use 1 to 8 capital letters and digits, such as KW");
  }
  const auto people = notebook.people();
  if (!people) return std::unexpected(people.error());
  if (given) {
    const bool known = std::ranges::find(*people, *given, &Person::code) != people->end();
    if (known || people->empty() || newcomer == Newcomer::kWelcome) return *given;
    return askedFault("--person", fmt::format("{} has not worked in this notebook", *given),
                      fmt::format("did you mean {}? Somebody new is let in with --new-person",
                                  likeliest(*people, *given)));
  }
  if (people->size() == 1) return people->front().code;
  return askedFault(
      "--person",
      people->empty() ? "the notebook knows nobody yet" : "several people work in this notebook",
      "say who you are, --person KW or VIALKEEPER_PERSON=KW");
}

Checked<RunRecord> runOfCode(Notebook& notebook, std::string_view code) {
  auto found = notebook.findRun(code);
  if (!found) return std::unexpected(found.error());
  if (*found) return **std::move(found);
  return askedFault(std::string(code.substr(0, 64)), "the notebook has no run of this code",
                    "codes look like KW-0042; see runs");
}

}  // namespace vialkeeper::app
