// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/saved_filters_menu.h"

#include <QHBoxLayout>
#include <QKeyEvent>
#include <QLabel>
#include <QLineEdit>
#include <QMenu>
#include <QPushButton>
#include <QToolButton>

#include "ui/widgets/drop_panel.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kNameWidth_px = 260;

/// A name as a menu's text: an ampersand is no mnemonic.
QString menuText(QString name) { return name.replace(QLatin1Char('&'), QStringLiteral("&&")); }

}  // namespace

SavedFiltersMenu::SavedFiltersMenu(QLineEdit& line)
    : QObject(&line),
      m_line(line),
      m_button(new QToolButton(&line)),
      m_menu(new QMenu(m_button)),
      m_panel(new DropPanel(line)),
      m_name(new QLineEdit) {
  m_button->setObjectName(QStringLiteral("savedFilters"));
  m_button->setText(tr("Saved"));
  m_button->setAccessibleName(tr("Saved filters"));
  m_button->setToolTip(tr("Keep this filter under a name, or choose one that was kept."));
  m_button->setPopupMode(QToolButton::InstantPopup);
  m_button->setMenu(m_menu);
  m_menu->setObjectName(QStringLiteral("savedFiltersMenu"));
  connect(m_menu, &QMenu::aboutToShow, this, &SavedFiltersMenu::fill);
  m_name->setObjectName(QStringLiteral("filterName"));
  m_name->setAccessibleName(tr("Name of the filter"));
  m_name->setMinimumWidth(Theme::instance().scaled(kNameWidth_px));
  m_name->installEventFilter(this);
  auto* label = new QLabel(tr("Keep it as"));
  label->setBuddy(m_name);
  auto* keep = new QPushButton(tr("Keep"));
  auto* row = new QHBoxLayout(m_panel);
  for (QWidget* widget :
       {static_cast<QWidget*>(label), static_cast<QWidget*>(m_name), static_cast<QWidget*>(keep)})
    row->addWidget(widget);
  connect(m_name, &QLineEdit::returnPressed, this, &SavedFiltersMenu::save);
  connect(keep, &QPushButton::clicked, this, &SavedFiltersMenu::save);
}

void SavedFiltersMenu::fill() {
  m_menu->clear();
  for (const SavedFilter& filter : m_filters.filters()) {
    QAction* action = m_menu->addAction(menuText(filter.name));
    action->setToolTip(filter.text);
    connect(action, &QAction::triggered, this, [this, text = filter.text] { emit chosen(text); });
  }
  if (!m_filters.filters().isEmpty()) m_menu->addSeparator();
  QAction* keep = m_menu->addAction(tr("Keep this filter…"), this, &SavedFiltersMenu::askName);
  keep->setEnabled(!m_line.text().trimmed().isEmpty());
  if (m_filters.filters().isEmpty()) return;
  QMenu* forget = m_menu->addMenu(tr("Forget"));
  for (const SavedFilter& filter : m_filters.filters()) {
    QAction* action = forget->addAction(menuText(filter.name));
    connect(action, &QAction::triggered, this,
            [this, name = filter.name] { m_filters.remove(name); });
  }
}

void SavedFiltersMenu::askName() {
  m_name->setText(m_filters.nameOf(m_line.text()));
  m_name->setPlaceholderText(m_line.text());
  m_panel->drop();
  m_name->selectAll();
  m_name->setFocus();
}

void SavedFiltersMenu::save() {
  // Without a name of its own a filter is called by its text.
  const QString name = m_name->text().trimmed().isEmpty() ? m_line.text() : m_name->text();
  m_filters.save(name, m_line.text());
  leaveName();
}

void SavedFiltersMenu::leaveName() {
  m_panel->hide();
  m_line.setFocus();
}

bool SavedFiltersMenu::eventFilter(QObject* watched, QEvent* event) {
  if (event->type() == QEvent::KeyPress &&
      static_cast<QKeyEvent*>(event)->key() == Qt::Key_Escape) {
    leaveName();
    return true;
  }
  return QObject::eventFilter(watched, event);
}

}  // namespace vialkeeper::ui
