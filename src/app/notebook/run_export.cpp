// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/run_export.h"

#include <fmt/format.h>

#include <filesystem>

#include "app/notebook/desk.h"
#include "app/notebook/log_line_kinds.h"
#include "app/text_files.h"
#include "text/csv.h"

namespace vialkeeper::app {
namespace {

namespace fs = std::filesystem;

std::string numberCell(const std::optional<double>& value, const char* unit) {
  return value ? fmt::format("{} {}", *value, unit) : std::string{};
}

/// Entries that were superseded are left out: the account is kept on what is thought right.
std::string logCsv(const std::vector<EventRecord>& events) {
  std::string csv = "time,event,pressure,temperature,volume,gas,amount,fraction,note\r\n";
  for (const EventRecord& event : events) {
    if (event.supersededBy != 0 || event.kind == event_kind::kAddendum ||
        event.kind == event_kind::kWithdrawn)
      continue;
    std::string pressure = numberCell(event.pressure_bar, "bar");
    if (!pressure.empty() && !event.pressureKind.empty()) pressure += " " + event.pressureKind;
    const bool words = event.kind == "observation" || event.kind == "photo";
    const std::string note = event.note.empty() && words ? event.raw : event.note;
    csv += fmt::format(
        "{},{},{},{},{},{},{},{},{}\r\n", toIsoText(event.at), words ? "observation" : event.kind,
        pressure, numberCell(event.temperature_C, "degC"), numberCell(event.volume_uL, "uL"),
        event.gas, numberCell(event.amount_mmol, "mmol"),
        event.fraction ? fmt::format("{}", *event.fraction) : "", text::toCsvCell(note));
  }
  return csv;
}

std::string weighedCsv(const std::vector<ComponentRecord>& components) {
  std::string csv = "key,actual\r\n";
  for (const ComponentRecord& component : components) {
    const std::string actual = component.actual_mg ? numberCell(component.actual_mg, "mg")
                                                   : numberCell(component.actual_uL, "uL");
    if (!actual.empty()) csv += fmt::format("{},{}\r\n", text::toCsvCell(component.key), actual);
  }
  return csv;
}

/// A file name without anything that could lead out of the folder.
std::string plainName(const std::string& name, const std::string& otherwise) {
  std::string plain;
  for (const char c : fs::path(name).filename().string())
    plain += c == '/' || c == '\\' || static_cast<unsigned char>(c) < 0x20 ? '_' : c;
  return plain.empty() || plain.front() == '.' ? otherwise + plain : plain;
}

class RunExporter {
 public:
  RunExporter(Notebook& notebook, const RunRecord& run, fs::path folder)
      : m_notebook(notebook), m_run(run), m_folder(std::move(folder)) {}

  Checked<void> write() {
    std::error_code error;
    fs::create_directories(m_folder / "files", error);
    if (error)
      return askedFault(m_folder.string(), "the folder cannot be made: " + error.message(),
                        "name another place");
    const auto canonical = m_notebook.canonicalRun(m_run.n);
    const auto plan = m_notebook.attachment(m_run.plan);
    const auto events = m_notebook.events(m_run.n);
    const auto components = m_notebook.components(m_run.n);
    if (!canonical) return std::unexpected(canonical.error());
    if (!plan) return std::unexpected(plan.error());
    if (!events) return std::unexpected(events.error());
    if (!components) return std::unexpected(components.error());
    for (const auto& [name, bytes] :
         {std::pair{"record.json", *canonical}, std::pair{"plan.toml", *plan},
          std::pair{"log.csv", logCsv(*events)},
          std::pair{"weighed.csv", weighedCsv(*components)}}) {
      if (const auto written = writeFile((m_folder / name).string(), bytes); !written)
        return written;
    }
    for (const EventRecord& event : *events) {
      if (event.attachment == 0) continue;
      if (const auto written = writeRaw(event.attachment, event.attachmentName); !written)
        return written;
    }
    return writeDatasets();
  }

 private:
  Checked<void> writeDatasets() {
    const auto datasets = m_notebook.datasetsOf(m_run.n);
    if (!datasets) return std::unexpected(datasets.error());
    for (const DatasetRecord& dataset : *datasets) {
      if (const auto written = writeRaw(dataset.raw, dataset.code + "-" + dataset.rawName);
          !written)
        return written;
    }
    return {};
  }

  Checked<void> writeRaw(RowNumber attachment, const std::string& name) {
    const auto bytes = m_notebook.attachment(attachment);
    if (!bytes) return std::unexpected(bytes.error());
    return writeFile(
        (m_folder / "files" / plainName(name, fmt::format("file-{}", attachment))).string(),
        *bytes);
  }

  Notebook& m_notebook;
  const RunRecord& m_run;
  fs::path m_folder;
};

}  // namespace

Checked<void> exportRuns(Notebook& notebook, const std::vector<std::string>& codes,
                         const std::string& folder) {
  std::vector<RunRecord> runs;
  text::Faults faults;
  for (const std::string& code : codes) {
    auto run = runOfCode(notebook, code);
    if (run) {
      runs.push_back(*std::move(run));
    } else {
      faults.insert(faults.end(), run.error().begin(), run.error().end());
    }
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  std::error_code ignored;
  if (fs::exists(folder, ignored))
    return askedFault(folder, "this folder is there already", "name a new one");
  for (const RunRecord& run : runs) {
    if (const auto done = RunExporter(notebook, run, fs::path(folder) / run.code).write(); !done)
      return done;
  }
  return {};
}

}  // namespace vialkeeper::app
