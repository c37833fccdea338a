// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>

#include "app/notebook/find_query.h"
#include "ui/models/notebook_link.h"

namespace vialkeeper::ui {

/// The search of the window: its text, what it found, and how. The work is done by another
/// connection in another thread; only the newest text is ever answered.
class RunSearch : public QObject {
  Q_OBJECT

 public:
  explicit RunSearch(NotebookLink& link, QObject* parent = nullptr) : QObject(parent), m_link(link) {}
  [[nodiscard]] NotebookLink& link() { return m_link; }

 private:
  NotebookLink& m_link;
};

}  // namespace vialkeeper::ui
