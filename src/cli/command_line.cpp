// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/command_line.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <CLI/CLI.hpp>
#include <algorithm>
#include <exception>
#include <ostream>
#include <vector>

#include "cli/verb.h"
#include "text/utf8.h"
#include "units/toml_section.h"

namespace vialkeeper::cli {
namespace {

using text::Fault;
using text::FaultKind;
using text::Faults;

int exitStatus(const Faults& faults) {
  const auto any = [&faults](FaultKind kind) {
    return std::ranges::any_of(faults, [kind](const Fault& fault) { return fault.kind == kind; });
  };
  if (any(FaultKind::kNotebook)) return 3;
  return any(FaultKind::kUsage) ? 2 : 1;
}

int report(const Faults& faults, std::ostream& err) {
  for (const Fault& fault : faults) err << text::toLine(fault) << '\n';
  return exitStatus(faults);
}

std::string helpHint(const CLI::App& program) {
  for (const CLI::App* verb : program.get_subcommands()) {
    return fmt::format("see vialkeeper {} --help", verb->get_name());
  }
  return "see vialkeeper --help";
}

Fault unknownVerb(const CLI::App& program, const std::string& name) {
  std::vector<std::string> verbs;
  for (const CLI::App* verb : program.get_subcommands([](const CLI::App*) { return true; })) {
    verbs.push_back(verb->get_name());
  }
  const auto nearest = units::nearestName(name, verbs);
  return usageFault(name, "this verb is not known",
                    nearest ? fmt::format("did you mean {}?", *nearest)
                            : fmt::format("choose among {}", fmt::join(verbs, ", ")));
}

/// Whether the option of that name, of the program or of the verb that is called, takes a value.
bool takesValue(const CLI::App& program, const std::string& name) {
  const CLI::Option* option = program.get_option_no_throw(name);
  for (const CLI::App* verb : program.get_subcommands()) {
    if (option == nullptr) option = verb->get_option_no_throw(name);
  }
  return option != nullptr && option->get_items_expected_max() > 0;
}

/// One complaint about an option or argument that is known: its name goes into the place.
Fault reworded(const CLI::App& program, const CLI::ParseError& error, std::string hint) {
  const std::string said = text::oneLine(error.what());
  switch (static_cast<CLI::ExitCodes>(error.get_exit_code())) {
    case CLI::ExitCodes::RequiredError:  // "PLAN is required"
      if (const std::size_t end = said.find(" is required"); end != std::string::npos) {
        return usageFault(said.substr(0, end), "this is missing", std::move(hint));
      }
      break;
    case CLI::ExitCodes::ArgumentMismatch:  // "--pdf: 1 required TEXT missing", "--pdf: At Most 1
                                            // required but …"
      if (const std::size_t end = said.find(": "); end != std::string::npos) {
        const bool repeated = said.find("At Most") != std::string::npos;
        return repeated ? usageFault(said.substr(0, end), "this option is given more than once",
                                     "keep one of them")
                        : usageFault(said.substr(0, end), "its value is missing", std::move(hint));
      }
      break;
    case CLI::ExitCodes::ConversionError:  // "Could not convert: --json = maybe"
      if (const std::size_t begin = said.find("--"); begin != std::string::npos) {
        const std::string name = said.substr(begin, said.find_first_of(" =", begin) - begin);
        return usageFault(
            name,
            takesValue(program, name) ? "its value cannot be read" : "this option takes no value",
            std::move(hint));
      }
      break;
    default:
      break;
  }
  return usageFault("", said, std::move(hint));
}

/// The parser's complaints in our words.
Faults parserFaults(const CLI::App& program, const CLI::ParseError& error) {
  const bool verbGiven = !program.get_subcommands().empty();
  if (error.get_exit_code() == static_cast<int>(CLI::ExitCodes::ExtrasError)) {
    Faults faults;
    for (const std::string& extra : program.remaining(true)) {
      if (!verbGiven && faults.empty() && !extra.starts_with('-'))
        return {unknownVerb(program, extra)};
      const bool option = extra.starts_with('-');
      faults.push_back(usageFault(
          extra, option ? "this option is not known" : "one argument too many", helpHint(program)));
    }
    if (!faults.empty()) return faults;
  }
  if (error.get_exit_code() == static_cast<int>(CLI::ExitCodes::RequiredError) && !verbGiven) {
    // The parser misses the verb before it looks at what it could not place.
    Faults faults;
    for (const std::string& extra : program.remaining()) {
      if (!extra.starts_with('-')) return {unknownVerb(program, extra)};
      faults.push_back(usageFault(extra, "this option is not known", helpHint(program)));
    }
    if (faults.empty()) faults.push_back(usageFault("", "no verb is given", helpHint(program)));
    return faults;
  }
  return {reworded(program, error, helpHint(program))};
}

void describe(CLI::App& program, CommonOptions& common) {
  program.description(
      "Vialkeeper: a record for light-driven, hydrogen-evolving reactions in sealed vials.");
  program.set_version_flag("--version", "vialkeeper " VIALKEEPER_VERSION);
  program.add_option("--book", common.book, "the notebook file (or VIALKEEPER_BOOK)");
  program.add_option("--person", common.person, "who works, by initials (or VIALKEEPER_PERSON)");
  program.add_flag("--new-person", common.newPerson,
                   "the initials are somebody's who has not worked in this notebook yet");
  program.add_flag("--json", common.json, "print one JSON object in place of a table");
  program.require_subcommand(1);
  program.fallthrough();
  program.footer(
      "Exit status: 0 done, 1 the input is at fault, 2 the command line, 3 the notebook.");
}

std::vector<Verb> allVerbs(CLI::App& program) {
  std::vector<Verb> verbs;
  for (const auto make :
       {massVerb,   chargeVerb,  sheetVerb,  createVerb,  demoVerb,  shelfVerb,
        addVerb,    cloneVerb,   runsVerb,   findVerb,    showVerb,  changeVerb, weighVerb,
        logVerb,    correctVerb, resultVerb, compareVerb, labelVerb, importVerb,
        exportVerb, backupVerb,  verifyVerb, keyVerb,     sealVerb,  countersignVerb}) {
    verbs.push_back(make(program));
  }
  return verbs;
}

}  // namespace

int run(std::span<const std::string> arguments, std::ostream& out, std::ostream& err,
        Surroundings& around) {
  CLI::App program;
  program.name("vialkeeper");
  CommonOptions common;
  common.around = &around;
  describe(program, common);
  const std::vector<Verb> verbs = allVerbs(program);
  try {
    // CLI11 takes its arguments from the back.
    program.parse(std::vector<std::string>(arguments.rbegin(), arguments.rend()));
  } catch (const CLI::Success& wanted) {
    return program.exit(wanted, out, err);  // --help, --version
  } catch (const CLI::ParseError& error) {
    return report(parserFaults(program, error), err);
  }
  for (const Verb& verb : verbs) {
    if (!verb.parser->parsed()) continue;
    const VerbResult result = verb.run(common);
    if (!result) return report(result.error(), err);
    out << *result;
    if (out.flush()) return 0;
    return report(
        {{.what = "the output could not be written", .mend = "check the disk or the pipe"}}, err);
  }
  return 2;
}

}  // namespace vialkeeper::cli
