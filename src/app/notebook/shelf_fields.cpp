// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/shelf_fields.h"

#include <algorithm>
#include <array>
#include <stdexcept>

namespace vialkeeper::app {
namespace {

using enum ShelfField::Type;
using units::Kind;

constexpr double kMillilitre = 1e6;    // mL for one m3
constexpr double kMicrolitre = 1e9;    // µL for one m3
constexpr double kMilligram = 1e6;     // mg for one kg
constexpr double kMolPerLitre = 1e-3;  // mol/L for one mol/m3

constexpr std::array kLotFields = {
    ShelfField{.name = "assay", .column = "assay", .type = kNumber},
    ShelfField{.name = "u_assay", .column = "u_assay", .type = kNumber},
    ShelfField{.name = "density",
               .column = "density_g_ml",
               .type = kQuantity,
               .kind = Kind::kDensity,
               .perSi = 1e-3,
               .shownUnit = "g/mL"},
    ShelfField{.name = "opened", .column = "opened"},
    ShelfField{.name = "note", .column = "note"},
};

constexpr std::array kStockFields = {
    ShelfField{.name = "solvent", .column = "solvent"},
    ShelfField{.name = "concentration",
               .column = "concentration_mol_l",
               .type = kQuantity,
               .kind = Kind::kConcentration,
               .perSi = kMolPerLitre,
               .shownUnit = "mol/L",
               .required = true},
    ShelfField{.name = "u_concentration",
               .column = "u_concentration_mol_l",
               .type = kQuantity,
               .kind = Kind::kConcentration,
               .perSi = kMolPerLitre,
               .shownUnit = "mol/L"},
    ShelfField{.name = "volume",
               .column = "volume_ml",
               .type = kQuantity,
               .kind = Kind::kVolume,
               .perSi = kMillilitre,
               .shownUnit = "mL"},
    ShelfField{.name = "made", .column = "made"},
    ShelfField{.name = "note", .column = "note"},
};

constexpr std::array kVialFields = {
    ShelfField{.name = "volume",
               .column = "volume_ml",
               .type = kQuantity,
               .kind = Kind::kVolume,
               .perSi = kMillilitre,
               .shownUnit = "mL",
               .required = true},
    ShelfField{.name = "u_volume",
               .column = "u_volume_ml",
               .type = kQuantity,
               .kind = Kind::kVolume,
               .perSi = kMillilitre,
               .shownUnit = "mL"},
    ShelfField{.name = "displaced",
               .column = "displaced_ml",
               .type = kQuantity,
               .kind = Kind::kVolume,
               .perSi = kMillilitre,
               .shownUnit = "mL"},
    ShelfField{.name = "rated_gauge",
               .column = "rated_gauge_bar",
               .type = kQuantity,
               .kind = Kind::kPressure,
               .perSi = 1e-5,
               .shownUnit = "bar"},
    ShelfField{.name = "derating", .column = "derating", .type = kNumber},
    ShelfField{.name = "note", .column = "note"},
};

constexpr std::array kLampFields = {
    ShelfField{.name = "wavelength",
               .column = "wavelength_nm",
               .type = kQuantity,
               .kind = Kind::kLength,
               .perSi = 1e9,
               .shownUnit = "nm"},
    ShelfField{.name = "power",
               .column = "power_w",
               .type = kQuantity,
               .kind = Kind::kPower,
               .perSi = 1.0,
               .shownUnit = "W"},
    ShelfField{.name = "note", .column = "note"},
};

constexpr std::array kBalanceFields = {
    ShelfField{.name = "readability",
               .column = "readability_mg",
               .type = kQuantity,
               .kind = Kind::kMass,
               .perSi = kMilligram,
               .shownUnit = "mg",
               .required = true},
    ShelfField{.name = "repeatability",
               .column = "repeatability_mg",
               .type = kQuantity,
               .kind = Kind::kMass,
               .perSi = kMilligram,
               .shownUnit = "mg",
               .required = true},
    ShelfField{.name = "note", .column = "note"},
};

constexpr std::array kPipetteFields = {
    ShelfField{.name = "nominal",
               .column = "nominal_ul",
               .type = kQuantity,
               .kind = Kind::kVolume,
               .perSi = kMicrolitre,
               .shownUnit = "µL",
               .required = true},
    ShelfField{.name = "smallest",
               .column = "smallest_ul",
               .type = kQuantity,
               .kind = Kind::kVolume,
               .perSi = kMicrolitre,
               .shownUnit = "µL"},
    ShelfField{.name = "systematic",
               .column = "systematic_ul",
               .type = kQuantity,
               .kind = Kind::kVolume,
               .perSi = kMicrolitre,
               .shownUnit = "µL",
               .required = true},
    ShelfField{.name = "random",
               .column = "random_ul",
               .type = kQuantity,
               .kind = Kind::kVolume,
               .perSi = kMicrolitre,
               .shownUnit = "µL",
               .required = true},
    ShelfField{.name = "note", .column = "note"},
};

constexpr std::array kKinds = {
    ShelfKindInfo{ShelfKind::kLot, "lot", "lots", "lot", true, kLotFields},
    ShelfKindInfo{ShelfKind::kStock, "stock", "stocks", "stock", true, kStockFields},
    ShelfKindInfo{ShelfKind::kVial, "vial", "vials", "vial_type", false, kVialFields},
    ShelfKindInfo{ShelfKind::kLamp, "lamp", "lamps", "lamp", false, kLampFields},
    ShelfKindInfo{ShelfKind::kBalance, "balance", "balances", "balance", false, kBalanceFields},
    ShelfKindInfo{ShelfKind::kPipette, "pipette", "pipettes", "pipette", false, kPipetteFields},
};

}  // namespace

std::span<const ShelfKindInfo> shelfKinds() { return kKinds; }

const ShelfKindInfo& shelfKind(ShelfKind kind) {
  const auto found = std::ranges::find(kKinds, kind, &ShelfKindInfo::kind);
  if (found == kKinds.end()) throw std::logic_error("shelfKind: no such kind");
  return *found;
}

const ShelfKindInfo* findShelfKind(std::string_view word) {
  const auto found = std::ranges::find_if(kKinds, [word](const ShelfKindInfo& info) {
    return info.word == word || info.plural == word;
  });
  return found == kKinds.end() ? nullptr : &*found;
}

}  // namespace vialkeeper::app
