// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/weighing.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <cmath>
#include <optional>

#include "charge/material.h"
#include "text/csv.h"
#include "text/text_fault.h"
#include "text/utf8.h"
#include "units/quantity_text.h"
#include "units/shown.h"

namespace vialkeeper::charge {
namespace {

using stats::Uncertain;
using text::Faults;
using units::Mass;
using units::Volume;

/// Reads the rows once the table itself is sound.
class WeighingReader {
 public:
  WeighingReader(const std::string& file, const Plan& plan) : m_file(file), m_plan(plan) {}

  text::Checked<Weighings> read(const text::CsvTable& table) {
    if (!findColumns(table.header)) return std::unexpected(std::move(m_faults));
    for (const text::CsvRow& row : table.rows) readRow(row);
    if (!m_faults.empty()) return std::unexpected(std::move(m_faults));
    return m_weighings;
  }

 private:
  void fault(int line, std::string field, std::string what, std::string mend) {
    m_faults.push_back({.file = m_file,
                        .line = line,
                        .field = std::move(field),
                        .what = std::move(what),
                        .mend = std::move(mend)});
  }

  bool findColumns(const text::CsvRow& header) {
    for (std::size_t i = 0; i < header.cells.size(); ++i) {
      if (header.cells[i] == "key") {
        m_keyColumn = i;
      } else if (header.cells[i] == "actual") {
        m_actualColumn = i;
      } else {
        fault(header.line, header.cells[i], "this column is not known here",
              "the columns are key and actual");
      }
    }
    if (!m_keyColumn)
      fault(header.line, "key", "the column is missing", "begin with the row key,actual");
    if (!m_actualColumn)
      fault(header.line, "actual", "the column is missing", "begin with the row key,actual");
    return m_faults.empty();
  }

  void readRow(const text::CsvRow& row) {
    const std::string& key = row.cells[*m_keyColumn];
    const std::string& written = row.cells[*m_actualColumn];
    const ComponentPlan* component = m_plan.find(key);
    if (component == nullptr) {
      fault(row.line, "key", fmt::format("the plan has no component {}", text::quoted(key)),
            advice(key));
    } else if (const auto earlier = std::ranges::find(m_weighings, key, &Weighing::key);
               earlier != m_weighings.end()) {
      fault(row.line, key,
            fmt::format("this component was recorded on line {} already", earlier->line),
            "keep one row for each component");
      return;
    }
    const auto read = units::readQuantityOf({units::Kind::kMass, units::Kind::kVolume}, written,
                                            units::Dialect::kFile);
    if (!read) {
      fault(row.line, key,
            fmt::format("{}: {}", text::quoted(written), whatWithPosition(read.error(), written)),
            read.error().mend);
      return;
    }
    if (component == nullptr) return;
    Weighing weighing{
        .key = key, .actual = Mass::fromSi(read->si), .asWritten = written, .line = row.line};
    if (read->kind == units::Kind::kVolume) weighing.actual = Volume::fromSi(read->si);
    if (const auto recordable = checkRecordable(*component, weighing.actual); !recordable) {
      fault(row.line, key, fmt::format("{}: {}", text::quoted(written), recordable.error().what),
            recordable.error().mend);
      return;
    }
    m_weighings.push_back(std::move(weighing));
  }

  [[nodiscard]] std::string advice(const std::string& key) const {
    std::vector<std::string> keys;
    for (const ComponentPlan& component : m_plan.components) keys.push_back(component.key);
    const auto nearest = units::nearestName(key, keys);
    return nearest ? fmt::format("did you mean {}?", *nearest)
                   : fmt::format("its keys are {}", fmt::join(keys, ", "));
  }

  const std::string& m_file;
  const Plan& m_plan;
  std::optional<std::size_t> m_keyColumn;
  std::optional<std::size_t> m_actualColumn;
  Weighings m_weighings;
  Faults m_faults;
};

/// Turns the recorded quantities into amounts, ratios and concentrations.
class WeighedCharge {
 public:
  WeighedCharge(const Plan& plan, const Substances& substances, const Weighings& weighings)
      : m_plan(plan), m_weighings(weighings) {
    text::Notices told;  // the same as those of the planned charge
    for (std::size_t i = 0; i < plan.components.size(); ++i) {
      m_materials.emplace_back(plan, plan.components[i], substances.components[i], m_causes, told);
    }
    for (const Weighing& weighing : weighings) m_amounts.push_back(amountOf(weighing));
  }

