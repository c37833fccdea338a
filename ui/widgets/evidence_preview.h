// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/dataset_preview.h"

class QLabel;
class QStackedWidget;
class QTableView;

namespace vialkeeper::ui {

class PlotWidget;

/// One dataset or file: its chart and table, or its picture; how it was read; its size and hash.
class EvidencePreview : public QWidget {
  Q_OBJECT

 public:
  explicit EvidencePreview(QWidget* parent = nullptr);
  void show(EvidenceContentPtr content);
  void showNothing(const QString& words);
  [[nodiscard]] QTableView& table() { return *m_table; }
  [[nodiscard]] PlotWidget& plot() { return *m_plot; }

 private:
  QWidget* makeDataset();
  void showPicture();

  EvidenceContentPtr m_content;
  DatasetTableModel m_values;
  QStackedWidget* m_stack;
  QLabel* m_nothing;
  PlotWidget* m_plot;
  QTableView* m_table;
  QLabel* m_recipe;
  QLabel* m_picture;
  QLabel* m_file;
};

}  // namespace vialkeeper::ui
