// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <algorithm>
#include <catch2/catch.hpp>

#include "cli/notebook_bench.h"

using namespace vialkeeper::tests;
using Catch::Matchers::Contains;
using Catch::Matchers::StartsWith;

namespace {

/// The codes of a command's notices, in their order.
std::vector<std::string> noticeCodes(const Ran& ran) {
  INFO(ran.err);
  REQUIRE(ran.status == 0);
  std::vector<std::string> codes;
  const nlohmann::json json = ran.json();
  for (const auto& notice : json["notices"]) codes.push_back(notice["code"]);
  return codes;
}

bool holds(const std::vector<std::string>& codes, const std::string& code) {
  return std::find(codes.begin(), codes.end(), code) != codes.end();
}

}  // namespace

TEST_CASE("log questions what can hardly be, and keeps it when it is right", "[cli][log]") {
  Book book;
  const Ran asked = book.verb({"log", "KW-0001", "p 420 bar"});
  CHECK(asked.status == 1);
  CHECK(asked.out.empty());
  CHECK(asked.err ==
        "entry: 420 bar gauge is more than a glass vial holds: did you mean 420 mbar? If it is "
        "right, add --yes\n");
  CHECK(book.verb({"show", "KW-0001", "--json"}).json()["events"].empty());
  REQUIRE(book.verb({"log", "KW-0001", "p 420 bar", "--yes"}).status == 0);
  CHECK(book.verb({"show", "KW-0001", "--json"}).json()["events"][0]["pressure_bar"] == 420.0);
  CHECK(book.verb({"correct", "KW-0001", "1", "p 410 bar"}).status == 1);
  CHECK(book.verb({"correct", "KW-0001", "1", "p 0.42 bar"}).status == 0);
}

TEST_CASE("log holds samples against the liquid that is left", "[cli][log]") {
  Book book;
  REQUIRE(book.verb({"log", "KW-0001", "aliquot 1.5 mL"}).status == 0);
  const Ran asked = book.verb({"log", "KW-0001", "aliquot 1 mL"});
  CHECK(asked.status == 1);
  CHECK_THAT(asked.err, Contains("is more than the vial's liquid (500 µL)"));
  REQUIRE(book.verb({"log", "KW-0001", "add 1 mL acetonitrile"}).status == 0);
  CHECK(book.verb({"log", "KW-0001", "aliquot 1 mL"}).status == 0);
  // A corrected entry counts as it is now.
  REQUIRE(book.verb({"correct", "KW-0001", "1", "aliquot 0.5 mL"}).status == 0);
  CHECK(book.verb({"log", "KW-0001", "aliquot 1.4 mL"}).status == 0);
}

TEST_CASE("a time before the run was set up is questioned", "[cli][log]") {
  Book book;
  book.clock().goOn(std::chrono::minutes{30});
  const Ran asked = book.verb({"log", "KW-0001", "lamp on", "--at", "13:50"});
  CHECK(asked.status == 1);
  CHECK(asked.err ==
        "entry: 2026-03-04T13:50:00+01:00 is before the run was set up "
        "(2026-03-04T14:00:00+01:00): is the time right? If it is right, add --yes\n");
  CHECK(book.verb({"log", "KW-0001", "lamp on", "--at", "14:00"}).status == 0);
  REQUIRE(book.verb({"log", "KW-0001", "lamp off", "--at", "13:50", "--yes"}).status == 0);
  // Whoever corrects the words has answered for the time already.
  CHECK(book.verb({"correct", "KW-0001", "2", "lamp off; fan on"}).status == 0);
}

TEST_CASE("times are shown with their offset", "[cli][log]") {
  Book book;
  CHECK_THAT(book.verb({"log", "KW-0001", "lamp on"}).out, Contains("2026-03-04T14:00+01:00"));
  const Ran shown = book.verb({"show", "KW-0001"});
  CHECK_THAT(shown.out, Contains("2026-03-04T14:00+01:00 by KW"));
  CHECK_THAT(shown.out, Contains("   1  2026-03-04T14:00+01:00  lamp on"));
}

TEST_CASE("weighing again says what was recorded before", "[cli][weigh]") {
  Book book;
  CHECK(book.verb({"weigh", "KW-0001", "amine", "24.3 mg", "--json"})
            .json()["recorded_before"]
            .is_null());
  const Ran again = book.verb({"weigh", "KW-0001", "amine", "24.1 mg"});
  CHECK_THAT(again.out,
             StartsWith("amine: 24.3 mg → 24.1 mg; the old record stays in the history"));
  CHECK(book.verb({"weigh", "KW-0001", "amine", "24.0 mg", "--json"}).json()["recorded_before"] ==
        "24.1 mg");
  CHECK_THAT(book.verb({"show", "KW-0001", "--history", "--json"}).out, Contains("24.3 mg"));
}