  /// Weighed amount of the limiting component, if it was weighed.
  std::optional<Uncertain> limitingAmount() const {
    for (std::size_t w = 0; w < m_weighings.size(); ++w) {
      if (m_weighings[w].key == m_plan.limiting) return m_amounts[w];
    }
    return std::nullopt;
  }

  void fillIn(Charge& charge) {
    const Uncertain limiting = limitingAmount() ? *limitingAmount() : plannedLimitingAmount(charge);
    const Uncertain liquid = liquidAsCharged(charge);
    noteLiquid(liquid.value(), charge);
    for (std::size_t w = 0; w < m_weighings.size(); ++w) {
      ComponentCharge& component = charge.components[m_plan.indexOf(m_weighings[w].key)];
      AsCharged charged;
      if (const auto* mass = std::get_if<Mass>(&m_weighings[w].actual)) charged.mass = *mass;
      if (const auto* volume = std::get_if<Volume>(&m_weighings[w].actual))
        charged.volume = *volume;
      charged.offTargetPercent = offTarget(component, charged);
      if (const auto& amount = m_amounts[w]) {
        charged.amount_mol = amount;
        charged.equiv = *amount / limiting;
        charged.molPercent = 100.0 * (*amount / limiting);
        if (component.liquidVolume) charged.concentration_mol_m3 = *amount / liquid;
      }
      noteDevice(m_plan.components[m_plan.indexOf(component.key)], charged, component);
      noteOffTarget(charged, component);
      component.charged = std::move(charged);
    }
  }

 private:
  /// A recorded mass [kg] or volume [m3] with the doubt of the device, if it is of the right kind.
  Uncertain recorded(const ComponentPlan& component, const std::variant<Mass, Volume>& actual) {
    const Device* device = component.device ? &*component.device : nullptr;
    if (const auto* mass = std::get_if<Mass>(&actual)) {
      const Balance* balance = device != nullptr ? device->balance() : nullptr;
      if (balance == nullptr) return Uncertain::unstated(mass->si(), m_causes.addUnknown());
      return {mass->si(), balance->standardUncertainty().si(), m_causes.add()};
    }
    const Volume volume = std::get<Volume>(actual);
    const Pipette* pipette = device != nullptr ? device->pipette() : nullptr;
    if (pipette == nullptr) return Uncertain::unstated(volume.si(), m_causes.addUnknown());
    return {volume.si(), pipette->standardUncertainty(volume).si(), m_causes.add()};
  }

  std::optional<Uncertain> amountOf(const Weighing& weighing) {
    const std::size_t i = m_plan.indexOf(weighing.key);
    m_recorded.push_back(recorded(m_plan.components[i], weighing.actual));
    const bool mass = std::holds_alternative<Mass>(weighing.actual);
    return mass ? m_materials[i].amountInMass(m_recorded.back())
                : m_materials[i].amountInVolume(m_recorded.back());
  }

  /// The planned total with every recorded liquid in place of its planned volume [m3].
  Uncertain liquidAsCharged(const Charge& charge) {
    Uncertain total = charge.totalLiquid.si();
    for (std::size_t w = 0; w < m_weighings.size(); ++w) {
      const std::size_t i = m_plan.indexOf(m_weighings[w].key);
      const ComponentCharge& component = charge.components[i];
      const bool mass = std::holds_alternative<Mass>(m_weighings[w].actual);
      if (!component.liquidVolume || (mass && !m_materials[i].density())) continue;
      const Uncertain volume = mass ? m_recorded[w] / *m_materials[i].density() : m_recorded[w];
      total += volume - component.liquidVolume->si();
    }
    return total;
  }

  /// The planned amount as a number of this calculation: its causes are those of another.
  Uncertain plannedLimitingAmount(const Charge& charge) {
    const auto& planned = charge.components[m_plan.indexOf(m_plan.limiting)].amount_mol;
    const double value = charge.limitingAmount.moles();
    const auto u = planned ? planned->standardUncertainty() : std::nullopt;
    return u ? Uncertain(value, *u, m_causes.add())
             : Uncertain::unstated(value, m_causes.addUnknown());
  }

  static std::optional<double> offTarget(const ComponentCharge& component,
                                         const AsCharged& charged) {
    std::optional<double> ratio;
    if (charged.mass && component.targetMass) ratio = *charged.mass / *component.targetMass;
    if (charged.volume && component.targetVolume) ratio = *charged.volume / *component.targetVolume;
    // A stock weighed by its density has no target mass of its own to compare with.
    if (charged.mass && !component.targetMass && component.targetVolume && component.density) {
      ratio = (*charged.mass / *component.density) / *component.targetVolume;
    }
    return ratio && std::isfinite(*ratio) ? std::optional(100.0 * (*ratio - 1.0)) : std::nullopt;
  }

