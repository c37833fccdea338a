// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include <random>

#include "charge/plan_fixture.h"
#include "charge/random_plan.h"
#include "charge/scaling.h"

using namespace vialkeeper;
using charge::Retarget;
using tests::at;
using tests::chargeOf;
using tests::weighed;

namespace {

constexpr std::uint64_t kPlans = 600;

/// Both have the same targets, amounts and ratios within `relative`; masses and amounts of `b` are
/// `factor` times those of `a`.
void checkSame(const charge::Charge& a, const charge::Charge& b, double relative,
               double factor = 1.0) {
  REQUIRE(a.components.size() == b.components.size());
  const auto same = [relative](double x, double y) {
    REQUIRE(x == Approx(y).epsilon(relative).margin(1e-18));
  };
  same(factor * a.totalLiquid.si(), b.totalLiquid.si());
  same(factor * a.limitingAmount.si(), b.limitingAmount.si());
  for (std::size_t i = 0; i < a.components.size(); ++i) {
    const auto& x = a.components[i];
    const auto& y = b.components[i];
    INFO(x.key);
    REQUIRE(x.targetMass.has_value() == y.targetMass.has_value());
    REQUIRE(x.targetVolume.has_value() == y.targetVolume.has_value());
    if (x.targetMass) same(factor * x.targetMass->si(), y.targetMass->si());
    if (x.targetVolume) same(factor * x.targetVolume->si(), y.targetVolume->si());
    REQUIRE(x.amount_mol.has_value() == y.amount_mol.has_value());
    if (!x.amount_mol) continue;
    same(factor * x.amount_mol->value(), y.amount_mol->value());
    same(*x.equiv, *y.equiv);
    same(*x.molPercent, *y.molPercent);
    REQUIRE(x.concentration.has_value() == y.concentration.has_value());
    if (x.concentration) same(x.concentration->si(), y.concentration->si());
  }
}

/// Every target recorded exactly as it was asked for.
std::vector<tests::Recorded> exactly(const charge::Charge& charge, std::mt19937_64& random) {
  std::vector<tests::Recorded> recorded;
  for (const auto& component : charge.components) {
    if (component.targetMass && (!component.targetVolume || random() % 2 == 0)) {
      if (component.targetMass->si() > 0.0)
        recorded.push_back({component.key, *component.targetMass});
    } else if (component.targetVolume && component.targetVolume->si() > 0.0) {
      recorded.push_back({component.key, *component.targetVolume});
    }
  }
  return recorded;
}

}  // namespace

TEST_CASE("charging exactly what was planned gives back the plan, 600 random plans",
          "[charge][identity]") {
  std::mt19937_64 random(1);
  std::size_t checked = 0;
  for (std::uint64_t seed = 0; seed < kPlans; ++seed) {
    const auto plan = tests::readGoodPlan(tests::randomPlanText(seed));
    const auto planned = chargeOf(plan);
    for (const auto retarget : {Retarget::kNo, Retarget::kYes}) {
      const auto charged = weighed(plan, exactly(planned, random), retarget);
      checkSame(planned, charged, 1e-9);
      for (const auto& component : charged.components) {
        if (!component.charged) continue;
        INFO(seed << " " << component.key);
        ++checked;
        REQUIRE(*component.charged->offTargetPercent == Approx(0.0).margin(1e-7));
        if (!component.amount_mol) continue;
        REQUIRE(component.charged->amount_mol->value() ==
                Approx(component.amount_mol->value()).epsilon(1e-9));
        REQUIRE(component.charged->equiv->value() == Approx(*component.equiv).epsilon(1e-9));
        REQUIRE(component.charged->molPercent->value() ==
                Approx(*component.molPercent).epsilon(1e-9));
        REQUIRE(component.charged->concentration_mol_m3.has_value() ==
                component.concentration.has_value());
        if (component.concentration) {
          REQUIRE(component.charged->concentration_mol_m3->value() ==
                  Approx(component.concentration->si()).epsilon(1e-9));
        }
      }
    }
  }
  CHECK(checked > 4 * kPlans);
}

