// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/find_language.h"

#include <fmt/format.h>

#include <algorithm>
#include <catch2/catch.hpp>
#include <cctype>
#include <fstream>
#include <random>
#include <string>

#include "app/notebook/fold_name.h"
#include "text/utf8.h"

using namespace vialkeeper::app;
using vialkeeper::text::TextFault;

namespace {

std::string shown(const std::optional<Interval>& interval, const std::string& unit) {
  if (!interval) return {};
  const auto end = [](const std::optional<double>& value) {
    return value ? fmt::format("{:.6g}", *value) : std::string();
  };
  return fmt::format(" [{},{}]{}", end(interval->least), end(interval->most), unit);
}

std::string shown(const WrittenLoading& loading) {
  return shown(loading.molPercent, "mol%") + shown(loading.concentration_mol_L, "M");
}

std::string shown(const ParsedConditions& conditions);

/// A condition in a short form of this test's own.
std::string shown(const ParsedCondition& condition) {
  struct {
    std::string operator()(const SubstanceName& name) const {
      return fmt::format("{}={}{}{}{}", name.role, name.written, name.isPrefix ? "*" : "",
                         name.isFinished ? "" : "~", shown(name.loading));
    }
    std::string operator()(const StructurePattern& pattern) const {
      return "smiles=" + pattern.smiles + shown(pattern.loading);
    }
    std::string operator()(const WordsCondition& words) const {
      std::string text;
      for (std::size_t i = 0; i < words.words.size(); ++i) {
        text +=
            fmt::format("{}'{}'{}", i > 0 ? " " : "", words.words[i], words.prefix[i] ? "*" : "");
      }
      return text;
    }
    std::string operator()(const TextFieldCondition& field) const {
      return fmt::format("field{}={}{}", static_cast<int>(field.field), field.value,
                         field.isPrefix ? "*" : "");
    }
    std::string operator()(const MeasureCondition& measure) const {
      if (measure.measure == MeasureCondition::Measure::kDate) {
        return fmt::format("date [{:.0f},{:.0f}]", measure.interval.least.value_or(-1),
                           measure.interval.most.value_or(-1));
      }
      return fmt::format("measure{}{}", static_cast<int>(measure.measure),
                         shown(measure.interval, ""));
    }
    std::string operator()(const ParsedAll& all) const {
      return "all(" + shown(all.conditions) + ")";
    }
    std::string operator()(const ParsedAny& any) const {
      return "any(" + shown(any.conditions) + ")";
    }
    std::string operator()(const ParsedNot& none) const {
      return "not(" + shown(none.conditions) + ")";
    }
  } writer;
  return std::visit(writer, condition.data);
}

std::string shown(const ParsedConditions& conditions) {
  std::string text;
  for (const ParsedCondition& condition : conditions)
    text += (text.empty() ? "" : " ; ") + shown(condition);
  return text;
}

std::string parsed(std::string_view text, bool asYouType = false) {
  const auto query = parseFind(text, {asYouType});
  if (!query)
    return fmt::format("fault {}+{}: {}: {}", query.error().offset, query.error().length,
                       query.error().what, query.error().mend);
  return shown(query->conditions);
}

/// The text that a fault points at.
std::string pointed(std::string_view text) {
  const auto query = parseFind(text);
  return query ? "no fault" : std::string(text.substr(query.error().offset, query.error().length));
}

std::string what(std::string_view text) {
  const auto query = parseFind(text);
  return query ? "no fault" : query.error().what;
}

}  // namespace

TEST_CASE("words, phrases and beginnings search the text", "[notebook][find]") {
  CHECK(parsed("").empty());
  CHECK(parsed("  \t ").empty());
  CHECK(parsed("amber film") == "'amber' 'film'");
  CHECK(parsed("amb* \"turned black\"") == "'amb'* 'turned black'");
  CHECK(parsed("\"turned bl\"*") == "'turned bl'*");
  CHECK(parsed("“turned black”") == "'turned black'");
  CHECK(parsed("\"a 12\"\" vial\"") == "'a 12\" vial'");
  CHECK(parsed("4-CzIPN 2-(4-fluorophenyl)indole 3:1 5\" http://x.y/z") ==
        "'4-CzIPN' '2-(4-fluorophenyl)indole' '3:1' '5\"' 'http://x.y/z'");
  CHECK(parsed("yield was low") == "'yield' 'was' 'low'");
  CHECK(parsed("A->B a>b") == "'A->B' 'a>b'");
}

