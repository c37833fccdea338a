// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/person_field.h"

#include <algorithm>

#include "app/notebook/desk.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/sentence_field.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kWidth_px = 90;

}  // namespace

PersonField::PersonField(NotebookLink& link, QWidget* parent) : QLineEdit(parent), m_link(link) {
  setObjectName(QStringLiteral("person"));
  setPlaceholderText(tr("initials"));
  setAccessibleName(tr("Who works: initials"));
  setToolTip(tr("Who works: 1 to 8 capital letters and digits, a letter first. Kept with every "
                "entry."));
  setFixedWidth(Theme::instance().scaled(kWidth_px));
  setText(link.person());
  setReadOnly(link.isReadOnly());
  connect(this, &QLineEdit::editingFinished, this, &PersonField::takeTyped);
  connect(&link, &NotebookLink::personChanged, this, [this] { setText(m_link.person()); });
}

void PersonField::takeTyped() {
  const QString typed = text().trimmed().toUpper();
  if (typed == m_link.person()) {
    setText(typed);
    setFaulty(*this, false);
    return;
  }
  if (!app::areInitials(toUtf8(typed))) {
    setFaulty(*this, true);
    emit refused(tr("“%1” are no initials: type 1 to 8 capital letters and digits, a letter first.")
                     .arg(text()));
    return;
  }
  const auto people = m_link.notebook().people();
  const bool known = people && std::ranges::any_of(*people, [&](const app::Person& person) {
                       return person.code == toUtf8(typed);
                     });
  if (people && !people->empty() && !known) {
    emit strangerTyped(typed);
    return;
  }
  takePerson(typed);
}

void PersonField::takePerson(const QString& initials) {
  setText(initials);
  setFaulty(*this, false);
  m_link.setPerson(initials);
}

}  // namespace vialkeeper::ui
