// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>
#include <unistd.h>

#include <CLI/CLI.hpp>
#include <istream>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/seal_run.h"
#include "app/text_files.h"
#include "cli/json_text.h"
#include "cli/notebook_session.h"
#include "cli/verb.h"
#include "db/signing.h"

namespace vialkeeper::cli {
namespace {

struct SealOptions {
  std::string run;
  std::string passphraseFile;
  bool yes = false;
};

/// The passphrase: the first line of a file, or of standard input. It never stands on the command
/// line, where other users of the machine could read it.
text::Checked<std::string> passphrase(const SealOptions& options, const CommonOptions& common) {
  std::string line;
  if (options.passphraseFile.empty()) {
    std::getline(common.around->in, line);
  } else {
    const auto bytes = app::readFile(options.passphraseFile);
    if (!bytes) return std::unexpected(bytes.error());
    line = bytes->substr(0, bytes->find('\n'));
  }
  if (!line.empty() && line.back() == '\r') line.pop_back();
  if (!line.empty()) return line;
  return std::unexpected(
      text::Faults{usageFault("--passphrase-file", "no passphrase is given",
                              "type it on standard input, or name a file that holds it")});
}

using Work = text::Checked<void> (*)(const app::Desk&, app::Signer&, const app::RunRecord&,
                                     const std::string&);

VerbResult signRun(const SealOptions& options, const CommonOptions& common, Work work,
                   const char* done) {
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  const auto run = app::runOfCode(session->notebook(), options.run);
  if (!run) return std::unexpected(run.error());
  const auto words = passphrase(options, common);
  if (!words) return std::unexpected(words.error());
  db::SodiumSigner signer;
  const auto signedRun = work(session->desk(), signer, *run, *words);
  if (!signedRun) return std::unexpected(signedRun.error());
  if (common.json) {
    return toJsonText({{"run", run->code},
                       {"person", session->desk().person},
                       {"done", done},
                       {"notices", nlohmann::ordered_json::array()}});
  }
  return fmt::format("{}: {} by {}\n", run->code, done, session->desk().person);
}

VerbResult newKey(const SealOptions& options, const CommonOptions& common) {
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  const auto words = passphrase(options, common);
  if (!words) return std::unexpected(words.error());
  db::SodiumSigner signer;
  const auto replaced = app::makeSigningKey(
      session->desk(), signer, *words, options.yes ? app::OldKey::kReplaced : app::OldKey::kKept);
  if (!replaced) return std::unexpected(replaced.error());
  if (common.json) {
    return toJsonText({{"person", session->desk().person},
                       {"replaced", *replaced},
                       {"notices", nlohmann::ordered_json::array()}});
  }
  return fmt::format("{} has a new signing key; without its passphrase nobody can sign with it\n{}",
                     session->desk().person,
                     *replaced ? "older seals stay valid under the key they were made with\n" : "");
}

void addPassphrase(CLI::App& parser, SealOptions& options) {
  parser.add_option("--passphrase-file", options.passphraseFile,
                    "a file whose first line is the passphrase; else standard input");
}

Verb signing(CLI::App& program, const char* name, const char* description, Work work,
             const char* done) {
  auto options = std::make_shared<SealOptions>();
  CLI::App* parser = program.add_subcommand(name, description);
  parser->add_option("RUN", options->run, "the code of a run, KW-0042")->required();
  addPassphrase(*parser, *options);
  return {parser,
          [=](const CommonOptions& common) { return signRun(*options, common, work, done); }};
}

}  // namespace

Verb keyVerb(CLI::App& program) {
  auto options = std::make_shared<SealOptions>();
  CLI::App* parser = program.add_subcommand("key", "Signing keys");
  parser->require_subcommand(1);
  CLI::App* make = parser->add_subcommand("new", "Make a signing key, protected by a passphrase");
  make->fallthrough();
  addPassphrase(*make, *options);
  make->add_flag("--yes", options->yes, "replace the key that you have; older seals stay valid");
  return {parser, [options](const CommonOptions& common) { return newKey(*options, common); }};
}

Verb sealVerb(CLI::App& program) {
  return signing(program, "seal", "Sign a closed run; from then on it takes addenda only",
                 app::sealRun, "sealed");
}

Verb countersignVerb(CLI::App& program) {
  return signing(program, "countersign", "Sign a sealed run as a witness", app::countersignRun,
                 "countersigned");
}

}  // namespace vialkeeper::cli
