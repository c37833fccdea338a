// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/run_sources.h"

#include <QFileInfo>
#include <QStringList>

#include "app/run_templates.h"
#include "app/text_files.h"
#include "charge/plan_reader.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

constexpr std::size_t kNewestRuns = 8;

QString titleOfPlan(const std::string& planText, const std::string& file) {
  const auto plan = charge::readPlan(planText, file);
  return plan && !plan->title.empty() ? toQt(plan->title) : toQt(file);
}

RunSource sourceOf(const app::RunRecord& run) {
  RunSource source{.kind = RunSource::Kind::kRun,
                   .title = run.title.empty() ? toQt(run.code) : toQt(run.title),
                   .where = toQt(run.code) + QStringLiteral(", ") +
                            toQt(units::toIsoText(run.created).substr(0, 10))};
  source.planFile = run.code;
  source.run = run;
  return source;
}

std::vector<RunSource> templateSources() {
  std::vector<RunSource> sources;
  for (const text::EmbeddedFile& file : app::runTemplates()) {
    RunSource source;
    source.planText = file.contents;
    source.planFile = file.name;
    source.title = titleOfPlan(source.planText, source.planFile);
    source.where = RunSources::tr("template");
    sources.push_back(std::move(source));
  }
  return sources;
}

bool holds(const RunSource& source, const QStringList& words) {
  const QString text =
      source.title + QLatin1Char(' ') + source.where + QLatin1Char(' ') + toQt(source.run.series);
  return std::ranges::all_of(
      words, [&text](const QString& word) { return text.contains(word, Qt::CaseInsensitive); });
}

}  // namespace

RunSources::RunSources(NotebookLink& link, QObject* parent)
    : QAbstractListModel(parent), m_link(link) {}

int RunSources::rowCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_shown.size());
}

QVariant RunSources::data(const QModelIndex& index, int role) const {
  if (!checkIndex(index, CheckIndexOption::IndexIsValid)) return {};
  const RunSource& each = source(index.row());
  switch (role) {
    case Qt::DisplayRole:
      return each.title;
    case kWhereRole:
      return each.where;
    case Qt::AccessibleTextRole:
      return each.title + QStringLiteral(", ") + each.where;
    default:
      return {};
  }
}

const RunSource& RunSources::source(int row) const {
  return *m_shown.at(static_cast<std::size_t>(row));
}

void RunSources::reload() {
  beginResetModel();
  m_shown.clear();
  if (m_templates.empty()) m_templates = templateSources();
  m_offered.clear();
  m_byCode.clear();
  m_runs.clear();
  m_typed.clear();
  const auto newest = m_link.notebook().find({}, {.limit = kNewestRuns, .count = false});
  if (newest)
    for (const app::FoundRun& each : newest->runs) m_runs.push_back(sourceOf(each.run));
  show();
  endResetModel();
}

void RunSources::setFilter(const QString& typed) {
  if (typed == m_typed) return;
  beginResetModel();
  m_typed = typed;
  m_byCode.clear();
  if (const auto run = m_link.notebook().findRun(toUtf8(typed.trimmed().toUpper())); run && *run)
    m_byCode.push_back(sourceOf(**run));
  show();
  endResetModel();
}

void RunSources::show() {
  m_shown.clear();
  for (const RunSource& each : m_byCode) m_shown.push_back(&each);
  const QStringList words = m_typed.split(QLatin1Char(' '), Qt::SkipEmptyParts);
  for (const auto* sources : {&m_offered, &m_runs, &m_templates}) {
    for (const RunSource& each : *sources) {
      const bool isThere = std::ranges::any_of(m_shown, [&each](const RunSource* shown) {
        return each.run.n != 0 && shown->run.n == each.run.n;
      });
      if (!isThere && holds(each, words)) m_shown.push_back(&each);
    }
  }
}

void RunSources::offer(RunSource source) {
  beginResetModel();
  m_typed.clear();
  m_byCode.clear();
  m_offered.clear();
  m_offered.push_back(std::move(source));
  show();
  endResetModel();
}

text::Checked<void> RunSources::offerRun(app::RowNumber run) {
  const auto record = m_link.notebook().run(run);
  if (!record) return std::unexpected(record.error());
  offer(sourceOf(*record));
  return {};
}

text::Checked<void> RunSources::offerFile(const QString& file) {
  auto planText = app::readFile(toUtf8(file));
  if (!planText) return std::unexpected(planText.error());
  RunSource source{.kind = RunSource::Kind::kFile, .title = {}, .where = {}};
  source.planText = *std::move(planText);
  source.planFile = toUtf8(QFileInfo(file).fileName());
  source.title = titleOfPlan(source.planText, source.planFile);
  source.where = tr("plan file %1").arg(toQt(source.planFile));
  offer(std::move(source));
  return {};
}

}  // namespace vialkeeper::ui
