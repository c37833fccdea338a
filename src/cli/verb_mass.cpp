// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/molar_mass.h"
#include "cli/json_text.h"
#include "cli/verb.h"

namespace vialkeeper::cli {
namespace {

struct MassOptions {
  std::string formula;
  std::string smiles;
  CLI::Option* formulaOption = nullptr;
  CLI::Option* smilesOption = nullptr;
};

VerbResult runMass(const MassOptions& options, const CommonOptions& common) {
  const bool byFormula = options.formulaOption->count() > 0;
  const bool bySmiles = options.smilesOption->count() > 0;
  if (byFormula == bySmiles) {
    return std::unexpected(text::Faults{
        usageFault("",
                   byFormula ? "a formula and a SMILES are both given"
                             : "neither a formula nor a SMILES is given",
                   "give one: vialkeeper mass FORMULA, or vialkeeper mass --smiles S")});
  }
  const auto answer =
      byFormula ? app::massOfFormula(options.formula) : app::massOfSmiles(options.smiles);
  if (!answer) {
    text::Fault fault = answer.error();
    if (bySmiles) fault.kind = text::FaultKind::kUsage;  // an option's value that cannot be read
    fault.field = bySmiles ? "--smiles" : "formula";
    return std::unexpected(text::Faults{fault});
  }
  const double mass = answer->molarMass.value.gramsPerMole();
  const double u = answer->molarMass.standardUncertainty.gramsPerMole();
  if (common.json) {
    return toJsonText({{"formula", answer->formula},
                       {"molar_mass_g_mol", mass},
                       {"u_molar_mass_g_mol", u},
                       {"notices", nlohmann::ordered_json::array()}});
  }
  return fmt::format("{}  {:.4f} g/mol  u = {:.2g} g/mol  (IUPAC standard atomic weights 2021)\n",
                     answer->formula, mass, u);
}

}  // namespace

Verb massVerb(CLI::App& program) {
  auto options = std::make_shared<MassOptions>();
  CLI::App* parser = program.add_subcommand("mass", "Molar mass of a formula or a structure");
  options->formulaOption =
      parser->add_option("FORMULA", options->formula, "for example C8H9N or CuSO4·5H2O");
  options->smilesOption =
      parser->add_option("--smiles", options->smiles, "a structure, for example C1Cc2ccccc2N1");
  return {parser, [options](const CommonOptions& common) { return runMass(*options, common); }};
}

}  // namespace vialkeeper::cli
