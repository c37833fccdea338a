// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/run_life.h"

#include <catch2/catch.hpp>

#include <fstream>
#include <map>
#include <string>
#include <vector>

#include "text/utf8.h"

using namespace vialkeeper;
using namespace vialkeeper::app;
using enum RunState;

namespace {

constexpr std::array<RunState, kRunStateCount> kStates = {kPlanned,  kCharged, kIrradiating,
                                                          kWorkedUp, kClosed,  kSealed};

/// The cells of every row of the page's tables.
std::vector<std::vector<std::string>> tableRows() {
  std::ifstream file(std::string(VIALKEEPER_SOURCE_DIR) + "/docs/run-life.md");
  REQUIRE(file);
  std::vector<std::vector<std::string>> rows;
  std::string line;
  while (std::getline(file, line)) {
    if (!line.starts_with('|') || line.starts_with("|-")) continue;
    std::vector<std::string> cells;
    for (std::size_t begin = 1, end = 0; (end = line.find('|', begin)) != std::string::npos;
         begin = end + 1) {
      cells.emplace_back(text::trimmed(std::string_view(line).substr(begin, end - begin)));
    }
    rows.push_back(std::move(cells));
  }
  return rows;
}

std::string inDocs(Permission permission) {
  switch (permission) {
    case Permission::kYes:
      return "yes";
    case Permission::kWithReason:
      return "reason";
    case Permission::kNo:
      break;
  }
  return "–";
}

std::string inDocs(Trigger trigger) {
  switch (trigger) {
    case Trigger::kFirstWeighing:
      return "first weighing";
    case Trigger::kLampOn:
      return "lamp on";
    case Trigger::kResult:
      return "first result";
    case Trigger::kNone:
      break;
  }
  return "";
}

// The tables hold at compile time.
static_assert(permissionOf(kClosed, kWorkedUp) == Permission::kWithReason);
static_assert(permissionOf(kSealed, kClosed) == Permission::kNo);
static_assert(permissionOf(kSealed, Deed::kLog) == Permission::kNo);
static_assert(stateAfter(kPlanned, Trigger::kFirstWeighing) == kCharged);

}  // namespace

TEST_CASE("the page on a run's life shows the table of transitions that is enforced",
          "[life][docs]") {
  std::map<std::string, std::pair<std::string, std::string>> shown;
  for (const auto& cells : tableRows()) {
    if (cells.size() == 4 && cells[0] != "from")
      shown[cells[0] + " > " + cells[1]] = {cells[2], cells[3]};
  }
  CHECK(shown.size() == kTransitions.size());
  for (const Transition& transition : kTransitions) {
    const std::string name =
        std::string(toText(transition.from)) + " > " + std::string(toText(transition.to));
    INFO(name);
    REQUIRE(shown.contains(name));
    CHECK(shown[name].first == inDocs(transition.permission));
    CHECK(shown[name].second == inDocs(transition.impliedBy));
  }
}

TEST_CASE("the page on a run's life shows the table of deeds that is enforced", "[life][docs]") {
  std::map<std::string, std::vector<std::string>> shown;
  for (const auto& cells : tableRows()) {
    if (cells.size() == 7) shown[cells[0]] = {cells.begin() + 1, cells.end()};
  }
  REQUIRE(shown.contains("to"));
  for (std::size_t i = 0; i < kStates.size(); ++i) CHECK(shown["to"][i] == toText(kStates[i]));
  CHECK(shown.size() == kDeedRules.size() + 1);
  for (const DeedRule& rule : kDeedRules) {
    INFO(rule.name);
    REQUIRE(shown.contains(std::string(rule.name)));
    for (std::size_t i = 0; i < kStates.size(); ++i)
      CHECK(shown[std::string(rule.name)][i] == inDocs(rule.in[i]));
  }
}

TEST_CASE("every deed has its rule, once", "[life][identity]") {
  for (std::size_t i = 0; i < kDeedRules.size(); ++i)
    CHECK(kDeedRules[i].deed == static_cast<Deed>(i));
  for (std::size_t i = 0; i < kTransitions.size(); ++i) {
    for (std::size_t j = i + 1; j < kTransitions.size(); ++j) {
      CHECK((kTransitions[i].from != kTransitions[j].from ||
             kTransitions[i].to != kTransitions[j].to));
    }
    CHECK(kTransitions[i].permission != Permission::kNo);
    // What happens by itself must not need a reason, and never moves a run back.
    if (kTransitions[i].impliedBy == Trigger::kNone) continue;
    CHECK(kTransitions[i].permission == Permission::kYes);
    CHECK(kTransitions[i].to > kTransitions[i].from);
  }
}

