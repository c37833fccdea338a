// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/filter_line.h"

#include <QAccessible>
#include <QHBoxLayout>
#include <QKeyEvent>
#include <QLabel>
#include <QStyle>
#include <QToolButton>

#include "ui/widgets/completion_list.h"
#include "ui/widgets/drop_panel.h"
#include "ui/widgets/filter_edit.h"
#include "ui/widgets/saved_filters_menu.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kMostBytes = 100'000;  ///< far beyond what a search may be: told by a fault

}  // namespace

FilterLine::FilterLine(RunSearch& search, QWidget* parent)
    : QWidget(parent),
      m_search(search),
      m_completion(search.link()),
      m_edit(new FilterEdit),
      m_count(new QLabel),
      m_saved(new SavedFiltersMenu(*m_edit)),
      m_faultPanel(new DropPanel(*m_edit)),
      m_fault(new QLabel),
      m_list(new CompletionList(m_completion, *m_edit)) {
  m_edit->setObjectName(QStringLiteral("filterLine"));
  m_edit->setAccessibleName(tr("Find runs"));
  m_edit->setPlaceholderText(tr("Find runs: words, acid:\"pivalic acid\" 5..20 mol%, yield>60"));
  m_edit->setMaxLength(kMostBytes);
  m_count->setObjectName(QStringLiteral("filterCount"));
  m_count->setProperty("quiet", true);
  m_edit->setEnd({static_cast<QWidget*>(m_count), m_saved->button()});
  m_edit->installEventFilter(this);
  m_fault->setObjectName(QStringLiteral("filterFault"));
  m_fault->setProperty("fault", true);
  m_fault->setTextFormat(Qt::PlainText);
  auto* within = new QHBoxLayout(m_faultPanel);
  within->addWidget(m_fault);
  auto* row = new QHBoxLayout(this);
  row->setContentsMargins(0, 0, 0, 0);
  row->addWidget(m_edit);
  setFocusProxy(m_edit);
  connect(m_edit, &QLineEdit::textChanged, this, &FilterLine::typed);
  connect(m_edit, &QLineEdit::textEdited, this, [this] { propose(false); });
  connect(m_list, &CompletionList::taken, this, &FilterLine::take);
  connect(m_saved, &SavedFiltersMenu::chosen, this, &FilterLine::setText);
  connect(&m_search, &RunSearch::found, this, &FilterLine::showCount);
  connect(&m_search, &RunSearch::faultChanged, this, &FilterLine::showFault);
  showCount();
}

void FilterLine::setText(const QString& text) {
  m_edit->setText(text);
  m_list->hide();
}

void FilterLine::typed(const QString& text) { m_search.setText(text); }

void FilterLine::propose(bool all) {
  m_completion.complete(m_edit->text(), m_edit->cursorPosition(), all);
  m_list->offer(m_edit->xOf(m_edit->cursorPosition()));
  // One panel at a time: what is being typed will mend itself.
  if (m_list->isVisible()) m_faultPanel->hide();
}

void FilterLine::take(int row) {
  const FilterCompletion::Taken taken = m_completion.taken(row);
  m_edit->setText(taken.text);
  m_edit->setCursorPosition(static_cast<int>(taken.cursor));
  // Behind a field its values are proposed at once.
  propose(false);
}

bool FilterLine::eventFilter(QObject* watched, QEvent* event) {
  if (event->type() == QEvent::KeyPress) {
    const auto* key = static_cast<QKeyEvent*>(event);
    return keyPressed(key->key(), key->modifiers()) || QWidget::eventFilter(watched, event);
  }
  if (event->type() == QEvent::FocusOut) {
    // Nothing hangs over the runs while somebody is among them.
    m_list->hide();
    m_faultPanel->hide();
  } else if (event->type() == QEvent::FocusIn) {
    showFault();
  }
  return QWidget::eventFilter(watched, event);
}

bool FilterLine::keyPressed(int key, Qt::KeyboardModifiers modifiers) {
  const bool offers = m_list->isVisible();
  switch (key) {
    case Qt::Key_Down:
      if (offers)
        m_list->move(1);
      else
        emit runsWanted();
      return true;
    case Qt::Key_Up:
      if (offers) m_list->move(-1);
      return offers;
    case Qt::Key_Tab:
      if (offers) take(std::max(0, m_list->chosen()));
      return offers;
    case Qt::Key_Space:
      if (modifiers != Qt::ControlModifier) return false;
      propose(true);
      return true;
    case Qt::Key_Return:
    case Qt::Key_Enter:
      return enterPressed();
    case Qt::Key_Escape:
      escapePressed();
      return true;
    default:
      return false;
  }
}

bool FilterLine::enterPressed() {
  if (m_list->isVisible() && m_list->chosen() >= 0) {
    take(m_list->chosen());
    return true;
  }
  m_list->hide();
  showFault();
  if (!m_search.fault()) emit runsWanted();
  return true;
}

void FilterLine::escapePressed() {
  if (m_list->isVisible()) {
    m_list->hide();
    showFault();
  } else if (!m_edit->text().isEmpty()) {
    m_edit->clear();
  } else {
    emit runsWanted();
  }
}

void FilterLine::showCount() {
  m_count->setText(m_search.countText());
  m_edit->setAccessibleDescription(m_count->text());
  m_edit->layOutEnd();
}

void FilterLine::showFault() {
  const auto& fault = m_search.fault();
  m_edit->setProperty("faulty", fault.has_value());
  m_edit->style()->unpolish(m_edit);
  m_edit->style()->polish(m_edit);
  m_edit->setMark(fault ? fault->from : -1, fault ? fault->length : 0);
  m_count->setVisible(!fault);
  m_edit->layOutEnd();
  if (!fault) {
    m_edit->setAccessibleDescription(m_count->text());
    m_faultPanel->hide();
    return;
  }
  m_fault->setText(fault->sentence);
  m_edit->setAccessibleDescription(fault->sentence);
  QAccessibleEvent told(m_edit, QAccessible::DescriptionChanged);
  QAccessible::updateAccessibility(&told);
  if (!m_list->isVisible() && m_edit->hasFocus()) m_faultPanel->drop();
}

}  // namespace vialkeeper::ui
