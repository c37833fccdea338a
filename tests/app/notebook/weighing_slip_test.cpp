// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/weighing_slip.h"

#include <catch2/catch.hpp>

#include <cmath>
#include <optional>
#include <random>
#include <string>
#include <vector>

#include "units/quantity_text.h"

using namespace vialkeeper;
using app::questionWeighing;
using app::Recorded;
using app::SlipKind;
using app::SlipQuestion;
using charge::ComponentCharge;
using charge::ComponentPlan;
using units::Density;
using units::Mass;
using units::Volume;

namespace {

ComponentPlan plan(charge::Supply supply, charge::Role role = charge::Role::kSubstrate) {
  return {.key = "x",
          .role = role,
          .name = "indoline",
          .identity = {},
          .amount = {},
          .supply = std::move(supply),
          .supplyGiven = true,
          .perLimiting = 0.0,
          .device = {},
          .tolerancePercent = {},
          .hazards = {},
          .place = {}};
}

ComponentCharge target(std::optional<double> mg, std::optional<double> uL,
                       std::optional<double> gPerML = {}) {
  ComponentCharge charge;
  charge.key = "x";
  charge.name = "indoline";
  if (mg) charge.targetMass = Mass::fromMilligrams(*mg);
  if (uL) charge.targetVolume = Volume::fromMicrolitres(*uL);
  if (gPerML) charge.density = Density::fromGramsPerMillilitre(*gPerML);
  return charge;
}

Recorded recorded(const std::string& text) {
  const auto read = units::readQuantityOf({units::Kind::kMass, units::Kind::kVolume}, text,
                                          units::Dialect::kPerson);
  REQUIRE(read);
  if (read->kind == units::Kind::kMass) return Mass::fromSi(read->si);
  return Volume::fromSi(read->si);
}

std::vector<SlipQuestion> ask(const ComponentPlan& plan, const ComponentCharge& target,
                              const std::string& text) {
  return questionWeighing(plan, target, recorded(text), text);
}

const ComponentPlan kSolid = plan(charge::SolidSupply{});
const ComponentPlan kLiquid = plan(charge::LiquidSupply{});
const ComponentPlan kStock = plan(charge::StockSupply{});
const ComponentPlan kSolvent = plan(charge::LiquidSupply{}, charge::Role::kSolvent);

}  // namespace

TEST_CASE("a power of ten off its target is questioned with the value that was probably meant",
          "[weighing]") {
  struct Row {
    const char* text;
    SlipKind kind;
    const char* likely;
    double factor;
  };
  const std::vector<Row> rows = {
      {"26.9 g", SlipKind::kUnit, "26.9 mg", 1e-3},
      {"26,9 g", SlipKind::kUnit, "26.9 mg", 1e-3},
      {"26.9 ug", SlipKind::kUnit, "26.9 mg", 1e3},
      {"26.9 µg", SlipKind::kUnit, "26.9 mg", 1e3},
      {"0.0269 mg", SlipKind::kUnit, "0.0269 g", 1e3},
      {"26.9 kg", SlipKind::kUnit, "26.9 mg", 1e-6},
      {"2.69 mg", SlipKind::kDecimalSign, "26.9 mg", 10},
      {"269 mg", SlipKind::kDecimalSign, "26.9 mg", 0.1},
      {"0.269 mg", SlipKind::kDecimalSign, "26.9 mg", 100},
      {"2690 mg", SlipKind::kDecimalSign, "26.9 mg", 0.01},
      {"0.269 g", SlipKind::kDecimalSign, "0.0269 g", 0.1},
      {"330 mg", SlipKind::kDecimalSign, "33 mg", 0.1},
      {"2.1 mg", SlipKind::kDecimalSign, "21 mg", 10},
  };
  for (const Row& row : rows) {
    INFO(row.text);
    const auto questions = ask(kSolid, target(26.8, {}), row.text);
    REQUIRE(questions.size() == 1);
    const SlipQuestion& question = questions.front();
    CHECK(question.kind == row.kind);
    CHECK(question.likelyText == row.likely);
    CHECK(question.ask == "did you mean " + std::string(row.likely) + "?");
    REQUIRE(question.likely);
    const double given = std::get<Mass>(recorded(row.text)).si();
    CHECK(std::get<Mass>(*question.likely).si() == Approx(given * row.factor).epsilon(1e-12));
  }
  CHECK(ask(kSolid, target(26.8, {}), "26.9 g").front().what ==
        "26.9 g is about 1000 times the target of 26.8 mg");
  CHECK(ask(kSolid, target(26.8, {}), "2.69 mg").front().what ==
        "2.69 mg is about 1/10 of the target of 26.8 mg");
}

TEST_CASE("volumes slip between microlitres and millilitres", "[weighing]") {
  const auto mL = ask(kStock, target({}, 100), "100 mL");
  REQUIRE(mL.size() == 1);
  CHECK(mL.front().kind == SlipKind::kUnit);
  CHECK(mL.front().likelyText == "100 uL");
  const auto uL = ask(kSolvent, target(1500, 1900, 0.786), "1.9 ul");
  REQUIRE(uL.size() == 1);
  CHECK(uL.front().likelyText == "1.9 mL");
}