TEST_CASE("marks alone ask for nothing, which is said", "[notebook][find]") {
  CHECK(pointed(" ***") == "***");
  CHECK(pointed("-- ' — *") == "-- ' — *");
  CHECK(what("not *") == "this asks for nothing: there is no letter and no figure in it");
  CHECK(parsed("***", true).empty());
  CHECK(parsed("acid:*") == "acid=*");
}

TEST_CASE("how much without a substance is pointed at", "[notebook][find]") {
  CHECK(pointed("5..20 mol%") == "5..20 mol%");
  CHECK(pointed("film 5-20 mol% yield>60") == "5-20 mol%");
  CHECK(pointed("5 – 20 mol%") == "5 – 20 mol%");
  CHECK(pointed(">5 mol%") == ">5 mol%");
  CHECK(pointed("..0.2 M") == "..0.2 M");
  CHECK(pointed("acid:TFA 5..20 mol% 1..2 equiv") == "1..2 equiv");
  CHECK(what("5..20 mol%") == "how much of which substance");
  CHECK(parsed("5..20 mol%").find("acid:\"pivalic acid\" 5..20 mol%") != std::string::npos);
  // Anybody's text.
  CHECK(parsed("5 mol% 5-20 mg 4-CzIPN 3..5 1-2") ==
        "'5' 'mol%' '5-20' 'mg' '4-CzIPN' '3..5' '1-2'");
  CHECK(parsed("\"5..20 mol%\"") == "'5..20 mol%'");
}

TEST_CASE("substances stand behind their role, with a loading", "[notebook][find]") {
  CHECK(parsed("photocatalyst:4CzIPN additive:\"pivalic acid\" 5..20 mol% yield>60") ==
        "photocatalyst=4CzIPN ; additive=pivalic acid [5,20]mol% ; measure0 [60,]");
  CHECK(parsed("additive:\"pivalic acid\" >5 mol%") == "additive=pivalic acid [5,]mol%");
  CHECK(parsed("ACID: TFA <= 0.1 M") == "acid=TFA [,0.1]M");
  CHECK(parsed("acid:TFA 0.1 M") == "acid=TFA [0.095,0.105]M");
  CHECK(parsed("acid:TFA 5mol%") == "acid=TFA [4.75,5.25]mol%");
  CHECK(parsed("acid:TFA 5 mol % film") == "acid=TFA [4.75,5.25]mol% ; 'film'");
  CHECK(parsed("base:DBU 1..1,5 equiv") == "base=DBU [100,150]mol%");
  CHECK(parsed("acid:TFA 5 mol%..20 mol%") == "acid=TFA [5,20]mol%");
  CHECK(parsed("acid:TFA 5 .. 20 mol%") == "acid=TFA [5,20]mol%");
  CHECK(parsed("acid:TFA 5.. mol%") == "acid=TFA [5,]mol%");
  CHECK(parsed("acid:TFA ..20 mol%") == "acid=TFA [,20]mol%");
  CHECK(parsed("(acid:TFA 5 mol%)") == "acid=TFA [4.75,5.25]mol%");
  CHECK(parsed("acid:TFA 10 mM..0.1 M") == "acid=TFA [0.01,0.1]M");
  CHECK(parsed("any:indole catalyst:Pd* acid:*") == "=indole ; catalyst=Pd* ; acid=*");
  CHECK(parsed("solvent=DMF") == "solvent=DMF");
  CHECK(parsed("ligand:dtbbpy").starts_with("fault 0+6"));
  // A number that begins a word is no loading.
  CHECK(parsed("acid:TFA 4-CzIPN 3 vials 2nd 5...") ==
        "acid=TFA ; '4-CzIPN' '3' 'vials' '2nd' '5...'");
  CHECK(parsed("substrate:(R)-amine structure:c1ccc(N)cc1 x") ==
        "substrate=(R)-amine ; smiles=c1ccc(N)cc1 ; 'x'");
  CHECK(parsed("(structure:C(=O)O or structure:\"[O-]*\")") == "any(smiles=C(=O)O ; smiles=[O-]*)");
  CHECK(parsed("structure:C* 5..20 mol%") == "smiles=C* [5,20]mol%");
}

