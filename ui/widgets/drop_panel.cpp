// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/drop_panel.h"

#include <QEvent>

namespace vialkeeper::ui {
namespace {

constexpr int kGap_px = 3;

}  // namespace

DropPanel::DropPanel(QWidget& under, QWidget* parent)
    : QFrame(parent == nullptr ? &under : parent), m_under(under) {
  setObjectName(QStringLiteral("dropPanel"));
  m_under.installEventFilter(this);
  // It hangs in the window, which may outlive what it hangs below.
  connect(&m_under, &QObject::destroyed, this, &QObject::deleteLater);
  hide();
}

void DropPanel::drop(int fromLeft_px) {
  m_fromLeft_px = fromLeft_px;
  // The window is known only once the line stands in one.
  if (parentWidget() != m_under.window()) setParent(m_under.window());
  show();
  place();
  raise();
}

void DropPanel::place() {
  const QWidget& window = *m_under.window();
  const QPoint corner = m_under.mapTo(&window, QPoint(m_fromLeft_px, m_under.height() + kGap_px));
  const int most = std::max(m_under.width() - m_fromLeft_px, window.width() - corner.x() - kGap_px);
  QSize size = sizeHint().boundedTo(QSize(most, window.height() - corner.y()));
  if (hasHeightForWidth()) size.setHeight(heightForWidth(size.width()));
  setGeometry(QRect(corner, size));
}

bool DropPanel::eventFilter(QObject* watched, QEvent* event) {
  if (event->type() == QEvent::Resize || event->type() == QEvent::Move) {
    if (isVisible()) place();
  } else if (event->type() == QEvent::Hide) {
    hide();
  }
  return QFrame::eventFilter(watched, event);
}

}  // namespace vialkeeper::ui
