// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "cli/command_bench.h"

using namespace vialkeeper::tests;

namespace {

struct UsageFault {
  std::vector<std::string>
      arguments;  ///< `PLAN` stands for the path of a sound plan, `W` for a weighed file
  int status;
  const char* place;
  const char* tells;
  const char* mend;
};

void checkUsageFaults(const std::vector<UsageFault>& faults) {
  const ScratchFolder folder;
  const std::string plan = folder.write("plan.toml", soundPlan());
  const std::string weighed = folder.write("w.csv", "key,actual\namine,24.1 mg\n");
  for (const UsageFault& fault : faults) {
    std::vector<std::string> arguments = fault.arguments;
    std::string line;
    for (std::string& argument : arguments) {
      line += " " + argument;
      if (argument == "PLAN") argument = plan;
      if (argument == "W") argument = weighed;
    }
    INFO("vialkeeper" << line);
    checkOneFault(folder, arguments, fault.status, fault.place, fault.tells, fault.mend);
  }
}

}  // namespace

TEST_CASE("a command line that cannot be meant is refused with status 2", "[cli][faults][usage]") {
  checkUsageFaults({
      {{}, 2, "", "no verb is given", "see vialkeeper --help"},
      {{"--json"}, 2, "", "no verb is given", "see vialkeeper --help"},
      {{"chrge", "PLAN"}, 2, "chrge", "this verb is not known", "did you mean charge?"},
      {{"titrate", "PLAN"},
       2,
       "titrate",
       "this verb is not known",
       "choose among mass, charge, sheet"},
      {{"--json", "chrge", "PLAN"}, 2, "chrge", "this verb is not known", "did you mean charge?"},
      {{"--verbose"}, 2, "--verbose", "this option is not known", "see vialkeeper --help"},
      {{"charge", "PLAN", "--verbose"},
       2,
       "--verbose",
       "this option is not known",
       "see vialkeeper charge --help"},
      {{"--verbose", "charge", "PLAN"},
       2,
       "--verbose",
       "this option is not known",
       "see vialkeeper charge --help"},
      {{"charge"}, 2, "PLAN", "this is missing", "see vialkeeper charge --help"},
      {{"sheet", "PLAN"}, 2, "--pdf", "this is missing", "see vialkeeper sheet --help"},
      {{"charge", "PLAN", "second.toml"},
       2,
       "second.toml",
       "one argument too many",
       "see vialkeeper charge --help"},
      {{"charge", "PLAN", "--weighed"},
       2,
       "--weighed",
       "its value is missing",
       "see vialkeeper charge --help"},
      {{"charge", "PLAN", "--scale-to"},
       2,
       "--scale-to",
       "its value is missing",
       "see vialkeeper charge --help"},
      {{"sheet", "PLAN", "--pdf"},
       2,
       "--pdf",
       "its value is missing",
       "see vialkeeper sheet --help"},
      {{"--book"}, 2, "--book", "its value is missing", "see vialkeeper --help"},
      {{"charge", "PLAN", "--json=perhaps"},
       2,
       "--json",
       "this option takes no value",
       "see vialkeeper charge --help"},
      {{"charge", "PLAN", "--scale-to", "1 mmol", "--scale-to", "2 mmol"},
       2,
       "--scale-to",
       "this option is given more than once",
       "keep one of them"},
      {{"sheet", "PLAN", "--pdf", ""},
       2,
       "--pdf",
       "the file name is empty",
       "name the PDF to write"},
      {{"sheet", "PLAN", "--pdf", "out.pdf", "--paper", "A5"},
       2,
       "--paper",
       "'A5' is no paper size here",
       "choose A4 or Letter"},
  });
}

TEST_CASE("a re-target needs a weighed file", "[cli][faults][usage]") {
  checkUsageFaults({
      {{"charge", "PLAN", "--retarget"},
       2,
       "--retarget",
       "there is nothing to follow without a weighing",
       "add --weighed CSV with the limiting component in it"},
      {{"charge", "nowhere.toml", "--retarget"},
       2,
       "--retarget",
       "there is nothing to follow",
       "add --weighed"},
  });
}

