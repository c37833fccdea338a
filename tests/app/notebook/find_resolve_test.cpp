// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include <map>

#include "app/notebook/find_language.h"
#include "app/notebook/fold_name.h"

using namespace vialkeeper::app;

namespace {

/// A small shelf.
class Shelf : public SubstanceResolver {
 public:
  std::vector<RowNumber> numbersByName(std::string_view folded) override {
    return numbersWhere([&](const std::string& name) { return foldName(name) == folded; });
  }
  std::vector<RowNumber> numbersByNameBeginning(std::string_view folded) override {
    return numbersWhere(
        [&](const std::string& name) { return foldName(name).starts_with(folded); });
  }
  std::vector<RowNumber> numbersByCas(std::string_view cas) override {
    return cas == "75-98-9" ? std::vector<RowNumber>{2} : std::vector<RowNumber>{};
  }
  std::expected<std::vector<RowNumber>, vialkeeper::text::TextFault> numbersBySubstructure(
      std::string_view smiles) override {
    if (smiles == "C(=O)O") return std::vector<RowNumber>{2, 3};
    if (smiles == "C1CC")
      return vialkeeper::text::textFault(1, 1, "ring 1 is never closed", "close it");
    return std::vector<RowNumber>{};
  }
  std::vector<std::string> names() override {
    std::vector<std::string> all;
    for (const auto& [name, n] : m_names) all.push_back(name);
    return all;
  }

 private:
  template <class Test>
  std::vector<RowNumber> numbersWhere(Test test) {
    std::vector<RowNumber> found;
    for (const auto& [name, n] : m_names) {
      if (test(name)) found.push_back(n);
    }
    return found;
  }
  std::multimap<std::string, RowNumber> m_names = {
      {"4CzIPN", 1}, {"pivalic acid", 2}, {"PivOH", 2}, {"acetic acid", 3}, {"DMF", 4}, {"dmf", 5}};
};

std::expected<FindQuery, vialkeeper::text::TextFault> found(std::string_view text,
                                                            const ParseOptions& parse = {},
                                                            const ResolveOptions& resolve = {}) {
  Shelf shelf;
  const auto parsed = parseFind(text, parse);
  REQUIRE(parsed);
  return resolveQuery(*parsed, shelf, resolve);
}

const SubstanceCondition& first(
    const std::expected<FindQuery, vialkeeper::text::TextFault>& query) {
  REQUIRE(query);
  return std::get<SubstanceCondition>(query->conditions.at(0).data);
}

}  // namespace

TEST_CASE("names are looked up folded, by synonym and by CAS number", "[notebook][find]") {
  CHECK(first(found("photocatalyst:\"4-czipn\"")).substances == std::vector<RowNumber>{1});
  CHECK(first(found("acid:pivoh 5..20 mol%")).substances == std::vector<RowNumber>{2});
  CHECK(first(found("acid:pivoh 5..20 mol%")).loading_molPercent->most.value() == Approx(20.0));
  CHECK(first(found("acid:75-98-9")).substances == std::vector<RowNumber>{2});
  CHECK(first(found("solvent:DMF")).substances == std::vector<RowNumber>{4, 5});
  CHECK(first(found("any:piv*")).substances == std::vector<RowNumber>{2});
  CHECK(first(found("structure:C(=O)O")).substances == std::vector<RowNumber>{2, 3});
  CHECK(first(found("structure:[Pd]")).substances.empty());
  CHECK(first(found("acid:*")).anySubstance);
}

TEST_CASE("the tree keeps its form", "[notebook][find]") {
  const auto query = found("a not (acid:pivoh or yield>60)");
  REQUIRE(query);
  REQUIRE(query->conditions.size() == 2);
  const auto& none = std::get<NoneOf>(query->conditions[1].data);
  const auto& any = std::get<AnyOf>(none.conditions.at(0).data);
  CHECK(std::holds_alternative<SubstanceCondition>(any.conditions.at(0).data));
  CHECK(std::holds_alternative<MeasureCondition>(any.conditions.at(1).data));
}

TEST_CASE("a name of no substance is a fault that offers the nearest", "[notebook][find]") {
  const auto slip = found("film acid:pivalicacit");
  REQUIRE_FALSE(slip);
  CHECK(slip.error().offset == 10);
  CHECK(slip.error().length == 11);
  CHECK(slip.error().what == "no substance of this notebook is called 'pivalicacit'");
  CHECK(slip.error().mend == "did you mean \"pivalic acid\"?");
  CHECK(found("acid:acid").error().mend == "did you mean \"acetic acid\" or \"pivalic acid\"?");
  CHECK(found("acid:pivalic").error().mend == "did you mean \"pivalic acid\"?");
  CHECK(found("acid:xyzzy").error().mend.starts_with("write a name"));
  CHECK(found("acid:64-19-7").error().what ==
        "no substance of this notebook has the CAS number '64-19-7'");
  CHECK(found("acid:xy*").error().what ==
        "no substance of this notebook is called 'xy' or begins so");
}

TEST_CASE("while it is typed, a name narrows and an unknown one matches nothing",
          "[notebook][find]") {
  CHECK(first(found("acid:piv", {true}, {true})).substances == std::vector<RowNumber>{2});
  CHECK(first(found("acid:xyz", {true}, {true})).substances.empty());
  CHECK(first(found("acid:piv ", {true}, {true})).substances.empty());
}

TEST_CASE("a structure that cannot be read is pointed at within the search", "[notebook][find]") {
  CHECK(found("x structure:C1CC").error().offset == 13);
  CHECK(found("x structure:\"C1CC\"").error().offset == 14);
}
