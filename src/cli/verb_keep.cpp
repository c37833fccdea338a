// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
// The verbs that keep a notebook safe: backup, verify, export, import.
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <algorithm>
#include <charconv>
#include <filesystem>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/dataset_import.h"
#include "app/notebook/run_export.h"
#include "app/text_files.h"
#include "cli/json_text.h"
#include "cli/notebook_session.h"
#include "cli/record_json.h"
#include "cli/verb.h"
#include "db/sqlite_notebook.h"
#include "text/utf8.h"

namespace vialkeeper::cli {
namespace {

using Json = nlohmann::ordered_json;

VerbResult runBackup(const std::string& file, const CommonOptions& common) {
  auto session = NotebookSession::forReading(common);
  if (!session) return std::unexpected(session.error());
  const auto done = session->notebook().backup(file);
  if (!done) return std::unexpected(done.error());
  if (common.json) return toJsonText({{"file", file}, {"notices", Json::array()}});
  return fmt::format("{}: a copy, opened again and found sound\n", file);
}

struct VerifyOptions {
  std::string head;
  std::string against;
};

/// `N:HASH`, as verify prints it. Sixteen digits of the hash are the least: fewer could be hit
/// upon.
text::Checked<app::ChainHead> readHead(const std::string& given) {
  constexpr std::size_t kLeast = 16;
  constexpr std::size_t kWhole = 64;
  const std::size_t colon = given.find(':');
  app::ChainHead head;
  const char* const end = given.data() + std::min(colon, given.size());
  const auto number = std::from_chars(given.data(), end, head.seq);
  if (colon != std::string::npos) head.hash = text::asciiLowered(given.substr(colon + 1));
  const bool isHash = head.hash.size() >= kLeast && head.hash.size() <= kWhole &&
                      head.hash.find_first_not_of("0123456789abcdef") == std::string::npos;
  if (number.ec == std::errc() && number.ptr == end && head.seq > 0 && isHash) return head;
  return std::unexpected(text::Faults{
      usageFault("--head", text::quoted(given) + " is no number of a revision with its hash",
                 "write N:HASH as verify prints it, with at least 16 digits of the hash")});
}

/// What verify finds wrong is a fault of the notebook: told line by line, exit status 3.
text::Faults findingFaults(const app::VerifyReport& report, const std::string& file) {
  text::Faults faults;
  for (const app::Finding& finding : report.findings) {
    faults.push_back({.kind = text::FaultKind::kNotebook,
                      .file = file,
                      .field = finding.where,
                      .what = finding.what,
                      .mend = "keep the file as it is and go back to a backup"});
  }
  return faults;
}

Json verifyJson(const app::VerifyReport& report) {
  Json notices = Json::array();
  for (const std::string& what : report.notChecked)
    notices.push_back({{"code", "not-checked"}, {"text", what}, {"at", ""}});
  Json head = nullptr;
  if (report.head.seq > 0) head = {{"revision", report.head.seq}, {"hash", report.head.hash}};
  return {{"sound", report.isNewerForm ? Json(nullptr) : Json(true)},
          {"revisions", report.revisions},
          {"records", report.records},
          {"attachments", report.attachments},
          {"seals", report.seals},
          {"head", head},
          {"compared_revisions", report.compared ? Json(*report.compared) : Json(nullptr)},
          {"notices", notices}};
}

std::string verifyText(const app::VerifyReport& report, const VerifyOptions& options) {
  std::string text =
      fmt::format("{}: {} revisions, {} records, {} attachments, {} seals\n",
                  report.isNewerForm ? "nothing wrong was found in what could be checked" : "sound",
                  report.revisions, report.records, report.attachments, report.seals);
  for (const std::string& what : report.notChecked) text += "! " + what + "\n";
  if (report.compared)
    text += fmt::format("all {} revisions of {} are in it unchanged\n", *report.compared,
                        options.against);
  if (report.head.seq > 0) text += fmt::format("head {}:{}\n", report.head.seq, report.head.hash);
  return text;
}

VerbResult runVerify(const VerifyOptions& options, const CommonOptions& common) {
  app::VerifyRequest request{.against = options.against};
  if (!options.head.empty()) {
    auto head = readHead(options.head);
    if (!head) return std::unexpected(head.error());
    request.head = *std::move(head);
  }
  auto session = NotebookSession::forChecking(common);
  if (!session) return std::unexpected(session.error());
  const auto report = session->notebook().verify(request);
  if (!report) return std::unexpected(report.error());
  if (!report->findings.empty()) return std::unexpected(findingFaults(*report, *bookFile(common)));
  return common.json ? toJsonText(verifyJson(*report)) : verifyText(*report, options);
}

struct ExportOptions {
  std::vector<std::string> runs;
  bool all = false;
  std::string to;
};

VerbResult runExport(const ExportOptions& options, const CommonOptions& common) {
  if (options.all == !options.runs.empty()) {
    return std::unexpected(text::Faults{
        usageFault(options.all ? "--all" : "RUN",
                   options.all ? "runs are named besides --all" : "nothing is named to export",
                   "name runs, or give --all")});
  }
  auto session = NotebookSession::forReading(common);
  if (!session) return std::unexpected(session.error());
  const auto done = options.all ? session->notebook().exportAll(options.to)
                                : app::exportRuns(session->notebook(), options.runs, options.to);
  if (!done) return std::unexpected(done.error());
  if (common.json) return toJsonText({{"folder", options.to}, {"notices", Json::array()}});
  return fmt::format(
      "{}: {}\n", options.to,
      options.all ? "the whole notebook" : fmt::format("{} runs", options.runs.size()));
}

struct ImportOptions {
  std::string file;
  std::string kind;
  std::string run;
};

/// Into a new file, or into an empty notebook that is there.
VerbResult importArchive(const ImportOptions& options, const CommonOptions& common) {
  const auto file = bookFile(common);
  if (!file) return std::unexpected(file.error());
  app::NotebookSummary summary;
  const auto fill = [&](app::Notebook& notebook) -> text::Checked<void> {
    if (auto done = notebook.importAll(options.file); !done) return done;
    const auto told = notebook.summary();
    if (!told) return std::unexpected(told.error());
    summary = *told;
    return {};
  };
  std::error_code ignored;
  if (std::filesystem::exists(*file, ignored)) {
    auto session = NotebookSession::forChecking(common);
    if (!session) return std::unexpected(session.error());
    if (const auto done = fill(session->notebook()); !done) return std::unexpected(done.error());
  } else if (const auto done = db::makeNotebook(*file, fill); !done) {
    return std::unexpected(done.error());
  }
  if (common.json)
    return toJsonText(
        {{"runs", summary.runs}, {"revisions", summary.revisions}, {"notices", Json::array()}});
  return fmt::format("{} runs, {} revisions\n", summary.runs, summary.revisions);
}

VerbResult importData(const ImportOptions& options, const CommonOptions& common) {
  const auto bytes = app::readFile(options.file);
  if (!bytes) return std::unexpected(bytes.error());
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  const auto run = app::runOfCode(session->notebook(), options.run);
  if (!run) return std::unexpected(run.error());
  const auto imported =
      app::importDataset(session->desk(), *run, *bytes, options.file, options.kind);
  if (!imported) return std::unexpected(imported.error());
  if (common.json)
    return toJsonText(
        {{"dataset", toJson(imported->record)}, {"notices", noticesJson(imported->notices)}});
  std::string answer = fmt::format("{}: {} rows, linked to {}\n", imported->record.code,
                                   imported->record.rows, run->code);
  for (const text::Notice& notice : imported->notices)
    answer += "! " + text::oneLine(notice.text) + "\n";
  return answer;
}

VerbResult runImport(const ImportOptions& options, const CommonOptions& common) {
  if (options.kind.empty() && options.run.empty()) {
    std::error_code ignored;
    const auto inputFault = [&options](const char* what, const char* mend) {
      return std::unexpected(text::Faults{{.file = options.file, .what = what, .mend = mend}});
    };
    if (!std::filesystem::exists(options.file, ignored))
      return inputFault("there is no such file or folder", "check the path");
    if (std::filesystem::is_directory(options.file, ignored)) {
      if (std::filesystem::exists(std::filesystem::path(options.file) / "notebook.json", ignored))
        return importArchive(options, common);
      return inputFault("this folder is no archive: it holds no notebook.json",
                        "name the folder that export --all made, or a file with --as and --run");
    }
  }
  text::Faults faults;
  if (options.kind.empty()) {
    faults.push_back(usageFault(
        "--as", "what the file holds is not said",
        "choose course, quench, decay, pressure or headspace; an archive folder needs no --as"));
  }
  if (options.run.empty())
    faults.push_back(
        usageFault("--run", "the run it belongs to is not named", "add --run KW-0042"));
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return importData(options, common);
}

}  // namespace

Verb backupVerb(CLI::App& program) {
  auto file = std::make_shared<std::string>();
  CLI::App* parser = program.add_subcommand("backup", "A verified copy of the notebook");
  parser->add_option("FILE", *file, "the copy's name; no file may have it yet")->required();
  return {parser, [file](const CommonOptions& common) { return runBackup(*file, common); }};
}

Verb verifyVerb(CLI::App& program) {
  auto options = std::make_shared<VerifyOptions>();
  CLI::App* parser = program.add_subcommand(
      "verify", "Check the notebook: pages, references, chain, records, files, seals");
  parser->add_option("--against", options->against,
                     "an earlier copy of the notebook: all its revisions must be in this one");
  parser->add_option("--head", options->head,
                     "N:HASH as an earlier verify printed it: must be in the trail");
  return {parser, [options](const CommonOptions& common) { return runVerify(*options, common); }};
}

Verb exportVerb(CLI::App& program) {
  auto options = std::make_shared<ExportOptions>();
  CLI::App* parser =
      program.add_subcommand("export", "Runs, or the whole notebook, as plain files");
  parser->add_option("RUN", options->runs, "the codes of runs");
  parser->add_flag("--all", options->all, "the whole notebook, so that import makes the same one");
  parser->add_option("--to", options->to, "a new folder")->required();
  return {parser, [options](const CommonOptions& common) { return runExport(*options, common); }};
}

Verb importVerb(CLI::App& program) {
  auto options = std::make_shared<ImportOptions>();
  CLI::App* parser =
      program.add_subcommand("import", "A data file for a run, or an archive into a new notebook");
  parser->add_option("FILE", options->file, "a CSV, or the folder of export --all")->required();
  parser->add_option("--as", options->kind, "course, quench, decay, pressure, headspace");
  parser->add_option("--run", options->run, "the run the data belong to");
  return {parser, [options](const CommonOptions& common) { return runImport(*options, common); }};
}

}  // namespace vialkeeper::cli
