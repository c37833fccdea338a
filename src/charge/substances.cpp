// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/substances.h"

#include <fmt/format.h>

#include <cmath>
#include <string>
#include <unordered_map>

#include "chem/solvents.h"
#include "stats/uncertain.h"
#include "text/text_fault.h"
#include "text/utf8.h"

namespace vialkeeper::charge {
namespace {

using chem::Composition;
using text::Faults;

constexpr const char* kWeightsSource = "IUPAC standard atomic weights 2021";

/// Resolves one substance and notes its faults at its place in the plan.
class SubstanceResolver {
 public:
  SubstanceResolver(const Plan& plan, const SmilesReader& readSmiles, Faults& faults)
      : m_plan(plan), m_readSmiles(readSmiles), m_faults(faults) {}

  Substance resolve(const Identity& identity, const units::SectionPlace& place) {
    m_place = &place;
    Substance substance;
    const auto fromFormula =
        identity.formula.empty() ? std::nullopt : readFormula(identity.formula);
    const auto fromSmiles = identity.smiles.empty()
                                ? std::nullopt
                                : readStructure(identity.smiles, substance.canonicalSmiles);
    if (fromFormula && fromSmiles && *fromFormula != *fromSmiles) {
      fault("smiles",
            fmt::format("the structure is {} but the formula says {}", toHillFormula(*fromSmiles),
                        toHillFormula(*fromFormula)),
            "correct the one that is wrong");
      return substance;
    }
    if (fromSmiles || fromFormula)
      takeComposition(fromSmiles ? *fromSmiles : *fromFormula, substance);
    if (identity.molarMass) takeMolarMass(identity, substance);
    return substance;
  }

 private:
  void fault(std::string_view field, std::string what, std::string mend) {
    m_faults.push_back({.file = m_plan.file,
                        .line = m_place->lineOf(field),
                        .field = m_place->path + "." + std::string(field),
                        .what = std::move(what),
                        .mend = std::move(mend)});
  }

  std::optional<Composition> readFormula(const std::string& formula) {
    auto composition = chem::parseFormula(formula);
    if (composition) return *std::move(composition);
    fault("formula",
          fmt::format("{}: {}", text::quoted(formula),
                      whatWithPosition(composition.error(), formula)),
          composition.error().mend);
    return std::nullopt;
  }

  std::optional<Composition> readStructure(const std::string& smiles, std::string& canonical) {
    const auto structure = m_readSmiles(smiles);
    if (!structure) {
      fault("smiles", fmt::format("{}: {}", text::quoted(smiles), structure.error().what),
            structure.error().mend);
      return std::nullopt;
    }
    canonical = structure->canonicalSmiles;
    auto composition = chem::parseFormula(structure->formula);
    if (composition) return *std::move(composition);
    fault("smiles", composition.error().what, composition.error().mend);
    return std::nullopt;
  }

  void takeComposition(const Composition& composition, Substance& substance) {
    substance.formula = toHillFormula(composition);
    const auto mass = chem::molarMass(composition);
    if (!mass) {
      fault(m_place->holds("smiles") ? "smiles" : "formula", mass.error().what, mass.error().mend);
      return;
    }
    substance.molarMass = *mass;
    substance.molarMassSource = fmt::format("{} from {}", substance.formula, kWeightsSource);
  }

  /// A molar mass from a label is rounded; it agrees within its last digit and 0.01 % for old
  /// tables.
  void takeMolarMass(const Identity& identity, Substance& substance) {
    const double given = identity.molarMass->gramsPerMole();
    const double lastDigit = identity.molarMassLastDigit.gramsPerMole();
    if (substance.molarMass) {
      const double computed = substance.molarMass->value.gramsPerMole();
      if (std::abs(computed - given) <= 0.5 * lastDigit + 1e-4 * computed) return;
      fault("molar_mass",
            fmt::format("{} has {:.3f} g/mol but {} g/mol is given", substance.formula, computed,
                        given),
            "correct the one that is wrong; a salt or hydrate counts as supplied");
      return;
    }
    substance.molarMass = {*identity.molarMass,
                           units::MolarMass::fromGramsPerMole(stats::rectangular(0.5 * lastDigit))};
    substance.molarMassSource = "as given in the plan";
  }

  const Plan& m_plan;
  const SmilesReader& m_readSmiles;
  Faults& m_faults;
  const units::SectionPlace* m_place = nullptr;
};

/// What the solvent table says of a liquid that the plan describes by its name alone.
Identity identityOf(const ComponentPlan& component) {
  const bool liquid = std::holds_alternative<LiquidSupply>(component.supply);
  if (!component.identity.isEmpty() || !liquid) return component.identity;
  Identity identity = component.identity;
  if (const chem::Solvent* known = chem::findSolvent(component.name))
    identity.formula = known->formula;
  return identity;
}

}  // namespace

SmilesReader structureModuleReader() {
  return [](std::string_view smiles) -> std::expected<chem::Structure, chem::StructureFault> {
    // A group's plans name the same few substances over and over, and reading one costs more than all the
    // rest of a charge. Each thread has its own, for the engine serves one at a time.
    constexpr std::size_t kMostKept = 4096;
    thread_local std::unordered_map<std::string, chem::Structure> kept;
    const std::string text(smiles);
    if (const auto known = kept.find(text); known != kept.end()) return known->second;
    const auto engine = chem::structureEngine();
    if (!engine) return std::unexpected(engine.error());
    auto structure = (*engine)->read(smiles);
    if (structure && kept.size() < kMostKept) kept.emplace(text, *structure);
    return structure;
  };
}

text::Checked<Substances> resolveSubstances(const Plan& plan, const SmilesReader& readSmiles) {
  Faults faults;
  Substances substances;
  SubstanceResolver resolver(plan, readSmiles, faults);
  for (const ComponentPlan& component : plan.components) {
    substances.components.push_back(resolver.resolve(identityOf(component), component.place));
  }
  for (const ProductPlan& product : plan.products) {
    substances.products.push_back(resolver.resolve(product.identity, product.place));
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return substances;
}

}  // namespace vialkeeper::charge