TEST_CASE("measures are compared in their units", "[notebook][find]") {
  CHECK(parsed("yield>=60% conversion:80..90") == "measure0 [60,] ; measure1 [80,90]");
  CHECK(parsed("yield > 60 film") == "measure0 [60,] ; 'film'");
  CHECK(parsed("yield>60 C") == "measure0 [60,] ; 'C'");
  CHECK(parsed("wavelength:440 nm") == "measure2 [439.5,440.5]");
  CHECK(parsed("wavelength:430..460") == "measure2 [430,460]");
  CHECK(parsed("wavelength:440 film") == "measure2 [439.5,440.5] ; 'film'");
  CHECK(parsed("temperature>30 C temperature≤308.15 K") == "measure3 [30,] ; measure3 [,35]");
  CHECK(parsed("temperature:-78 C..0 °C") == "measure3 [-78,2.7315e-07]");
  CHECK(parsed("temperature:25 C") == "measure3 [24.5,25.5]");
  CHECK(parsed("duration:16 h") == "measure4 [15.5,16.5]");
  CHECK(parsed("duration>1 h 30 min film") == "measure4 [1.5,] ; 'film'");
  CHECK(parsed("duration:30 min..1 h 20 min") == "measure4 [0.5,1.33333]");
  CHECK(parsed("liquid<1500 µL limiting:0.2 mmol") == "measure5 [,1.5] ; measure6 [0.19,0.21]");
  CHECK(parsed("yield:0") == "measure0 [-0.5,0.5]");
  CHECK(parsed("yield:60..") == "measure0 [60,]");
  CHECK(parsed("yield:60.. film") == "measure0 [60,] ; 'film'");
  const auto above = parseFind("yield>60");
  CHECK(std::get<MeasureCondition>(above->conditions[0].data).interval.least > 60.0);
  const auto positive = parseFind("yield>0");
  CHECK(std::get<MeasureCondition>(positive->conditions[0].data).interval.least > 0.0);
  const auto from = parseFind("yield>=10");
  CHECK(std::get<MeasureCondition>(from->conditions[0].data).interval.least < 10.0 - 1e-10);
}

TEST_CASE("days, months and years are read as their whole length", "[notebook][find]") {
  CHECK(parsed("2026-03") == "date [1772323200000,1775001599999]");
  CHECK(parsed("2026-03-01..2026-03-15") == "date [1772323200000,1773619199999]");
  CHECK(parsed("date:2026") == "date [1767225600000,1798761599999]");
  CHECK(parsed("date>2026-03-15") == "date [1773619200000,-1]");
  CHECK(parsed("date<2026-03 film") == "date [-1,1772323199999] ; 'film'");
  CHECK(parsed("2026-03.. film") == "date [1772323200000,-1] ; 'film'");
  CHECK(parsed("date:..2026-02") == "date [-1,1772323199999]");
  CHECK(parsed("2026 2026-3 2026-03-01T10:00") == "'2026' '2026-3' '2026-03-01T10:00'");
  CHECK(pointed("film 2026-13") == "2026-13");
  CHECK(pointed("2026-02-30") == "2026-02-30");
  CHECK(what("2026-03..2026-01") == "the range runs backwards");
}

TEST_CASE("text fields and states", "[notebook][find]") {
  CHECK(parsed("person:KW state:Closed series:\"acid additives\" code:KW-00*") ==
        "field2=KW ; field3=Closed ; field1=acid additives ; field0=KW-00*");
  CHECK(parsed("state:\"worked up\"") == "field3=worked-up");
  CHECK(parsed("state:cl", true) == "field3=cl*");
  CHECK(parsed("state:closd") == "fault 6+5: there is no state 'closd': did you mean closed?");
}

TEST_CASE("not, or, and, parentheses", "[notebook][find]") {
  CHECK(parsed("not acid:TFA") == "not(acid=TFA)");
  CHECK(parsed("film not black grey") == "'film' 'grey' ; not('black')");
  CHECK(parsed("a b or c d") == "any('a' 'b' ; 'c' 'd')");
  CHECK(parsed("a acid:TFA or c") == "any(all('a' ; acid=TFA) ; 'c')");
  CHECK(parsed("a (b or c) and d") == "'a' 'd' ; any('b' ; 'c')");
  CHECK(parsed("NOT (a OR not b)") == "not(any('a' ; not('b')))");
  CHECK(parsed("not(a acid:x)") == "not(all('a' ; acid=x))");
  CHECK(parsed("\"or\" \"not\" order") == "'or' 'not' 'order'");
  CHECK(parsed("-- or film") == "'film'");
  CHECK(pointed("or film") == "or");
  CHECK(pointed("film or") == "");
  CHECK(pointed("film and") == "and");
  CHECK(pointed("and film") == "and");
  CHECK(pointed("film not") == "not");
  CHECK(pointed("film (grey") == "(");
  CHECK(pointed("film) grey") == ")");
  CHECK(pointed("film ()") == "()");
  CHECK(pointed("film \"grey") == "\"grey");
}

