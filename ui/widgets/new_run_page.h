// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/notebook_link.h"

namespace vialkeeper::ui {

/// Sets up a run from a template or an earlier run.
class NewRunPage : public QWidget {
  Q_OBJECT

 public:
  explicit NewRunPage(NotebookLink& link, QWidget* parent = nullptr);

  /// Offers an earlier run as the one to start from.
  void startFrom(vialkeeper::app::RowNumber run);

 signals:
  void created(vialkeeper::app::RowNumber run);
  void cancelled();

 private:
  NotebookLink& m_link;
};

}  // namespace vialkeeper::ui
