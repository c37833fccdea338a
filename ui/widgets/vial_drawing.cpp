// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/vial_drawing.h"

#include <QPainter>
#include <QPainterPath>
#include <algorithm>

#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

/// The glass in a rectangle: cap, neck, shoulder, body.
struct Glass {
  explicit Glass(const QRectF& room) {
    const double capHeight = room.height() * 0.10;
    const double neckHeight = room.height() * 0.07;
    const double shoulder = room.height() * 0.10;
    const double neckWidth = room.width() * 0.52;
    const double left = room.center().x() - neckWidth / 2.0;
    cap = QRectF(left - 3.0, room.top(), neckWidth + 6.0, capHeight);
    septum = QRectF(left + neckWidth * 0.3, room.top() - 2.5, neckWidth * 0.4, 4.0);
    const double neckTop = cap.bottom();
    const double bodyTop = neckTop + neckHeight + shoulder;
    const double round = room.width() * 0.14;
    body = QRectF(QPointF(room.left(), bodyTop), room.bottomRight());
    outline.moveTo(left, neckTop);
    outline.lineTo(left, neckTop + neckHeight);
    outline.cubicTo(left, bodyTop - shoulder * 0.4, room.left(), bodyTop - shoulder * 0.6,
                    room.left(), bodyTop);
    outline.lineTo(room.left(), room.bottom() - round);
    outline.quadTo(room.left(), room.bottom(), room.left() + round, room.bottom());
    outline.lineTo(room.right() - round, room.bottom());
    outline.quadTo(room.right(), room.bottom(), room.right(), room.bottom() - round);
    outline.lineTo(room.right(), bodyTop);
    outline.cubicTo(room.right(), bodyTop - shoulder * 0.6, left + neckWidth,
                    bodyTop - shoulder * 0.4, left + neckWidth, neckTop + neckHeight);
    outline.lineTo(left + neckWidth, neckTop);
    outline.closeSubpath();
    // A body of revolution: neck and shoulder hold less than their height says.
    const double narrow = 0.52 * 0.52;
    const double above = neckHeight * narrow + shoulder * 0.6;
    wholeHeight = body.height() + above;
  }

  /// Height of the liquid's surface for a share of the vial's volume.
  [[nodiscard]] double surface(double filled) const {
    return std::max(body.bottom() - filled * wholeHeight, outline.boundingRect().top());
  }

  QRectF cap;
  QRectF septum;
  QRectF body;
  QPainterPath outline;
  double wholeHeight = 0.0;
};

void drawStirBar(QPainter& painter, const Glass& glass) {
  const double height = glass.body.height() * 0.07;
  const double width = glass.body.width() * 0.36;
  const QRectF bar(glass.body.center().x() - width / 2.0, glass.body.bottom() - height - 4.0, width,
                   height);
  painter.setPen(QPen(colour("glass"), 1.0));
  painter.setBrush(colour("panel"));
  painter.drawRoundedRect(bar, height / 2.0, height / 2.0);
}

}  // namespace

VialDrawing::VialDrawing(QWidget* parent) : QWidget(parent) {
  setSizePolicy(QSizePolicy::Fixed, QSizePolicy::MinimumExpanding);
}

QSize VialDrawing::sizeHint() const {
  return {Theme::instance().scaled(54), Theme::instance().scaled(100)};
}

void VialDrawing::show(const std::optional<VialView>& vial, bool lampIsOn) {
  m_vial = vial;
  m_lampIsOn = lampIsOn;
  const QString words = vial ? vial->words : tr("The plan names no vial.");
  setToolTip(words);
  setAccessibleName(tr("Vial"));
  setAccessibleDescription(words);
  update();
}

void VialDrawing::paintEvent(QPaintEvent*) {
  QPainter painter(this);
  painter.setRenderHint(QPainter::Antialiasing);
  const Glass glass(QRectF(rect()).adjusted(3.0, 5.0, -3.0, -3.0));
  QPen outline(colour("glass"), 1.6);
  if (!m_vial) {
    outline.setStyle(Qt::DashLine);
    painter.setPen(outline);
    painter.drawPath(glass.outline);
    painter.setPen(colour("quiet"));
    painter.drawText(glass.body, Qt::AlignCenter | Qt::TextWordWrap, tr("no vial"));
    return;
  }
  painter.fillPath(glass.outline, m_lampIsOn ? colour("lampFill") : colour("panel"));
  QPainterPath below;
  below.addRect(
      QRectF(QPointF(glass.body.left(), glass.surface(m_vial->filled)), glass.body.bottomRight()));
  if (m_vial->filled > 0.0) painter.fillPath(glass.outline.intersected(below), colour("liquid"));
  if (m_vial->hasStirBar) drawStirBar(painter, glass);
  painter.setBrush(Qt::NoBrush);
  painter.setPen(outline);
  painter.drawPath(glass.outline);
  painter.setBrush(colour("glass"));
  painter.drawRoundedRect(glass.cap, 2.0, 2.0);
  painter.setPen(Qt::NoPen);
  painter.setBrush(colour("quiet"));
  painter.drawRect(glass.septum);
}

}  // namespace vialkeeper::ui
