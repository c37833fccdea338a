// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "cli/command_bench.h"

using namespace vialkeeper::tests;

namespace {

std::string utf16(const std::string& ascii) {
  std::string bytes = "\xFF\xFE";
  for (const char c : ascii) bytes += std::string{c, '\0'};
  return bytes;
}

std::string crlf(std::string text) {
  for (std::size_t at = text.find('\n'); at != std::string::npos; at = text.find('\n', at + 2))
    text.insert(at, "\r");
  return text;
}

}  // namespace

TEST_CASE("a plan file that is not there, or is none, is refused by its name", "[cli][faults]") {
  const ScratchFolder folder;
  folder.makeFolder("runs");
  folder.write("plan.toml", soundPlan());
  checkOneFault(folder, {"charge", folder.path("nowhere.toml")}, 1, "nowhere.toml",
                "there is no such file", "check the path");
  checkOneFault(folder, {"charge", folder.path("runs")}, 1, "runs", "this is a folder, not a file",
                "name a file");
  checkOneFault(folder, {"charge", folder.path("plan.toml/inside.toml")}, 1,
                "plan.toml/inside.toml", "a part of the path is not a folder", "check the path");
}

TEST_CASE("a plan in another encoding is refused with the line", "[cli][faults]") {
  const ScratchFolder folder;
  const auto plan = [&](const std::string& bytes) { return folder.write("plan.toml", bytes); };
  checkOneFault(folder, {"charge", plan(changed(soundPlan(), "\"indoline\"", "\"indol\xEFne\""))},
                1, "plan.toml:20", "bytes that are not UTF-8",
                "save the file in the encoding UTF-8");
  checkOneFault(
      folder,
      {"charge", plan(changed(soundPlan(), "\"indoline\"", std::string("\"indo\0ine\"", 10)))}, 1,
      "plan.toml:20", "a NUL byte in a text file", "save it as plain text in UTF-8");
  checkOneFault(folder, {"charge", plan(utf16("format = \"vialkeeper-plan/1\"\n"))}, 1,
                "plan.toml:1", "the file is UTF-16", "save it as UTF-8");
}

TEST_CASE("a file far too large for a plan is refused", "[cli][faults]") {
  const ScratchFolder folder;
  const std::string plan =
      folder.write("plan.toml", soundPlan() + std::string(std::size_t{1} << 20U, '#'));
  checkOneFault(folder, {"charge", plan}, 1, "plan.toml", "the file is larger than 1 MiB",
                "a plan is a short text");
}

TEST_CASE("an empty plan is told all that it lacks", "[cli][faults]") {
  const ScratchFolder folder;
  for (const char* bytes : {"", "\n\n", "# nothing yet\n", "\xEF\xBB\xBF"}) {
    const Ran ran = run({"charge", folder.write("plan.toml", bytes)});
    CHECK(ran.status == 1);
    CHECK(ran.out.empty());
    REQUIRE(ran.faults().size() == 4);
    const std::string said = folder.withoutPath(ran.err);
    for (const char* field : {"format", "reaction", "liquid", "component"}) {
      CHECK_THAT(said, Catch::Matchers::Contains("plan.toml:" + std::string(field) +
                                                 ": this is missing: "));
    }
  }
}

TEST_CASE("line ends of Windows and a byte-order mark change nothing", "[cli][faults]") {
  const ScratchFolder folder;
  const Ran plain = run({"--json", "charge", folder.write("plan.toml", soundPlan())});
  REQUIRE(plain.status == 0);
  CHECK(run({"--json", "charge", folder.write("plan.toml", crlf(soundPlan()))}).out == plain.out);
  CHECK(run({"--json", "charge", folder.write("plan.toml", "\xEF\xBB\xBF" + soundPlan())}).out ==
        plain.out);

  // and the places stay right
  const std::string spoilt = changed(soundPlan(), "0.200 mmol", "0.200 mol%");
  checkOneFault(folder, {"charge", folder.write("plan.toml", "\xEF\xBB\xBF" + crlf(spoilt))}, 1,
                "plan.toml:23:component.amine.amount", "unit 'mol%' is not known here",
                "write a number");
}

