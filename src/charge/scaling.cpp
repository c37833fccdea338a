// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/scaling.h"

#include <fmt/format.h>

#include <cmath>
#include <stdexcept>

#include "units/shown.h"

namespace vialkeeper::charge {
namespace {

bool isAbsolute(Basis basis) {
  return basis == Basis::kAmount || basis == Basis::kMass || basis == Basis::kVolume;
}

/// The scaled basis as its author would have written it.
std::string written(const AmountPlan& amount) {
  constexpr int kDigits = 6;
  switch (amount.basis) {
    case Basis::kAmount:
      return units::shown(units::Amount::fromSi(amount.value), kDigits);
    case Basis::kMass:
      return units::shown(units::Mass::fromSi(amount.value), kDigits);
    default:
      return units::shown(units::Volume::fromSi(amount.value), kDigits);
  }
}

}  // namespace

Plan scaled(const Plan& plan, double factor) {
  if (!(factor > 0.0) || !std::isfinite(factor)) {
    throw std::logic_error(fmt::format("scaled: factor {} is not positive and finite", factor));
  }
  Plan larger = plan;
  for (ComponentPlan& component : larger.components) {
    if (!isAbsolute(component.amount.basis) || factor == 1.0) continue;
    component.amount.value *= factor;
    component.amount.asWritten = written(component.amount);
  }
  if (larger.liquid.total) larger.liquid.total = factor * *larger.liquid.total;
  return larger;
}

Plan scaledToVial(const Plan& plan, units::Volume volume) {
  if (!plan.vial) throw std::logic_error("scaledToVial: the plan has no vial");
  Plan moved = scaled(plan, volume / plan.vial->volume);
  moved.vial->name = units::shown(volume) + " vial";
  moved.vial->volumeUncertainty = (volume / plan.vial->volume) * plan.vial->volumeUncertainty;
  moved.vial->volume = volume;
  moved.vial->ratedGauge.reset();
  return moved;
}

}  // namespace vialkeeper::charge
