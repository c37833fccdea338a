// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractTableModel>
#include <optional>
#include <vector>

#include "app/notebook/shelf_cards.h"
#include "app/notebook/substance_cards.h"
#include "ui/models/notebook_link.h"

namespace vialkeeper::ui {

/// One compartment of the shelf: substances, or the cards of one kind.
struct ShelfCompartment {
  QString title;                                ///< `Substances`
  QString word;                                 ///< `substance`, as the use cases call it
  std::optional<app::ShelfKind> kind = {};      ///< nothing: substances
};

/// All compartments in the order of the shelf.
[[nodiscard]] const std::vector<ShelfCompartment>& shelfCompartments();

/// The cards of one compartment as a table, by name.
class ShelfModel : public QAbstractTableModel {
  Q_OBJECT

 public:
  ShelfModel(NotebookLink& link, const ShelfCompartment& compartment, QObject* parent = nullptr);

  [[nodiscard]] const ShelfCompartment& compartment() const { return m_compartment; }
  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] int columnCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  [[nodiscard]] QVariant headerData(int section, Qt::Orientation orientation,
                                    int role) const override;

  /// Only cards whose name or first columns hold this text, in any case.
  void setFilter(const QString& text);
  [[nodiscard]] const app::SubstanceRecord* substance(int row) const;
  [[nodiscard]] const app::ShelfCard* card(int row) const;
  [[nodiscard]] int rowOf(const std::string& name) const;

 public slots:
  void load();

 private:
  struct Row {
    std::vector<QString> cells;
    std::size_t place = 0;  ///< among what was read
  };
  void readSubstances();
  void readCards(app::ShelfKind kind);
  void filterRows();

  NotebookLink& m_link;
  ShelfCompartment m_compartment;
  std::vector<QString> m_titles;
  std::vector<app::SubstanceRecord> m_substances;
  std::vector<app::ShelfCard> m_cards;
  std::vector<Row> m_all;
  std::vector<Row> m_rows;
  QString m_filter;
};

}  // namespace vialkeeper::ui
