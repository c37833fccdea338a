// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <GraphMol/RWMol.h>

#include <expected>
#include <memory>
#include <string_view>

#include "chem/structure.h"

namespace vialkeeper::chem {

/// Whether hydrogens that are written as atoms stay atoms.
enum class Hydrogens {
  Counted,   ///< no, except where they bear a meaning (isotopes, H2, double-bond geometry)
  AsWritten  ///< yes
};

/// The sanitised molecule of a SMILES. RDKit's own messages are switched off.
/// Fault: not one real structure, or one whose valences do not add up; says where.
/// Throws nothing of its own; std::bad_alloc and RDKit's invariant failures pass through.
[[nodiscard]] std::expected<std::unique_ptr<RDKit::RWMol>, StructureFault> parseMolecule(
    std::string_view smiles, Hydrogens hydrogens = Hydrogens::Counted);

/// What a module answers when RDKit fails in a way that is nobody's mistake.
[[nodiscard]] StructureFault unexpectedFault();

/// Calls work() and turns any exception into a fault: none may leave a module.
template <class Work>
auto guarded(Work work) noexcept -> decltype(work()) {
  try {
    return work();
  } catch (...) {
    return std::unexpected(unexpectedFault());
  }
}

}  // namespace vialkeeper::chem
