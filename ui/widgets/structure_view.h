// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QSvgRenderer>
#include <QWidget>

namespace vialkeeper::ui {

/// A structure, drawn in the colour of the text. A SMILES that cannot be drawn shows nothing.
class StructureView : public QWidget {
  Q_OBJECT

 public:
  explicit StructureView(QWidget* parent = nullptr);
  void setSmiles(const QString& smiles);
  [[nodiscard]] bool isDrawn() const { return m_renderer.isValid(); }
  [[nodiscard]] QSize sizeHint() const override;

 protected:
  void paintEvent(QPaintEvent* event) override;
  void resizeEvent(QResizeEvent* event) override;

 private:
  void draw();

  QString m_smiles;
  QSvgRenderer m_renderer;
};

}  // namespace vialkeeper::ui
