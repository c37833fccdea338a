// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/new_run_model.h"

#include "charge/plan_reader.h"
#include "ui/models/background.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

NewRunModel::Field fieldOf(const text::Fault& fault) {
  if (fault.field == "title") return NewRunModel::Field::kTitle;
  if (fault.field == "series") return NewRunModel::Field::kSeries;
  return NewRunModel::Field::kSource;
}

std::vector<NewRunModel::FieldFault> fieldFaults(const text::Faults& faults) {
  std::vector<NewRunModel::FieldFault> list;
  for (const text::Fault& fault : faults) {
    const auto field = fieldOf(fault);
    list.push_back({field, sentences({fault}, field == NewRunModel::Field::kSource)});
  }
  return list;
}

QString joined(const std::vector<std::string>& lines) {
  QStringList all;
  for (const std::string& line : lines) all += toQt(line);
  return all.join(QLatin1Char('\n'));
}

QString asSentence(QString words) {
  if (!words.endsWith(QLatin1Char('.'))) words += QLatin1Char('.');
  return words;
}

}  // namespace

NewRunModel::NewRunModel(NotebookLink& link, QObject* parent)
    : QObject(parent), m_link(link), m_sources(link) {}

void NewRunModel::reset() {
  m_sources.reload();
  choose(-1);
}

void NewRunModel::clearPreview() {
  m_preview.show({});
  m_notices.clear();
  m_vial.clear();
  m_caution.clear();
  m_sourceFault.clear();
}

void NewRunModel::choose(int row) {
  ++m_choice;
  m_wanted.reset();
  m_suggested = {};
  m_isWorking = false;
  clearPreview();
  if (row >= 0) startFrom(m_sources.source(row));
  emit chosen();
  if (m_wanted && m_sourceFault.isEmpty()) previewWanted();
  emit previewed();
}

void NewRunModel::startFrom(const RunSource& source) {
  m_suggested = {source.title, {}, toQt(source.run.aim)};
  app::NewRun wanted{.planText = source.planText, .planFile = source.planFile};
  wanted.clonedFrom = source.run.n;
  if (source.kind == RunSource::Kind::kRun) {
    auto planText = m_link.notebook().attachment(source.run.plan);
    if (!planText) {
      m_sourceFault = sentences(planText.error());
      return;
    }
    wanted.planText = *std::move(planText);
  }
  if (const auto plan = charge::readPlan(wanted.planText, wanted.planFile))
    m_suggested.series = toQt(plan->series);
  m_wanted = std::move(wanted);
}

void NewRunModel::previewWanted() {
  m_isWorking = true;
  inBackground(
      this,
      [files = &m_link.workplace().files, file = toUtf8(m_link.file()),
       wanted = *m_wanted]() -> text::Checked<app::RunPreview> {
        auto notebook = files->open(file, NotebookFiles::Use::kReading);
        if (!notebook) return std::unexpected(notebook.error());
        return app::previewRun(**notebook, wanted);
      },
      [this, choice = m_choice](const text::Checked<app::RunPreview>& preview) {
        // Another source may be chosen by now.
        if (choice == m_choice) take(preview);
      });
}

void NewRunModel::take(const text::Checked<app::RunPreview>& preview) {
  m_isWorking = false;
  clearPreview();
  if (!preview) {
    m_sourceFault = sentences(preview.error());
  } else {
    app::SheetContent sheet = app::weighingSheet(preview->planned);
    for (const text::Notice& notice : preview->notices) m_notices += asSentence(toQt(notice.text));
    if (!preview->newSubstances.empty()) {
      QStringList names;
      for (const std::string& name : preview->newSubstances) names += toQt(name);
      m_notices += tr("New on the shelf: %1.").arg(names.join(QStringLiteral(", ")));
    }
    m_vial = joined(sheet.vial.lines);
    if (!sheet.cautions.empty()) m_caution = toQt(sheet.cautions.front());
    m_preview.show(std::move(sheet.rows));
  }
  emit previewed();
}

std::expected<app::RowNumber, std::vector<NewRunModel::FieldFault>> NewRunModel::create(
    const Words& words) {
  const auto refused = [](Field field, const QString& sentence) {
    return std::unexpected(std::vector<FieldFault>{{field, sentence}});
  };
  if (!m_wanted)
    return refused(Field::kSource, tr("Nothing is chosen: choose what the run starts from."));
  if (m_link.person().isEmpty())
    return refused(Field::kSource, tr("Nobody is named: type your initials at the top right."));
  app::NewRun wanted = *m_wanted;
  wanted.title = toUtf8(words.title.trimmed());
  wanted.aim = toUtf8(words.aim.trimmed());
  if (wanted.title.empty())
    return refused(Field::kTitle, tr("The run has no title: say in a few words what it is."));
  // The plan says the same as the notebook, for whoever exports it.
  if (words.title.trimmed() != m_suggested.title)
    wanted.overrides.push_back({"title", wanted.title});
  if (words.series.trimmed() != m_suggested.series)
    wanted.overrides.push_back({"series", toUtf8(words.series.trimmed())});
  const auto added = app::addRun(m_link.desk(), wanted);
  if (!added) return std::unexpected(fieldFaults(added.error()));
  m_link.lookForChanges();
  return added->run.n;
}

}  // namespace vialkeeper::ui
