// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <functional>
#include <string>

#include "text/fault.h"

namespace CLI {
class App;
}

namespace vialkeeper::cli {

/// Options that stand before or behind any verb.
struct CommonOptions {
  std::string book;
  bool json = false;
};

/// What a verb prints on standard output when all went well.
using VerbResult = text::Checked<std::string>;

/// A verb: adds its options to the parser and, once those are parsed, does its work.
struct Verb {
  CLI::App* parser;
  std::function<VerbResult(const CommonOptions&)> run;
};

[[nodiscard]] Verb massVerb(CLI::App& program);
[[nodiscard]] Verb chargeVerb(CLI::App& program);
[[nodiscard]] Verb sheetVerb(CLI::App& program);

/// A fault of the command line itself, at the option of that name.
[[nodiscard]] inline text::Fault usageFault(std::string option, std::string what, std::string mend) {
  return {.kind = text::FaultKind::kUsage,
          .field = std::move(option),
          .what = std::move(what),
          .mend = std::move(mend)};
}

}  // namespace vialkeeper::cli
