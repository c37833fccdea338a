// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/label_style.h"

#include <QStyle>
#include <QVariant>

namespace vialkeeper::ui {

QLabel* styledLabel(std::initializer_list<const char*> properties, const QString& text) {
  auto* label = new QLabel(text);
  label->setTextFormat(Qt::PlainText);
  for (const char* property : properties) label->setProperty(property, true);
  return label;
}

void setStyleProperty(QWidget& widget, const char* name, const QVariant& value) {
  if (widget.property(name) == value) return;
  widget.setProperty(name, value);
  widget.style()->unpolish(&widget);
  widget.style()->polish(&widget);
  widget.updateGeometry();
}

}  // namespace vialkeeper::ui
