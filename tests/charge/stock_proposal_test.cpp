// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/stock_proposal.h"

#include <catch2/catch.hpp>

#include <cmath>
#include <random>

using namespace vialkeeper;
using charge::proposeStock;
using charge::StockRequest;
using units::Amount;
using units::Mass;
using units::Volume;

namespace {

StockRequest randomRequest(std::mt19937_64& random) {
  std::uniform_real_distribution<double> decade(0.0, 1.0);
  const auto between = [&](double low, double high) {
    return low * std::pow(high / low, decade(random));
  };
  return {.amount = Amount::fromMoles(between(1e-9, 1e-4)),
          .suppliedMassPerMole = Mass::fromGrams(between(50.0, 2000.0)),
          .minimumWeight = Mass::fromMilligrams(between(0.82, 2000.0)),
          .room = Volume::fromMillilitres(between(0.01, 5.0))};
}

/// The least mass over every round concentration, flask and pipette that satisfies the request, by
/// trying all; infinite where none does. The pipettes and flasks of every installation are written
/// out here.
double leastMass_kg(const StockRequest& request) {
  double least = std::numeric_limits<double>::infinity();
  for (const double molPerL : {1e-4, 2e-4, 2.5e-4, 5e-4, 1e-3, 2e-3, 2.5e-3, 5e-3, 1e-2, 2e-2,
                               2.5e-2, 5e-2, 0.1, 0.2, 0.25, 0.5, 1.0}) {
    const double transfer_L = request.amount.moles() / molPerL;
    if (transfer_L > request.room.litres()) continue;
    for (const double pipette_uL : {10.0, 20.0, 100.0, 200.0, 1000.0, 5000.0}) {
      if (transfer_L * 1e6 < 0.2 * pipette_uL || transfer_L * 1e6 > pipette_uL) continue;
      for (const double flask_mL : {1.0, 2.0, 5.0, 10.0, 25.0}) {
        const double mass = molPerL * flask_mL / 1e3 * request.suppliedMassPerMole.si();
        if (mass >= request.minimumWeight.si() && transfer_L * 1e3 <= flask_mL)
          least = std::min(least, mass);
      }
    }
  }
  return least;
}

}  // namespace

TEST_CASE("a proposed stock satisfies all that was asked, in 3000 random requests",
          "[charge][identity]") {
  std::mt19937_64 random(20260304);
  int found = 0;
  for (int round = 0; round < 3000; ++round) {
    const StockRequest request = randomRequest(random);
    const auto proposal = proposeStock(request);
    if (!proposal) continue;
    ++found;
    const charge::Device* device = charge::findDevice(proposal->pipette);
    REQUIRE(device != nullptr);
    REQUIRE(device->pipette() != nullptr);
    const double part = proposal->transfer / device->pipette()->nominal;
    REQUIRE(part >= 0.2);
    REQUIRE(part <= 1.0);
    REQUIRE(proposal->transfer <= request.room);
    REQUIRE(proposal->transfer <= proposal->flask);
    REQUIRE(proposal->stockMass >= request.minimumWeight);
    REQUIRE((proposal->concentration * proposal->transfer).si() ==
            Approx(request.amount.si()).epsilon(1e-12));
    REQUIRE(proposal->stockMass.si() == Approx((proposal->concentration * proposal->flask).si() *
                                               request.suppliedMassPerMole.si())
                                            .epsilon(1e-12));
  }
  CHECK(found > 500);
}

TEST_CASE("no stock that satisfies all would cost less material, and none is missed",
          "[charge][identity]") {
  std::mt19937_64 random(4);
  for (int round = 0; round < 3000; ++round) {
    const StockRequest request = randomRequest(random);
    const auto proposal = proposeStock(request);
    const double least = leastMass_kg(request);
    REQUIRE(proposal.has_value() == std::isfinite(least));
    if (proposal) REQUIRE(proposal->stockMass.si() == Approx(least).epsilon(1e-9));
  }
}

TEST_CASE("a photocatalyst of a few tenths of a milligram gets a stock as a chemist would make it",
          "[charge]") {
  // 2 umol of 788.9 g/mol are 1.58 mg; the balance weighs from 40 mg, 1 mL is to spare. Least mass
  // above 40 mg: 5 mM in 10 mL or 10 mM in 5 mL, 39.4 mg, fall short; 25 mM in 2 mL the same; 2.5
  // mM in 25 mL, 49.3 mg, is the first.
  const auto proposal = proposeStock({.amount = Amount::fromMoles(2e-6),
                                      .suppliedMassPerMole = Mass::fromGrams(788.9),
                                      .minimumWeight = Mass::fromMilligrams(40),
                                      .room = Volume::fromMillilitres(1.0)});
  REQUIRE(proposal);
  CHECK(proposal->concentration.millimolPerLitre() == Approx(2.5));
  CHECK(proposal->flask.millilitres() == Approx(25.0));
  CHECK(proposal->stockMass.milligrams() == Approx(49.306).epsilon(1e-4));
  CHECK(proposal->transfer.microlitres() == Approx(800.0));
  CHECK(proposal->pipette == "pipette-1000uL");
}
