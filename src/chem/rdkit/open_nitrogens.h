// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>

namespace vialkeeper::chem {

/// The SMILES with as few bare aromatic `n` as need be turned into `[nH]` for its rings to have
/// alternating double bonds: what is meant by `n1cccc1` as a part of N-substituted pyrroles. The
/// same text where none is needed or none helps.
[[nodiscard]] std::string closeOpenNitrogens(std::string_view smiles);

}  // namespace vialkeeper::chem
