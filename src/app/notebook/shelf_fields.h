// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <span>
#include <string_view>

#include "app/notebook/records.h"
#include "units/quantity.h"

namespace vialkeeper::app {

/// One field of a kind of card: how it is called and written, and where it is kept.
struct ShelfField {
  std::string_view name;    ///< as a person types it: `volume`
  std::string_view column;  ///< in the file, with its unit: `volume_ml`
  enum class Type { kText, kNumber, kQuantity } type = Type::kText;
  units::Kind kind = units::Kind::kVolume;  ///< of a quantity
  double perSi = 1.0;                       ///< column's value for one SI unit
  std::string_view shownUnit = {};          ///< unit of the column, as printed
  bool required = false;
};

/// A kind of card: lots, stocks, vials, lamps, balances, pipettes.
struct ShelfKindInfo {
  ShelfKind kind;
  std::string_view word;     ///< as a person types it: `vial`
  std::string_view plural;   ///< `vials`
  std::string_view table;    ///< in the file
  bool ofSubstance = false;  ///< lots and stocks belong to a substance
  std::span<const ShelfField> fields;
};

[[nodiscard]] std::span<const ShelfKindInfo> shelfKinds();
[[nodiscard]] const ShelfKindInfo& shelfKind(ShelfKind kind);
[[nodiscard]] const ShelfKindInfo* findShelfKind(std::string_view word);

}  // namespace vialkeeper::app
