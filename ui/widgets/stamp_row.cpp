// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/stamp_row.h"

#include <QAction>
#include <QEvent>
#include <QFontMetrics>
#include <QGridLayout>
#include <QStyleOptionButton>
#include <QStylePainter>

#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kGap_px = 8;
constexpr int kSide_px = 8;
constexpr double kKeysShare = 0.8;  // of the word's size

QFont wordFont(QFont font) {
  font.setBold(true);
  return font;
}

QFont keysFont(QFont font) {
  font.setBold(false);
  font.setPointSizeF(font.pointSizeF() * kKeysShare);
  return font;
}

}  // namespace

StampButton::StampButton(Stamp stamp, QWidget* parent)
    : QPushButton(parent), m_keys(stampKey(stamp)) {
  setProperty("stamp", true);
  setProperty("meaning", stampMeaning(stamp));
  setSizePolicy(QSizePolicy::Expanding, QSizePolicy::Fixed);
  setWord(stampWord(stamp, false));
  // Pressed anywhere in the window while the page is shown; Qt tells two that want the same keys.
  auto* press = new QAction(this);
  press->setShortcut(QKeySequence(m_keys));
  press->setShortcutContext(Qt::WindowShortcut);
  press->setAutoRepeat(false);
  connect(press, &QAction::triggered, this, &StampButton::click);
  addAction(press);
}

void StampButton::setWord(const QString& word) {
  if (word == m_word) return;
  m_word = word;
  setAccessibleName(word);
  setToolTip(tr("%1 (%2)").arg(word, m_keys));
  updateGeometry();
  update();
}

QSize StampButton::sizeHint() const {
  const QFontMetrics words(wordFont(font()));
  const QFontMetrics keys(keysFont(font()));
  return {std::max(words.horizontalAdvance(m_word), keys.horizontalAdvance(m_keys)) +
              2 * kSide_px,
          words.height() + keys.height() + Theme::instance().scaled(16)};
}

void StampButton::paintEvent(QPaintEvent*) {
  QStylePainter painter(this);
  QStyleOptionButton option;
  initStyleOption(&option);
  option.text.clear();
  painter.drawControl(QStyle::CE_PushButton, option);
  const QFontMetrics words(wordFont(font()));
  const QFontMetrics keys(keysFont(font()));
  const int top = (height() - words.height() - keys.height()) / 2;
  painter.setFont(wordFont(font()));
  painter.setPen(isEnabled() ? colour("text") : colour("quiet"));
  painter.drawText(QRect(0, top, width(), words.height()), Qt::AlignCenter, m_word);
  painter.setFont(keysFont(font()));
  painter.setPen(colour("quiet"));
  painter.drawText(QRect(0, top + words.height(), width(), keys.height()), Qt::AlignCenter, m_keys);
}

StampRow::StampRow(QWidget* parent) : QWidget(parent), m_grid(new QGridLayout(this)) {
  setSizePolicy(QSizePolicy::Expanding, QSizePolicy::Fixed);
  m_grid->setContentsMargins(0, 0, 0, 0);
  m_grid->setSpacing(kGap_px);
  for (const Stamp stamp : kStamps) {
    auto* made = new StampButton(stamp, this);
    connect(made, &StampButton::clicked, this, [this, stamp] { emit stamped(stamp); });
    m_buttons[static_cast<std::size_t>(stamp)] = made;
  }
  arrange();
}

void StampRow::showLamp(bool isOn) {
  StampButton& lamp = button(Stamp::kLamp);
  lamp.setWord(stampWord(Stamp::kLamp, isOn));
}

QSize StampRow::minimumSizeHint() const {
  int widest = 0;
  for (const StampButton* each : m_buttons) widest = std::max(widest, each->sizeHint().width());
  return {3 * widest + 2 * kGap_px, m_grid->minimumSize().height()};
}

void StampRow::arrange() {
  // In one row every stamp is as wide as its word; in several all are as wide as the widest.
  int sum = -kGap_px;
  int widest = 1;
  for (const StampButton* each : m_buttons) {
    sum += each->sizeHint().width() + kGap_px;
    widest = std::max(widest, each->sizeHint().width());
  }
  const int count = static_cast<int>(m_buttons.size());
  const int fitting = std::max(1, (width() + kGap_px) / (widest + kGap_px));
  const int rows = sum <= width() ? 1 : std::max(2, (count + fitting - 1) / fitting);
  if (rows == m_rows) return;
  m_rows = rows;
  const int columns = (count + rows - 1) / rows;
  for (int i = 0; i < count; ++i)
    m_grid->addWidget(m_buttons[static_cast<std::size_t>(i)], i / columns, i % columns);
  updateGeometry();
}

void StampRow::resizeEvent(QResizeEvent* event) {
  QWidget::resizeEvent(event);
  arrange();
}

bool StampRow::event(QEvent* event) {
  if (event->type() == QEvent::LayoutRequest) arrange();
  return QWidget::event(event);
}

}  // namespace vialkeeper::ui
