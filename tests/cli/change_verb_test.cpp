// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>
#include <nlohmann/json.hpp>
#include <string>
#include <vector>

#include "cli/command_bench.h"
#include "support/molfiles.h"
#include "support/sample_plan.h"
#include "support/scratch_folder.h"

using namespace vialkeeper::tests;
using nlohmann::json;

namespace {

/// A notebook of KW with one run of the sample plan.
class Book {
 public:
  Book() : m_file(m_folder.path("book.vialbook")) {
    REQUIRE(verb({"create"}).status == 0);
    REQUIRE(verb({"add", m_folder.write("plan.toml", samplePlanText())}).status == 0);
  }

  [[nodiscard]] Ran verb(std::vector<std::string> arguments) const {
    std::vector<std::string> all{"--book", m_file, "--person", "KW"};
    all.insert(all.end(), arguments.begin(), arguments.end());
    return run(all);
  }
  [[nodiscard]] json answer(std::vector<std::string> arguments) const {
    arguments.emplace_back("--json");
    const Ran ran = verb(std::move(arguments));
    INFO(ran.err);
    REQUIRE(ran.status == 0);
    return json::parse(ran.out);
  }
  [[nodiscard]] const ScratchFolder& folder() const { return m_folder; }

 private:
  ScratchFolder m_folder;
  std::string m_file;
};

json componentOf(const json& answer, const std::string& key) {
  for (const json& component : answer["components"]) {
    if (component["key"] == key) return component;
  }
  return nullptr;
}

}  // namespace

TEST_CASE("change sets fields and amounts, and takes components out", "[cli][change][regression]") {
  const Book book;
  const json changed = book.answer({"change", "KW-0001", "--amount", "pc=2 mol%", "--set",
                                    "irradiation.temperature=40 degC", "--remove", "nickel"});
  CHECK(changed["run"]["temperature_degC"] == 40.0);
  CHECK(componentOf(changed, "pc")["mol_percent"] == 2.0);
  CHECK(componentOf(changed, "nickel").is_null());
  CHECK(changed["new_substances"].empty());
  // As show tells it, with a history that keeps what was taken out.
  const json shown = book.answer({"show", "KW-0001", "--history"});
  CHECK(shown["components"] == changed["components"]);
  const json& last = shown["history"].back();
  CHECK(last["action"] == "change");
  bool kept = false;
  for (const json& change : last["changes"]) {
    if (change["table"] == "component" && change["after"].is_null())
      kept = change["before"]["key"] == "nickel";
  }
  CHECK(kept);
  const Ran table = book.verb({"change", "KW-0001", "--set", "title=Another title"});
  CHECK(table.status == 0);
  CHECK(table.out.find("Another title") != std::string::npos);
  CHECK(book.verb({"verify"}).status == 0);
}

TEST_CASE("change takes a whole plan, with a component more", "[cli][change][regression]") {
  const Book book;
  const std::string plan = samplePlanText() +
                           "\n[[component]]\nkey = \"acid\"\nrole = \"acid\"\nname = \"pivalic "
                           "acid\"\nformula = \"C5H10O2\"\nequiv = 1.5\n";
  const json changed = book.answer({"change", "KW-0001", "--plan",
                                    book.folder().write("more.toml", plan), "--amount", "acid=2"});
  CHECK(componentOf(changed, "acid")["amount_mmol"].get<double>() == Approx(0.4));
  CHECK(changed["new_substances"] == json{"pivalic acid"});
}

TEST_CASE("change tells every fault at once and changes nothing", "[cli][change][regression]") {
  const Book book;
  const Ran ran = book.verb({"change", "KW-0001", "--amount", "pc=5 bar", "--set",
                             "vial.volume=-1 mL", "--remove", "xenon"});
  CHECK(ran.status == 1);
  CHECK(ran.err.find("component.pc.amount: '5 bar'") != std::string::npos);
  CHECK(ran.err.find("vial.volume") != std::string::npos);
  CHECK(ran.err.find("component.xenon") != std::string::npos);
  CHECK(book.answer({"show", "KW-0001", "--history"})["history"].size() == 1);
  CHECK(book.verb({"change", "KW-0001"}).status == 2);
  CHECK(book.verb({"change", "KW-0001", "--amount", "pc"}).status == 2);
  CHECK(book.verb({"change", "KW-0001", "--set", "=1"}).status == 2);
  CHECK(book.verb({"change", "KW-0009", "--set", "title=x"}).status == 1);
}

TEST_CASE("change takes a reason where the run's state asks for it", "[cli][change][regression]") {
  const Book book;
  REQUIRE(book.verb({"weigh", "KW-0001", "nickel", "3.2 mg", "--yes"}).status == 0);
  CHECK(book.verb({"change", "KW-0001", "--amount", "nickel=6 mol%"}).status == 1);
  CHECK(book.verb({"change", "KW-0001", "--amount", "nickel=6 mol%", "--reason", "as agreed"})
            .status == 0);
  const Ran weighed = book.verb({"change", "KW-0001", "--remove", "nickel", "--reason", "no"});
  CHECK(weighed.status == 1);
  CHECK(weighed.err.find("was weighed") != std::string::npos);
}

TEST_CASE("log withdraws an entry", "[cli][log][regression]") {
  const Book book;
  REQUIRE(book.verb({"log", "KW-0001", "lamp", "on"}).status == 0);
  const json withdrawn =
      book.answer({"log", "KW-0001", "--withdraw", "1", "--reason", "the other lamp"});
  CHECK(withdrawn["event"]["event"] == "withdrawn");
  CHECK(withdrawn["event"]["supersedes"] == 1);
  CHECK(withdrawn["read_as"] == "entry 1 withdrawn: 'the other lamp'");
  CHECK(book.verb({"log", "KW-0001", "--withdraw", "1"}).status == 1);
  CHECK(book.verb({"log", "KW-0001", "--withdraw", "2", "text"}).status == 2);
  CHECK(book.verb({"log", "KW-0001"}).status == 2);
  CHECK(book.verb({"correct", "KW-0001", "2"}).status == 2);
}

TEST_CASE("shelf import takes an SD file", "[cli][shelf][regression]") {
  const Book book;
  const std::string file =
      book.folder().write("shelf.sdf", ethanolMolfile() + "> <CAS>\n64-17-5\n\n$$$$\n");
  CHECK(book.answer({"shelf", "import", file, "--as", "substance"})["added"] == 1);
  CHECK(book.verb({"shelf", "import", file, "--as", "vial"}).status == 2);
  CHECK(book.answer({"shelf", "show", "64-17-5"})["substances"].size() == 1);
}