TEST_CASE("a second key is questioned, and older seals stay valid under the first", "[cli][seal]") {
  Book book;
  const std::string words = "an invented passphrase\n";
  REQUIRE(book.verb({"weigh", "KW-0001", "amine", "24.3 mg"}).status == 0);
  REQUIRE(book.verb({"result", "KW-0001", "--yield", "50 %"}).status == 0);
  REQUIRE(book.verb({"result", "KW-0001", "--state", "closed"}).status == 0);
  REQUIRE(book.verbWithInput("KW", {"key", "new"}, words).status == 0);
  REQUIRE(book.verbWithInput("KW", {"seal", "KW-0001"}, words).status == 0);

  const auto before = book.folder().contents();
  const Ran asked = book.verbWithInput("KW", {"key", "new"}, words);
  CHECK(asked.status == 1);
  CHECK_THAT(asked.err, Contains("KW has a signing key already") && Contains("--yes") &&
                            Contains("older seals stay valid"));
  CHECK(book.folder().contents() == before);
  const Ran replaced =
      book.verbWithInput("KW", {"key", "new", "--yes", "--json"}, "another passphrase\n");
  REQUIRE(replaced.status == 0);
  CHECK(replaced.json()["replaced"] == true);
  CHECK(book.verb({"verify"}).status == 0);

  CHECK_THAT(book.verbWithInput("KW", {"countersign", "KW-0001"}, words).err,
             Contains("KW sealed this run: a witness is somebody else"));
  REQUIRE(book.verbWithInput("TS", {"key", "new", "--new-person"}, words).status == 0);
  REQUIRE(book.verbWithInput("TS", {"countersign", "KW-0001"}, words).status == 0);
  CHECK_THAT(book.verbWithInput("TS", {"countersign", "KW-0001"}, words).err,
             Contains("TS has countersigned this run already"));
}

TEST_CASE("a title that speaks of what was set otherwise is told", "[cli][add]") {
  Book book;
  const auto clone = [&book](std::vector<std::string> options) {
    options.insert(options.begin(), {"clone", "KW-0001", "--json"});
    return book.verb(options);
  };
  // `Indoline dehydrogenation` names the amine and nothing of the acid.
  const Ran kept = clone({"--set", "component.amine.amount=0.100 mmol"});
  CHECK(holds(noticeCodes(kept), "title-kept"));
  CHECK(kept.json()["notices"][0]["at"] == "title");
  CHECK_FALSE(holds(noticeCodes(clone({"--set", "component.acid.equiv=0.2"})), "title-kept"));
  CHECK_FALSE(
      holds(noticeCodes(clone({"--set", "component.amine.amount=0.100 mmol", "--title", "Half"})),
            "title-kept"));
  const std::string plan = book.folder().write(
      "loading.toml", changed(soundPlan(), "Indoline dehydrogenation", "Ni at 5 mol%, 0.2 mmol"));
  const auto add = [&](const std::string& set) {
    return noticeCodes(book.verb({"add", plan, "--json", "--set", set}));
  };
  CHECK(holds(add("component.nickel.mol_percent=10"), "title-kept"));
  CHECK(holds(add("component.amine.amount=0.1 mmol"), "title-kept"));
  CHECK_FALSE(holds(add("vial.volume=20 mL"), "title-kept"));
}

TEST_CASE("the lists of runs count, and refuse what cannot be", "[cli][find]") {
  Book book;
  CHECK_THAT(book.verb({"runs"}).out, Catch::Matchers::EndsWith("\n1 run\n"));
  REQUIRE(book.verb({"clone", "KW-0001"}).status == 0);
  CHECK_THAT(book.verb({"runs"}).out, Catch::Matchers::EndsWith("\n2 runs\n"));
  CHECK(book.verb({"runs", "--limit", "0"}).status == 0);
  for (const auto& [options, err] : std::vector<std::pair<std::vector<std::string>, std::string>>{
           {{"--limit=-1"}, "--limit: -1 is less than nothing: "},
           {{"--limit", "-1"}, "--limit: -1 is less than nothing: "},
           {{"--limit", "few"}, "--limit: its value cannot be read: "},
           {{"--csv", "--json"}, "--csv: a list is written as CSV or as JSON, not as both: "}}) {
    INFO(err);
    std::vector<std::string> arguments{"runs"};
    arguments.insert(arguments.end(), options.begin(), options.end());
    const Ran ran = book.verb(arguments);
    CHECK(ran.status == 2);
    CHECK(ran.out.empty());
    CHECK_THAT(ran.err, StartsWith(err));
  }
  CHECK(book.verb({"find", "***"}).status == 1);
  CHECK_THAT(book.verb({"find", "5-20 mol%"}).err, Contains("how much of which substance"));
}

TEST_CASE("shelf add tells of a name on the shelf that looks like the new one", "[cli][shelf]") {
  Book book;
  const Ran near =
      book.verb({"shelf", "add", "substance", "pivalc acid", "--formula", "C5H10O3", "--json"});
  CHECK(noticeCodes(near) == std::vector<std::string>{"near-miss"});
  CHECK_THAT(near.json()["notices"][0]["text"].get<std::string>(), Contains("pivalic acid"));
  CHECK(noticeCodes(book.verb({"shelf", "add", "substance", "quinuclidine", "--formula", "C7H13N",
                               "--json"}))
            .empty());
}
