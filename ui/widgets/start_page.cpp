// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/start_page.h"

#include <QFileInfo>
#include <QHBoxLayout>
#include <QLabel>
#include <QPushButton>
#include <QVBoxLayout>

#include "ui/models/recent_notebooks.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kChoiceWidth_px = 300;

/// One choice: a button, and under it what it means.
QWidget* choice(const QString& text, const QString& meaning, QPushButton*& button) {
  auto* box = new QWidget;
  button = new QPushButton(text);
  button->setProperty("first", true);
  button->setAccessibleDescription(meaning);
  auto* words = new QLabel(meaning);
  words->setWordWrap(true);
  words->setProperty("quiet", true);
  auto* column = new QVBoxLayout(box);
  column->setContentsMargins(0, 0, 0, 0);
  column->addWidget(button);
  column->addWidget(words);
  column->addStretch();
  box->setFixedWidth(Theme::instance().scaled(kChoiceWidth_px));
  return box;
}

}  // namespace

StartPage::StartPage(QWidget* parent)
    : QWidget(parent), m_message(new QLabel), m_recent(new QVBoxLayout) {
  setObjectName(QStringLiteral("page"));
  auto* name = new QLabel(tr("Vialkeeper"));
  name->setProperty("huge", true);
  auto* line = new QLabel(tr("A record for light-driven reactions that give off hydrogen."));
  line->setProperty("quiet", true);
  QPushButton* make = nullptr;
  QPushButton* open = nullptr;
  QPushButton* demo = nullptr;
  auto* choices = new QHBoxLayout;
  choices->setSpacing(24);
  choices->addStretch();
  choices->addWidget(choice(tr("&New notebook"),
                            tr("One file that keeps every run. Choose where it is to lie."), make));
  choices->addWidget(
      choice(tr("&Open a notebook"), tr("A .vialbook file of yours or of your group."), open));
  choices->addWidget(choice(tr("&Look around"),
                            tr("A notebook of invented runs. Nothing in it was ever measured."),
                            demo));
  choices->addStretch();
  m_message->setAlignment(Qt::AlignHCenter);
  m_message->setWordWrap(true);
  auto* column = new QVBoxLayout(this);
  column->addStretch(2);
  column->addWidget(name, 0, Qt::AlignHCenter);
  column->addWidget(line, 0, Qt::AlignHCenter);
  column->addSpacing(28);
  column->addLayout(choices);
  column->addSpacing(12);
  column->addWidget(m_message);
  column->addSpacing(12);
  column->addLayout(m_recent);
  column->addStretch(3);
  connect(make, &QPushButton::clicked, this, &StartPage::newWanted);
  connect(open, &QPushButton::clicked, this, &StartPage::openWanted);
  connect(demo, &QPushButton::clicked, this, &StartPage::demoWanted);
  showRecent();
}

void StartPage::showMessage(const QString& message, bool isFault) {
  m_message->setText(message);
  m_message->setProperty("fault", isFault);
  // A property in the style sheet counts from the next polish on.
  m_message->setStyleSheet(m_message->styleSheet());
}

void StartPage::showRecent() {
  while (QLayoutItem* item = m_recent->takeAt(0)) {
    if (item->widget() != nullptr) item->widget()->deleteLater();
    delete item;
  }
  for (const QString& file : RecentNotebooks().files()) {
    const QFileInfo info(file);
    auto* button = new QPushButton(tr("%1   in %2").arg(info.fileName(), info.path()));
    button->setProperty("flat", true);
    button->setAccessibleName(tr("Open %1 again").arg(info.fileName()));
    connect(button, &QPushButton::clicked, this, [this, file] { emit fileChosen(file); });
    m_recent->addWidget(button, 0, Qt::AlignHCenter);
  }
}

}  // namespace vialkeeper::ui