TEST_CASE("both code points of micro, and a blank or none before the unit, mean the same",
          "[cli][faults]") {
  const ScratchFolder folder;
  const std::string inMicromoles = changed(soundPlan(), "0.200 mmol", "200 umol");
  const Ran plain = run({"--json", "charge", folder.write("plan.toml", inMicromoles)});
  REQUIRE(plain.status == 0);
  for (const char* written : {"200 \u00B5mol", "200 \u03BCmol", "200umol"}) {
    const std::string plan = changed(soundPlan(), "0.200 mmol", written);
    const Ran other = run({"--json", "charge", folder.write("plan.toml", plan)});
    CHECK(other.status == 0);
    CHECK(other.json()["components"][0]["amount_mmol"] ==
          plain.json()["components"][0]["amount_mmol"]);
  }
}

TEST_CASE("an amount and a liquid that define each other are refused", "[cli][faults]") {
  const ScratchFolder folder;
  std::string plan =
      changed(soundPlan(), "total = \"2.0 mL\"", "limiting_concentration = \"0.1 mol/L\"");
  plan = changed(plan, "amount = \"0.200 mmol\"", "concentration = \"0.1 mol/L\"");
  checkOneFault(folder, {"charge", folder.write("plan.toml", plan)}, 1,
                "plan.toml:23:component.amine.concentration",
                "the limiting component's amount and the liquid's volume are defined by each other",
                "give liquid.total, or the component's amount");
}

TEST_CASE("an empty gas supply is told both that it lacks", "[cli][faults]") {
  const ScratchFolder folder;
  const std::string plan =
      changed(soundPlan(), "tolerance_percent = 2", "supply = { kind = \"gas\" }");
  const Ran ran = run({"charge", folder.write("plan.toml", plan)});
  CHECK(ran.status == 1);
  REQUIRE(ran.faults().size() == 2);
  CHECK_THAT(folder.withoutPath(ran.faults()[0]),
             Catch::Matchers::StartsWith(
                 "plan.toml:39:component.acid.supply.pressure: this is missing: "));
  CHECK_THAT(folder.withoutPath(ran.faults()[1]),
             Catch::Matchers::StartsWith(
                 "plan.toml:39:component.acid.supply.temperature: this is missing: "));
}

TEST_CASE("eight faults of one plan are told at once, from top to bottom", "[cli][faults]") {
  std::string plan = soundPlan();
  plan = changed(plan, "title = ", "titel = ");                  // 2: unknown field
  plan = changed(plan, "species = \"H2\"", "species = \"He\"");  // 6: no gas of the table
  plan = changed(plan, "derating = 0.5", "derating = 1.2");      // 9: out of range
  plan = changed(plan, "pressure = \"1.013 bar\"", "pressure = 1.013 bar");  // 13: not quoted
  plan = changed(plan, "496-15-1", "496-15-2");                              // 22: check digit
  plan = changed(plan, "0.200 mmol", "0,200 mmol");                          // 23: comma
  plan = changed(plan, "role = \"acid\"", "role = \"acidic\"");              // 35: no role
  plan = changed(plan, "share = 9", "share = -9");                           // 44: negative
  const ScratchFolder folder;
  folder.write("plan.toml", plan);
  const auto before = folder.contents();
  const Ran ran = run({"charge", folder.path("plan.toml")});
  CHECK(ran.status == 1);
  CHECK(ran.out.empty());
  const std::vector<std::string> places = {"2:titel",
                                           "6:reaction.gases[1].species",
                                           "9:vial.derating",
                                           "13:pressure",
                                           "22:component.amine.cas",
                                           "23:component.amine.amount",
                                           "35:component.acid.role",
                                           "44:component.mecn.share"};
  const auto faults = ran.faults();
  INFO(ran.err);
  REQUIRE(faults.size() == places.size());
  for (std::size_t i = 0; i < places.size(); ++i) {
    CHECK_THAT(folder.withoutPath(faults[i]),
               Catch::Matchers::StartsWith("plan.toml:" + places[i] + ": "));
  }
  CHECK(folder.contents() == before);
}
