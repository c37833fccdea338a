// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <algorithm>

#include "app/notebook/component_records.h"
#include "app/notebook/run_life.h"
#include "app/notebook/weigh_run.h"
#include "text/utf8.h"

namespace vialkeeper::app {

Checked<RunSheet> restoreWeighing(const Desk& desk, const RunRecord& run, const std::string& key,
                                  const std::string& quantity, const std::string& reason) {
  if (const auto may = mayDo(run.state, Deed::kWeigh, reason); !may)
    return std::unexpected(may.error());
  auto sheet = loadRun(desk.notebook, run);
  if (!sheet) return std::unexpected(sheet.error());
  const auto component = componentOfKey(sheet->planned.plan, key);
  if (!component) return std::unexpected(component.error());
  const Action action = desk.action("weigh", reason);
  const auto record = std::ranges::find(sheet->components, key, &ComponentRecord::key);
  if (text::trimmed(quantity).empty()) {
    forgetActual(*record);
  } else {
    const auto actual = readActual(**component, quantity);
    if (!actual) return std::unexpected(actual.error());
    takeActual(*record, *actual, quantity, action.author);
  }
  const auto judged = judgeAll(sheet->planned.plan, sheet->planned.substances, sheet->components);
  if (!judged) return std::unexpected(judged.error());
  const auto done = desk.notebook.act(action, [&](Writing& writing) -> Checked<void> {
    for (const ComponentRecord& each : sheet->components) {
      if (const auto written = writing.changeComponent(each); !written) return written;
    }
    return {};
  });
  if (!done) return std::unexpected(done.error());
  const auto current = desk.notebook.run(run.n);
  if (!current) return std::unexpected(current.error());
  return loadRun(desk.notebook, *current);
}

}  // namespace vialkeeper::app
