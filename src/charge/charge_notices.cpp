// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/charge_notices.h"

#include <fmt/format.h>

#include <algorithm>
#include <string>
#include <vector>

#include "units/shown.h"

namespace vialkeeper::charge {
namespace {

using units::shown;
using units::Volume;

void note(ComponentCharge& component, std::string code, std::string text) {
  component.notices.push_back({std::move(code), std::move(text), "component." + component.key});
}

std::string joined(const std::vector<std::string>& items) {
  std::string list;
  for (const std::string& item : items) list += (list.empty() ? "" : ", ") + item;
  return list;
}

/// The share solvent with the most still to be added, and how much that is.
struct Room {
  std::size_t solvent;
  Volume volume;
};

std::optional<Room> largestRoom(const Plan& plan, const Charge& charge,
                                std::span<const Volume> promised) {
  std::optional<Room> best;
  for (std::size_t i = 0; i < plan.components.size(); ++i) {
    if (plan.components[i].amount.basis != Basis::kShare || !charge.components[i].targetVolume)
      continue;
    const Volume left = *charge.components[i].targetVolume - promised[i];
    if (!best || left > best->volume) best = Room{i, left};
  }
  return best;
}

/// A weighing below the balance's minimum, and the stock solution that would avoid it. A proposal
/// takes no more than half of the solvent that is still to be added, so that rinsing stays
/// possible.
void noteMinimumWeight(const Plan& plan, const Material& material, std::size_t i, Charge& charge,
                       std::vector<Volume>& promised) {
  ComponentCharge& component = charge.components[i];
  const auto& device = plan.components[i].device;
  const Balance* balance = device ? device->balance() : nullptr;
  if (balance == nullptr || !component.targetMass ||
      !(*component.targetMass < balance->minimumWeight()))
    return;
  note(component, "minimum-weight",
       fmt::format("{} is below the least that {} may weigh to 0.1 %, {}",
                   shown(*component.targetMass), device->name, shown(balance->minimumWeight())));
  const auto room = largestRoom(plan, charge, promised);
  if (!room || !component.amount_mol || !material.molarMass()) return;
  if (!(room->volume.si() > 0.0)) return;
  component.proposal = proposeStock(
      {.amount = units::Amount::fromMoles(component.amount_mol->value()),
       .suppliedMassPerMole = units::Mass::fromSi(material.molarMass()->value() / material.assay()),
       .minimumWeight = balance->minimumWeight(),
       .room = 0.5 * room->volume});
  if (!component.proposal) return;
  StockProposal& proposal = *component.proposal;
  proposal.solventKey = plan.components[room->solvent].key;
  promised[room->solvent] = promised[room->solvent] + proposal.transfer;
  note(component, "stock-proposed",
       fmt::format("make {:g} mL of a {} stock in {} ({} of {}) and take {} with {}; try first "
                   "that it dissolves",
                   proposal.flask.millilitres(), shown(proposal.concentration, 2),
                   plan.components[room->solvent].name, shown(proposal.stockMass), component.name,
                   shown(proposal.transfer), proposal.pipette));
}

void notePipetteRange(const ComponentPlan& plan, ComponentCharge& component) {
  const Pipette* pipette = plan.device ? plan.device->pipette() : nullptr;
  if (pipette == nullptr || !component.targetVolume || !(component.targetVolume->si() > 0.0))
    return;
  if (*component.targetVolume < pipette->smallest) {
    note(component, "below-pipette-range",
         fmt::format("{} is below the least volume of {}, {}: take a smaller pipette",
                     shown(*component.targetVolume), plan.device->name, shown(pipette->smallest)));
  }
  const int strokes = pipette->strokesFor(*component.targetVolume);
  if (strokes > 1) {
    note(component, "several-strokes",
         fmt::format("{} takes {} equal strokes of {}", shown(*component.targetVolume), strokes,
                     plan.device->name));
  }
}

void noteUndetermined(const ComponentPlan& plan, ComponentCharge& component) {
  if (component.amount_mol) return;
  note(component, "undetermined",
       fmt::format("the molar mass of {} is not given, so its amount of substance is not known",
                   plan.name));
}

void noteWholeCharge(const Plan& plan, std::span<const Material> materials, Volume missing,
                     Charge& charge) {
  std::vector<std::string> solids;
  std::vector<std::string> liquids;
  std::vector<std::string> exact;
  std::vector<std::string> withoutDevice;
  for (std::size_t i = 0; i < materials.size(); ++i) {
    const ComponentCharge& component = charge.components[i];
    const bool solid = materials[i].isSolid();
    if (solid && !materials[i].density()) solids.push_back(component.key);
    if (!solid && !materials[i].isGas()) liquids.push_back(component.key);
    if (!materials[i].takenAsExact().empty()) {
      exact.push_back(fmt::format("{} of {}", joined(materials[i].takenAsExact()), component.key));
    }
    if (!plan.components[i].device && component.amount_mol) withoutDevice.push_back(component.key);
  }
  const auto add = [&charge](std::string code, std::string text, std::string at) {
    charge.notices.push_back({std::move(code), std::move(text), std::move(at)});
  };
  if (charge.fill && *charge.fill > 0.5) {
    add("fill-above-half",
        fmt::format(
            "the liquid fills {:.0f} % of the vial; above half, little room is left for the gas",
            100.0 * *charge.fill),
        "liquid");
  }
  if (missing / charge.totalLiquid > 1e-6) {
    add("volume-not-filled",
        fmt::format("{} of the total of {} are filled by no component", shown(missing),
                    shown(charge.totalLiquid)),
        "liquid.total");
  }
  if (liquids.size() > 1) {
    add("ideal-mixing",
        "volumes of liquids are taken to add up; mixing may change the total by some per cent",
        "liquid");
  }
  if (!solids.empty()) {
    add("solids-take-no-room",
        fmt::format("solids without a density are taken to displace nothing: {}", joined(solids)),
        "liquid");
  }
  if (!exact.empty()) {
    add("taken-as-exact",
        fmt::format("no uncertainty is given, so none is counted, for {}", joined(exact)), "");
  }
  if (!withoutDevice.empty()) {
    add("no-device",
        fmt::format("no balance or pipette is named, so the uncertainty is not known, for {}",
                    joined(withoutDevice)),
        "");
  }
}

}  // namespace

void addNotices(const Plan& plan, std::span<const Material> materials, Volume missing,
                Charge& charge) {
  std::vector<Volume> promised(materials.size(), Volume::fromSi(0.0));
  for (std::size_t i = 0; i < materials.size(); ++i) {
    noteUndetermined(plan.components[i], charge.components[i]);
    noteMinimumWeight(plan, materials[i], i, charge, promised);
    notePipetteRange(plan.components[i], charge.components[i]);
  }
  noteWholeCharge(plan, materials, missing, charge);
}

}  // namespace vialkeeper::charge
