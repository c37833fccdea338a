// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/scale_options.h"

#include <fmt/format.h>

#include <CLI/CLI.hpp>

#include "cli/verb.h"
#include "text/text_fault.h"
#include "text/utf8.h"
#include "units/quantity_text.h"

namespace vialkeeper::cli {
namespace {

text::Fault unreadable(const char* option, const std::string& written,
                       const text::TextFault& fault) {
  return usageFault(option,
                    fmt::format("{}: {}", text::quoted(written), whatWithPosition(fault, written)),
                    fault.mend);
}

}  // namespace

void addScaleOptions(CLI::App& parser, ScaleOptions& options) {
  parser.add_option("--scale-to", options.scaleTo,
                    "another amount or mass of the limiting component, such as \"0.5 mmol\"");
  parser.add_option("--scale-to-vial", options.scaleToVial,
                    "another vial's brim-full volume, such as \"20 mL\", at the same fill");
}

text::Faults readScale(const ScaleOptions& options, app::ChargeRequest& request) {
  text::Faults faults;
  if (options.scaleTo) {
    const auto read = units::readQuantityOf({units::Kind::kAmount, units::Kind::kMass},
                                            *options.scaleTo, units::Dialect::kFile);
    if (!read) {
      faults.push_back(unreadable("--scale-to", *options.scaleTo, read.error()));
    } else if (read->kind == units::Kind::kAmount) {
      request.scaleToAmount = units::Amount::fromSi(read->si);
    } else {
      request.scaleToMass = units::Mass::fromSi(read->si);
    }
  }
  if (options.scaleToVial) {
    const auto read =
        units::readQuantity<units::Volume>(*options.scaleToVial, units::Dialect::kFile);
    if (read) {
      request.scaleToVial = *read;
    } else {
      faults.push_back(unreadable("--scale-to-vial", *options.scaleToVial, read.error()));
    }
  }
  if (options.scaleTo && options.scaleToVial) {
    faults.push_back(usageFault("--scale-to-vial", "the scale is given twice",
                                "keep --scale-to or --scale-to-vial"));
  }
  return faults;
}

}  // namespace vialkeeper::cli
