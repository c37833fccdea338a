// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "cli/command_bench.h"

using namespace vialkeeper::tests;

namespace {

struct CsvFault {
  const char* name;
  std::string csv;
  const char* place;  ///< behind `w.csv`
  const char* tells;
  const char* mend;
};

}  // namespace

TEST_CASE("a weighed file that cannot be meant is refused with the place",
          "[cli][faults][weighed]") {
  const std::string head = "key,actual\n";
  const std::vector<CsvFault> faults = {
      {"a misspelt key", head + "amin,24 mg\n", ":2:key", "the plan has no component 'amin'",
       "did you mean amine?"},
      {"an unknown key", head + "catalyst,24 mg\n", ":2:key",
       "the plan has no component 'catalyst'", "its keys are amine, nickel, acid, mecn, water"},
      {"no key", head + ",24 mg\n", ":2:key", "the plan has no component ''", "its keys are"},
      {"a key twice", head + "amine,24 mg\nacid,2 mg\namine,25 mg\n", ":4:amine",
       "this component was recorded on line 2 already", "keep one row for each component"},
      {"a volume of a solid", head + "amine,24 uL\n", ":2:amine",
       "'24 uL': a solid is recorded by mass", "give what the balance showed"},
      {"a mass of a stock", head + "nickel,99 mg\n", ":2:nickel",
       "'99 mg': a stock without a density is recorded by volume",
       "give the volume, or the stock's density"},
      {"an amount of substance", head + "amine,0.2 mmol\n", ":2:amine",
       "mmol is an amount of substance, but a mass or a volume is wanted (character 5)",
       "write a number with one of"},
      {"no unit", head + "amine,24.1\n", ":2:amine", "'24.1': the unit is missing (character 5)",
       "write a number with one of the units mg"},
      {"nothing", head + "amine,\n", ":2:amine", "'': no number here",
       "begin with a number, such as 12.3"},
      {"a decimal comma in quotation marks", head + "amine,\"24,1 mg\"\n", ":2:amine",
       "'24,1 mg': a comma in a number", "write a decimal point"},
      {"a decimal comma", head + "amine,24,1 mg\n", ":2", "3 cells where the header has 2",
       "quote a cell that holds a comma"},
      {"a negative mass", head + "amine,-24 mg\n", ":2:amine", "'-24 mg': a negative value",
       "give a value above zero"},
      {"a mass of zero", head + "amine,0 mg\n", ":2:amine", "'0 mg': zero",
       "give a value above zero"},
      {"a column missing", "key\namine\n", ":1:actual", "the column is missing",
       "begin with the row key,actual"},
      {"an unknown column", "key,actual,note\namine,24 mg,fine\n", ":1:note",
       "this column is not known here", "the columns are key and actual"},
      {"a column twice", "key,actual,key\namine,24 mg,amine\n", ":1:key",
       "this column stands twice", "keep one of them"},
      {"a column without a name", "key,\namine,24 mg\n", ":1", "a column without a name",
       "name every column in the first row"},
      {"too many cells", head + "amine,24 mg\nacid,2 mg,\n", ":3", "3 cells where the header has 2",
       "quote a cell"},
      {"too few cells", head + "amine\n", ":2", "1 cell where the header has 2",
       "add the missing cells"},
      {"text behind a quoted cell", head + "\"amine\"s,24 mg\n", ":2", "text follows a quoted cell",
       "put the whole cell in quotation marks"},
      {"an empty file", "", "", "the file holds no table", "begin with a row of column names"},
      {"NUL", head + std::string("am\0ne,24 mg\n", 12), ":2", "a NUL byte in a text file",
       "save it as plain text"},
      {"UTF-16", std::string("\xFF\xFEk\0e\0", 6), ":1", "the file is UTF-16", "save it as UTF-8"},
      {"Latin-1", head + "am\xEFne,24 mg\n", ":2", "bytes that are not UTF-8",
       "save the file in the encoding UTF-8"},
  };
  const ScratchFolder folder;
  const std::string plan = folder.write("plan.toml", soundPlan());
  for (const CsvFault& fault : faults) {
    INFO(fault.name);
    const std::string csv = folder.write("w.csv", fault.csv);
    checkOneFault(folder, {"charge", plan, "--weighed", csv}, 1, std::string("w.csv") + fault.place,
                  fault.tells, fault.mend);
  }
}

TEST_CASE("a weighed file that is not there, or is none, is refused by its name",
          "[cli][faults][weighed]") {
  const ScratchFolder folder;
  const std::string plan = folder.write("plan.toml", soundPlan());
  folder.makeFolder("weighed");
  checkOneFault(folder, {"charge", plan, "--weighed", folder.path("w.csv")}, 1, "w.csv",
                "there is no such file", "check the path");
  checkOneFault(folder, {"charge", plan, "--weighed", folder.path("weighed")}, 1, "weighed",
                "this is a folder, not a file", "name a file");
}

TEST_CASE("nothing can follow a limiting component that was not weighed",
          "[cli][faults][weighed]") {
  const ScratchFolder folder;
  const std::string plan = folder.write("plan.toml", soundPlan());
  const std::string csv = folder.write("w.csv", "key,actual\nacid,2.1 mg\n");
  checkOneFault(folder, {"charge", plan, "--weighed", csv, "--retarget"}, 1, "w.csv:amine",
                "the limiting component was not weighed", "record it first");
}

TEST_CASE("faults of the weighed file and of the substances are told together",
          "[cli][faults][weighed]") {
  const ScratchFolder folder;
  const std::string plan =
      folder.write("plan.toml", changed(soundPlan(), "\"C8H9N\"", "\"C8H9n\""));
  const std::string csv = folder.write("w.csv", "key,actual\namin,24 mg\nacid,2.1\nacid,2 mg\n");
  const Ran ran = run({"charge", plan, "--weighed", csv});
  CHECK(ran.status == 1);
  CHECK(ran.out.empty());
  const auto faults = ran.faults();
  INFO(ran.err);
  REQUIRE(faults.size() == 3);
  CHECK_THAT(folder.withoutPath(faults[0]),
             Catch::Matchers::StartsWith("plan.toml:21:component.amine.formula: "));
  CHECK_THAT(folder.withoutPath(faults[1]), Catch::Matchers::StartsWith("w.csv:2:key: "));
  CHECK_THAT(folder.withoutPath(faults[2]), Catch::Matchers::StartsWith("w.csv:3:acid: "));
}

TEST_CASE("quotes, blanks, line ends of Windows and a byte-order mark change nothing",
          "[cli][weighed]") {
  const ScratchFolder folder;
  const std::string plan = folder.write("plan.toml", soundPlan());
  const auto charged = [&](const std::string& csv) {
    return run({"--json", "charge", plan, "--weighed", folder.write("w.csv", csv)});
  };
  const Ran plain = charged("key,actual\namine,24.1 mg\nnickel,98 uL\n");
  REQUIRE(plain.status == 0);
  for (const char* csv : {"\xEF\xBB\xBFkey,actual\r\namine,24.1 mg\r\nnickel,98 uL\r\n",
                          " key , actual \n amine , 24.1 mg \n\n nickel , 98 uL",
                          "key,actual\n\"amine\",\"24.1 mg\"\nnickel,98uL\n",
                          "key,actual\namine,24.1mg\nnickel,98 \u00B5L\n",
                          "actual,key\n24.1 mg,amine\n98 \u03BCL,nickel\n"}) {
    INFO(csv);
    CHECK(charged(csv).out == plain.out);
  }
}