TEST_CASE("a search that cannot be read points at the character and says how to mend it",
          "[notebook][find]") {
  CHECK(parsed("film additve:TFA") ==
        "fault 5+7: there is no field 'additve': did you mean additive? Or put it between "
        "quotation marks to search "
        "for the text");
  CHECK(pointed("yeild>60") == "yeild");
  CHECK(pointed("solvent>DMF") == "solvent>");
  CHECK(pointed("film additive:") == "additive:");
  CHECK(pointed("(additive: )") == "additive: ");
  CHECK(what("additive:TFA 5..20") == "the unit is missing");
  CHECK(what("additive:TFA >5") == "the unit is missing");
  CHECK(pointed("additive:TFA >5 mg") == "5 mg");
  CHECK(pointed("additive:TFA 5 mg") == "5 mg");
  CHECK(what("additive:TFA 5-20 mol%") == "a range is written with two dots");
  CHECK(what("additive:TFA 5 – 20 mol%") == "a range is written with two dots");
  CHECK(what("wavelength:430-460 nm") == "a range is written with two dots");
  CHECK(what("additive:TFA 20..5 mol%") == "the range runs backwards");
  CHECK(what("additive:TFA 5 mol%..0.1 M") == "the two ends are not of one kind");
  CHECK(what("yield>50..60") == "a comparison and a range at once");
  CHECK(what("yield:high") == "no number follows");
  CHECK(what("yield>") == "no number follows");
  CHECK(what("temperature>30") == "the unit is missing");
  CHECK(pointed("temperature>30 foo") == "foo");
  CHECK(pointed("yield>60foo") == "foo");
  CHECK(pointed("wavelength:440 nmm") == "no fault");  // a word
  CHECK(pointed("wavelength:440nmm") == "nmm");
  CHECK(what("film \xFF") == "a byte that is no text in UTF-8");
  const TextFault fault = parseFind("acé additve:x").error();
  CHECK(vialkeeper::text::whatWithPosition(fault, "acé additve:x") ==
        "there is no field 'additve' (character 5)");
}

TEST_CASE("while it is typed, an unfinished end is no fault", "[notebook][find]") {
  CHECK(parsed("film gre", true) == "'film' 'gre'*");
  CHECK(parsed("film gre ", true) == "'film' 'gre'");
  CHECK(parsed("additive:piv", true) == "additive=piv~");
  CHECK(parsed("additive:\"pivalic ac", true) == "additive=pivalic ac~");
  CHECK(parsed("additive:piv ", true) == "additive=piv");
  CHECK(parsed("person:K", true) == "field2=K*");
  for (const char* unfinished :
       {"film additive:", "film yield>", "film (", "film not", "film not ", "film or", "film or ",
        "film and", "film and ", "film \"", "film temperature>3", "film yield:60..6foo"}) {
    INFO(unfinished);
    const std::string got = parsed(unfinished, true);
    CHECK(got.starts_with("'film'"));
  }
  CHECK(parsed("acid:TFA 5..", true) == "acid=TFA");
  CHECK(parsed("acid:TFA 5..20 m", true) == "acid=TFA");
  CHECK(parsed("additve:x film", true).starts_with("fault 0+7"));
  // Whatever is typed up to somewhere may be a fault, but never one behind the text.
  const std::string whole =
      "photocatalyst:4CzIPN (additive:\"pivalic acid\" 5..20 mol% or not acid:TFA >0.1 M) yield>60 "
      "2026-03 amb*";
  for (std::size_t length = 0; length <= whole.size(); ++length) {
    INFO(whole.substr(0, length));
    CHECK(parseFind(whole.substr(0, length), {true}));
  }
}

