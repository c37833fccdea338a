// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "app/notebook/desk.h"
#include "app/notebook/signer.h"

namespace vialkeeper::app {

/// Whether a new key may take the place of one that the person has.
enum class OldKey { kKept, kReplaced };

/// Makes a signing key for the person at the desk. Where one may be replaced, the later key takes
/// its place for signing; what the earlier one signed stays valid under it. Fault: the person has a
/// key that is to be kept.
/// Gives whether there was an earlier one.
[[nodiscard]] Checked<bool> makeSigningKey(const Desk& desk, Signer& signer,
                                           const std::string& passphrase, OldKey old);

/// Seals a closed run: from then on it takes addenda only. The seal covers the run and all it links
/// to. Fault: the run is not closed, the person has no key, the passphrase does not open it.
[[nodiscard]] Checked<void> sealRun(const Desk& desk, Signer& signer, const RunRecord& run,
                                    const std::string& passphrase);

/// Adds a witness's signature to a sealed run. Fault: the run is not sealed, the witness is its
/// author or has signed already.
[[nodiscard]] Checked<void> countersignRun(const Desk& desk, Signer& signer, const RunRecord& run,
                                           const std::string& passphrase);

}  // namespace vialkeeper::app
