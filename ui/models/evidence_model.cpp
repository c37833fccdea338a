// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/evidence_model.h"

#include <algorithm>

#include "ui/models/photo_entries.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

EvidenceModel::Item itemOf(const app::DatasetRecord& record) {
  return {
      .code = toQt(record.code),
      .title = toQt(record.title),
      .kind = toQt(record.kind),
      .size = EvidenceModel::tr("%1 rows, %2 columns").arg(record.rows).arg(record.columns.size()),
      .raw = record.raw,
      .rawName = toQt(record.rawName),
      .dataset = record};
}

EvidenceModel::Item itemOf(const PhotoEntry& photo) {
  return {.title = photo.name,
          .kind = EvidenceModel::tr("photo"),
          .size = photo.when,
          .raw = photo.attachment,
          .rawName = photo.name};
}

}  // namespace

bool EvidenceModel::Item::isSameAs(const Item& other) const {
  return code == other.code && title == other.title && kind == other.kind && size == other.size &&
         raw == other.raw && rawName == other.rawName;
}

EvidenceModel::EvidenceModel(OpenRun& run, QObject* parent)
    : QAbstractTableModel(parent), m_run(run) {
  connect(&m_run, &OpenRun::reloaded, this, &EvidenceModel::follow);
  m_items = makeItems();
}

std::vector<EvidenceModel::Item> EvidenceModel::makeItems() const {
  std::vector<Item> items;
  if (!m_run.isOpen()) return items;
  for (const app::DatasetRecord& record : m_run.datasets()) items.push_back(itemOf(record));
  for (const PhotoEntry& photo : photoEntries(m_run.events())) items.push_back(itemOf(photo));
  return items;
}

void EvidenceModel::follow() {
  std::vector<Item> items = makeItems();
  if (std::ranges::equal(items, m_items,
                         [](const Item& a, const Item& b) { return a.isSameAs(b); }))
    return;
  beginResetModel();
  m_items = std::move(items);
  endResetModel();
}

int EvidenceModel::rowCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_items.size());
}

int EvidenceModel::columnCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(kColumnCount);
}

QVariant EvidenceModel::data(const QModelIndex& index, int role) const {
  if (!checkIndex(index, CheckIndexOption::IndexIsValid | CheckIndexOption::ParentIsInvalid))
    return {};
  const Item& item = m_items[static_cast<std::size_t>(index.row())];
  if (role == Qt::ToolTipRole) return item.rawName;
  if (role != Qt::DisplayRole) return {};
  switch (index.column()) {
    case kName:
      return item.code.isEmpty() ? item.title : item.code + QStringLiteral("  ") + item.title;
    case kKind:
      return item.kind;
    default:
      return item.size;
  }
}

QVariant EvidenceModel::headerData(int section, Qt::Orientation orientation, int role) const {
  if (orientation != Qt::Horizontal || role != Qt::DisplayRole) return {};
  switch (section) {
    case kName:
      return tr("dataset or file");
    case kKind:
      return tr("kind");
    case kSize:
      return tr("what it holds");
    default:
      return {};
  }
}

const EvidenceModel::Item* EvidenceModel::itemAt(int row) const {
  return row >= 0 && row < rowCount() ? &m_items[static_cast<std::size_t>(row)] : nullptr;
}

int EvidenceModel::rowOfDataset(const QString& code) const {
  const auto found = std::ranges::find(m_items, code, &Item::code);
  return found == m_items.end() ? -1 : static_cast<int>(found - m_items.begin());
}

}  // namespace vialkeeper::ui