TEST_CASE("hostile searches are read or refused, never more", "[notebook][find][identity]") {
  CHECK(parsed("' OR 1=1 --") == "'1=1'");
  CHECK(parsed("NEAR(a b) ^a title:x").starts_with("fault"));
  CHECK(parsed("NEAR ^film film^2 a+b {col}") == "'NEAR' '^film' 'film^2' 'a+b' '{col}'");
  CHECK(parsed(std::string_view("fi\0lm", 5)) == "'fi' 'lm'");
  CHECK(parsed("\u202Efilm\u200B") == "'film'");
  CHECK(what(std::string(10'000'000, 'a')) == "a search of more than 10000 bytes");
  CHECK(what(std::string(5'000, '(')) == "more than 32 levels of parentheses and 'not'");
  std::string nots;
  for (int i = 0; i < 40; ++i) nots += "not ";
  CHECK(what(nots + "a") == "more than 32 levels of parentheses and 'not'");
  std::string many;
  for (int i = 0; i < 201; ++i) many += "a or ";
  CHECK(what(many + "a") == "more than 200 conditions");

  constexpr std::string_view kParts[] = {"a",  "or",   " ",  " ",          "not",     "(",
                                         ")",  "\"",   "*",  "additive:",  "yield",   ">",
                                         "<=", "..",   "5",  "mol%",       "2026-03", "-",
                                         "é",  "\xE2", "\0", "structure:", ":",       "0.1 M",
                                         "=",  "'",    "h",  "1e9"};
  std::mt19937_64 random(17);
  for (int round = 0; round < 20'000; ++round) {
    std::string text;
    const std::size_t parts = random() % 14;
    for (std::size_t i = 0; i < parts; ++i) text += kParts[random() % std::size(kParts)];
    for (const bool asYouType : {false, true}) {
      const auto query = parseFind(text, {asYouType});
      INFO(text);
      if (query) continue;
      REQUIRE(query.error().offset <= text.size());
      REQUIRE(query.error().offset + query.error().length <= text.size());
      REQUIRE_FALSE(query.error().what.empty());
      REQUIRE_FALSE(query.error().mend.empty());
    }
  }
}

TEST_CASE("a value is written so that it is read back", "[notebook][find][identity]") {
  CHECK(asFindValue("4CzIPN") == "4CzIPN");
  CHECK(asFindValue("pivalic acid") == "\"pivalic acid\"");
  for (const char* name : {"(R)-BINOL", "a\"b", "\"", "x)", "amb*", "5 mol%", "not", "β-pinene",
                           "N,N-dimethyl", "a:b", ">5"}) {
    INFO(name);
    const auto query = parseFind("additive:" + asFindValue(name) + " film");
    REQUIRE(query);
    REQUIRE(query->conditions.size() == 2);
    CHECK(std::get<SubstanceName>(query->conditions[0].data).written == name);
    CHECK_FALSE(std::get<SubstanceName>(query->conditions[0].data).isPrefix);
  }
}

TEST_CASE("the examples of docs/find.md are read", "[notebook][find]") {
  std::ifstream page(VIALKEEPER_SOURCE_DIR "/docs/find.md");
  std::size_t examples = 0;
  for (std::string line; std::getline(page, line);) {
    if (line.starts_with("    ")) CHECK(parsed(line).find("fault") == std::string::npos);
    // In running text, what is written as code and holds a field or a range.
    for (std::size_t at = line.find('`'); at != std::string::npos; at = line.find('`', at + 1)) {
      const std::size_t end = line.find('`', at + 1);
      if (end == std::string::npos) break;
      const std::string code = line.substr(at + 1, end - at - 1);
      at = end;
      const bool isLoading = code.find("mol%") != std::string::npos ||
                             code.find("equiv") != std::string::npos || code.ends_with(" M");
      const bool isExample =
          code.find_first_of(":>.") != std::string::npos && !code.ends_with(':') && code != ".." &&
          code != ">" && code != ">=" &&
          std::ranges::any_of(code, [](unsigned char c) { return std::isalnum(c) != 0; }) &&
          !code.starts_with("vialkeeper");
      // What the page shows as refused.
      if ((!isExample && !isLoading) || code.starts_with("5-20")) continue;
      ++examples;
      INFO(code);
      CHECK(parsed(isLoading ? "any:x " + code : code).find("fault") == std::string::npos);
    }
  }
  CHECK(examples > 30);
}
