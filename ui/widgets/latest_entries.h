// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>
#include <QWidget>
#include <vector>

namespace vialkeeper::ui {

/// The last entries of the log, one line each; a line too long for its room ends in an ellipsis and
/// stands whole in the tip.
class LatestEntries : public QWidget {
  Q_OBJECT

 public:
  explicit LatestEntries(QWidget* parent = nullptr);
  void show(const std::vector<QString>& entries);
  [[nodiscard]] QSize sizeHint() const override;

 protected:
  void paintEvent(QPaintEvent* event) override;

 private:
  std::vector<QString> m_entries;
};

}  // namespace vialkeeper::ui
