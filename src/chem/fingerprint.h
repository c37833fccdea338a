// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <string_view>

namespace vialkeeper::chem {

/// Whether a structure may have a part, by the fingerprints of StructureEngine::fingerprint() and
/// Pattern::fingerprint(): all bits of the part are set in the structure. False is certain, true is
/// for Pattern::isIn() to decide. True also where the two differ in length, as with a fingerprint
/// that was never made: nothing speaks against the part.
[[nodiscard]] constexpr bool mayContain(std::string_view structureFingerprint,
                                        std::string_view patternFingerprint) {
  if (structureFingerprint.size() != patternFingerprint.size()) return true;
  for (std::size_t i = 0; i < patternFingerprint.size(); ++i) {
    if ((patternFingerprint[i] & ~structureFingerprint[i]) != 0) return false;
  }
  return true;
}

}  // namespace vialkeeper::chem
