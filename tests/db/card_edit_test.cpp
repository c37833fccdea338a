// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>
#include <random>

#include "app/notebook/shelf_cards.h"
#include "app/notebook/substance_cards.h"
#include "db/work_desk.h"

namespace vialkeeper {
namespace {

using tests::good;
using tests::told;
using tests::WorkDesk;

std::vector<std::string> names(const std::vector<app::SubstanceRecord>& cards) {
  std::vector<std::string> list;
  for (const app::SubstanceRecord& card : cards) list.push_back(card.name);
  return list;
}

app::SubstanceRecord addIndoline(WorkDesk& work) {
  return good(app::addSubstanceCard(work.desk(), {.name = "indoline",
                                                  .synonyms = {"2,3-dihydroindole"},
                                                  .smiles = "c1ccc2c(c1)CCN2",
                                                  .cas = "496-15-1",
                                                  .hazards = {"H302"},
                                                  .note = "invented"}))
      .substance;
}

TEST_CASE("a substance's draft describes the same card", "[app][shelf][identity]") {
  WorkDesk work;
  const auto card = addIndoline(work);
  const auto described = good(app::describeSubstance(app::draftOf(card)));
  CHECK(described.name == card.name);
  CHECK(described.synonyms == card.synonyms);
  CHECK(described.formula == card.formula);
  CHECK(described.canonicalSmiles == card.canonicalSmiles);
  CHECK(described.inchiKey == card.inchiKey);
  CHECK(described.molarMass_g_mol == card.molarMass_g_mol);
  CHECK(described.fingerprint == card.fingerprint);
  CHECK(described.hazards == card.hazards);
  const auto bare =
      good(app::describeSubstance({.name = "a polymer", .molarMass = "5000.25 g/mol"}));
  CHECK(good(app::describeSubstance(app::draftOf(bare))).molarMass_g_mol == bare.molarMass_g_mol);
}

TEST_CASE("a card that is saved as it was read is not changed", "[app][shelf][identity]") {
  WorkDesk work;
  const auto card = good(work.notebook().substance(addIndoline(work).n));
  const auto before = good(work.notebook().summary()).revisions;
  const auto same = good(app::changeSubstanceCard(work.desk(), card, app::draftOf(card)));
  CHECK(same.version == card.version);
  CHECK(good(work.notebook().summary()).revisions == before);
}

TEST_CASE("a changed card has the names it was given and no others", "[app][shelf][regression]") {
  WorkDesk work;
  const auto card = addIndoline(work);
  app::SubstanceDraft draft = app::draftOf(card);
  draft.name = "2,3-dihydro-1H-indole";
  draft.synonyms = {"indoline"};
  draft.note = "redistilled";
  const auto changed = good(app::changeSubstanceCard(work.desk(), card, draft));
  CHECK(changed.name == "2,3-dihydro-1H-indole");
  CHECK(changed.synonyms == std::vector<std::string>{"indoline"});
  CHECK(good(app::suggestSubstances(work.notebook(), "2,3-dihydroindole")).empty());
  CHECK(tests::findings(work.notebook()).empty());
  // The older version is not written over the newer one.
  CHECK(told(app::changeSubstanceCard(work.desk(), card, app::draftOf(card))).find("substance 1") ==
        0);
  CHECK(told(app::changeSubstanceCard(work.desk(), changed, {.name = "", .cas = "1-1-1"})).size() >
        10);
  good(app::addSubstanceCard(work.desk(), {.name = "quinoline", .formula = "C9H7N"}));
  app::SubstanceDraft clash = app::draftOf(changed);
  clash = {.name = "quinoline", .formula = "C9H7N"};
  CHECK(told(app::changeSubstanceCard(work.desk(), changed, clash)).find("on the shelf already") !=
        std::string::npos);
}

TEST_CASE("suggestions begin with what was typed, then have words that do, then hold it",
          "[app][shelf][regression]") {
  WorkDesk work;
  addIndoline(work);
  for (const auto& [name, formula, cas] : {std::tuple{"pivalic acid", "C5H10O2", "75-98-9"},
                                           {"acetic acid", "C2H4O2", "64-19-7"},
                                           {"acetonitrile", "C2H3N", "75-05-8"},
                                           {"N-acetylindoline", "C10H11NO", ""},
                                           {"fluoroacetic acid", "C2H3FO2", ""}})
    good(app::addSubstanceCard(work.desk(), {.name = name, .formula = formula, .cas = cas}));
  const auto suggested = [&work](std::string_view typed, std::size_t most = 8) {
    return names(good(app::suggestSubstances(work.notebook(), typed, most)));
  };
  CHECK(suggested("acet") == std::vector<std::string>{"acetic acid", "acetonitrile",
                                                      "N-acetylindoline", "fluoroacetic acid"});
  CHECK(suggested("ACET", 2) == std::vector<std::string>{"acetic acid", "acetonitrile"});
  CHECK(suggested("acid").size() == 3);
  CHECK(suggested("75-") == std::vector<std::string>{"acetonitrile", "pivalic acid"});
  CHECK(suggested("64-19-7") == std::vector<std::string>{"acetic acid"});
  CHECK(suggested("dihydroindole") == std::vector<std::string>{"indoline"});
  // Another way to write the structure.
  CHECK(suggested("C1CC2=CC=CC=C2N1") == std::vector<std::string>{"indoline"});
  CHECK(suggested("").empty());
  CHECK(suggested("  ").empty());
  CHECK(suggested("\xFF\xFE").empty());
  CHECK(suggested("indoline", 0).empty());
}

TEST_CASE("no text makes suggestions fail", "[app][shelf][identity]") {
  WorkDesk work;
  addIndoline(work);
  std::mt19937_64 random(3);
  for (int round = 0; round < 400; ++round) {
    std::string typed;
    for (std::size_t length = random() % 6; length > 0; --length)
      typed += static_cast<char>(random() % 256);
    REQUIRE(app::suggestSubstances(work.notebook(), typed));
  }
}

TEST_CASE("a card's fields as typed make the same card", "[app][shelf][identity]") {
  WorkDesk work;
  addIndoline(work);
  const app::ShelfCard vial =
      good(app::addShelfCard(work.desk(), app::ShelfKind::kVial, "10 mL crimp",
                             {{"volume", "11.6 mL"},
                              {"u_volume", "0.1 mL"},
                              {"rated_gauge", "2 bar"},
                              {"derating", "0.5"},
                              {"note", "invented"}}));
  const app::ShelfCard lot = good(app::addShelfCard(
      work.desk(), app::ShelfKind::kLot, "IND-1", {{"substance", "indoline"}, {"assay", "0.985"}}));
  for (const app::ShelfCard& card : {vial, lot}) {
    const auto typed = app::typedFields(work.notebook(), card);
    const auto read = good(app::readCard(work.notebook(), card.kind, card.name, typed));
    CHECK(read.fields == card.fields);
    CHECK(read.substance == card.substance);
    const auto present = *good(work.notebook().findCard(card.kind, card.name));
    CHECK(good(app::changeShelfCard(work.desk(), present, card.name, typed)).version ==
          present.version);
  }
}

TEST_CASE("a changed card keeps only what it was given", "[app][shelf][regression]") {
  WorkDesk work;
  const app::ShelfCard vial =
      good(app::addShelfCard(work.desk(), app::ShelfKind::kVial, "a vial",
                             {{"volume", "11.6 mL"}, {"rated_gauge", "2 bar"}}));
  good(app::addShelfCard(work.desk(), app::ShelfKind::kVial, "another", {{"volume", "20 mL"}}));
  const auto changed =
      good(app::changeShelfCard(work.desk(), vial, "a new name", {{"volume", "11.7 mL"}}));
  CHECK(changed.name == "a new name");
  CHECK(changed.version == 2);
  CHECK(changed.fields.size() == 1);
  CHECK_FALSE(good(work.notebook().findCard(app::ShelfKind::kVial, "a vial")));
  CHECK(told(app::changeShelfCard(work.desk(), changed, "another", {{"volume", "1 mL"}})) ==
        "name: there is a vial called another already\n");
  CHECK(
      told(app::changeShelfCard(work.desk(), changed, "x", {{"volume", "1 mg"}, {"colour", "red"}}))
          .find("colour: ") != std::string::npos);
  CHECK(told(app::changeShelfCard(work.desk(), vial, "x", {{"volume", "1 mL"}})).size() > 0);
  CHECK(tests::findings(work.notebook()).empty());
}

}  // namespace
}  // namespace vialkeeper
