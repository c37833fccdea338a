// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/charge_table_model.h"

#include <algorithm>

#include "ui/models/balance_reading.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

bool sameKeys(const std::vector<ChargeRow>& a, const std::vector<ChargeRow>& b) {
  return std::ranges::equal(a, b, {}, &ChargeRow::key, &ChargeRow::key);
}

QString joined(const QStringList& parts) {
  QStringList said = parts;
  said.removeAll(QString());
  return said.join(QStringLiteral(" · "));
}

}  // namespace

ChargeTableModel::ChargeTableModel(OpenRun& run, ChangeReason& reason, QObject* parent)
    : QAbstractTableModel(parent), m_run(run), m_reason(reason) {
  connect(&m_run, &OpenRun::reloaded, this, &ChargeTableModel::follow);
  connect(&m_run, &OpenRun::opened, this, [this] { m_kept.clear(); });
  connect(&m_reason, &ChangeReason::givenUp, this, &ChargeTableModel::forgetWaiting);
  follow();
}

void ChargeTableModel::follow() {
  std::vector<ChargeRow> rows;
  if (m_run.isOpen()) rows = chargeRows(m_run.sheet());
  if (sameKeys(rows, m_rows)) {
    m_rows = std::move(rows);
    if (!m_rows.empty()) emit dataChanged(index(0, 0), index(rowCount() - 1, kColumns - 1));
    return;
  }
  beginResetModel();
  m_rows = std::move(rows);
  endResetModel();
}

int ChargeTableModel::rowCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_rows.size());
}

int ChargeTableModel::columnCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : kColumns;
}

QVariant ChargeTableModel::headerData(int section, Qt::Orientation orientation, int role) const {
  if (orientation != Qt::Horizontal || section < 0 || section >= kColumns) return {};
  if (role == Qt::TextAlignmentRole)
    return QVariant::fromValue(Qt::Alignment(Qt::AlignVCenter) |
                               (section <= kAmount ? Qt::AlignLeft : Qt::AlignRight));
  if (role != Qt::DisplayRole) return {};
  switch (section) {
    case kComponent:
      return tr("component");
    case kAmount:
      return tr("as written");
    case kMillimoles:
      return tr("mmol");
    case kRatio:
      return tr("equiv / mol%");
    case kTarget:
      return tr("weigh or pipette");
    case kWeighed:
      return tr("weighed");
    default:
      return tr("as charged");
  }
}

bool ChargeTableModel::isHere(const QModelIndex& index) const {
  return index.isValid() && index.row() < rowCount() && index.column() < kColumns;
}

Qt::ItemFlags ChargeTableModel::flags(const QModelIndex& index) const {
  if (!isHere(index)) return Qt::NoItemFlags;
  Qt::ItemFlags flags = Qt::ItemIsSelectable | Qt::ItemIsEnabled | Qt::ItemNeverHasChildren;
  const auto may = [this](app::Deed deed) {
    return m_run.permission(deed) != app::Permission::kNo;
  };
  if ((index.column() == kAmount && may(app::Deed::kChangePlan)) ||
      (index.column() == kWeighed && may(app::Deed::kWeigh)))
    flags |= Qt::ItemIsEditable;
  return flags;
}

const ChargeTableModel::Kept* ChargeTableModel::kept(const std::string& key, int column) const {
  const auto found = m_kept.find({key, column});
  return found == m_kept.end() ? nullptr : &found->second;
}

QString ChargeTableModel::shown(const ChargeRow& row, int column) const {
  if (const Kept* typed = kept(row.key, column); typed != nullptr && column != kComponent)
    return typed->typed;
  switch (column) {
    case kComponent:
      return row.name;
    case kAmount:
      return row.amount;
    case kMillimoles:
      return row.mmol;
    case kRatio:
      return row.ratio;
    case kTarget:
      return row.target;
    case kWeighed:
      return row.weighed;
    default:
      return row.charged;
  }
}

QString ChargeTableModel::secondLine(const ChargeRow& row, int column) const {
  switch (column) {
    case kComponent:
      return row.roleLine;
    case kTarget:
      return joined({row.tolerance, row.alternative});
    case kCharged:
      return row.deviation;
    default:
      return {};
  }
}

Tone ChargeTableModel::tone(const ChargeRow& row, int column) const {
  if (kept(row.key, column) != nullptr && column != kComponent) return Tone::kFault;
  return column == kCharged ? row.chargedTone : Tone::kPlain;
}

QStringList ChargeTableModel::faultsOf(const ChargeRow& row) const {
  QStringList sentences;
  for (const auto& [place, kept] : m_kept) {
    if (place.first == row.key && kept.questions.empty()) sentences += kept.sentence;
  }
  return sentences;
}

