// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractTableModel>
#include <QString>
#include <memory>
#include <vector>

#include "ui/models/evidence_model.h"

namespace vialkeeper::ui {

/// A dataset or file with everything that its preview shows; read in another thread.
struct EvidenceContent {
  EvidenceModel::Item item = {};
  std::string bytes = {};  ///< the raw file as it came
  QString sha256 = {};
  std::vector<std::vector<double>> values = {};  ///< by column

  [[nodiscard]] bool isDataset() const { return item.dataset.has_value(); }
};

using EvidenceContentPtr = std::shared_ptr<const EvidenceContent>;

/// Reads all of an item through a connection of its own.
[[nodiscard]] text::Checked<EvidenceContentPtr> readEvidence(app::Notebook& notebook,
                                                             const EvidenceModel::Item& item);

/// `18,204 bytes · SHA-256 9f86…`.
[[nodiscard]] QString fileSentence(const EvidenceContent& content);
/// What the recipe holds: how the file was read, and the constants before its table.
[[nodiscard]] QString recipeOf(const EvidenceContent& content);

/// A column against the first one: the points that have both, in the order of the first.
struct DatasetCurve {
  QString name = {};
  std::vector<double> x = {};
  std::vector<double> y = {};
};
[[nodiscard]] std::vector<DatasetCurve> curvesOf(const EvidenceContent& content);
/// `time [h]`.
[[nodiscard]] QString titleOf(const app::DatasetColumn& column);

/// The numbers of a dataset; nothing is copied.
class DatasetTableModel : public QAbstractTableModel {
  Q_OBJECT

 public:
  using QAbstractTableModel::QAbstractTableModel;
  void show(EvidenceContentPtr content);

  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] int columnCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  [[nodiscard]] QVariant headerData(int section, Qt::Orientation orientation,
                                    int role) const override;

 private:
  EvidenceContentPtr m_content;
};

}  // namespace vialkeeper::ui
