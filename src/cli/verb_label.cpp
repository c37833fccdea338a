// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/sheet_content.h"
#include "app/text_files.h"
#include "cli/json_text.h"
#include "cli/planned_source.h"
#include "cli/verb.h"
#include "exports/pages.h"

namespace vialkeeper::cli {
namespace {

struct LabelOptions {
  std::vector<std::string> sources;
  std::string pdf;
};

VerbResult runLabel(const LabelOptions& options, const CommonOptions& common) {
  std::vector<app::LabelContent> labels;
  for (const std::string& source : options.sources) {
    const auto run = plannedFrom(source, {}, common);
    if (!run) return std::unexpected(run.error());
    labels.push_back(app::vialLabel(*run));
  }
  const auto document = exports::printVialLabels(labels);
  if (!document) return std::unexpected(document.error());
  if (const auto written = app::writePdf(options.pdf, document->bytes); !written)
    return std::unexpected(written.error());
  if (common.json)
    return toJsonText({{"pages", document->pages},
                       {"file", options.pdf},
                       {"notices", nlohmann::ordered_json::array()}});
  return fmt::format("{}: {} {}\n", options.pdf, document->pages,
                     document->pages == 1 ? "label" : "labels");
}

}  // namespace

Verb labelVerb(CLI::App& program) {
  auto options = std::make_shared<LabelOptions>();
  CLI::App* parser = program.add_subcommand("label", "Labels for vials, as PDF");
  parser->add_option("RUN", options->sources, "codes of runs, or plan files")->required();
  parser->add_option("--pdf", options->pdf, "the PDF file to write")->required();
  return {parser, [options](const CommonOptions& common) { return runLabel(*options, common); }};
}

}  // namespace vialkeeper::cli
