// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/seal_run.h"

#include <fmt/format.h>

#include <algorithm>

namespace vialkeeper::app {
namespace {

Checked<SigningKey> keyOf(const Desk& desk) {
  const auto key = desk.notebook.signingKey(desk.person);
  if (!key) return std::unexpected(key.error());
  if (*key) return **key;
  return askedFault("key", fmt::format("{} has no signing key", desk.person),
                    "make one first: key new");
}

/// Signs what the notebook holds at that moment and keeps the seal, within one action.
Checked<void> signInside(const Desk& desk, Signer& signer, Writing& writing, const SigningKey& key,
                         const RunRecord& run, const std::string& meaning,
                         const std::string& passphrase, const units::Moment& at) {
  const auto canonical = desk.notebook.canonicalRun(run.n);
  if (!canonical) return std::unexpected(canonical.error());
  auto seal = signer.sign(key, passphrase, meaning, at, *canonical);
  if (!seal) return std::unexpected(seal.error());
  seal->run = run.n;
  const auto added = writing.addSeal(*seal);
  if (!added) return std::unexpected(added.error());
  return {};
}

}  // namespace

Checked<bool> makeSigningKey(const Desk& desk, Signer& signer, const std::string& passphrase,
                             OldKey old) {
  const auto earlier = desk.notebook.signingKey(desk.person);
  if (!earlier) return std::unexpected(earlier.error());
  if (*earlier && old == OldKey::kKept) {
    return askedFault("key", fmt::format("{} has a signing key already", desk.person),
                      "keep it, or replace it with --yes: from then on the new one signs, and "
                      "older seals stay valid under the key they were made with");
  }
  auto key = signer.makeKey(desk.person, passphrase);
  if (!key) return std::unexpected(key.error());
  const auto done =
      desk.notebook.act(desk.action("key new"), [&](Writing& writing) -> Checked<void> {
        const auto added = writing.addSigningKey(*key);
        if (!added) return std::unexpected(added.error());
        return {};
      });
  if (!done) return std::unexpected(done.error());
  return earlier->has_value();
}

Checked<void> sealRun(const Desk& desk, Signer& signer, const RunRecord& run,
                      const std::string& passphrase) {
  if (run.state == RunState::kSealed)
    return askedFault(run.code, "the run is sealed already", "countersign it, or add an addendum");
  if (run.state != RunState::kClosed) {
    return askedFault(
        run.code, fmt::format("the run is {}, and only a closed run is sealed", toText(run.state)),
        "close it first: result RUN --state closed");
  }
  const auto key = keyOf(desk);
  if (!key) return std::unexpected(key.error());
  const Action action = desk.action("seal");
  return desk.notebook.act(action, [&](Writing& writing) -> Checked<void> {
    RunRecord sealed = run;
    sealed.state = RunState::kSealed;
    if (const auto changed = writing.changeRun(sealed); !changed) return changed;
    return signInside(desk, signer, writing, *key, run, "author", passphrase, action.author.at);
  });
}

Checked<void> countersignRun(const Desk& desk, Signer& signer, const RunRecord& run,
                             const std::string& passphrase) {
  if (run.state != RunState::kSealed)
    return askedFault(run.code, "the run is not sealed", "its author seals it first");
  const auto seals = desk.notebook.seals(run.n);
  if (!seals) return std::unexpected(seals.error());
  const auto signedBefore = std::ranges::find(*seals, desk.person, &SealRecord::person);
  if (signedBefore != seals->end()) {
    const bool isAuthor = signedBefore->meaning == "author";
    return askedFault(run.code,
                      isAuthor ? fmt::format("{} sealed this run", desk.person)
                               : fmt::format("{} has countersigned this run already", desk.person),
                      isAuthor ? "a witness is somebody else: say who, --person"
                               : "once is enough; another witness may still sign");
  }
  const auto key = keyOf(desk);
  if (!key) return std::unexpected(key.error());
  const Action action = desk.action("countersign");
  return desk.notebook.act(action, [&](Writing& writing) {
    return signInside(desk, signer, writing, *key, run, "witness", passphrase, action.author.at);
  });
}

}  // namespace vialkeeper::app
