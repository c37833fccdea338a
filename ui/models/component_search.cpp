// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/component_search.h"

#include "app/notebook/substance_cards.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {

ComponentSearch::ComponentSearch(NotebookLink& link, QObject* parent)
    : QAbstractListModel(parent), m_link(link) {}

void ComponentSearch::setText(const QString& typed) {
  beginResetModel();
  m_text = typed.trimmed();
  m_found.clear();
  if (!m_text.isEmpty()) {
    auto found = app::suggestSubstances(m_link.notebook(), toUtf8(m_text));
    if (found) m_found = *std::move(found);
  }
  endResetModel();
}

int ComponentSearch::rowCount(const QModelIndex& parent) const {
  if (parent.isValid() || m_text.isEmpty()) return 0;
  return static_cast<int>(m_found.size()) + 1;
}

std::optional<app::SubstanceRecord> ComponentSearch::substance(int row) const {
  if (row < 0 || row >= static_cast<int>(m_found.size())) return std::nullopt;
  return m_found[static_cast<std::size_t>(row)];
}

QVariant ComponentSearch::data(const QModelIndex& index, int role) const {
  if (!index.isValid() || index.row() >= rowCount()) return {};
  const auto found = substance(index.row());
  if (role == kIsNewRole) return !found.has_value();
  if (!found) {
    if (role == Qt::DisplayRole || role == Qt::AccessibleTextRole)
      return tr("“%1” is new: describe it").arg(m_text);
    return {};
  }
  QStringList details{toQt(found->formula), toQt(found->cas)};
  for (const std::string& synonym : found->synonyms) details += toQt(synonym);
  details.removeAll(QString());
  switch (role) {
    case Qt::DisplayRole:
      return toQt(found->name);
    case Qt::AccessibleTextRole:
      return toQt(found->name) + QStringLiteral(", ") + details.join(QStringLiteral(", "));
    case kDetailsRole:
      return details.join(QStringLiteral(" · "));
    case kSmilesRole:
      return toQt(found->smiles);
    default:
      return {};
  }
}

}  // namespace vialkeeper::ui
