// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// Datasets and files of the open run, previewed and saved out again.
class EvidencePage : public QWidget {
  Q_OBJECT

 public:
  explicit EvidencePage(OpenRun& run, QWidget* parent = nullptr);

 private:
  OpenRun& m_run;
};

}  // namespace vialkeeper::ui
