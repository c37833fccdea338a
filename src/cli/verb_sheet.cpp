// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <filesystem>
#include <memory>
#include <nlohmann/json.hpp>
#include <optional>

#include "app/plan_charge.h"
#include "app/sheet_content.h"
#include "app/text_files.h"
#include "cli/json_text.h"
#include "cli/planned_source.h"
#include "cli/scale_options.h"
#include "cli/verb.h"
#include "exports/pages.h"
#include "text/utf8.h"

namespace vialkeeper::cli {
namespace {

struct SheetOptions {
  std::string plan;
  std::string pdf;
  std::string paper = "A4";
  std::optional<std::string> weighed;
  bool stocks = false;
  ScaleOptions scale;
};

text::Checked<exports::PdfDocument> print(const app::PlannedRun& run, bool stocks,
                                          exports::Paper paper) {
  if (!stocks) return exports::printWeighingSheet(app::weighingSheet(run), paper);
  const auto sheets = app::stockSheets(run);
  if (!sheets.empty()) return exports::printStockSheets(sheets, paper);
  return std::unexpected(
      text::Faults{{.file = run.plan.file,
                    .what = "the plan neither uses a stock solution nor needs one",
                    .mend = "leave --stocks out for the weighing sheet"}});
}

VerbResult runSheet(const SheetOptions& options, const CommonOptions& common) {
  app::ChargeRequest request{.weighedFile = options.weighed};
  text::Faults faults = readScale(options.scale, request);
  if (options.paper != "A4" && options.paper != "Letter") {
    faults.push_back(
        usageFault("--paper", fmt::format("{} is no paper size here", text::quoted(options.paper)),
                   "choose A4 or Letter"));
  }
  for (const std::string& input : {options.plan, options.weighed.value_or("")}) {
    std::error_code ignored;
    if (!input.empty() && std::filesystem::equivalent(input, options.pdf, ignored)) {
      faults.push_back(usageFault("--pdf", "this is the file that is read", "name another file"));
    }
  }
  if (options.pdf.empty())
    faults.push_back(usageFault("--pdf", "the file name is empty", "name the PDF to write"));
  if (!faults.empty()) return std::unexpected(std::move(faults));
  const auto run = plannedFrom(options.plan, request, common);
  if (!run) return std::unexpected(run.error());
  const auto paper = options.paper == "A4" ? exports::Paper::kA4 : exports::Paper::kLetter;
  const auto document = print(*run, options.stocks, paper);
  if (!document) return std::unexpected(document.error());
  if (const auto written = app::writePdf(options.pdf, document->bytes); !written) {
    return std::unexpected(written.error());
  }
  if (common.json) {
    return toJsonText({{"pages", document->pages},
                       {"file", options.pdf},
                       {"notices", noticesJson(run->charge.notices)}});
  }
  return fmt::format("{}: {} {}\n", options.pdf, document->pages,
                     document->pages == 1 ? "page" : "pages");
}

}  // namespace

Verb sheetVerb(CLI::App& program) {
  auto options = std::make_shared<SheetOptions>();
  CLI::App* parser = program.add_subcommand("sheet", "The weighing sheet of a plan, as PDF");
  parser->add_option("PLAN", options->plan, "a plan file, or with --book the code of a run")
      ->required();
  parser->add_option("--pdf", options->pdf, "the PDF file to write")->required();
  parser->add_option("--paper", options->paper, "A4 (default) or Letter");
  parser->add_option("--weighed", options->weighed,
                     "CSV of key,actual: fills in what was recorded");
  parser->add_flag("--stocks", options->stocks,
                   "the sheets for making its stock solutions instead");
  addScaleOptions(*parser, options->scale);
  return {parser, [options](const CommonOptions& common) { return runSheet(*options, common); }};
}

}  // namespace vialkeeper::cli
