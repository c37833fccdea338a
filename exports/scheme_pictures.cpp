// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/scheme_pictures.h"

#include <utility>

#include "chem/structure.h"
#include "text/utf8.h"

namespace vialkeeper::exports {
namespace {

using chem::StructureFault;

std::expected<StructurePicture, StructureFault> draw(const std::string& smiles) {
  const auto engine = chem::structureEngine();
  if (!engine) return std::unexpected(engine.error());
  const auto extent = (*engine)->extent(smiles);
  if (!extent) return std::unexpected(extent.error());
  auto svg = (*engine)->drawSvg(smiles, extent->width_px, extent->height_px);
  if (!svg) return std::unexpected(svg.error());
  return StructurePicture{std::move(*svg), extent->width_px, extent->height_px};
}

std::vector<StructurePicture> drawAll(const std::vector<app::SchemeMember>& members,
                                      text::Faults& faults) {
  std::vector<StructurePicture> pictures;
  for (const app::SchemeMember& member : members) {
    StructurePicture& picture = pictures.emplace_back();
    if (member.smiles.empty()) continue;
    auto drawn = draw(member.smiles);
    if (drawn) {
      picture = std::move(*drawn);
    } else {
      faults.push_back({.what = "the structure of " + text::quoted(member.label) +
                                " cannot be drawn: " + drawn.error().what,
                        .mend = drawn.error().mend});
    }
  }
  return pictures;
}

}  // namespace

text::Checked<SchemePictures> drawStructures(const app::SchemeContent& scheme) {
  SchemePictures pictures;
  if (scheme.isEmpty()) return pictures;
  text::Faults faults;
  pictures.reactants = drawAll(scheme.reactants, faults);
  pictures.products = drawAll(scheme.products, faults);
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return pictures;
}

}  // namespace vialkeeper::exports
