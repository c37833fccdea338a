// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/structure_view.h"

#include <QPainter>
#include <algorithm>

#include "chem/structure.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

/// The drawing is black on nothing; on a dark page it must be light.
QByteArray recoloured(const std::string& svg) {
  QByteArray text = QByteArray::fromStdString(svg);
  const QByteArray ink = colour("text").name().toLatin1();
  text.replace(":#000000", ":" + ink);
  return text;
}

}  // namespace

StructureView::StructureView(QWidget* parent) : QWidget(parent) {
  setMinimumSize(120, 90);
  setAccessibleName(tr("Structure"));
  connect(&Theme::instance(), &Theme::changed, this, &StructureView::draw);
}

QSize StructureView::sizeHint() const { return {200, 140}; }

void StructureView::setSmiles(const QString& smiles) {
  if (smiles == m_smiles) return;
  m_smiles = smiles;
  setAccessibleDescription(smiles);
  draw();
}

void StructureView::draw() {
  m_renderer.load(QByteArray());
  if (!m_smiles.isEmpty()) {
    const auto engine = chem::structureEngine();
    if (engine) {
      const auto svg =
          (*engine)->drawSvg(toUtf8(m_smiles), std::max(1, width()), std::max(1, height()));
      if (svg) m_renderer.load(recoloured(*svg));
    }
  }
  update();
}

void StructureView::resizeEvent(QResizeEvent* event) {
  QWidget::resizeEvent(event);
  draw();
}

void StructureView::paintEvent(QPaintEvent*) {
  if (!m_renderer.isValid()) return;
  QPainter painter(this);
  m_renderer.render(&painter, rect());
}

}  // namespace vialkeeper::ui
