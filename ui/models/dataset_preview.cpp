// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/dataset_preview.h"

#include <QCryptographicHash>
#include <QLocale>
#include <algorithm>
#include <cmath>
#include <numeric>

#include "ui/models/qt_text.h"

namespace vialkeeper::ui {

text::Checked<EvidenceContentPtr> readEvidence(app::Notebook& notebook,
                                               const EvidenceModel::Item& item) {
  auto content = std::make_shared<EvidenceContent>();
  content->item = item;
  auto bytes = notebook.attachment(item.raw);
  if (!bytes) return std::unexpected(bytes.error());
  content->bytes = *std::move(bytes);
  const QByteArrayView view(content->bytes.data(), static_cast<qsizetype>(content->bytes.size()));
  QCryptographicHash hash(QCryptographicHash::Sha256);
  hash.addData(view);
  content->sha256 = QString::fromLatin1(hash.result().toHex());
  if (item.dataset) {
    auto values = notebook.datasetValues(*item.dataset);
    if (!values) return std::unexpected(values.error());
    content->values = *std::move(values);
  }
  return content;
}

QString fileSentence(const EvidenceContent& content) {
  return EvidenceModel::tr("%1, %2 bytes as it came · SHA-256 %3")
      .arg(content.item.rawName,
           QLocale(QLocale::English).toString(static_cast<qulonglong>(content.bytes.size())),
           content.sha256);
}

QString recipeOf(const EvidenceContent& content) {
  return content.item.dataset ? toQt(content.item.dataset->recipe) : QString();
}

QString titleOf(const app::DatasetColumn& column) {
  return column.unit.empty() ? toQt(column.name)
                             : QStringLiteral("%1 [%2]").arg(toQt(column.name), toQt(column.unit));
}

std::vector<DatasetCurve> curvesOf(const EvidenceContent& content) {
  std::vector<DatasetCurve> curves;
  if (!content.item.dataset || content.values.size() < 2) return curves;
  const std::vector<double>& first = content.values.front();
  std::vector<std::size_t> order(first.size());
  std::iota(order.begin(), order.end(), std::size_t{0});
  std::erase_if(order, [&](std::size_t at) { return std::isnan(first[at]); });
  std::ranges::stable_sort(order, {}, [&](std::size_t at) { return first[at]; });
  for (std::size_t c = 1; c < content.values.size(); ++c) {
    DatasetCurve curve{.name = titleOf(content.item.dataset->columns[c]), .x = {}, .y = {}};
    curve.x.reserve(order.size());
    curve.y.reserve(order.size());
    for (const std::size_t at : order) {
      curve.x.push_back(first[at]);
      curve.y.push_back(content.values[c][at]);
    }
    curves.push_back(std::move(curve));
  }
  return curves;
}

void DatasetTableModel::show(EvidenceContentPtr content) {
  beginResetModel();
  m_content = std::move(content);
  endResetModel();
}

int DatasetTableModel::rowCount(const QModelIndex& parent) const {
  if (parent.isValid() || !m_content || m_content->values.empty()) return 0;
  return static_cast<int>(m_content->values.front().size());
}

int DatasetTableModel::columnCount(const QModelIndex& parent) const {
  return parent.isValid() || !m_content ? 0 : static_cast<int>(m_content->values.size());
}

QVariant DatasetTableModel::data(const QModelIndex& index, int role) const {
  if (!checkIndex(index, CheckIndexOption::IndexIsValid | CheckIndexOption::ParentIsInvalid))
    return {};
  if (role == Qt::TextAlignmentRole) return QVariant::fromValue(Qt::AlignRight | Qt::AlignVCenter);
  if (role != Qt::DisplayRole) return {};
  const double value =
      m_content
          ->values[static_cast<std::size_t>(index.column())][static_cast<std::size_t>(index.row())];
  return std::isnan(value) ? tr("gap")
                           : QString::number(value, 'g', QLocale::FloatingPointShortest);
}

QVariant DatasetTableModel::headerData(int section, Qt::Orientation orientation, int role) const {
  if (role != Qt::DisplayRole || !m_content || !m_content->item.dataset) return {};
  if (orientation == Qt::Vertical) return section + 1;
  const auto& columns = m_content->item.dataset->columns;
  if (section < 0 || static_cast<std::size_t>(section) >= columns.size()) return {};
  return titleOf(columns[static_cast<std::size_t>(section)]);
}

}  // namespace vialkeeper::ui
