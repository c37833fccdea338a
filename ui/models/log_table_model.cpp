// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/log_table_model.h"

#include <algorithm>
#include <chrono>

#include "app/notebook/log_line_kinds.h"
#include "app/notebook/log_line_sentence.h"
#include "app/notebook/log_time.h"
#include "ui/models/moment_text.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

constexpr qsizetype kLongestReading = 2000;
constexpr qsizetype kLongestQuote = 60;

bool isText(std::string_view kind) {
  return kind == app::event_kind::kObservation || kind == app::event_kind::kAddendum;
}

/// The line as it was typed, short enough for a remark.
QString quoted(const std::string& raw) {
  QString line = toQt(raw).simplified();
  if (line.size() > kLongestQuote) line = line.left(kLongestQuote) + QStringLiteral("…");
  return QStringLiteral("“%1”").arg(line);
}

/// What the entry says beside its kind.
QString readingOf(const app::EventRecord& event) {
  QString reading = isText(event.kind) ? toQt(event.note.empty() ? event.raw : event.note)
                                       : toQt(app::eventSentence(event));
  const QString kind = toQt(event.kind);
  if (!isText(event.kind) && reading.startsWith(kind)) {
    reading = reading.mid(kind.size());
    while (reading.startsWith(QLatin1Char(':')) || reading.startsWith(QLatin1Char(' ')))
      reading.remove(0, 1);
  }
  if (reading.size() > kLongestReading)
    reading = LogTableModel::tr("%1… (%2 characters in all)")
                  .arg(reading.left(kLongestReading))
                  .arg(reading.size());
  return reading;
}

QString wordOf(const std::string& kind) {
  return kind == app::event_kind::kObservation ? LogTableModel::tr("note") : toQt(kind);
}

}  // namespace

LogTableModel::LogTableModel(OpenRun& run, QObject* parent)
    : QAbstractTableModel(parent), m_run(run) {
  connect(&m_run, &OpenRun::reloaded, this, &LogTableModel::follow);
  m_rows = makeRows();
}

void LogTableModel::follow() {
  std::vector<Row> rows = makeRows();
  if (rows == m_rows) return;
  beginResetModel();
  m_rows = std::move(rows);
  endResetModel();
}

const app::EventRecord* LogTableModel::eventOf(app::RowNumber n) const {
  for (const app::NumberedEvent& entry : m_run.events())
    if (entry.event.n == n) return &entry.event;
  return nullptr;
}

QString LogTableModel::remarkOf(const app::EventRecord& event) const {
  QStringList remarks;
  if (event.supersededBy != 0) {
    if (const auto* later = eventOf(event.supersededBy)) {
      const QString when = clockBeside(later->logged, event.at);
      remarks += later->kind == app::event_kind::kWithdrawn ? tr("withdrawn at %1").arg(when)
                                                            : tr("corrected at %1").arg(when);
    }
  }
  const auto* earlier = event.supersedes == 0 ? nullptr : eventOf(event.supersedes);
  if (earlier != nullptr && event.kind != app::event_kind::kWithdrawn) {
    remarks += tr("corrects %1").arg(quoted(earlier->raw));
  } else if (event.logged.utc - event.at.utc >= std::chrono::minutes(1) && earlier == nullptr) {
    const auto time = app::readLogTime(units::toIsoText(event.at), event.logged);
    const QString when = clockBeside(event.logged, event.at);
    remarks += time && time->late ? tr("late: written %1").arg(when) : tr("written %1").arg(when);
  }
  return remarks.join(QStringLiteral("; "));
}

LogTableModel::Row LogTableModel::makeRow(const app::NumberedEvent& entry) const {
  const app::EventRecord& event = entry.event;
  Row row{.entry = entry.number,
          .kind = wordOf(event.kind),
          .reading = readingOf(event),
          .remark = remarkOf(event),
          .who = toQt(event.person),
          .tip = tr("Entry %1, typed as %2").arg(entry.number).arg(quoted(event.raw)),
          .struck = event.supersededBy != 0};
  if (event.kind == app::event_kind::kWithdrawn) {
    if (const auto* earlier = eventOf(event.supersedes))
      row.reading = tr("%1 was taken back").arg(quoted(earlier->raw));
  }
  return row;
}

std::vector<LogTableModel::Row> LogTableModel::makeRows() const {
  std::vector<Row> rows;
  if (!m_run.isOpen()) return rows;
  const auto& events = m_run.events();
  rows.reserve(events.size());
  units::Moment above = m_run.link().now();
  for (auto entry = events.rbegin(); entry != events.rend(); ++entry) {
    rows.push_back(makeRow(*entry));
    rows.back().when = clockBeside(entry->event.at, above);
    above = entry->event.at;
  }
  return rows;
}

int LogTableModel::rowCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_rows.size());
}

int LogTableModel::columnCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(kColumnCount);
}

QVariant LogTableModel::data(const QModelIndex& index, int role) const {
  if (!checkIndex(index, CheckIndexOption::IndexIsValid | CheckIndexOption::ParentIsInvalid))
    return {};
  const Row& row = m_rows[static_cast<std::size_t>(index.row())];
  switch (role) {
    case kEntryRole:
      return row.entry;
    case kStruckRole:
      return row.struck;
    case kKindRole:
      return row.kind;
    case Qt::ToolTipRole:
      return row.tip;
    case Qt::AccessibleTextRole:
    case Qt::DisplayRole:
      switch (index.column()) {
        case kWhen:
          return row.when;
        case kKind:
          return row.kind;
        case kReading:
          return row.reading;
        case kRemark:
          return row.remark;
        default:
          return row.who;
      }
    default:
      return {};
  }
}

QVariant LogTableModel::headerData(int section, Qt::Orientation orientation, int role) const {
  if (orientation != Qt::Horizontal || role != Qt::DisplayRole) return {};
  switch (section) {
    case kWhen:
      return tr("when");
    case kKind:
      return tr("what");
    case kReading:
      return tr("reading");
    case kRemark:
      return tr("remark");
    case kWho:
      return tr("who");
    default:
      return {};
  }
}

int LogTableModel::entryAt(int row) const {
  return row >= 0 && row < rowCount() ? m_rows[static_cast<std::size_t>(row)].entry : 0;
}

int LogTableModel::rowOf(int entry) const {
  const auto found = std::ranges::find(m_rows, entry, &Row::entry);
  return found == m_rows.end() ? -1 : static_cast<int>(found - m_rows.begin());
}

bool LogTableModel::stands(int entry) const {
  const int row = rowOf(entry);
  return row >= 0 && !m_rows[static_cast<std::size_t>(row)].struck;
}

}  // namespace vialkeeper::ui