/// What a screen reader says of a cell: its head, its text, and what stands around it.
QString ChargeTableModel::spoken(const ChargeRow& row, int column) const {
  const QString head = headerData(column, Qt::Horizontal, Qt::DisplayRole).toString();
  const QString text = shown(row, column);
  QStringList parts{text.isEmpty() ? tr("empty") : text, secondLine(row, column)};
  if (const Kept* typed = kept(row.key, column)) parts += tr("not taken: %1").arg(typed->sentence);
  if (column == kComponent) parts += row.notices;
  parts.removeAll(QString());
  const QString whose = column == kComponent ? QString() : row.name + QStringLiteral(", ");
  return whose + head + QStringLiteral(": ") + parts.join(QStringLiteral(", "));
}

QVariant ChargeTableModel::data(const QModelIndex& index, int role) const {
  if (!isHere(index)) return {};
  const ChargeRow& row = m_rows[static_cast<std::size_t>(index.row())];
  const int column = index.column();
  const Kept* weighing = kept(row.key, kWeighed);
  const bool asked = weighing != nullptr && !weighing->questions.empty();
  switch (role) {
    case Qt::DisplayRole:
    case Qt::EditRole:
      return shown(row, column);
    case Qt::TextAlignmentRole:
      return headerData(column, Qt::Horizontal, role);
    case Qt::AccessibleTextRole:
      return spoken(row, column);
    case kSecondLineRole:
      return secondLine(row, column);
    case kToneRole:
      return QVariant::fromValue(static_cast<int>(tone(row, column)));
    case kNoticesRole:
      return row.notices;
    case kFaultsRole:
      return faultsOf(row);
    case kQuestionRole:
      return asked ? weighing->sentence : QString();
    case kLikelyRole:
      return asked ? toQt(weighing->questions.front().likelyText) : QString();
    case kIsKeptRole:
      return kept(row.key, column) != nullptr;
    default:
      return {};
  }
}

bool ChargeTableModel::setData(const QModelIndex& index, const QVariant& value, int role) {
  if (role != Qt::EditRole || !(flags(index) & Qt::ItemIsEditable)) return false;
  const ChargeRow& row = m_rows[static_cast<std::size_t>(index.row())];
  const std::string key = row.key;
  const QString typed = value.toString();
  const QString before = index.column() == kAmount ? row.amount : row.weighed;
  if (typed.trimmed() == before) {
    forget(index);
    return true;
  }
  if (index.column() == kAmount) return editAmount(key, typed);
  if (typed.trimmed().isEmpty()) {
    clear(key);
    return true;
  }
  return weigh(key, typed, false);
}

bool ChargeTableModel::editAmount(const std::string& key, const QString& typed) {
  const QString what = tr("change the amount of %1").arg(nameOf(key));
  const Place place{key, kAmount};
  if (!m_reason.allows(app::Deed::kChangePlan, what,
                       [this, key, typed] { editAmount(key, typed); }))
    return keep(place, {typed, tr("Not taken yet: say above why it is changed."), {}, true});
  return take(place, typed,
              m_run.edit(what, {app::AmountEdit{key, toUtf8(typed)}}, {m_reason.text(), false}));
}

bool ChargeTableModel::weigh(const std::string& key, const QString& typed, bool accepted) {
  const Place place{key, kWeighed};
  if (!m_reason.allows(app::Deed::kWeigh, tr("weigh %1").arg(nameOf(key)),
                       [this, key, typed, accepted] { weigh(key, typed, accepted); }))
    return keep(place, {typed, tr("Not taken yet: say above why it is changed."), {}, true});
  const QString quantity = readBalanceLine(typed, {}).text;
  return take(place, typed, m_run.weigh(key, quantity, {m_reason.text(), accepted}));
}

void ChargeTableModel::clear(const std::string& key) {
  if (!m_reason.allows(app::Deed::kWeigh, tr("clear %1").arg(nameOf(key)),
                       [this, key] { clear(key); }))
    return;
  take({key, kWeighed}, {}, m_run.clearWeighing(key, {m_reason.text(), false}));
}

void ChargeTableModel::removeComponent(const std::string& key) {
  const QString what = tr("remove %1").arg(nameOf(key));
  if (!m_reason.allows(app::Deed::kChangePlan, what, [this, key] { removeComponent(key); })) return;
  take({key, kComponent}, {},
       m_run.edit(what, {app::ComponentRemoval{key}}, {m_reason.text(), false}));
}

void ChargeTableModel::remove(int row) {
  if (row < 0 || row >= rowCount()) return;
  const std::string key = keyOf(row);
  const QString refusal = m_run.refusal(app::Deed::kChangePlan);
  if (refusal.isEmpty())
    removeComponent(key);
  else
    keep({key, kComponent}, {{}, refusal});
}

