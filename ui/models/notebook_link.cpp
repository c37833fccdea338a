// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/notebook_link.h"

#include <QFileInfo>

#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

constexpr int kWatchInterval_ms = 1000;

}  // namespace

NotebookLink::NotebookLink(Workplace workplace, std::unique_ptr<app::Notebook> notebook,
                           QString file, QString person, QObject* parent)
    : QObject(parent),
      m_workplace(workplace),
      m_notebook(std::move(notebook)),
      m_file(std::move(file)),
      m_person(std::move(person)) {
  m_mark = m_notebook->changeMark().value_or(0);
  connect(&m_watch, &QTimer::timeout, this, &NotebookLink::lookForChanges);
  m_watch.start(kWatchInterval_ms);
}

QString NotebookLink::name() const { return QFileInfo(m_file).fileName(); }

void NotebookLink::setPerson(const QString& initials) {
  if (initials == m_person) return;
  m_person = initials;
  emit personChanged();
}

QString NotebookLink::readOnlyReason() const { return toQt(m_notebook->readOnlyReason()); }

text::Checked<std::unique_ptr<app::Notebook>> NotebookLink::openAnother(
    NotebookFiles::Use use) const {
  return m_workplace.files.open(m_file.toStdString(), use);
}

bool NotebookLink::hasUnseenChanges() {
  const auto mark = m_notebook->changeMark();
  return mark && *mark != m_mark;
}

void NotebookLink::lookForChanges() {
  const auto mark = m_notebook->changeMark();
  // A file that is locked this second is asked again the next.
  if (!mark || *mark == m_mark) return;
  m_mark = *mark;
  ++m_generation;
  emit changed();
}

}  // namespace vialkeeper::ui
