// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/devices.h"

#include <algorithm>
#include <cmath>
#include <vector>

#include "chem/reference_table.h"
#include "stats/uncertain.h"

namespace vialkeeper::charge {
namespace {

using chem::ReferenceTable;
using units::Mass;
using units::Volume;

std::vector<Device> readDevices() {
  std::vector<Device> devices;
  for (const auto& row : ReferenceTable::builtIn("balances.csv").rows()) {
    devices.push_back(
        {row.text("name"), Balance{Mass::fromMilligrams(row.required("readability_mg")),
                                   Mass::fromMilligrams(row.required("repeatability_mg"))}});
  }
  for (const auto& row : ReferenceTable::builtIn("pipettes.csv").rows()) {
    devices.push_back(
        {row.text("name"), Pipette{Volume::fromMicrolitres(row.required("nominal_uL")),
                                   Volume::fromMicrolitres(row.required("minimum_uL")),
                                   Volume::fromMicrolitres(row.required("systematic_limit_uL")),
                                   Volume::fromMicrolitres(row.required("random_limit_uL"))}});
  }
  return devices;
}

std::vector<Flask> readFlasks() {
  std::vector<Flask> list;
  for (const auto& row : ReferenceTable::builtIn("flasks.csv").rows()) {
    list.push_back({Volume::fromMillilitres(row.required("nominal_mL")),
                    Volume::fromMillilitres(row.required("limit_mL"))});
  }
  std::ranges::sort(list, {}, [](const Flask& flask) { return flask.nominal.si(); });
  return list;
}

}  // namespace

Mass Balance::standardUncertainty() const {
  const double rounding = stats::rectangular(readability.si() / 2.0);
  return Mass::fromSi(
      std::sqrt(repeatability.si() * repeatability.si() + 2.0 * rounding * rounding));
}

Mass Balance::minimumWeight() const { return 2000.0 * std::max(repeatability, 0.41 * readability); }

int Pipette::strokesFor(Volume volume) const {
  // A volume that equals a whole number of strokes must not need one more through rounding.
  const double strokes = std::ceil(volume / nominal - 1e-9);
  return static_cast<int>(std::clamp(strokes, 1.0, 1e6));
}

Volume Pipette::standardUncertainty(Volume volume) const {
  const double strokes = strokesFor(volume);
  const double systematic = strokes * stats::rectangular(systematicLimit.si());
  const double random = std::sqrt(strokes) * randomLimit.si();
  return Volume::fromSi(std::hypot(systematic, random));
}

std::span<const Device> builtInDevices() {
  static const std::vector<Device> devices = readDevices();
  return devices;
}

const Device* findDevice(std::string_view name) {
  const auto found = std::ranges::find(builtInDevices(), name, &Device::name);
  return found == builtInDevices().end() ? nullptr : &*found;
}

std::span<const Flask> flasks() {
  static const std::vector<Flask> list = readFlasks();
  return list;
}

}  // namespace vialkeeper::charge
