// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/devices.h"

#include <catch2/catch.hpp>

#include <cmath>

using namespace vialkeeper;
using charge::Balance;
using charge::findDevice;
using charge::Pipette;
using units::Mass;
using units::Volume;

namespace {

const Pipette& pipette(const std::string& name) {
  const charge::Device* device = findDevice(name);
  REQUIRE(device != nullptr);
  REQUIRE(device->pipette() != nullptr);
  return *device->pipette();
}

}  // namespace

TEST_CASE("the minimum weight is the one that USP <41> works out", "[charge][published]") {
  // USP general chapter <41>, 2019 revision (quoted at ppmu.ouryao.com thread 701175): s = 0.00015
  // g gives 0.30000 g.
  const Balance example{Mass::fromMilligrams(0.1), Mass::fromMilligrams(0.15)};
  CHECK(example.minimumWeight().grams() == Approx(0.30000).margin(5e-6));
}

TEST_CASE("a balance that repeats better than 0.41 of its digit cannot weigh below 820 digits",
          "[charge][published]") {
  // Sartorius, summary of USP chapter 41: 2000 x 0.41 d = 820 d.
  for (const double d_mg : {0.001, 0.01, 0.1, 1.0}) {
    for (const double share : {0.01, 0.2, 0.41}) {
      const Balance balance{Mass::fromMilligrams(d_mg), Mass::fromMilligrams(share * d_mg)};
      CHECK(balance.minimumWeight().milligrams() == Approx(820.0 * d_mg).epsilon(1e-12));
    }
    const Balance worse{Mass::fromMilligrams(d_mg), Mass::fromMilligrams(0.42 * d_mg)};
    CHECK(worse.minimumWeight().milligrams() == Approx(840.0 * d_mg).epsilon(1e-12));
  }
}

TEST_CASE("the pipettes have the limits of the percent steps of ISO 8655-2",
          "[charge][published]") {
  // ISO 8655-2:2022 type A as steps of the nominal volume (public calibration script, secondary
  // copy): systematic 1.2 % to 10 uL, 1.0 % to 50 uL, 0.8 % to 5000 uL; random 0.8 % to 10 uL, 0.5
  // % to 50 uL, 0.3 % above. The row of 1000 uL, 8 and 3 uL, also stands in a calibration paper
  // (studylib.net 26303027).
  struct Row {
    double nominal, systematic, random;
  };
  for (const auto& [nominal, systematic, random] :
       {Row{10, 0.12, 0.08}, Row{20, 0.20, 0.10}, Row{100, 0.8, 0.3}, Row{200, 1.6, 0.6},
        Row{1000, 8.0, 3.0}, Row{5000, 40, 15}}) {
    const double systematicPercent = nominal <= 10 ? 1.2 : nominal <= 50 ? 1.0 : 0.8;
    const double randomPercent = nominal <= 10 ? 0.8 : nominal <= 50 ? 0.5 : 0.3;
    INFO(nominal);
    const Pipette& p = pipette("pipette-" + std::to_string(static_cast<int>(nominal)) + "uL");
    CHECK(p.nominal.microlitres() == Approx(nominal).epsilon(1e-12));
    CHECK(p.systematicLimit.microlitres() == Approx(systematic).epsilon(1e-12));
    CHECK(p.randomLimit.microlitres() == Approx(random).epsilon(1e-12));
    CHECK(p.systematicLimit.microlitres() ==
          Approx(systematicPercent / 100.0 * nominal).epsilon(1e-12));
    CHECK(p.randomLimit.microlitres() == Approx(randomPercent / 100.0 * nominal).epsilon(1e-12));
    CHECK(p.smallest < p.nominal);
  }
}

TEST_CASE(
    "the limits of a thousand-microlitre pipette are 0.8, 1.6 and 4 % at 1000, 500 and 200 uL",
    "[charge][published]") {
  // Same calibration paper: 0.8/1.6/4 % systematic and 0.3/0.6/1.5 % random, for the uL figure
  // holds at every volume.
  const Pipette& p = pipette("pipette-1000uL");
  for (const auto& [volume, systematic, random] :
       {std::tuple{1000.0, 0.8, 0.3}, {500.0, 1.6, 0.6}, {200.0, 4.0, 1.5}}) {
    const double u = p.standardUncertainty(Volume::fromMicrolitres(volume)).microlitres();
    const double expected =
        volume / 100.0 * std::sqrt(systematic * systematic / 3.0 + random * random);
    CHECK(u == Approx(expected).epsilon(1e-12));
  }
}

TEST_CASE("the doubt of a tared weighing and of pipette strokes is the GUM's sum",
          "[charge][identity]") {
  // Balance d 0.01 mg, s 0.02 mg: sqrt(0.02^2 + 2 x 0.01^2/12) = 0.0204124 mg.
  CHECK(findDevice("balance-0.01mg")->balance()->standardUncertainty().milligrams() ==
        Approx(0.0204124).epsilon(1e-5));
  // d = s = 1 mg: sqrt(1 + 2/12) = 1.080123 mg.
  CHECK(findDevice("balance-1mg")->balance()->standardUncertainty().milligrams() ==
        Approx(1.080123).epsilon(1e-6));
  // 1000 uL pipette: one stroke sqrt(64/3 + 9) = 5.50757 uL; three, sqrt(9 x 64/3 + 3 x 9)
  // = 14.79865 uL.
  const Pipette& p = pipette("pipette-1000uL");
  CHECK(p.standardUncertainty(Volume::fromMicrolitres(600)).microlitres() ==
        Approx(5.50757).epsilon(1e-6));
  CHECK(p.standardUncertainty(Volume::fromMicrolitres(2500)).microlitres() ==
        Approx(14.79865).epsilon(1e-6));
}

TEST_CASE("strokes are the fewest equal ones, and a full stroke is one in spite of rounding",
          "[charge]") {
  const Pipette& p = pipette("pipette-1000uL");
  CHECK(p.strokesFor(Volume::fromMicrolitres(1)) == 1);
  CHECK(p.strokesFor(Volume::fromMicrolitres(1000)) == 1);
  CHECK(p.strokesFor(Volume::fromMicrolitres(1000.001)) == 2);
  CHECK(p.strokesFor(Volume::fromMillilitres(2.0)) == 2);
  CHECK(p.strokesFor(0.1 * Volume::fromMillilitres(30)) == 3);
}

TEST_CASE("a device is found by its exact name, each once", "[charge]") {
  CHECK(findDevice("balance-0.01mg")->balance() != nullptr);
  CHECK(findDevice("balance-0.01mg")->pipette() == nullptr);
  CHECK(findDevice("balance-0.01 mg") == nullptr);
  CHECK(findDevice("") == nullptr);
  for (const charge::Device& device : charge::builtInDevices())
    CHECK(findDevice(device.name) == &device);
}

TEST_CASE("stock flasks are the standard sizes from small to large with their limits", "[charge]") {
  // ISO 1042 class A, from memory: 25 mL +- 0.04, those below +- 0.025.
  std::vector<double> sizes, limits;
  for (const charge::Flask& flask : charge::flasks()) {
    sizes.push_back(std::round(flask.nominal.millilitres()));
    limits.push_back(std::round(flask.limit.millilitres() * 1e6) / 1e6);
  }
  CHECK(sizes == std::vector<double>{1, 2, 5, 10, 25});
  CHECK(limits == std::vector<double>{0.025, 0.025, 0.025, 0.025, 0.04});
}
