// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/amount_editor.h"

#include <QStyle>
#include <algorithm>

#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kReadingWidth = 420;

}  // namespace

AmountEditor::AmountEditor(QWidget* parent) : QLineEdit(parent), m_reading(new QLabel(parent)) {
  setObjectName(QStringLiteral("amountEditor"));
  m_reading->setObjectName(QStringLiteral("cellReading"));
  m_reading->setTextFormat(Qt::PlainText);
  m_reading->setWordWrap(true);
  m_reading->setAttribute(Qt::WA_TransparentForMouseEvents);
  m_reading->hide();
}

AmountEditor::~AmountEditor() {
  // The parent may be on its way out and have taken the label along already.
  if (parentWidget() != nullptr && parentWidget()->children().contains(m_reading))
    m_reading->deleteLater();
}

void AmountEditor::showReading(const QString& text, bool isFault) {
  m_reading->setText(text);
  m_reading->setProperty("fault", isFault);
  m_reading->style()->unpolish(m_reading);
  m_reading->style()->polish(m_reading);
  setProperty("faulty", isFault);
  style()->unpolish(this);
  style()->polish(this);
  setAccessibleDescription(text);
  m_reading->setVisible(!text.isEmpty() && isVisible());
  placeReading();
}

void AmountEditor::placeReading() {
  const QWidget* all = parentWidget();
  const int widest = std::min(Theme::instance().scaled(kReadingWidth), all->width() - 8);
  m_reading->setMaximumWidth(widest);
  const int single = m_reading->fontMetrics().horizontalAdvance(m_reading->text()) + 24;
  const int width = std::min(widest, std::max(single, this->width()));
  const int height = m_reading->heightForWidth(width);
  const int left = std::clamp(x(), 0, std::max(0, all->width() - width - 4));
  int top = geometry().bottom() + 3;
  if (top + height > all->height()) top = std::max(0, y() - height - 3);
  m_reading->setGeometry(left, top, width, height);
  m_reading->raise();
}

void AmountEditor::moveEvent(QMoveEvent* event) {
  QLineEdit::moveEvent(event);
  placeReading();
}

void AmountEditor::resizeEvent(QResizeEvent* event) {
  QLineEdit::resizeEvent(event);
  placeReading();
}

void AmountEditor::hideEvent(QHideEvent* event) {
  QLineEdit::hideEvent(event);
  m_reading->hide();
}

}  // namespace vialkeeper::ui