TEST_CASE("a scale that cannot be read is the command line's fault", "[cli][faults][usage]") {
  const char* what = "write a number with one of the units mmol, umol, nmol, mol, mg, g, kg, ug";
  checkUsageFaults({
      {{"charge", "PLAN", "--scale-to", ""},
       2,
       "--scale-to",
       "'': no number here",
       "begin with a number"},
      {{"charge", "PLAN", "--scale-to", "much"},
       2,
       "--scale-to",
       "'much': no number here",
       "begin with a number"},
      {{"charge", "PLAN", "--scale-to", "0 mmol"},
       2,
       "--scale-to",
       "'0 mmol': zero",
       "give a value above zero"},
      {{"charge", "PLAN", "--scale-to", "-1 mmol"},
       2,
       "--scale-to",
       "'-1 mmol': a negative value",
       "give a value"},
      {{"charge", "PLAN", "--scale-to", "nan mmol"},
       2,
       "--scale-to",
       "'nan mmol': no number here",
       "begin with"},
      {{"charge", "PLAN", "--scale-to", "inf mmol"},
       2,
       "--scale-to",
       "'inf mmol': no number here",
       "begin with"},
      {{"charge", "PLAN", "--scale-to", "0,5 mmol"},
       2,
       "--scale-to",
       "a comma in a number (character 2)",
       "write a decimal point"},
      {{"charge", "PLAN", "--scale-to", "0.5"},
       2,
       "--scale-to",
       "'0.5': the unit is missing (character 4)",
       what},
      {{"charge", "PLAN", "--scale-to", "2 mL"},
       2,
       "--scale-to",
       "mL is a volume, but an amount of substance or a mass is wanted (character 3)",
       what},
      {{"charge", "PLAN", "--scale-to", "2 equiv"},
       2,
       "--scale-to",
       "unit 'equiv' is not known here",
       what},
      {{"charge", "PLAN", "--scale-to", "20 mmol"},
       1,
       "plan.toml:16:liquid.total",
       "leave no headspace",
       "take a larger vial or less liquid"},
      {{"charge", "PLAN", "--scale-to-vial", "0 mL"},
       2,
       "--scale-to-vial",
       "'0 mL': zero",
       "give a value above zero"},
      {{"charge", "PLAN", "--scale-to-vial", "20 mg"},
       2,
       "--scale-to-vial",
       "mg is a mass, but a volume is wanted",
       "write a number with one of the units mL, uL, L"},
      {{"charge", "PLAN", "--scale-to", "1 mmol", "--scale-to-vial", "20 mL"},
       2,
       "--scale-to-vial",
       "the scale is given twice",
       "keep --scale-to or --scale-to-vial"},
      {{"sheet", "PLAN", "--pdf", "out.pdf", "--scale-to", "0 mmol"},
       2,
       "--scale-to",
       "'0 mmol': zero",
       "give"},
  });
}

TEST_CASE("a mass of something else than a formula is refused with the character",
          "[cli][faults][usage]") {
  checkUsageFaults({
      {{"mass"},
       2,
       "",
       "neither a formula nor a SMILES is given",
       "give one: vialkeeper mass FORMULA"},
      {{"mass", "H2O", "--smiles", "O"},
       2,
       "",
       "a formula and a SMILES are both given",
       "give one"},
      {{"mass", "H2O", "D2O"}, 2, "D2O", "one argument too many", "see vialkeeper mass --help"},
      {{"mass", "--smiles"}, 2, "--smiles", "its value is missing", "see vialkeeper mass --help"},
      {{"mass", "--smiles", ""}, 2, "--smiles", "the SMILES is empty", "give a SMILES"},
      {{"mass", ""}, 1, "formula", "'': no formula here", "write one such as C8H9N"},
      {{"mass", "water"},
       1,
       "formula",
       "'water': 'w' begins no element (character 1)",
       "elements begin with a capital letter"},
      {{"mass", "Xx2"},
       1,
       "formula",
       "'Xx2': 'Xx' is no element (character 1)",
       "check the spelling"},
      {{"mass", "Ca(OH2"},
       1,
       "formula",
       "'Ca(OH2': '(' is never closed (character 3)",
       "close it with ')'"},
      {{"mass", "H2O)"},
       1,
       "formula",
       "'H2O)': ')' closes no bracket (character 4)",
       "remove it or open one"},
      {{"mass", "()"}, 1, "formula", "'()': empty brackets", "remove them"},
      {{"mass", "2+"}, 1, "formula", "'2+': a number before the first element", "an isotope stands in brackets"},
      {{"mass", "+"}, 1, "formula", "'+': a charge without atoms", "name the elements"},
      {{"mass", "TcO2"},
       1,
       "formula",
       "'TcO2': Tc has no standard atomic weight",
       "give the molar mass"},
  });
}

TEST_CASE("faults of several options are told at once", "[cli][faults][usage]") {
  const ScratchFolder folder;
  const std::string plan = folder.write("plan.toml", soundPlan());
  const Ran ran =
      run({"charge", plan, "--scale-to", "0 mmol", "--scale-to-vial", "20", "--retarget"});
  CHECK(ran.status == 2);
  CHECK(ran.out.empty());
  CHECK(ran.faults().size() == 4);  // with the scale given twice
  const Ran extras = run({"charge", plan, "--one", "--two"});
  CHECK(extras.status == 2);
  CHECK(extras.faults().size() == 2);
}

TEST_CASE("help and version are no faults", "[cli][usage]") {
  for (const std::vector<std::string>& arguments : {std::vector<std::string>{"--help"},
                                                    {"charge", "--help"},
                                                    {"mass", "--help"},
                                                    {"sheet", "--help"},
                                                    {"--version"}}) {
    const Ran ran = run(arguments);
    CHECK(ran.status == 0);
    CHECK(!ran.out.empty());
    CHECK(ran.err.empty());
  }
}
