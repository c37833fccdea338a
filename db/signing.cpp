// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/signing.h"

#include <fmt/format.h>
#include <sodium.h>

#include <array>

#include "db/canonical_json.h"
#include "text/utf8.h"

namespace vialkeeper::db {
namespace {

const unsigned char* bytesOf(std::string_view text) {
  return reinterpret_cast<const unsigned char*>(text.data());
}
unsigned char* bytesOf(std::string& text) { return reinterpret_cast<unsigned char*>(text.data()); }

/// A secret that is wiped when it is no longer needed.
template <std::size_t size>
class Secret {
 public:
  Secret() = default;
  Secret(const Secret&) = delete;
  Secret& operator=(const Secret&) = delete;
  ~Secret() { sodium_memzero(m_bytes.data(), size); }
  [[nodiscard]] unsigned char* data() { return m_bytes.data(); }

 private:
  std::array<unsigned char, size> m_bytes{};
};

std::unexpected<text::Faults> fault(std::string field, std::string what, std::string mend) {
  return std::unexpected(
      text::Faults{{.field = std::move(field), .what = std::move(what), .mend = std::move(mend)}});
}

bool isReady() { return sodium_init() >= 0; }

using BoxKey = Secret<crypto_secretbox_KEYBYTES>;
using SecretKey = Secret<crypto_sign_SECRETKEYBYTES>;

bool deriveKey(BoxKey& boxKey, const std::string& passphrase, const app::SigningKey& key) {
  return crypto_pwhash(
             boxKey.data(), crypto_secretbox_KEYBYTES, passphrase.data(), passphrase.size(),
             bytesOf(key.salt), static_cast<unsigned long long>(key.operations),
             static_cast<std::size_t>(key.memory_bytes), crypto_pwhash_ALG_ARGON2ID13) == 0;
}

/// Bounds beyond which a key's figures were not written by this program: a damaged file must not
/// ask for all memory.
bool isPlausible(const app::SigningKey& key) {
  return key.salt.size() == crypto_pwhash_SALTBYTES &&
         key.nonce.size() == crypto_secretbox_NONCEBYTES &&
         key.sealedSecret.size() == crypto_sign_SECRETKEYBYTES + crypto_secretbox_MACBYTES &&
         key.operations >= 1 && key.operations <= 10 && key.memory_bytes >= 8192 &&
         key.memory_bytes <= (std::int64_t{1} << 30);
}

}  // namespace

std::string sealMessage(std::string_view meaning, std::int64_t signed_ms, std::string_view sha256) {
  return fmt::format("vialkeeper-seal/1\n{}\n{}\n{}", meaning, signed_ms, toHex(sha256));
}

bool isSignedBy(std::string_view publicKey, std::string_view message, std::string_view signature) {
  if (!isReady() || publicKey.size() != crypto_sign_PUBLICKEYBYTES ||
      signature.size() != crypto_sign_BYTES)
    return false;
  return crypto_sign_verify_detached(bytesOf(signature), bytesOf(message), message.size(),
                                     bytesOf(publicKey)) == 0;
}

text::Checked<app::SigningKey> SodiumSigner::makeKey(const std::string& person,
                                                     const std::string& passphrase) {
  if (!isReady())
    return fault("", "the cryptographic library does not start", "install libsodium again");
  if (text::characterIndex(passphrase, passphrase.size()) < 8) {
    return fault("passphrase", "the passphrase is shorter than eight characters",
                 "take a longer one");
  }
  app::SigningKey key{
      .person = person,
      .publicKey = std::string(crypto_sign_PUBLICKEYBYTES, '\0'),
      .sealedSecret = std::string(crypto_sign_SECRETKEYBYTES + crypto_secretbox_MACBYTES, '\0'),
      .salt = std::string(crypto_pwhash_SALTBYTES, '\0'),
      .nonce = std::string(crypto_secretbox_NONCEBYTES, '\0'),
      .operations = crypto_pwhash_OPSLIMIT_MODERATE,
      .memory_bytes = crypto_pwhash_MEMLIMIT_MODERATE};
  SecretKey secret;
  BoxKey boxKey;
  crypto_sign_keypair(bytesOf(key.publicKey), secret.data());
  randombytes_buf(key.salt.data(), key.salt.size());
  randombytes_buf(key.nonce.data(), key.nonce.size());
  if (!deriveKey(boxKey, passphrase, key))
    return fault("", "there is not enough memory to protect the key", "close other programs");
  crypto_secretbox_easy(bytesOf(key.sealedSecret), secret.data(), crypto_sign_SECRETKEYBYTES,
                        bytesOf(key.nonce), boxKey.data());
  return key;
}

text::Checked<app::SealRecord> SodiumSigner::sign(const app::SigningKey& key,
                                                  const std::string& passphrase,
                                                  const std::string& meaning,
                                                  const units::Moment& at,
                                                  const std::string& canonical) {
  if (!isReady() || !isPlausible(key))
    return fault("key", "the signing key is damaged", "run verify");
  SecretKey secret;
  BoxKey boxKey;
  if (!deriveKey(boxKey, passphrase, key))
    return fault("", "there is not enough memory to open the key", "close other programs");
  if (crypto_secretbox_open_easy(secret.data(), bytesOf(key.sealedSecret), key.sealedSecret.size(),
                                 bytesOf(key.nonce), boxKey.data()) != 0) {
    return fault("passphrase", "the passphrase does not open the key", "type it again");
  }
  app::SealRecord seal{.meaning = meaning,
                       .key = key.n,
                       .person = key.person,
                       .publicKey = key.publicKey,
                       .canonical = canonical,
                       .sha256 = sha256(canonical),
                       .signature = std::string(crypto_sign_BYTES, '\0'),
                       .signedAt = at};
  const std::string message = sealMessage(meaning, at.utc.time_since_epoch().count(), seal.sha256);
  crypto_sign_detached(bytesOf(seal.signature), nullptr, bytesOf(message), message.size(),
                       secret.data());
  return seal;
}

}  // namespace vialkeeper::db
