// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QLabel>
#include <QLineEdit>

namespace vialkeeper::ui {

/// The field in a cell that takes an amount as people write it; what it would mean, or why it
/// cannot be taken, stands below it while it is typed.
class AmountEditor : public QLineEdit {
  Q_OBJECT

 public:
  explicit AmountEditor(QWidget* parent);
  ~AmountEditor() override;
  /// An empty text shows nothing.
  void showReading(const QString& text, bool isFault);
  [[nodiscard]] QString reading() const { return m_reading->text(); }

 protected:
  void moveEvent(QMoveEvent* event) override;
  void resizeEvent(QResizeEvent* event) override;
  void hideEvent(QHideEvent* event) override;

 private:
  void placeReading();

  QLabel* m_reading;  ///< a sibling, over the rows below
};

}  // namespace vialkeeper::ui
