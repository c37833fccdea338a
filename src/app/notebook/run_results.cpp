// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/run_results.h"

#include <fmt/format.h>

#include "app/notebook/run_life.h"
#include "text/text_fault.h"
#include "text/utf8.h"
#include "units/quantity_text.h"

namespace vialkeeper::app {
namespace {

using text::Faults;

/// A percentage with its standard uncertainty, if one is given.
struct Percent {
  double value = 0.0;
  std::optional<double> u;
};

void add(Faults& faults, const Checked<void>& done) {
  if (!done) faults.insert(faults.end(), done.error().begin(), done.error().end());
}

void note(Faults& faults, std::string field, std::string what, std::string mend) {
  faults.push_back({.field = std::move(field), .what = std::move(what), .mend = std::move(mend)});
}

std::optional<Percent> readPercent(const std::string& field, const std::string& typed,
                                   Faults& faults) {
  std::string_view rest = text::trimmed(typed);
  if (rest.ends_with('%')) rest = text::trimmed(rest.substr(0, rest.size() - 1));
  std::string_view doubt;
  for (const std::string_view sign : {"±", "+-", "+/-"}) {
    const std::size_t at = rest.find(sign);
    if (at == std::string_view::npos) continue;
    doubt = text::trimmed(rest.substr(at + sign.size()));
    rest = text::trimmed(rest.substr(0, at));
    break;
  }
  const auto value = units::readNumber(rest, units::Dialect::kPerson);
  const auto u = doubt.empty() ? std::expected<double, text::TextFault>(0.0)
                               : units::readNumber(doubt, units::Dialect::kPerson);
  if (!value || !u || *u < 0.0) {
    note(faults, field, fmt::format("{} is no percentage", text::quoted(typed)),
         "write for example 71 % or 71 ± 2 %");
    return std::nullopt;
  }
  // A little above 100 is measurement; much above is a slip.
  if (*value < 0.0 || *value > 110.0) {
    note(faults, field, fmt::format("{} % lies outside 0 to 110 %", *value), "check the number");
    return std::nullopt;
  }
  return Percent{*value, doubt.empty() ? std::nullopt : std::optional(*u)};
}

void readWords(const std::optional<std::string>& given, const char* field, std::string& into,
               Faults& faults) {
  if (!given) return;
  if (text::firstInvalidUtf8(*given) || given->find('\0') != std::string::npos) {
    note(faults, field, "the text holds bytes that are no text", "type it again");
    return;
  }
  into = *given;
}

}  // namespace

Checked<RunRecord> recordResult(const Desk& desk, const RunRecord& run,
                                const ResultRequest& request) {
  RunRecord changed = run;
  Faults faults;
  if (request.yield || request.conversion) {
    add(faults, mayDo(run.state, Deed::kRecordResult, request.reason));
    changed.state = stateAfter(run.state, Trigger::kResult);
  }
  if (request.yield) {
    if (const auto percent = readPercent("--yield", *request.yield, faults)) {
      changed.yield_percent = percent->value;
      changed.uYield_percent = percent->u;
    }
  }
  if (request.conversion) {
    if (const auto percent = readPercent("--conversion", *request.conversion, faults)) {
      changed.conversion_percent = percent->value;
      changed.uConversion_percent = percent->u;
    }
  }
  if (request.conclusion) add(faults, mayDo(run.state, Deed::kConclude, request.reason));
  if (request.aim || request.title)
    add(faults, mayDo(run.state, Deed::kWriteHeadings, request.reason));
  readWords(request.conclusion, "--conclusion", changed.conclusion, faults);
  readWords(request.aim, "--aim", changed.aim, faults);
  readWords(request.title, "--title", changed.title, faults);
  if (request.state) {
    const auto state = runStateFromText(*request.state);
    if (!state || *state == RunState::kSealed) {
      note(faults, "--state", fmt::format("{} is no state to set", text::quoted(*request.state)),
           "choose planned, charged, irradiating, worked-up or closed; seal has a verb of its own");
    } else if (*state != changed.state) {
      add(faults, mayTransition(changed.state, *state, request.reason));
      changed.state = *state;
    }
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  const auto done = desk.notebook.act(desk.action("result", request.reason),
                                      [&](Writing& writing) { return writing.changeRun(changed); });
  if (!done) return std::unexpected(done.error());
  return desk.notebook.run(run.n);
}

}  // namespace vialkeeper::app
