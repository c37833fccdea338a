// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/history_model.h"

#include <QJsonArray>
#include <QJsonDocument>
#include <QJsonObject>
#include <QSet>
#include <QStringList>

#include "ui/models/moment_text.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

/// Longest text of a value that a line shows.
constexpr qsizetype kLongestValue = 60;

/// Columns that only serve the file.
bool servesFile(const QString& column) {
  return column == QStringLiteral("id") || column == QStringLiteral("version") ||
         column == QStringLiteral("n") || column.endsWith(QStringLiteral("_n")) ||
         column.endsWith(QStringLiteral("_ms")) || column.endsWith(QStringLiteral("_offset_min"));
}

QString valueText(const QJsonValue& value) {
  if (value.isNull() || value.isUndefined()) return QStringLiteral("–");
  if (value.isObject()) return HistoryModel::tr("bytes");
  QString text = value.isDouble() ? QString::number(value.toDouble(), 'g', 6)
                                  : value.toVariant().toString();
  text.replace(QLatin1Char('\n'), QLatin1Char(' '));
  if (text.size() > kLongestValue) text = text.left(kLongestValue) + QStringLiteral("…");
  return text;
}

}  // namespace

QStringList changedValues(const app::RevisionRecord& revision) {
  QStringList lines;
  const auto changes =
      QJsonDocument::fromJson(QByteArray::fromStdString(revision.changes)).array();
  for (const QJsonValue& change : changes) {
    const QJsonObject before = change[QStringLiteral("before")].toObject();
    const QJsonObject after = change[QStringLiteral("after")].toObject();
    QStringList columns = after.keys() + before.keys();
    columns.removeDuplicates();
    columns.sort();
    const QString of = after.value(QStringLiteral("name"))
                           .toString(before.value(QStringLiteral("name")).toString());
    for (const QString& column : columns) {
      if (servesFile(column) || before.value(column) == after.value(column)) continue;
      QString what = change[QStringLiteral("table")].toString();
      if (!of.isEmpty() && column != QStringLiteral("name")) what += QLatin1Char(' ') + of;
      QString words = column;
      words.replace(QLatin1Char('_'), QLatin1Char(' '));
      lines += QStringLiteral("%1, %2: %3 → %4")
                   .arg(what, words, valueText(before.value(column)),
                        valueText(after.value(column)));
    }
  }
  return lines;
}

HistoryModel::HistoryModel(OpenRun& run, QObject* parent)
    : QAbstractTableModel(parent), m_run(run) {
  connect(&m_run, &OpenRun::reloaded, this, &HistoryModel::load);
  load();
}

void HistoryModel::load() {
  beginResetModel();
  m_revisions.clear();
  if (m_run.isOpen()) {
    m_revisions = m_run.link().notebook().history(m_run.run().n).value_or(
        std::vector<app::RevisionRecord>{});
    std::ranges::sort(m_revisions, std::ranges::greater{}, &app::RevisionRecord::seq);
  }
  endResetModel();
}

int HistoryModel::rowCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_revisions.size());
}

int HistoryModel::columnCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : kColumnCount;
}

QVariant HistoryModel::data(const QModelIndex& index, int role) const {
  if (!checkIndex(index, CheckIndexOption::IndexIsValid)) return {};
  const app::RevisionRecord& revision = m_revisions[static_cast<std::size_t>(index.row())];
  if (role == Qt::ToolTipRole) return changedValues(revision).join(QLatin1Char('\n'));
  if (role != Qt::DisplayRole && role != Qt::AccessibleTextRole) return {};
  switch (index.column()) {
    case kWhen:
      return momentText(revision.at);
    case kWho:
      return toQt(revision.person);
    case kWhat:
      return toQt(revision.action);
    case kChanges: {
      const QStringList values = changedValues(revision);
      const QString first = values.isEmpty() ? QString() : values.front();
      return values.size() > 1 ? tr("%1 (and %2 more)").arg(first).arg(values.size() - 1) : first;
    }
    default:
      return toQt(revision.reason);
  }
}

QVariant HistoryModel::headerData(int section, Qt::Orientation orientation, int role) const {
  if (orientation != Qt::Horizontal || role != Qt::DisplayRole) return {};
  static const QStringList names = {tr("when"), tr("who"), tr("action"), tr("changed"),
                                    tr("reason")};
  return section >= 0 && section < kColumnCount ? names[section] : QString();
}

}  // namespace vialkeeper::ui
