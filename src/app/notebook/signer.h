// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "app/notebook/records.h"
#include "text/fault.h"

namespace vialkeeper::app {

/// The port to keys and signatures.
class Signer {
 public:
  Signer() = default;
  Signer(const Signer&) = delete;
  Signer& operator=(const Signer&) = delete;
  virtual ~Signer() = default;

  /// A new key pair of a person, its secret half sealed under the passphrase.
  /// Fault: a passphrase of fewer than eight characters, no memory for the key derivation.
  virtual text::Checked<SigningKey> makeKey(const std::string& person,
                                            const std::string& passphrase) = 0;

  /// Signs a canonical text. Fault: the passphrase does not open the key.
  virtual text::Checked<SealRecord> sign(const SigningKey& key, const std::string& passphrase,
                                         const std::string& meaning, const units::Moment& at,
                                         const std::string& canonical) = 0;
};

}  // namespace vialkeeper::app
