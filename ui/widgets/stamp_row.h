// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QPushButton>
#include <QWidget>
#include <array>

#include "ui/models/log_stamps.h"

class QGridLayout;

namespace vialkeeper::ui {

/// A large key for one event: its word, and below it the keys that press it.
class StampButton : public QPushButton {
  Q_OBJECT

 public:
  StampButton(Stamp stamp, QWidget* parent);
  void setWord(const QString& word);
  [[nodiscard]] QString word() const { return m_word; }
  [[nodiscard]] QSize sizeHint() const override;
  [[nodiscard]] QSize minimumSizeHint() const override { return sizeHint(); }

 protected:
  void paintEvent(QPaintEvent* event) override;

 private:
  QString m_word;
  QString m_keys;
};

/// The stamps in a row, or in two where one has no room.
class StampRow : public QWidget {
  Q_OBJECT

 public:
  explicit StampRow(QWidget* parent = nullptr);
  void showLamp(bool isOn);
  [[nodiscard]] StampButton& button(Stamp stamp) {
    return *m_buttons[static_cast<std::size_t>(stamp)];
  }
  [[nodiscard]] QSize minimumSizeHint() const override;

 signals:
  void stamped(vialkeeper::ui::Stamp stamp);

 protected:
  void resizeEvent(QResizeEvent* event) override;
  bool event(QEvent* event) override;

 private:
  void arrange();

  std::array<StampButton*, kStamps.size()> m_buttons{};
  QGridLayout* m_grid;
  int m_rows = 0;
};

}  // namespace vialkeeper::ui
