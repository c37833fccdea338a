// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/plan_checks.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <vector>

#include "chem/solvents.h"
#include "text/utf8.h"
#include "units/toml_section.h"

namespace vialkeeper::charge {
namespace {

using text::Faults;

class PlanChecker {
 public:
  PlanChecker(const Plan& plan, std::span<const WrittenKey> keys, Faults& faults)
      : m_plan(plan), m_keys(keys), m_faults(faults) {}

  void run() {
    checkKeys();
    checkLimiting();
    checkAdditionOrder();
    for (const ComponentPlan& component : m_plan.components) {
      checkBasisAgainstRole(component);
      checkBasisAgainstSupply(component);
      checkStockSolvent(component);
      checkDevice(component);
    }
  }

 private:
  void fault(const units::SectionPlace& place, std::string_view field, std::string what,
             std::string mend) {
    const std::string dot = place.path.empty() || field.empty() ? "" : ".";
    m_faults.push_back({.file = m_plan.file,
                        .line = place.lineOf(field),
                        .field = place.path + dot + std::string(field),
                        .what = std::move(what),
                        .mend = std::move(mend)});
  }

  [[nodiscard]] bool isWritten(std::string_view key) const {
    return std::ranges::any_of(m_keys,
                               [&](const WrittenKey& k) { return !k.product && k.key == key; });
  }

  void checkKeys() {
    for (std::size_t i = 0; i < m_keys.size(); ++i) {
      const auto earlier = std::ranges::find(m_keys.first(i), m_keys[i].key, &WrittenKey::key);
      if (earlier == m_keys.first(i).end()) continue;
      m_faults.push_back({.file = m_plan.file,
                          .line = m_keys[i].line,
                          .field = m_keys[i].path + ".key",
                          .what = fmt::format("the key {} is taken by the entry of line {}",
                                              text::quoted(m_keys[i].key), earlier->line),
                          .mend = "give every component and product a key of its own"});
    }
  }

  void checkLimiting() {
    if (m_plan.limiting.empty()) return;  // told where it is missing
    if (!isWritten(m_plan.limiting)) {
      std::vector<std::string> keys;
      for (const WrittenKey& k : m_keys) {
        if (!k.product) keys.push_back(k.key);
      }
      const auto nearest = units::nearestName(m_plan.limiting, keys);
      fault(m_plan.reactionPlace, "limiting",
            fmt::format("no component has the key {}", text::quoted(m_plan.limiting)),
            nearest ? fmt::format("did you mean {}?", *nearest)
                    : fmt::format("name one of {}", fmt::join(keys, ", ")));
      return;
    }
    const ComponentPlan* limiting = m_plan.find(m_plan.limiting);
    if (limiting == nullptr) return;
    const Basis basis = limiting->amount.basis;
    if (basis == Basis::kEquiv || basis == Basis::kMolPercent || basis == Basis::kShare) {
      fault(limiting->place, toText(basis), "the limiting component is measured against itself",
            "give its amount, mass, volume, or concentration of a given total");
    }
    if (basis == Basis::kConcentration && m_plan.liquid.limitingConcentration) {
      fault(limiting->place, "concentration",
            "the limiting component's amount and the liquid's volume are defined by each other",
            "give liquid.total, or the component's amount");
    }
  }

  void checkAdditionOrder() {
    std::vector<std::string_view> seen;
    for (const std::string& key : m_plan.additionOrder) {
      if (!isWritten(key)) {
        m_faults.push_back({.file = m_plan.file,
                            .line = m_plan.additionOrderLine,
                            .field = "addition_order",
                            .what = fmt::format("no component has the key {}", text::quoted(key)),
                            .mend = "list keys of components"});
      } else if (std::ranges::find(seen, key) != seen.end()) {
        m_faults.push_back({.file = m_plan.file,
                            .line = m_plan.additionOrderLine,
                            .field = "addition_order",
                            .what = fmt::format("{} is listed twice", text::quoted(key)),
                            .mend = "list every key once"});
      }
      seen.push_back(key);
    }
  }

  void checkBasisAgainstRole(const ComponentPlan& component) {
    if (component.amount.basis != Basis::kShare || component.isSolvent()) return;
    fault(component.place, "share", "a share is for solvents only",
          "give the component's amount, equiv, mol_percent or concentration");
  }

  void checkBasisAgainstSupply(const ComponentPlan& component) {
    const Basis basis = component.amount.basis;
    if (std::holds_alternative<SolidSupply>(component.supply) && basis == Basis::kVolume) {
      fault(component.place, "volume", "a solid is weighed, not measured by volume",
            "give its mass, or a supply of kind liquid, stock or gas");
    }
    const auto* stock = std::get_if<StockSupply>(&component.supply);
    if (stock != nullptr && basis == Basis::kMass && !stock->density) {
      fault(component.place, "mass", "the mass of a stock solution needs its density",
            "give the volume, or the density in the supply");
    }
    if (basis == Basis::kShare && component.isSolvent() &&
        !std::holds_alternative<LiquidSupply>(component.supply)) {
      fault(component.place, "share", "a share is filled up with a neat liquid",
            "leave the supply out or make it of kind liquid");
    }
  }

  void checkStockSolvent(const ComponentPlan& component) {
    const auto* stock = std::get_if<StockSupply>(&component.supply);
    if (stock == nullptr || stock->solvent.empty()) return;
    if (m_plan.solventOf(*stock) || chem::findSolvent(stock->solvent) != nullptr) return;
    if (isWritten(stock->solvent) && m_plan.find(stock->solvent) == nullptr) return;  // unreadable
    fault(component.place, "supply",
          fmt::format("the stock's solvent {} is no solvent of this plan",
                      text::quoted(stock->solvent)),
          "name a solvent component by key or name, or a solvent of the table");
  }

  void checkDevice(const ComponentPlan& component) {
    if (!component.device) return;
    const bool pipette = component.device->pipette() != nullptr;
    if (pipette && std::holds_alternative<SolidSupply>(component.supply)) {
      fault(component.place, "device", "a solid cannot be measured with a pipette",
            "name a balance");
    } else if (!pipette && std::holds_alternative<GasSupply>(component.supply)) {
      fault(component.place, "device", "a gas is not weighed here", "leave the device out");
    }
  }

  const Plan& m_plan;
  std::span<const WrittenKey> m_keys;
  Faults& m_faults;
};

}  // namespace

void checkPlan(const Plan& plan, std::span<const WrittenKey> keys, Faults& faults) {
  PlanChecker(plan, keys, faults).run();
}

}  // namespace vialkeeper::charge
