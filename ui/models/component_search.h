// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractListModel>
#include <optional>
#include <vector>

#include "app/notebook/records.h"
#include "ui/models/notebook_link.h"

namespace vialkeeper::ui {

/// Substances of the shelf for what is typed so far, and behind them the offer to make a new one.
class ComponentSearch : public QAbstractListModel {
  Q_OBJECT

 public:
  enum Role {
    kDetailsRole = Qt::UserRole + 1,  ///< formula, CAS number, other names
    kSmilesRole,
    kIsNewRole,
  };

  explicit ComponentSearch(NotebookLink& link, QObject* parent = nullptr);

  void setText(const QString& typed);
  [[nodiscard]] const QString& text() const { return m_text; }
  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  /// The substance of a row; nothing for the offer of a new one.
  [[nodiscard]] std::optional<app::SubstanceRecord> substance(int row) const;

 private:
  NotebookLink& m_link;
  QString m_text;
  std::vector<app::SubstanceRecord> m_found;
};

}  // namespace vialkeeper::ui
