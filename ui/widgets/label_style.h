// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QLabel>
#include <QString>
#include <initializer_list>

namespace vialkeeper::ui {

/// A label that shows plain text, with properties of the style sheet set: `quiet`, `small`.
[[nodiscard]] QLabel* styledLabel(std::initializer_list<const char*> properties,
                                  const QString& text = {});

/// Sets a property that the style sheet asks for, and has the widget drawn by it.
void setStyleProperty(QWidget& widget, const char* name, const QVariant& value);

}  // namespace vialkeeper::ui
