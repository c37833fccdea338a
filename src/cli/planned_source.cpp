// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/planned_source.h"

#include <filesystem>

#include "app/notebook/run_plan.h"
#include "cli/notebook_session.h"

namespace vialkeeper::cli {

bool isRunCode(const std::string& source, const CommonOptions& common) {
  std::error_code ignored;
  return bookFile(common).has_value() && !std::filesystem::exists(source, ignored);
}

text::Checked<app::PlannedRun> plannedFrom(const std::string& source, app::ChargeRequest request,
                                           const CommonOptions& common) {
  if (!isRunCode(source, common)) {
    request.planFile = source;
    return app::planCharge(request);
  }
  if (request.weighedFile || request.scaleToAmount || request.scaleToMass || request.scaleToVial) {
    return std::unexpected(
        text::Faults{usageFault(request.weighedFile ? "--weighed" : "--scale-to",
                                "a run of the notebook has its own weighings and scale",
                                "record with weigh, or clone the run with --set")});
  }
  auto session = NotebookSession::forReading(common);
  if (!session) return std::unexpected(session.error());
  const auto run = app::runOfCode(session->notebook(), source);
  if (!run) return std::unexpected(run.error());
  auto sheet = app::loadRun(session->notebook(), *run, request.retarget);
  if (!sheet) return std::unexpected(sheet.error());
  return std::move(sheet->planned);
}

}  // namespace vialkeeper::cli
