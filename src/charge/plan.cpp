// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/plan.h"

#include <algorithm>
#include <stdexcept>

#include "chem/solvents.h"
#include "text/utf8.h"

namespace vialkeeper::charge {

std::string_view toText(Role role) {
  switch (role) {
    case Role::kSubstrate:
      return "substrate";
    case Role::kPartner:
      return "partner";
    case Role::kPhotocatalyst:
      return "photocatalyst";
    case Role::kCocatalyst:
      return "cocatalyst";
    case Role::kAdditive:
      return "additive";
    case Role::kAcid:
      return "acid";
    case Role::kBase:
      return "base";
    case Role::kOxidant:
      return "oxidant";
    case Role::kReductant:
      return "reductant";
    case Role::kQuencher:
      return "quencher";
    case Role::kStandard:
      return "standard";
    case Role::kProduct:
      return "product";
    case Role::kSolvent:
      return "solvent";
    case Role::kGas:
      return "gas";
    case Role::kOther:
      return "other";
  }
  return "other";
}

std::string_view toText(Basis basis) {
  switch (basis) {
    case Basis::kAmount:
      return "amount";
    case Basis::kMass:
      return "mass";
    case Basis::kVolume:
      return "volume";
    case Basis::kEquiv:
      return "equiv";
    case Basis::kMolPercent:
      return "mol_percent";
    case Basis::kConcentration:
      return "concentration";
    case Basis::kShare:
      return "share";
  }
  return "amount";
}

const ComponentPlan* Plan::find(std::string_view key) const {
  const auto found = std::ranges::find(components, key, &ComponentPlan::key);
  return found == components.end() ? nullptr : &*found;
}

std::size_t Plan::indexOf(std::string_view key) const {
  const auto found = std::ranges::find(components, key, &ComponentPlan::key);
  if (found == components.end()) throw std::logic_error("no component " + std::string(key));
  return static_cast<std::size_t>(found - components.begin());
}

std::optional<std::size_t> Plan::solventOf(const StockSupply& stock) const {
  // A key wins over a name, and two spellings of one solvent in the table are the same solvent.
  for (std::size_t i = 0; i < components.size(); ++i) {
    if (components[i].isSolvent() && components[i].key == stock.solvent) return i;
  }
  const std::string wanted = text::asciiLowered(stock.solvent);
  const chem::Solvent* known = chem::findSolvent(stock.solvent);
  for (std::size_t i = 0; i < components.size(); ++i) {
    if (!components[i].isSolvent()) continue;
    const bool sameName = text::asciiLowered(components[i].name) == wanted;
    if (sameName || (known != nullptr && chem::findSolvent(components[i].name) == known)) return i;
  }
  return std::nullopt;
}

}  // namespace vialkeeper::charge
