// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/saved_filters.h"

#include <QSettings>

namespace vialkeeper::ui {
namespace {

const QString kFilters = QStringLiteral("filters");

QList<SavedFilter> kept() {
  QSettings settings;
  QList<SavedFilter> filters;
  const int count = settings.beginReadArray(kFilters);
  for (int i = 0; i < count; ++i) {
    settings.setArrayIndex(i);
    filters += {settings.value(QStringLiteral("name")).toString(),
                settings.value(QStringLiteral("text")).toString()};
  }
  settings.endArray();
  return filters;
}

}  // namespace

SavedFilters::SavedFilters(QObject* parent) : QAbstractListModel(parent), m_filters(kept()) {}

int SavedFilters::rowCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_filters.size());
}

QVariant SavedFilters::data(const QModelIndex& index, int role) const {
  if (!checkIndex(index, CheckIndexOption::IndexIsValid)) return {};
  const SavedFilter& filter = m_filters[index.row()];
  if (role == Qt::DisplayRole) return filter.name;
  if (role == Qt::ToolTipRole) return filter.text;
  return {};
}

QString SavedFilters::nameOf(const QString& text) const {
  for (const SavedFilter& filter : m_filters)
    if (filter.text == text.trimmed()) return filter.name;
  return {};
}

bool SavedFilters::save(const QString& name, const QString& text) {
  const SavedFilter filter{name.simplified(), text.trimmed()};
  if (filter.name.isEmpty() || filter.text.isEmpty()) return false;
  // Another window may have kept one meanwhile.
  QList<SavedFilter> filters = kept();
  filters.removeIf([&](const SavedFilter& each) { return each.name == filter.name; });
  filters += filter;
  std::ranges::sort(filters, [](const SavedFilter& a, const SavedFilter& b) {
    return a.name.compare(b.name, Qt::CaseInsensitive) < 0;
  });
  setFilters(std::move(filters));
  return true;
}

void SavedFilters::remove(const QString& name) {
  QList<SavedFilter> filters = kept();
  filters.removeIf([&](const SavedFilter& each) { return each.name == name; });
  setFilters(std::move(filters));
}

void SavedFilters::setFilters(QList<SavedFilter> filters) {
  beginResetModel();
  m_filters = std::move(filters);
  endResetModel();
  QSettings settings;
  settings.remove(kFilters);
  settings.beginWriteArray(kFilters, static_cast<int>(m_filters.size()));
  for (int i = 0; i < m_filters.size(); ++i) {
    settings.setArrayIndex(i);
    settings.setValue(QStringLiteral("name"), m_filters[i].name);
    settings.setValue(QStringLiteral("text"), m_filters[i].text);
  }
  settings.endArray();
}

}  // namespace vialkeeper::ui
