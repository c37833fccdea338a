// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractTableModel>
#include <vector>

#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// The evidence of the open run: its datasets, and the files of its log.
class EvidenceModel : public QAbstractTableModel {
  Q_OBJECT

 public:
  enum Column { kName, kKind, kSize, kColumnCount };

  /// A row: a dataset, or a file that came with the log.
  struct Item {
    QString code = {};  ///< `DS-0007`; empty for a file
    QString title = {};
    QString kind = {};
    QString size = {};  ///< `241 rows, 3 columns`
    app::RowNumber raw = 0;
    QString rawName = {};
    std::optional<app::DatasetRecord> dataset = {};

    [[nodiscard]] bool isSameAs(const Item& other) const;
  };

  explicit EvidenceModel(OpenRun& run, QObject* parent = nullptr);

  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] int columnCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  [[nodiscard]] QVariant headerData(int section, Qt::Orientation orientation,
                                    int role) const override;

  [[nodiscard]] const Item* itemAt(int row) const;
  [[nodiscard]] int rowOfDataset(const QString& code) const;

 private:
  void follow();
  [[nodiscard]] std::vector<Item> makeItems() const;

  OpenRun& m_run;
  std::vector<Item> m_items;
};

}  // namespace vialkeeper::ui
