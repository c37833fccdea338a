// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <algorithm>
#include <cstddef>
#include <string_view>

namespace vialkeeper::chem {

/// The bits of a fingerprint; what follows them is the release that made them.
inline constexpr std::size_t kFingerprintBytes = 256;

/// Whether a structure may have a part, by the fingerprints of StructureEngine::fingerprint() and
/// Pattern::fingerprint(): all bits of the part are set in the structure. False is certain, true is
/// for Pattern::isIn() to decide. True also where the two differ in length, as with a fingerprint
/// that was never made, or in the release that stands behind the bits: nothing speaks against the
/// part, and an update of RDKit can make a stored fingerprint useless, but never wrong.
[[nodiscard]] constexpr bool mayContain(std::string_view structureFingerprint,
                                        std::string_view patternFingerprint) {
  if (structureFingerprint.size() != patternFingerprint.size()) return true;
  const std::size_t bytes = std::min(patternFingerprint.size(), kFingerprintBytes);
  if (structureFingerprint.substr(bytes) != patternFingerprint.substr(bytes)) return true;
  for (std::size_t i = 0; i < bytes; ++i) {
    if ((patternFingerprint[i] & ~structureFingerprint[i]) != 0) return false;
  }
  return true;
}

}  // namespace vialkeeper::chem