  /// Deviations that a glance at the table must not miss.
  static void noteOffTarget(const AsCharged& charged, ComponentCharge& component) {
    if (!charged.offTargetPercent || std::abs(*charged.offTargetPercent) <= component.tolerancePercent) return;
    component.notices.push_back({"off-target",
                                 fmt::format("{:+.1f} % off the target, beyond ±{:.2g} %",
                                             *charged.offTargetPercent, component.tolerancePercent),
                                 "component." + component.key});
  }

  /// The liquid as recorded, where it is not what the plan says or more than the vial holds.
  void noteLiquid(double liquid_m3, Charge& charge) const {
    const auto shown = [](double volume_m3) { return units::shown(Volume::fromSi(volume_m3)); };
    const double room_m3 = m_plan.vial ? m_plan.vial->volume.si() - m_plan.vial->displaced.si() : liquid_m3 + 1.0;
    if (liquid_m3 >= room_m3) {
      charge.notices.push_back({"no-headspace",
                                fmt::format("as recorded, {} of liquid are more than the vial holds: check the "
                                            "recorded volumes before you close it",
                                            shown(liquid_m3)),
                                "liquid"});
    } else if (std::abs(liquid_m3 / charge.totalLiquid.si() - 1.0) > 0.05) {
      charge.notices.push_back({"liquid-off-plan",
                                fmt::format("as recorded the liquid comes to {}, planned are {}", shown(liquid_m3),
                                            shown(charge.totalLiquid.si())),
                                "liquid"});
    }
  }

  static void noteDevice(const ComponentPlan& plan, const AsCharged& charged,
                         ComponentCharge& component) {
    if (!plan.device) return;
    const bool fits =
        charged.mass ? plan.device->balance() != nullptr : plan.device->pipette() != nullptr;
    if (fits) return;
    component.notices.push_back(
        {"other-device",
         fmt::format("{} was recorded by {}, but its device is {}: the uncertainty is not known",
                     plan.name, charged.mass ? "mass" : "volume", plan.device->name),
         "component." + plan.key});
  }

  const Plan& m_plan;
  const Weighings& m_weighings;
  stats::Causes m_causes;
  std::vector<Material> m_materials;
  std::vector<Uncertain> m_recorded;                ///< in the order of the weighings
  std::vector<std::optional<Uncertain>> m_amounts;  ///< in the order of the weighings
};

}  // namespace

std::expected<void, text::TextFault> checkRecordable(const ComponentPlan& component,
                                                     const std::variant<Mass, Volume>& actual) {
  const bool mass = std::holds_alternative<Mass>(actual);
  if (!mass && std::holds_alternative<SolidSupply>(component.supply)) {
    return text::textFault(0, 0, "a solid is recorded by mass",
                           "give what the balance showed, such as 12.3 mg");
  }
  if (mass && std::holds_alternative<GasSupply>(component.supply)) {
    return text::textFault(0, 0, "a gas is recorded by volume",
                           "give its volume at the supply's pressure");
  }
  const auto* stock = std::get_if<StockSupply>(&component.supply);
  if (mass && stock != nullptr && !stock->density) {
    return text::textFault(0, 0, "a stock without a density is recorded by volume",
                           "give the volume, or the stock's density in the plan");
  }
  return {};
}

text::Checked<Weighings> readWeighings(std::string_view bytes, const std::string& file,
                                       const Plan& plan) {
  const auto table = text::readCsv(bytes, file);
  if (!table) return std::unexpected(table.error());
  return WeighingReader(file, plan).read(*table);
}

text::Checked<Charge> chargeAsWeighed(const Plan& plan, const Substances& substances,
                                      const Weighings& weighings, Retarget retarget) {
  // The planned charge is worked out first: what is wrong with the plan must not hide behind a
  // weighing.
  auto charge = computeCharge(plan, substances);
  if (!charge) return charge;
  WeighedCharge weighed(plan, substances, weighings);
  if (retarget == Retarget::kYes) {
    const auto limiting = weighed.limitingAmount();
    if (!limiting) {
      return std::unexpected(
          Faults{{.field = plan.limiting,
                  .what = "the limiting component was not weighed, so nothing can follow it",
                  .mend = "record it first, or leave the re-target out"}});
    }
    charge = computeCharge(plan, substances, units::Amount::fromMoles(limiting->value()));
    if (!charge) return charge;
  }
  weighed.fillIn(*charge);
  return charge;
}

}  // namespace vialkeeper::charge