TEST_CASE("scaling by a and then by b is scaling by a times b, 600 random plans",
          "[charge][identity]") {
  std::mt19937_64 random(2);
  std::uniform_real_distribution<double> factor(0.1, 10.0);
  for (std::uint64_t seed = 0; seed < kPlans; ++seed) {
    INFO(seed);
    const auto plan = tests::readGoodPlan(tests::randomPlanText(seed));
    const double a = factor(random);
    const double b = factor(random);
    const auto inTwo = chargeOf(charge::scaled(charge::scaled(plan, a), b));
    checkSame(chargeOf(charge::scaled(plan, a * b)), inTwo, 1e-12);
    checkSame(chargeOf(plan), inTwo, 1e-9, a * b);
  }
}

TEST_CASE("solvents, stocks, liquids and solids with density fill the total, 600 random plans",
          "[charge][identity]") {
  for (std::uint64_t seed = 0; seed < kPlans; ++seed) {
    INFO(seed);
    const auto charge = chargeOf(tests::randomPlanText(seed));
    double sum = 0.0;
    for (const auto& component : charge.components) {
      if (!component.liquidVolume) continue;
      REQUIRE(component.liquidVolume->si() >= 0.0);
      sum += component.liquidVolume->si();
    }
    REQUIRE(sum == Approx(charge.totalLiquid.si()).epsilon(1e-9));
    REQUIRE_FALSE(tests::hasNotice(charge.notices, "volume-not-filled"));
  }
}

TEST_CASE("the same plan in other units gives the same charge, 600 random plans",
          "[charge][identity]") {
  for (std::uint64_t seed = 0; seed < kPlans; ++seed) {
    INFO(seed);
    REQUIRE(tests::randomPlanText(seed, 0) != tests::randomPlanText(seed, 1));
    checkSame(chargeOf(tests::randomPlanText(seed, 0)), chargeOf(tests::randomPlanText(seed, 1)),
              1e-12);
  }
}

TEST_CASE("a re-target follows the weighed amount by its rule, 600 random plans",
          "[charge][identity]") {
  std::mt19937_64 random(3);
  std::uniform_real_distribution<double> factor(0.9, 1.1);
  using charge::Basis;
  for (std::uint64_t seed = 0; seed < kPlans; ++seed) {
    const auto plan = tests::readGoodPlan(tests::randomPlanText(seed));
    const auto planned = chargeOf(plan);
    const auto& limiting = at(planned, "a");
    const double f = factor(random);
    tests::Recorded recorded{"a", units::Mass::fromSi(0.0)};
    if (limiting.targetMass) {
      recorded.actual = f * *limiting.targetMass;
    } else {
      recorded.actual = f * *limiting.targetVolume;
    }
    const auto after = weighed(plan, {recorded}, Retarget::kYes);
    REQUIRE(after.limitingAmount.si() == Approx(f * planned.limitingAmount.si()).epsilon(1e-9));
    const double volumeFactor = plan.liquid.total ? 1.0 : f;
    REQUIRE(after.totalLiquid.si() ==
            Approx(volumeFactor * planned.totalLiquid.si()).epsilon(1e-9));
    for (std::size_t i = 0; i < planned.components.size(); ++i) {
      const auto& before = planned.components[i];
      const Basis basis = plan.components[i].amount.basis;
      if (basis == Basis::kShare) continue;
      const bool follows = basis == Basis::kEquiv || basis == Basis::kMolPercent;
      const double expected = follows                                               ? f
                              : basis == Basis::kConcentration && before.key != "a" ? volumeFactor
                                                                                    : 1.0;
      INFO(seed << " " << before.key);
      REQUIRE(after.components[i].amount_mol->value() ==
              Approx(expected * before.amount_mol->value()).epsilon(1e-9));
    }
    REQUIRE(*at(after, "a").charged->equiv->standardUncertainty() == 0.0);
  }
}
