// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/compare_runs.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <functional>
#include <map>
#include <optional>

#include "units/shown.h"

namespace vialkeeper::app {
namespace {

constexpr const char* kNone = "–";

/// A loading with what is known of its doubt, in mol%.
struct Loading {
  double value = 0.0;
  double u = 0.0;
  double amount_mmol = 0.0;
};

std::optional<Loading> loadingOf(const ComponentRecord& component) {
  const auto percent = component.loading_molPercent();
  if (!percent) return std::nullopt;
  Loading loading{
      .value = *percent,
      .amount_mmol = component.charged_mmol.value_or(component.planned_mmol.value_or(0.0))};
  if (component.uCharged_mmol && component.charged_mmol && *component.charged_mmol > 0.0) {
    loading.u = *percent * *component.uCharged_mmol / *component.charged_mmol;
  }
  return loading;
}

bool differ(const Loading& a, const Loading& b) {
  const double u = std::hypot(a.u, b.u);
  const double bound = u > 0.0 ? 2.0 * u : 1e-3 * std::max(std::abs(a.value), std::abs(b.value));
  return std::abs(a.value - b.value) > bound;
}

class Comparer {
 public:
  Comparer(Notebook& notebook, const std::vector<RunRecord>& runs) : m_notebook(notebook) {
    m_result.runs = runs;
  }

  Checked<RunComparison> compare() {
    if (auto read = readComponents(); !read) return std::unexpected(read.error());
    compareComponents();
    conditions();
    const auto percent = [](const std::optional<double>& value, const std::optional<double>& u) {
      if (!value) return std::string(kNone);
      return u ? fmt::format("{:.3g} ± {:.2g} %", *value, *u) : fmt::format("{:.3g} %", *value);
    };
    add(m_result.outcomes, "yield",
        [&](const RunRecord& run) { return percent(run.yield_percent, run.uYield_percent); });
    add(m_result.outcomes, "conversion", [&](const RunRecord& run) {
      return percent(run.conversion_percent, run.uConversion_percent);
    });
    return std::move(m_result);
  }

 private:
  using ByPlace = std::map<std::pair<std::string, RowNumber>, ComponentRecord>;

  Checked<void> readComponents() {
    for (const RunRecord& run : m_result.runs) {
      auto list = m_notebook.components(run.n);
      if (!list) return std::unexpected(list.error());
      ByPlace byPlace;
      for (ComponentRecord& component : *list) {
        const std::pair place{component.role, component.substance};
        if (!byPlace.contains(place)) m_order.push_back(place);
        byPlace.emplace(place, std::move(component));
      }
      m_components.push_back(std::move(byPlace));
    }
    return {};
  }

  void compareComponents() {
    std::vector<std::pair<std::string, RowNumber>> seen;
    for (const auto& place : m_order) {
      if (std::ranges::find(seen, place) != seen.end()) continue;
      seen.push_back(place);
      compareComponent(place);
    }
  }

  void compareComponent(const std::pair<std::string, RowNumber>& place) {
    std::vector<std::string> loadings;
    std::vector<std::string> lots;
    std::optional<Loading> first;
    bool different = false;
    std::string name;
    for (const ByPlace& components : m_components) {
      const auto found = components.find(place);
      if (found == components.end()) {
        loadings.emplace_back(kNone);
        lots.emplace_back(kNone);
        different = true;
        continue;
      }
      name = found->second.name;
      const auto loading = loadingOf(found->second);
      loadings.push_back(loadingText(found->second, loading));
      lots.push_back(found->second.lot == 0 ? kNone : fmt::format("lot {}", found->second.lot));
      if (loading && first && differ(*first, *loading)) different = true;
      if (loading && !first) first = loading;
    }
    note(different, fmt::format("{}: {}", place.first, name), std::move(loadings));
    const bool sameLots =
        std::ranges::all_of(lots, [&](const std::string& lot) { return lot == lots.front(); });
    if (!sameLots) m_result.inputs.push_back({fmt::format("lot of {}", name), std::move(lots)});
  }

  static std::string loadingText(const ComponentRecord& component,
                                 const std::optional<Loading>& loading) {
    if (!loading) return "present";
    if (component.role == "solvent" && component.target_uL)
      return units::toSignificant(*component.target_uL, 3) + " µL";
    const std::string doubt =
        loading->u > 0.0 ? fmt::format(" ± {}", units::toSignificant(loading->u, 1)) : "";
    return fmt::format("{}{} mol%", units::toSignificant(loading->value, 3), doubt);
  }

  void note(bool different, std::string what, std::vector<std::string> values) {
    if (different) {
      m_result.inputs.push_back({std::move(what), std::move(values)});
    } else {
      ++m_result.sameInputs;
    }
  }

  void add(std::vector<Difference>& list, const std::string& what,
           const std::function<std::string(const RunRecord&)>& value) {
    std::vector<std::string> values;
    for (const RunRecord& run : m_result.runs) values.push_back(value(run));
    const bool same =
        std::ranges::all_of(values, [&](const std::string& v) { return v == values.front(); });
    if (&list == &m_result.inputs) {
      note(!same, what, std::move(values));
    } else if (!same || values.front() != kNone) {
      list.push_back({what, std::move(values)});
    }
  }

  void conditions() {
    const auto orNone = [](const std::string& text) {
      return text.empty() ? std::string(kNone) : text;
    };
    const auto number = [](const std::optional<double>& value, const char* unit) {
      return value ? fmt::format("{:.4g} {}", *value, unit) : std::string(kNone);
    };
    std::vector<Difference>& inputs = m_result.inputs;
    add(inputs, "limiting amount",
        [](const RunRecord& run) { return fmt::format("{:.4g} mmol", run.limiting_mmol); });
    add(inputs, "liquid",
        [](const RunRecord& run) { return fmt::format("{:.4g} mL", run.liquid_mL); });
    add(inputs, "vial", [&](const RunRecord& run) { return orNone(run.vial); });
    add(inputs, "atmosphere", [&](const RunRecord& run) { return orNone(run.atmosphere); });
    add(inputs, "lamp", [&](const RunRecord& run) { return orNone(run.lamp); });
    add(inputs, "wavelength",
        [&](const RunRecord& run) { return number(run.wavelength_nm, "nm"); });
    add(inputs, "temperature",
        [&](const RunRecord& run) { return number(run.temperature_C, "°C"); });
    add(inputs, "duration", [&](const RunRecord& run) { return number(run.duration_h, "h"); });
    add(inputs, "person", [](const RunRecord& run) { return run.person; });
  }

  Notebook& m_notebook;
  RunComparison m_result;
  std::vector<ByPlace> m_components;
  std::vector<std::pair<std::string, RowNumber>> m_order;
};

}  // namespace

Checked<RunComparison> compareRuns(Notebook& notebook, const std::vector<RunRecord>& runs) {
  return Comparer(notebook, runs).compare();
}

}  // namespace vialkeeper::app
