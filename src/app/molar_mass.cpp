// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/molar_mass.h"

#include <fmt/format.h>

#include "chem/structure.h"
#include "text/text_fault.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

std::unexpected<text::Fault> fault(std::string what, std::string mend) {
  return std::unexpected(text::Fault{.what = std::move(what), .mend = std::move(mend)});
}

}  // namespace

std::expected<MolarMassAnswer, text::Fault> massOfFormula(std::string_view formula) {
  const std::string_view content = text::trimmed(formula);
  const auto composition = chem::parseFormula(content);
  if (!composition) {
    return fault(fmt::format("{}: {}", text::quoted(content),
                             whatWithPosition(composition.error(), content)),
                 composition.error().mend);
  }
  const auto mass = chem::molarMass(*composition);
  if (!mass)
    return fault(fmt::format("{}: {}", text::quoted(content), mass.error().what),
                 mass.error().mend);
  return MolarMassAnswer{toHillFormula(*composition), *mass};
}

std::expected<MolarMassAnswer, text::Fault> massOfSmiles(std::string_view smiles) {
  const auto engine = chem::structureEngine();
  if (!engine) return fault(engine.error().what, engine.error().mend);
  const auto structure = (*engine)->read(smiles);
  if (!structure) {
    return fault(fmt::format("{}: {}", text::quoted(smiles), structure.error().what),
                 structure.error().mend);
  }
  return massOfFormula(structure->formula);
}

}  // namespace vialkeeper::app
