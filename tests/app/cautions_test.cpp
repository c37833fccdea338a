// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "app/sheet_bench.h"

using namespace vialkeeper;
using namespace vialkeeper::tests;

namespace {

std::vector<std::string> cautionsOf(const std::string& plan) {
  return app::weighingSheet(planned(plan)).cautions;
}

constexpr const char* kGases = "gases = [ { species = \"H2\" } ]\n";

}  // namespace

TEST_CASE("hydrogen and the pressure that it builds call for their cautions",
          "[app][sheet][cautions]") {
  const auto cautions = cautionsOf(sheetPlan());
  CHECK(anyHolds(cautions, "builds up pressure"));
  CHECK(anyHolds(cautions, "Hydrogen burns in air"));
  CHECK(!anyHolds(cautions, "No pressure rating"));
  CHECK(!anyHolds(cautions, "oxygen"));
  const auto still = cautionsOf(replaced(sheetPlan(), kGases, ""));
  CHECK(!anyHolds(still, "builds up pressure"));
  CHECK(!anyHolds(still, "Hydrogen"));
  const auto nitrogen =
      cautionsOf(replaced(sheetPlan(), kGases, "gases = [ { species = \"N2\" } ]\n"));
  CHECK(anyHolds(nitrogen, "builds up pressure"));
  CHECK(!anyHolds(nitrogen, "Hydrogen"));
  CHECK(anyHolds(cautionsOf(replaced(sheetPlan(), kGases, "gases = [ { species = \"CO\" } ]\n")),
                 "Carbon monoxide"));
}

TEST_CASE("a vial without a rating is told where gas is given off", "[app][sheet][cautions]") {
  const std::string unrated = replaced(sheetPlan(), "rated_gauge = \"2.0 bar\"\n", "");
  CHECK(anyHolds(cautionsOf(unrated), "No pressure rating is known"));
  CHECK(!anyHolds(cautionsOf(replaced(unrated, kGases, "")), "No pressure rating is known"));
}

TEST_CASE("hydrogen under a headspace with oxygen is told", "[app][sheet][cautions]") {
  for (const char* atmosphere : {"\"air\"", "{ N2 = 0.9, O2 = 0.1 }"}) {
    INFO(atmosphere);
    const std::string plan =
        replaced(sheetPlan(), "atmosphere = \"N2\"", std::string("atmosphere = ") + atmosphere);
    CHECK(anyHolds(cautionsOf(plan), "The headspace holds oxygen"));
    CHECK(!anyHolds(cautionsOf(replaced(plan, kGases, "")), "The headspace holds oxygen"));
  }
  CHECK(!anyHolds(cautionsOf(replaced(sheetPlan(), "\"N2\"", "{ N2 = 1.0, O2 = 0.0 }")),
                  "holds oxygen"));
}

TEST_CASE("UV and visible light call for different goggles, darkness for none",
          "[app][sheet][cautions]") {
  const auto at = [](const std::string& wavelength) {
    return cautionsOf(
        replaced(sheetPlan(), "wavelength = \"440 nm\"", "wavelength = \"" + wavelength + "\""));
  };
  CHECK(anyHolds(at("440 nm"), "Bright light harms the eyes"));
  CHECK(anyHolds(at("400 nm"), "Bright light harms the eyes"));
  CHECK(anyHolds(at("365 nm"), "UV harms eyes and skin"));
  CHECK(!anyHolds(at("365 nm"), "Bright light"));
  const auto dark = cautionsOf(replaced(sheetPlan(), "wavelength = \"440 nm\"\n", ""));
  CHECK(!anyHolds(dark, "UV"));
  CHECK(!anyHolds(dark, "Bright light"));
}

TEST_CASE("every sheet says who decides", "[app][sheet][cautions]") {
  CHECK(anyHolds(cautionsOf(sheetPlan()), "your safety officer decide"));
  CHECK(anyHolds(cautionsOf(replaced(sheetPlan(), kGases, "")), "your safety officer decide"));
}