TEST_CASE("what is near its target is not questioned", "[weighing]") {
  for (const char* text : {"26.8 mg", "26.9 mg", "21 mg", "33 mg", "0.0269 g", "26900 ug"}) {
    INFO(text);
    CHECK(ask(kSolid, target(26.8, {}), text).empty());
  }
  CHECK(ask(kLiquid, target(26.8, 25.2, 1.063), "25.2 uL").empty());
  CHECK(ask(kLiquid, target(26.8, 25.2, 1.063), "26.8 mg").empty());
  CHECK(ask(kSolid, target(0, {}), "26.8 mg").empty());
  CHECK(ask(kSolid, target({}, {}), "26.8 mg").empty());
}

TEST_CASE("more than a quarter off target is questioned, with no guess", "[weighing]") {
  struct Row {
    const char* text;
    const char* what;
  };
  const std::vector<Row> rows = {{"12.3 mg", "12.3 mg is 54 % below the target of 26.8 mg"},
                                 {"34 mg", "34 mg is 27 % above the target of 26.8 mg"},
                                 {"80 mg", "80 mg is 2.99 times the target of 26.8 mg"},
                                 {"20 mg", "20 mg is 25 % below the target of 26.8 mg"}};
  for (const Row& row : rows) {
    const auto questions = ask(kSolid, target(26.8, {}), row.text);
    REQUIRE(questions.size() == 1);
    CHECK(questions.front().kind == SlipKind::kOffTarget);
    CHECK(questions.front().what == row.what);
    CHECK(!questions.front().likely);
    CHECK(questions.front().likelyText.empty());
  }
}

TEST_CASE("a mass where a volume is usual is questioned, and the reverse", "[weighing]") {
  ComponentPlan stock = kStock;
  const auto weighed = ask(stock, target({}, 100, 0.79), "79 mg");
  REQUIRE(weighed.size() == 1);
  CHECK(weighed.front().kind == SlipKind::kOtherQuantity);
  CHECK(weighed.front().what == "79 mg is a mass, but indoline is usually taken by volume");
  CHECK(weighed.front().ask == "was it really weighed?");
  const auto figure = ask(stock, target({}, 100, 0.79), "100 mg");
  REQUIRE(figure.size() == 1);  // the other quantity explains the size too
  CHECK(figure.front().likelyText == "100 µL");
  CHECK(std::get<Volume>(*figure.front().likely).microlitres() == Approx(100));

  ComponentPlan onBalance = kLiquid;
  onBalance.device = *charge::findDevice("balance-0.1mg");
  CHECK(ask(onBalance, target(26.8, 25.2, 1.063), "25.2 uL").front().kind ==
        SlipKind::kOtherQuantity);
  CHECK(ask(onBalance, target(26.8, 25.2, 1.063), "26.8 mg").empty());
  ComponentPlan byPipette = kLiquid;
  byPipette.device = *charge::findDevice("pipette-100uL");
  CHECK(ask(byPipette, target(26.8, 25.2, 1.063), "25.2 uL").empty());
  CHECK(ask(byPipette, target(26.8, 25.2, 1.063), "26.8 mg").front().ask ==
        "was it really weighed?");
}

TEST_CASE("the figure of the other target is recognised where the density tells them apart",
          "[weighing]") {
  const auto heavy = ask(kLiquid, target(133, 100, 1.33), "100 mg");
  REQUIRE(heavy.size() == 1);
  CHECK(heavy.front().kind == SlipKind::kOtherQuantity);
  CHECK(heavy.front().what == "100 mg has the figure of the target of 100 µL");
  CHECK(heavy.front().likelyText == "100 µL");
  const auto reverse = ask(kLiquid, target(133, 100, 1.33), "133 uL");
  REQUIRE(reverse.size() == 1);
  CHECK(reverse.front().likelyText == "133 mg");
}

TEST_CASE("whatever is recorded, the questions are few, worded, and alike twice",
          "[weighing][identity]") {
  std::mt19937_64 random(5);
  std::uniform_real_distribution<double> power(-12, 6);
  const std::vector<const ComponentPlan*> plans = {&kSolid, &kLiquid, &kStock, &kSolvent};
  for (int round = 0; round < 5000; ++round) {
    const auto some = [&] { return std::pow(10.0, power(random)); };
    const auto goal = target(random() % 3 != 0 ? std::optional(some()) : std::nullopt,
                             random() % 3 != 0 ? std::optional(some()) : std::nullopt,
                             random() % 2 != 0 ? std::optional(some()) : std::nullopt);
    const Recorded actual = random() % 2 != 0 ? Recorded(Mass::fromMilligrams(some()))
                                              : Recorded(Volume::fromMicrolitres(some()));
    const auto questions = questionWeighing(*plans[random() % 4], goal, actual,
                                            random() % 2 != 0 ? "nonsense \xFF" : "");
    REQUIRE(questions.size() <= 2);
    for (const SlipQuestion& question : questions) {
      REQUIRE(!question.what.empty());
      REQUIRE(question.ask.ends_with('?'));
      REQUIRE(question.likely.has_value() == !question.likelyText.empty());
    }
  }
}

TEST_CASE("the value that was probably meant raises no question of size itself",
          "[weighing][identity]") {
  for (const char* text :
       {"26.9 g", "2.69 mg", "269 mg", "2690 mg", "26.9 ug", "330 mg", "21.5 g"}) {
    INFO(text);
    const auto questions = ask(kSolid, target(26.8, {}), text);
    REQUIRE(questions.size() == 1);
    CHECK(ask(kSolid, target(26.8, {}), questions.front().likelyText).empty());
  }
}