TEST_CASE("transitions and deeds are allowed or refused with a sentence for every pair", "[life]") {
  for (const RunState from : kStates) {
    for (const RunState to : kStates) {
      INFO(toText(from) << " > " << toText(to));
      const Permission permission = permissionOf(from, to);
      CHECK(mayTransition(from, to).has_value() == (permission == Permission::kYes));
      CHECK(mayTransition(from, to, "vial leaked").has_value() == (permission != Permission::kNo));
      CHECK(mayTransition(from, to, " \t\u00A0").has_value() == (permission == Permission::kYes));
      if (const auto refused = mayTransition(from, to); !refused) {
        REQUIRE(refused.error().size() == 1);
        CHECK(refused.error().front().field == "state");
        CHECK(!refused.error().front().what.empty());
        CHECK(!refused.error().front().mend.empty());
      }
    }
    for (const DeedRule& rule : kDeedRules) {
      INFO(toText(from) << ": " << rule.name);
      const Permission permission = permissionOf(from, rule.deed);
      CHECK(mayDo(from, rule.deed).has_value() == (permission == Permission::kYes));
      CHECK(mayDo(from, rule.deed, "misread").has_value() == (permission != Permission::kNo));
      if (const auto refused = mayDo(from, rule.deed); !refused)
        CHECK(!refused.error().front().mend.empty());
    }
  }
}

TEST_CASE("nothing leaves sealed, and everything but an addendum and a countersignature is over",
          "[life]") {
  for (const RunState to : kStates) CHECK(!mayTransition(kSealed, to, "a very good reason"));
  for (const DeedRule& rule : kDeedRules) {
    const bool stays = rule.deed == Deed::kAddAddendum || rule.deed == Deed::kCountersign;
    CHECK(mayDo(kSealed, rule.deed, "a very good reason").has_value() == stays);
  }
  CHECK(mayTransition(kSealed, kWorkedUp, "r").error().front().what == "a sealed run stays sealed");
}

TEST_CASE("the sentences say what and how to mend it", "[life]") {
  const auto reopened = mayTransition(kClosed, kWorkedUp).error().front();
  CHECK(reopened.what == "from closed to worked-up takes a reason");
  CHECK(reopened.mend == "say why in a few words: it is kept with the change");
  const auto skipped = mayTransition(kPlanned, kSealed).error().front();
  CHECK(skipped.what == "a run cannot go from planned to sealed");
  CHECK(skipped.mend == "from here it may become charged or irradiating, or with a reason closed");
  CHECK(mayTransition(kCharged, kCharged).error().front().what == "the run is charged already");
  const auto logged = mayDo(kClosed, Deed::kLog).error().front();
  CHECK(logged.what == "nobody can add a log entry while the run is closed");
  CHECK(logged.mend == "open the run again: from closed to worked up, with a reason");
  CHECK(mayDo(kSealed, Deed::kWeigh).error().front().mend ==
        "write an addendum: it stands beside the sealed record");
  CHECK(mayDo(kCharged, Deed::kChangePlan).error().front().what ==
        "to change the plan takes a reason once the run is charged");
  CHECK(mayDo(kClosed, Deed::kCountersign).error().front().mend == "seal the run first");
  CHECK(mayDo(kPlanned, Deed::kRecordResult).error().front().what ==
        "nobody can record a result while the run is planned");
}

TEST_CASE("events move a run on and never back", "[life]") {
  CHECK(stateAfter(kPlanned, Trigger::kFirstWeighing) == kCharged);
  CHECK(stateAfter(kPlanned, Trigger::kLampOn) == kIrradiating);
  CHECK(stateAfter(kCharged, Trigger::kLampOn) == kIrradiating);
  CHECK(stateAfter(kCharged, Trigger::kResult) == kWorkedUp);
  CHECK(stateAfter(kIrradiating, Trigger::kResult) == kWorkedUp);
  CHECK(stateAfter(kIrradiating, Trigger::kFirstWeighing) == kIrradiating);
  CHECK(stateAfter(kWorkedUp, Trigger::kLampOn) == kWorkedUp);
  for (const RunState state : kStates) {
    CHECK(stateAfter(state, Trigger::kNone) == state);
    for (const Trigger trigger : {Trigger::kFirstWeighing, Trigger::kLampOn, Trigger::kResult}) {
      CHECK(stateAfter(state, trigger) >= state);
      CHECK((state < kClosed || stateAfter(state, trigger) == state));
    }
  }
  CHECK(triggerOf("lamp on") == Trigger::kLampOn);
  for (const char* kind : {"lamp off", "pressure", "vent", "observation", "photo", "addendum"})
    CHECK(triggerOf(kind) == Trigger::kNone);
}
