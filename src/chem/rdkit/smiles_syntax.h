// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string_view>

#include "chem/structure.h"

namespace vialkeeper::chem {

/// The most likely mistake in a SMILES that RDKit's parser has refused, as it does without a
/// reason. Positions count characters from 1. No RDKit here.
/// Source: OpenSMILES for the grammar; two bonds between the same atoms are not looked for.
[[nodiscard]] StructureFault explainSyntax(std::string_view smiles);

}  // namespace vialkeeper::chem
