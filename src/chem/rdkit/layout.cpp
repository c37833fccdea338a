// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/layout.h"

#include <GraphMol/Depictor/RDDepictor.h>
#include <GraphMol/MolDraw2D/MolDraw2D.h>  // MolDraw2DUtils.h does not stand alone
#include <GraphMol/MolDraw2D/MolDraw2DUtils.h>

#include <algorithm>
#include <limits>
#include <vector>

namespace vialkeeper::chem {
namespace {

// Closer than this part of a bond length two atoms count as lying on each other: the diagonal
// across a norbornane, drawn on purpose, is longer.
constexpr double kTooClose = 0.45;
// CoordGen's time grows steeply; a drawing with more atoms is no use at this scale anyway.
constexpr unsigned int kMostAtomsForCoordGen = 200;

/// Chooses CoordGen for the life of this object; the choice is a global variable of RDKit's.
class CoordGenChosen {
 public:
  CoordGenChosen() : m_before(RDDepict::preferCoordGen) { RDDepict::preferCoordGen = true; }
  CoordGenChosen(const CoordGenChosen&) = delete;
  CoordGenChosen& operator=(const CoordGenChosen&) = delete;
  ~CoordGenChosen() { RDDepict::preferCoordGen = m_before; }

 private:
  bool m_before;
};

/// Scales the coordinates so that the median bond has kLayoutBondLength.
void normalise(RDKit::RWMol& mol) {
  RDKit::Conformer& layout = mol.getConformer();
  std::vector<double> lengths;
  for (const RDKit::Bond* bond : mol.bonds()) {
    lengths.push_back(
        (layout.getAtomPos(bond->getBeginAtomIdx()) - layout.getAtomPos(bond->getEndAtomIdx()))
            .length());
  }
  if (lengths.empty()) return;
  const auto middle = lengths.begin() + static_cast<std::ptrdiff_t>(lengths.size() / 2);
  std::nth_element(lengths.begin(), middle, lengths.end());
  if (!(*middle > 0.0)) return;
  for (RDGeom::Point3D& point : layout.getPositions()) point *= kLayoutBondLength / *middle;
}

/// The number of pairs of atoms that lie on each other.
int crowding(const RDKit::RWMol& mol) {
  constexpr double kNear = kTooClose * kLayoutBondLength;
  const auto& points = mol.getConformer().getPositions();
  int pairs = 0;
  for (std::size_t i = 0; i < points.size(); ++i) {
    for (std::size_t j = 0; j < i; ++j) {
      pairs += (points[i] - points[j]).lengthSq() < kNear * kNear ? 1 : 0;
    }
  }
  return pairs;
}

RDKit::RWMol prepared(const RDKit::RWMol& mol) {
  RDKit::RWMol drawn(mol);
  RDKit::MolDraw2DUtils::prepareMolForDrawing(drawn);
  normalise(drawn);
  return drawn;
}

}  // namespace

RDKit::RWMol layOut(const RDKit::RWMol& mol) {
  RDKit::RWMol usual = prepared(mol);
  const int crowded = crowding(usual);
  if (crowded == 0 || mol.getNumAtoms() > kMostAtomsForCoordGen) return usual;
  const CoordGenChosen chosen;
  RDKit::RWMol other = prepared(mol);
  return crowding(other) < crowded ? other : usual;
}

}  // namespace vialkeeper::chem
