// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <functional>
#include <optional>
#include <string>

#include "cli/surroundings.h"
#include "text/fault.h"

namespace CLI {
class App;
}

namespace vialkeeper::cli {

/// Options that stand before or behind any verb.
struct CommonOptions {
  std::string book;
  std::optional<std::string> person;
  bool newPerson = false;  ///< initials that the notebook does not know are somebody new
  bool json = false;
  Surroundings* around = nullptr;
};

/// What a verb prints on standard output when all went well.
using VerbResult = text::Checked<std::string>;

/// A verb: adds its options to the parser and, once those are parsed, does its work.
struct Verb {
  CLI::App* parser;
  std::function<VerbResult(const CommonOptions&)> run;
};

// On plain files, and on a notebook's runs where one is named.
[[nodiscard]] Verb massVerb(CLI::App& program);
[[nodiscard]] Verb chargeVerb(CLI::App& program);
[[nodiscard]] Verb sheetVerb(CLI::App& program);

// On a notebook.
[[nodiscard]] Verb createVerb(CLI::App& program);
[[nodiscard]] Verb demoVerb(CLI::App& program);
[[nodiscard]] Verb shelfVerb(CLI::App& program);
[[nodiscard]] Verb addVerb(CLI::App& program);
[[nodiscard]] Verb cloneVerb(CLI::App& program);
[[nodiscard]] Verb runsVerb(CLI::App& program);
[[nodiscard]] Verb findVerb(CLI::App& program);
[[nodiscard]] Verb showVerb(CLI::App& program);
[[nodiscard]] Verb changeVerb(CLI::App& program);
[[nodiscard]] Verb weighVerb(CLI::App& program);
[[nodiscard]] Verb logVerb(CLI::App& program);
[[nodiscard]] Verb correctVerb(CLI::App& program);
[[nodiscard]] Verb resultVerb(CLI::App& program);
[[nodiscard]] Verb compareVerb(CLI::App& program);
[[nodiscard]] Verb labelVerb(CLI::App& program);
[[nodiscard]] Verb importVerb(CLI::App& program);
[[nodiscard]] Verb exportVerb(CLI::App& program);
[[nodiscard]] Verb backupVerb(CLI::App& program);
[[nodiscard]] Verb verifyVerb(CLI::App& program);
[[nodiscard]] Verb keyVerb(CLI::App& program);
[[nodiscard]] Verb sealVerb(CLI::App& program);
[[nodiscard]] Verb countersignVerb(CLI::App& program);

/// A fault of the command line itself, at the option of that name.
[[nodiscard]] inline text::Fault usageFault(std::string option, std::string what,
                                            std::string mend) {
  return {.kind = text::FaultKind::kUsage,
          .field = std::move(option),
          .what = std::move(what),
          .mend = std::move(mend)};
}

}  // namespace vialkeeper::cli