void ChargeTableModel::clearWeighing(int row) {
  if (row < 0 || row >= rowCount()) return;
  const std::string key = keyOf(row);
  const QString refusal = m_run.refusal(app::Deed::kWeigh);
  if (refusal.isEmpty())
    clear(key);
  else
    keep({key, kWeighed}, {m_rows[static_cast<std::size_t>(row)].weighed, refusal});
}

bool ChargeTableModel::keep(const Place& place, Kept kept) {
  m_kept[place] = std::move(kept);
  tellRow(place.first);
  return false;
}

/// What a command came to, for the cell it came from.
bool ChargeTableModel::take(const Place& place, const QString& typed, const Outcome& outcome) {
  if (outcome.done || outcome.conflict) {
    m_kept.erase(place);
    tellRow(place.first);
    return outcome.done;
  }
  if (outcome.questions.empty()) return keep(place, {typed, sentences(outcome.faults, false)});
  QStringList asked;
  for (const app::SlipQuestion& question : outcome.questions)
    asked += toQt(question.what) + QStringLiteral(": ") + toQt(question.ask);
  return keep(place, {typed, asked.join(QLatin1Char('\n')), outcome.questions});
}

void ChargeTableModel::tellRow(const std::string& key) {
  const int row = rowOf(key);
  if (row >= 0) emit dataChanged(index(row, 0), index(row, kColumns - 1));
}

void ChargeTableModel::forgetWaiting() {
  std::erase_if(m_kept, [](const auto& each) { return each.second.waits; });
  if (rowCount() > 0) emit dataChanged(index(0, 0), index(rowCount() - 1, kColumns - 1));
}

bool ChargeTableModel::forget(const QModelIndex& index) {
  if (!isHere(index)) return false;
  const std::string key = keyOf(index.row());
  const bool was = m_kept.erase({key, index.column()}) > 0;
  if (was) tellRow(key);
  return was;
}

bool ChargeTableModel::forgetRow(int row) {
  bool was = false;
  for (int column = 0; column < kColumns; ++column) was = forget(index(row, column)) || was;
  return was;
}

void ChargeTableModel::acceptTyped(int row) {
  if (row < 0 || row >= rowCount()) return;
  const std::string key = keyOf(row);
  if (const Kept* asked = kept(key, kWeighed)) weigh(key, QString(asked->typed), true);
}

void ChargeTableModel::takeLikely(int row) {
  if (row < 0 || row >= rowCount()) return;
  const std::string key = keyOf(row);
  const Kept* asked = kept(key, kWeighed);
  if (asked == nullptr || asked->questions.empty()) return;
  const QString likely = toQt(asked->questions.front().likelyText);
  if (!likely.isEmpty()) weigh(key, likely, false);
}

std::string ChargeTableModel::keyOf(int row) const {
  return row < 0 || row >= rowCount() ? std::string() : m_rows[static_cast<std::size_t>(row)].key;
}

int ChargeTableModel::rowOf(const std::string& key) const {
  const auto found = std::ranges::find(m_rows, key, &ChargeRow::key);
  return found == m_rows.end() ? -1 : static_cast<int>(found - m_rows.begin());
}

QString ChargeTableModel::nameOf(const std::string& key) const {
  const int row = rowOf(key);
  return row < 0 ? toQt(key) : m_rows[static_cast<std::size_t>(row)].name;
}

ChargeTableModel::Reading ChargeTableModel::preview(const QModelIndex& index,
                                                    const QString& typed) const {
  if (!isHere(index) || typed.trimmed().isEmpty()) return {};
  const std::string key = keyOf(index.row());
  if (index.column() == kAmount) {
    const auto sheet = app::previewEdit(m_run.link().notebook(), m_run.run(),
                                        {app::AmountEdit{key, toUtf8(typed)}});
    if (!sheet) return {sentences(sheet.error(), false), true};
    const ChargeRow row = chargeRow(*sheet, sheet->planned.plan.indexOf(key));
    const QString mmol = row.mmol.isEmpty() ? QString() : row.mmol + QStringLiteral(" mmol");
    return {joined({mmol, row.ratio, row.target}), false};
  }
  if (index.column() != kWeighed) return {};
  const auto meant =
      app::previewWeighing(m_run.sheet(), key, toUtf8(readBalanceLine(typed, {}).text));
  if (!meant) return {sentences(meant.error(), false), true};
  QString off;
  if (meant->offTargetPercent)
    off = deviationText(*meant->offTargetPercent) +
          (meant->withinTolerance ? tr(", within tolerance") : tr(", beyond tolerance"));
  return {joined({off, toQt(meant->asCharged)}), false};
}

}  // namespace vialkeeper::ui
