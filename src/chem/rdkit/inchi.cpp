// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/inchi.h"

#include <GraphMol/MolOps.h>
#include <GraphMol/RWMol.h>
#include <inchi_api.h>

#include <algorithm>
#include <array>
#include <optional>
#include <string>
#include <vector>

namespace vialkeeper::chem {
namespace {

constexpr unsigned int kMostInchiAtoms =
    1023;  // inchi_api.h: "number of atoms in the structure < 1024"

/// The structure in the form that libinchi takes.
struct InchiInput {
  std::vector<inchi_Atom> atoms;
  std::vector<inchi_Stereo0D> stereo;
};

S_CHAR bondType(const RDKit::Bond& bond) {
  switch (bond.getBondType()) {
    case RDKit::Bond::DOUBLE:
      return INCHI_BOND_TYPE_DOUBLE;
    case RDKit::Bond::TRIPLE:
      return INCHI_BOND_TYPE_TRIPLE;
    case RDKit::Bond::AROMATIC:
      return INCHI_BOND_TYPE_ALTERN;
    default:
      return INCHI_BOND_TYPE_SINGLE;
  }
}

inchi_Atom inchiAtom(const RDKit::Atom& atom) {
  inchi_Atom out = {};
  const std::string symbol = atom.getSymbol();
  std::copy_n(symbol.begin(), std::min<std::size_t>(symbol.size(), ATOM_EL_LEN - 1), out.elname);
  out.num_iso_H[0] = static_cast<S_CHAR>(atom.getTotalNumHs());
  out.isotopic_mass = static_cast<AT_NUM>(atom.getIsotope());
  out.charge = static_cast<S_CHAR>(atom.getFormalCharge());
  // One electron is a doublet, two are taken as a triplet; InChI has no name for more.
  const unsigned int unpaired = atom.getNumRadicalElectrons();
  if (unpaired == 1) out.radical = INCHI_RADICAL_DOUBLET;
  if (unpaired == 2) out.radical = INCHI_RADICAL_TRIPLET;
  return out;
}

/// Adds the bond to the atom that comes first; libinchi wants every bond once.
/// False where the atom has more neighbours than libinchi has room for.
bool addBond(std::vector<inchi_Atom>& atoms, const RDKit::Bond& bond) {
  const unsigned int first = std::min(bond.getBeginAtomIdx(), bond.getEndAtomIdx());
  const unsigned int second = std::max(bond.getBeginAtomIdx(), bond.getEndAtomIdx());
  inchi_Atom& atom = atoms[first];
  if (atom.num_bonds >= MAXVAL ||
      bond.getOwningMol().getAtomWithIdx(second)->getDegree() > MAXVAL) {
    return false;
  }
  atom.neighbor[atom.num_bonds] = static_cast<AT_NUM>(second);
  atom.bond_type[atom.num_bonds] = bondType(bond);
  ++atom.num_bonds;
  return true;
}

/// The parity of a tetrahedral centre.
/// RDKit looks from the first bond's atom at the others in bond order, a hydrogen that is only
/// counted coming last. InChI takes the centre itself in that hydrogen's place and wants it first,
/// which is three exchanges away and so of the other sense.
std::optional<inchi_Stereo0D> tetrahedralParity(const RDKit::Atom& atom) {
  const auto tag = atom.getChiralTag();
  const bool clockwise = tag == RDKit::Atom::CHI_TETRAHEDRAL_CW;
  if (!clockwise && tag != RDKit::Atom::CHI_TETRAHEDRAL_CCW) return std::nullopt;
  const unsigned int degree = atom.getDegree();
  if (degree != 3 && degree != 4) return std::nullopt;
  inchi_Stereo0D stereo = {};
  stereo.type = INCHI_StereoType_Tetrahedral;
  stereo.central_atom = static_cast<AT_NUM>(atom.getIdx());
  std::size_t next = 0;
  if (degree == 3) stereo.neighbor[next++] = stereo.central_atom;
  for (const RDKit::Bond* bond : atom.getOwningMol().atomBonds(&atom)) {
    stereo.neighbor[next++] = static_cast<AT_NUM>(bond->getOtherAtomIdx(atom.getIdx()));
  }
  const bool even = clockwise == (degree == 4);
  stereo.parity = even ? INCHI_PARITY_EVEN : INCHI_PARITY_ODD;
  return stereo;
}

/// The parity of a double bond: odd where the two named neighbours are on one side.
std::optional<inchi_Stereo0D> doubleBondParity(const RDKit::Bond& bond) {
  const auto stereo = bond.getStereo();
  const bool sameSide = stereo == RDKit::Bond::STEREOZ || stereo == RDKit::Bond::STEREOCIS;
  const bool across = stereo == RDKit::Bond::STEREOE || stereo == RDKit::Bond::STEREOTRANS;
  const auto& named = bond.getStereoAtoms();
  if ((!sameSide && !across) || named.size() != 2) return std::nullopt;
  inchi_Stereo0D out = {};
  out.type = INCHI_StereoType_DoubleBond;
  out.central_atom = NO_ATOM;
  out.neighbor[0] = static_cast<AT_NUM>(named[0]);
  out.neighbor[1] = static_cast<AT_NUM>(bond.getBeginAtomIdx());
  out.neighbor[2] = static_cast<AT_NUM>(bond.getEndAtomIdx());
  out.neighbor[3] = static_cast<AT_NUM>(named[1]);
  out.parity = sameSide ? INCHI_PARITY_ODD : INCHI_PARITY_EVEN;
  return out;
}

std::optional<InchiInput> inchiInput(const RDKit::ROMol& mol) {
  if (mol.getNumAtoms() > kMostInchiAtoms) return std::nullopt;
  InchiInput input;
  for (const RDKit::Atom* atom : mol.atoms()) {
    input.atoms.push_back(inchiAtom(*atom));
    if (const auto parity = tetrahedralParity(*atom)) input.stereo.push_back(*parity);
  }
  for (const RDKit::Bond* bond : mol.bonds()) {
    if (!addBond(input.atoms, *bond)) return std::nullopt;
    if (const auto parity = doubleBondParity(*bond)) input.stereo.push_back(*parity);
  }
  return input;
}

std::string inchiKey(const std::string& inchi) {
  std::array<char, 28> key = {};  // 27 characters and the final zero
  std::array<char, 65> unused1 = {};
  std::array<char, 65> unused2 = {};
  const int status =
      GetINCHIKeyFromINCHI(inchi.c_str(), 0, 0, key.data(), unused1.data(), unused2.data());
  return status == INCHIKEY_OK ? std::string(key.data()) : std::string();
}

}  // namespace

Identity standardInchi(const RDKit::ROMol& mol) {
  RDKit::RWMol kekule(mol);
  RDKit::MolOps::Kekulize(kekule, true);
  std::optional<InchiInput> structure = inchiInput(kekule);
  if (!structure) return {};
  std::string options = "-W10";  // no more than 10 s; the limit does not change the result
  inchi_Input input = {};
  input.atom = structure->atoms.data();
  input.num_atoms = static_cast<AT_NUM>(structure->atoms.size());
  input.stereo0D = structure->stereo.data();
  input.num_stereo0D = static_cast<AT_NUM>(structure->stereo.size());
  input.szOptions = options.data();
  inchi_Output output = {};
  const int status = GetStdINCHI(&input, &output);
  Identity identity;
  if ((status == inchi_Ret_OKAY || status == inchi_Ret_WARNING) && output.szInChI != nullptr) {
    identity.inchi = output.szInChI;
    identity.inchiKey = inchiKey(identity.inchi);
  }
  FreeStdINCHI(&output);
  if (identity.inchiKey.empty()) identity.inchi.clear();
  return identity;
}

}  // namespace vialkeeper::chem
