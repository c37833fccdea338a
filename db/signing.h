// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <string>
#include <string_view>

#include "app/notebook/signer.h"

namespace vialkeeper::db {

/// What is signed: a tag, the meaning, the time, and the hash of the canonical text.
[[nodiscard]] std::string sealMessage(std::string_view meaning, std::int64_t signed_ms,
                                      std::string_view sha256);

/// Whether the Ed25519 signature (RFC 8032) of the message is that of the public key.
[[nodiscard]] bool isSignedBy(std::string_view publicKey, std::string_view message,
                              std::string_view signature);

/// Keys and signatures over libsodium: Ed25519, the secret half sealed by XSalsa20-Poly1305 under a
/// key that Argon2id draws from the passphrase.
class SodiumSigner final : public app::Signer {
 public:
  text::Checked<app::SigningKey> makeKey(const std::string& person,
                                         const std::string& passphrase) override;
  text::Checked<app::SealRecord> sign(const app::SigningKey& key, const std::string& passphrase,
                                      const std::string& meaning, const units::Moment& at,
                                      const std::string& canonical) override;
};

}  // namespace vialkeeper::db
