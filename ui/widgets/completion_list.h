// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QListView>

#include "ui/models/filter_completion.h"
#include "ui/widgets/drop_panel.h"

namespace vialkeeper::ui {

/// The proposals below the filter line. The line keeps the focus and tells what to do by key.
class CompletionList : public DropPanel {
  Q_OBJECT

 public:
  CompletionList(FilterCompletion& completion, QWidget& under);

  /// Shows what the model proposes, nothing chosen yet; hides where there is nothing.
  void offer(int fromLeft_px);
  /// Goes down or up, round the end.
  void move(int by);
  /// The chosen row, -1 where none is.
  [[nodiscard]] int chosen() const;

 signals:
  void taken(int row);

 private:
  FilterCompletion& m_completion;
  QListView* m_list;
};

}  // namespace vialkeeper::ui
