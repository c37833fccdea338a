// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/latest_entries.h"

#include <QFontMetrics>
#include <QPainter>
#include <QStringList>

#include "ui/widgets/theme.h"

namespace vialkeeper::ui {

LatestEntries::LatestEntries(QWidget* parent) : QWidget(parent) {
  setSizePolicy(QSizePolicy::Fixed, QSizePolicy::Preferred);
  setAccessibleName(tr("Last entries"));
}

QSize LatestEntries::sizeHint() const {
  return {Theme::instance().scaled(210), 5 * fontMetrics().height()};
}

void LatestEntries::show(const std::vector<QString>& entries) {
  if (entries == m_entries) return;
  m_entries = entries;
  const QStringList lines(entries.begin(), entries.end());
  setToolTip(lines.join(QLatin1Char('\n')));
  setAccessibleDescription(lines.join(QStringLiteral("; ")));
  update();
}

void LatestEntries::paintEvent(QPaintEvent*) {
  QPainter painter(this);
  const QFontMetrics metrics = fontMetrics();
  const int step = metrics.height() + Theme::instance().scaled(5);
  int baseline = metrics.ascent();
  painter.setPen(colour("quiet"));
  painter.drawText(0, baseline, m_entries.empty() ? tr("Nothing logged yet") : tr("Last entries"));
  for (std::size_t i = 0; i < m_entries.size(); ++i) {
    baseline += step;
    if (baseline + metrics.descent() > height()) return;
    painter.setPen(i == 0 ? colour("text") : colour("quiet"));
    painter.drawText(0, baseline, metrics.elidedText(m_entries[i], Qt::ElideRight, width()));
  }
}

}  // namespace vialkeeper::ui
