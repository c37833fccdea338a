// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/weigh_run.h"

#include <algorithm>

#include "app/notebook/component_records.h"
#include "app/notebook/run_life.h"

namespace vialkeeper::app {

Checked<WeighedComponent> weighComponent(const Desk& desk, const RunRecord& run,
                                         const std::string& key, const std::string& quantity,
                                         bool accepted, const std::string& reason) {
  if (const auto may = mayDo(run.state, Deed::kWeigh, reason); !may)
    return std::unexpected(may.error());
  auto sheet = loadRun(desk.notebook, run);
  if (!sheet) return std::unexpected(sheet.error());
  const auto component = componentOfKey(sheet->planned.plan, key);
  if (!component) return std::unexpected(component.error());
  const auto actual = readActual(**component, quantity);
  if (!actual) return std::unexpected(actual.error());
  if (!accepted) {
    auto questions =
        questionWeighing(**component, *sheet->planned.charge.find(key), *actual, quantity);
    if (!questions.empty()) return WeighedComponent{std::move(questions), *std::move(sheet)};
  }
  const Action action = desk.action("weigh", reason);
  const auto record = std::ranges::find(sheet->components, key, &ComponentRecord::key);
  takeActual(*record, *actual, quantity, action.author);
  if (const auto judged =
          judgeAll(sheet->planned.plan, sheet->planned.substances, sheet->components);
      !judged)
    return std::unexpected(judged.error());
  RunRecord changed = run;
  changed.state = stateAfter(run.state, Trigger::kFirstWeighing);
  const auto done = desk.notebook.act(action, [&](Writing& writing) -> Checked<void> {
    for (const ComponentRecord& each : sheet->components) {
      if (const auto written = writing.changeComponent(each); !written) return written;
    }
    return changed.state == run.state ? Checked<void>{} : writing.changeRun(changed);
  });
  if (!done) return std::unexpected(done.error());
  auto current = desk.notebook.run(run.n);
  if (!current) return std::unexpected(current.error());
  auto reloaded = loadRun(desk.notebook, *current);
  if (!reloaded) return std::unexpected(reloaded.error());
  return WeighedComponent{{}, *std::move(reloaded)};
}

}  // namespace vialkeeper::app
