// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/open_run.h"

#include <algorithm>

#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

constexpr const char* kUndoReason = "undone";
constexpr const char* kRedoReason = "done again";

}  // namespace

OpenRun::OpenRun(NotebookLink& link, ActionHistory& history, QObject* parent)
    : QObject(parent), m_link(link), m_history(history) {
  connect(&m_link, &NotebookLink::changed, this, &OpenRun::followChanges);
}

text::Checked<void> OpenRun::load(app::RowNumber n) {
  auto run = m_link.notebook().run(n);
  if (!run) return std::unexpected(run.error());
  auto sheet = app::loadRun(m_link.notebook(), *run);
  if (!sheet) return std::unexpected(sheet.error());
  auto events = app::numberedEvents(m_link.notebook(), *run);
  if (!events) return std::unexpected(events.error());
  auto datasets = m_link.notebook().datasetsOf(n);
  if (!datasets) return std::unexpected(datasets.error());
  m_sheet = *std::move(sheet);
  m_events = *std::move(events);
  m_datasets = *std::move(datasets);
  return {};
}

text::Checked<void> OpenRun::open(app::RowNumber run) {
  const auto loaded = load(run);
  if (!loaded) {
    close();
    return loaded;
  }
  emit opened();
  emit reloaded();
  return {};
}

void OpenRun::close() {
  if (!isOpen()) return;
  m_sheet.reset();
  m_events.clear();
  m_datasets.clear();
  emit opened();
  emit reloaded();
}

void OpenRun::followChanges() {
  if (isOpen()) reload();
}

void OpenRun::reload() {
  if (!isOpen()) return;
  if (const auto loaded = load(run().n); !loaded) {
    emit refused(loaded.error());
    return;
  }
  emit reloaded();
}

Outcome OpenRun::finished() {
  // Tells everybody who looks at the notebook, this run among them.
  m_link.lookForChanges();
  return Outcome::success();
}

app::VialStrip OpenRun::strip() const { return app::vialStrip(*m_sheet, m_events, m_link.now()); }

app::Permission OpenRun::permission(app::Deed deed) const {
  if (!isOpen() || m_link.isReadOnly()) return app::Permission::kNo;
  return app::permissionOf(run().state, deed);
}

QString OpenRun::refusal(app::Deed deed) const {
  if (m_link.isReadOnly()) return m_link.readOnlyReason();
  if (!isOpen()) return tr("No run is open.");
  const auto may = app::mayDo(run().state, deed, kUndoReason);
  return may ? QString() : sentences(may.error(), false);
}

const app::ComponentRecord* OpenRun::component(const std::string& key) const {
  const auto found = std::ranges::find(m_sheet->components, key, &app::ComponentRecord::key);
  return found == m_sheet->components.end() ? nullptr : &*found;
}

bool OpenRun::isAsShown(const std::string& key, const QString& mine,
                        std::function<void()> takeMine) {
  if (!m_link.hasUnseenChanges()) return true;
  const app::ComponentRecord* shown = component(key);
  const QString before = shown == nullptr ? QString() : toQt(shown->actualText);
  m_link.lookForChanges();
  const app::ComponentRecord* present = component(key);
  const QString now = present == nullptr ? tr("the component is gone") : toQt(present->actualText);
  if (now == before || now == mine) return true;
  emit conflictFound({tr("%1, weighed").arg(present == nullptr ? toQt(key) : toQt(present->name)),
                      mine, now.isEmpty() ? tr("nothing is recorded") : now, std::move(takeMine)});
  return false;
}

Outcome OpenRun::edit(const QString& name, std::vector<app::PlanEdit> edits,
                      const CommandOptions& options) {
  if (m_link.hasUnseenChanges()) {
    const app::RowNumber shown = run().plan;
    m_link.lookForChanges();
    if (run().plan != shown) {
      emit conflictFound({tr("The plan of %1").arg(toQt(run().code)), name,
                          tr("somebody else changed the plan meanwhile; it is shown now"),
                          [this, name, edits, options] { edit(name, edits, options); }});
      return {.conflict = true};
    }
  }
  const auto edited = app::editRun(m_link.desk(), run(), edits, toUtf8(options.reason));
  if (!edited) return Outcome::failure(edited.error());
  const auto restore = [this, n = run().n](app::RowNumber plan, const std::string& why) {
    return onRun(n, [&](const app::RunRecord& present) {
      return app::restorePlan(m_link.desk(), present, plan, why);
    });
  };
  m_history.add({name,
                 [restore, plan = edited->planBefore] { return restore(plan, kUndoReason); },
                 [restore, plan = edited->sheet.run.plan] { return restore(plan, kRedoReason); }});
  return finished();
}

void OpenRun::rememberWeighing(const QString& name, const std::string& key,
                               const std::string& before, const std::string& after) {
  const auto restore = [this, n = run().n, key](const std::string& quantity,
                                                const std::string& why) {
    return onRun(n, [&](const app::RunRecord& present) {
      return app::restoreWeighing(m_link.desk(), present, key, quantity, why);
    });
  };
  m_history.add({name, [restore, before] { return restore(before, kUndoReason); },
                 [restore, after] { return restore(after, kRedoReason); }});
}

Outcome OpenRun::weigh(const std::string& key, const QString& typed,
                       const CommandOptions& options) {
  const CommandOptions again{options.reason, true};
  if (!isAsShown(key, typed, [this, key, typed, again] { weigh(key, typed, again); }))
    return {.conflict = true};
  const app::ComponentRecord* shown = component(key);
  const std::string before = shown == nullptr ? "" : shown->actualText;
  const QString name = tr("weigh %1").arg(toQt(shown == nullptr ? key : shown->name));
  const auto weighed = app::weighComponent(m_link.desk(), run(), key, toUtf8(typed),
                                           options.accepted, toUtf8(options.reason));
  if (!weighed) return Outcome::failure(weighed.error());
  if (!weighed->questions.empty()) return {.questions = weighed->questions};
  rememberWeighing(name, key, before, toUtf8(typed));
  return finished();
}

Outcome OpenRun::clearWeighing(const std::string& key, const CommandOptions& options) {
  const app::ComponentRecord* shown = component(key);
  if (shown == nullptr || shown->actualText.empty()) return Outcome::success();
  const std::string before = shown->actualText;
  const QString name = tr("clear %1").arg(toQt(shown->name));
  const auto cleared = app::restoreWeighing(m_link.desk(), run(), key, "", toUtf8(options.reason));
  if (!cleared) return Outcome::failure(cleared.error());
  rememberWeighing(name, key, before, "");
  return finished();
}

Outcome OpenRun::record(const app::ResultRequest& request) {
  const app::RunRecord before = run();
  const auto recorded = app::recordResult(m_link.desk(), before, request);
  if (!recorded) {
    // What was shown may be old: the next try works on what is there now.
    m_link.lookForChanges();
    return Outcome::failure(recorded.error());
  }
  const auto restore = [this](const app::RunRecord& wanted, const std::string& why) {
    return onRun(wanted.n, [&](const app::RunRecord& present) {
      return app::restoreResult(m_link.desk(), present, wanted, why);
    });
  };
  m_history.add({tr("change %1").arg(toQt(before.code)),
                 [restore, before] { return restore(before, kUndoReason); },
                 [restore, after = *recorded] { return restore(after, kRedoReason); }});
  return finished();
}

}  // namespace vialkeeper::ui
