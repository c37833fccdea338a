// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QLineEdit>

#include "ui/models/notebook_link.h"

namespace vialkeeper::ui {

/// Who works: initials, typed and taken with Enter or on leaving.
class PersonField : public QLineEdit {
  Q_OBJECT

 public:
  explicit PersonField(NotebookLink& link, QWidget* parent = nullptr);

 signals:
  /// What was typed are no initials; the field keeps it.
  void refused(const QString& sentence);
  /// Initials nobody has used in this notebook yet: to be confirmed with takePerson.
  void strangerTyped(const QString& initials);

 public slots:
  void takePerson(const QString& initials);

 private:
  void takeTyped();

  NotebookLink& m_link;
};

}  // namespace vialkeeper::ui
