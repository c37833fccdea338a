// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <GraphMol/MolDraw2D/MolDraw2DSVG.h>
#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <string>

#include "chem/rdkit/layout.h"
#include "chem/rdkit/molecule.h"
#include "chem/rdkit/structure_module.h"
#include "chem/rdkit/svg_picture.h"

namespace vialkeeper::chem {
namespace {

constexpr double kBondLength_px = 28.0;
constexpr double kPixelsPerUnit = kBondLength_px / kLayoutBondLength;
// Label and line sizes in proportion to the bond, close to what journals print.
constexpr double kFontSize_units = 0.75;
constexpr double kLineWidth_px = 1.4;
constexpr int kLargestSide_px = 10'000;

/// A canvas [px] on which the molecule has room to spare at kPixelsPerUnit, so that the fixed
/// bond length decides the scale and not the fit.
int roomySide(const RDKit::RWMol& mol) {
  double low = 0.0;
  double high = 0.0;
  for (const RDGeom::Point3D& point : mol.getConformer().getPositions()) {
    low = std::min({low, point.x, point.y});
    high = std::max({high, point.x, point.y});
  }
  constexpr double kLabelRoom = 16.0;
  return static_cast<int>((2.0 * (high - low) + kLabelRoom) * kPixelsPerUnit);
}

SvgPicture draw(const RDKit::RWMol& undrawn) {
  RDKit::RWMol mol = layOut(undrawn);
  const int side = roomySide(mol);
  RDKit::MolDraw2DSVG canvas(side, side);
  RDKit::MolDrawOptions& options = canvas.drawOptions();
  options.prepareMolsBeforeDrawing = false;
  options.clearBackground = false;
  options.includeMetadata = false;
  options.fixedBondLength = kPixelsPerUnit;
  options.baseFontSize = kFontSize_units;
  options.flagCloseContactsDist = -1;  // no red boxes round atoms that come close
  options.bondLineWidth = kLineWidth_px;
  RDKit::setMonochromeMode(options, RDKit::DrawColour(0, 0, 0), RDKit::DrawColour(1, 1, 1));
  canvas.drawMolecule(mol);
  canvas.finishDrawing();
  return pictureOf(canvas.getDrawingText());
}

class RdkitDrawer final : public StructureDrawer {
 public:
  std::expected<std::string, StructureFault> drawSvg(std::string_view smiles, int width_px,
                                                     int height_px) override {
    return guarded([&]() -> std::expected<std::string, StructureFault> {
      if (std::min(width_px, height_px) < 1 || std::max(width_px, height_px) > kLargestSide_px) {
        return std::unexpected(StructureFault{
            fmt::format("a drawing of {} by {} px cannot be made", width_px, height_px),
            fmt::format("give a width and a height from 1 to {} px", kLargestSide_px)});
      }
      const auto mol = parseMolecule(smiles);
      if (!mol) return std::unexpected(mol.error());
      return toSvg(draw(**mol), width_px, height_px, 1.0);
    });
  }

  std::expected<StructureEngine::Extent, StructureFault> extent(std::string_view smiles) override {
    return guarded([&]() -> std::expected<StructureEngine::Extent, StructureFault> {
      const auto mol = parseMolecule(smiles);
      if (!mol) return std::unexpected(mol.error());
      const SvgPicture picture = draw(**mol);
      return StructureEngine::Extent{static_cast<int>(std::ceil(picture.right - picture.left)),
                                     static_cast<int>(std::ceil(picture.bottom - picture.top))};
    });
  }
};

}  // namespace
}  // namespace vialkeeper::chem

/// The module's one export; the object is kept by the module and never destroyed.
extern "C" __attribute__((visibility("default"))) void* vialkeeper_open_structure_drawer(
    int abiVersion) {
  using namespace vialkeeper::chem;
  if (abiVersion != kStructureModuleAbi) return nullptr;
  static StructureDrawer* drawer = new RdkitDrawer;
  return drawer;
}
