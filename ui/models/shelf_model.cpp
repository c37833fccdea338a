// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/shelf_model.h"

#include <QStringList>
#include <algorithm>

#include "app/notebook/shelf_fields.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

QString joined(const std::vector<std::string>& texts) {
  QStringList all;
  for (const std::string& each : texts) all += toQt(each);
  return all.join(QStringLiteral(", "));
}

/// `rated_gauge` as a heading: `rated gauge`, with the unit in which it is kept.
QString headingOf(const app::ShelfField& field) {
  QString heading = toQt(field.name);
  heading.replace(QLatin1Char('_'), QLatin1Char(' '));
  return heading;
}

}  // namespace

const std::vector<ShelfCompartment>& shelfCompartments() {
  static const std::vector<ShelfCompartment> all = [] {
    std::vector<ShelfCompartment> compartments{
        {ShelfModel::tr("Substances"), QStringLiteral("substance")}};
    for (const app::ShelfKindInfo& info : app::shelfKinds()) {
      QString title = toQt(info.plural);
      title[0] = title[0].toUpper();
      compartments.push_back({title, toQt(info.word), info.kind});
    }
    return compartments;
  }();
  return all;
}

ShelfModel::ShelfModel(NotebookLink& link, const ShelfCompartment& compartment, QObject* parent)
    : QAbstractTableModel(parent), m_link(link), m_compartment(compartment) {
  connect(&m_link, &NotebookLink::changed, this, &ShelfModel::load);
  if (!m_compartment.kind) {
    m_titles = {tr("name"), tr("formula"), tr("molar mass"), tr("CAS number"), tr("hazards"),
                tr("also called")};
  } else {
    m_titles = {tr("name")};
    const app::ShelfKindInfo& info = app::shelfKind(*m_compartment.kind);
    if (info.ofSubstance) m_titles.push_back(tr("substance"));
    for (const app::ShelfField& field : info.fields) m_titles.push_back(headingOf(field));
  }
  load();
}

void ShelfModel::load() {
  beginResetModel();
  m_all.clear();
  m_substances.clear();
  m_cards.clear();
  if (m_compartment.kind)
    readCards(*m_compartment.kind);
  else
    readSubstances();
  std::ranges::sort(m_all, [](const Row& a, const Row& b) {
    return QString::localeAwareCompare(a.cells[0], b.cells[0]) < 0;
  });
  filterRows();
  endResetModel();
}

void ShelfModel::readSubstances() {
  m_substances = m_link.notebook().substances().value_or(std::vector<app::SubstanceRecord>{});
  for (const app::SubstanceRecord& each : m_substances) {
    const QString mass = each.molarMass_g_mol
                             ? QString::number(*each.molarMass_g_mol, 'f', 2) + tr(" g/mol")
                             : QString();
    m_all.push_back({{toQt(each.name), toQt(each.formula), mass, toQt(each.cas),
                      joined(each.hazards), joined(each.synonyms)},
                     m_all.size()});
  }
}

void ShelfModel::readCards(app::ShelfKind kind) {
  const app::ShelfKindInfo& info = app::shelfKind(kind);
  m_cards = m_link.notebook().cards(kind).value_or(std::vector<app::ShelfCard>{});
  for (const app::ShelfCard& card : m_cards) {
    Row row{{toQt(card.name)}, m_all.size()};
    if (info.ofSubstance) {
      const auto substance = m_link.notebook().substance(card.substance);
      row.cells.push_back(substance ? toQt(substance->name) : QString());
    }
    for (const app::ShelfField& field : info.fields)
      row.cells.push_back(toQt(app::shownField(card, field)));
    m_all.push_back(std::move(row));
  }
}

void ShelfModel::filterRows() {
  m_rows.clear();
  std::ranges::copy_if(m_all, std::back_inserter(m_rows), [this](const Row& row) {
    return m_filter.isEmpty() || std::ranges::any_of(row.cells, [this](const QString& cell) {
             return cell.contains(m_filter, Qt::CaseInsensitive);
           });
  });
}

void ShelfModel::setFilter(const QString& text) {
  if (text == m_filter) return;
  beginResetModel();
  m_filter = text;
  filterRows();
  endResetModel();
}

int ShelfModel::rowCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_rows.size());
}

int ShelfModel::columnCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_titles.size());
}

QVariant ShelfModel::data(const QModelIndex& index, int role) const {
  if (!checkIndex(index, CheckIndexOption::IndexIsValid)) return {};
  if (role != Qt::DisplayRole && role != Qt::ToolTipRole && role != Qt::AccessibleTextRole)
    return {};
  return m_rows[static_cast<std::size_t>(index.row())]
      .cells[static_cast<std::size_t>(index.column())];
}

QVariant ShelfModel::headerData(int section, Qt::Orientation orientation, int role) const {
  if (orientation != Qt::Horizontal || role != Qt::DisplayRole) return {};
  const auto place = static_cast<std::size_t>(section);
  return place < m_titles.size() ? m_titles[place] : QString();
}

const app::SubstanceRecord* ShelfModel::substance(int row) const {
  if (m_compartment.kind || row < 0 || row >= rowCount()) return nullptr;
  return &m_substances[m_rows[static_cast<std::size_t>(row)].place];
}

const app::ShelfCard* ShelfModel::card(int row) const {
  if (!m_compartment.kind || row < 0 || row >= rowCount()) return nullptr;
  return &m_cards[m_rows[static_cast<std::size_t>(row)].place];
}

int ShelfModel::rowOf(const std::string& name) const {
  const auto found = std::ranges::find_if(
      m_rows, [&](const Row& row) { return row.cells[0] == toQt(name); });
  return found == m_rows.end() ? -1 : static_cast<int>(found - m_rows.begin());
}

}  // namespace vialkeeper::ui
