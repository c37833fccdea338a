// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/main_window.h"

#include <QApplication>
#include <QFileDialog>
#include <QMenu>
#include <QStackedWidget>

#include "ui/models/background.h"
#include "ui/models/demo_notebook.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/message_bar.h"
#include "ui/widgets/start_page.h"
#include "ui/widgets/theme.h"
#include "ui/widgets/workspace.h"

namespace vialkeeper::ui {
namespace {

constexpr QSize kFirstSize(1280, 800);
const QString kFilter = QStringLiteral("Vialkeeper (*.vialbook)");

}  // namespace

MainWindow::MainWindow(Workplace workplace, QWidget* parent)
    : QMainWindow(parent),
      m_workplace(workplace),
      m_commands(*this),
      m_stack(new QStackedWidget),
      m_start(new StartPage),
      m_menu(new QMenu(this)) {
  setWindowTitle(tr("Vialkeeper"));
  setCentralWidget(m_stack);
  m_stack->addWidget(m_start);
  resize(kFirstSize);
  connect(m_start, &StartPage::newWanted, this, &MainWindow::chooseNewNotebook);
  connect(m_start, &StartPage::openWanted, this, &MainWindow::chooseNotebook);
  connect(m_start, &StartPage::demoWanted, this, &MainWindow::openDemo);
  connect(m_start, &StartPage::fileChosen, this, &MainWindow::openNotebook);
  addCommands();
}

MainWindow::~MainWindow() = default;

void MainWindow::addCommands() {
  m_menu->setTitle(tr("Menu"));
  m_menu->addAction(m_commands.add(tr("New notebook…"), {}, [this] { chooseNewNotebook(); }));
  m_menu->addAction(
      m_commands.add(tr("Open a notebook…"), QKeySequence::Open, [this] { chooseNotebook(); }));
  m_menu->addAction(m_commands.add(tr("Back up a copy…"), {}, [this] { backUp(); }));
  m_menu->addAction(m_commands.add(tr("Close the notebook"), {}, [this] { closeNotebook(); }));
  m_menu->addSeparator();
  m_undo = m_commands.add(tr("Undo"), QKeySequence::Undo, [this] {
    if (m_workspace != nullptr) m_workspace->history().undo();
  });
  m_redo = m_commands.add(tr("Redo"), QKeySequence(tr("Ctrl+Shift+Z")), [this] {
    if (m_workspace != nullptr) m_workspace->history().redo();
  });
  m_menu->addAction(m_undo);
  m_menu->addAction(m_redo);
  m_menu->addSeparator();
  addRunCommands(*m_menu);
  m_menu->addSeparator();
  addViewCommands(*m_menu);
  m_menu->addSeparator();
  m_menu->addAction(m_commands.add(tr("Quit"), QKeySequence(tr("Ctrl+Q")), [this] { close(); }));
  nameUndo();
}

void MainWindow::addRunCommands(QMenu& menu) {
  const auto add = [&](const QString& text, const QString& keys, void (Workspace::*act)()) {
    menu.addAction(m_commands.add(text, QKeySequence(keys), [this, act] {
      if (m_workspace != nullptr) (m_workspace->*act)();
    }));
  };
  const auto addPage = [&](const QString& text, const QString& keys, RunPage::Page page) {
    menu.addAction(m_commands.add(text, QKeySequence(keys), [this, page] {
      if (m_workspace != nullptr) m_workspace->showPage(page);
    }));
  };
  add(tr("Find runs"), QStringLiteral("Ctrl+F"), &Workspace::focusFilter);
  add(tr("Go to the runs"), QStringLiteral("Ctrl+R"), &Workspace::focusRuns);
  add(tr("New run"), QStringLiteral("Ctrl+N"), &Workspace::showNewRun);
  add(tr("New run from this one"), QStringLiteral("Ctrl+D"), &Workspace::cloneSelected);
  add(tr("Log an entry"), QStringLiteral("Ctrl+L"), &Workspace::focusEntry);
  addPage(tr("Charge"), QStringLiteral("Ctrl+1"), RunPage::Page::kCharge);
  addPage(tr("Log"), QStringLiteral("Ctrl+2"), RunPage::Page::kLog);
  addPage(tr("Evidence"), QStringLiteral("Ctrl+3"), RunPage::Page::kEvidence);
  addPage(tr("Result"), QStringLiteral("Ctrl+4"), RunPage::Page::kResult);
  add(tr("Shelf"), QStringLiteral("Ctrl+0"), &Workspace::showShelf);
}

void MainWindow::addViewCommands(QMenu& menu) {
  const auto addTheme = [&](const QString& text, Theme::Choice choice) {
    menu.addAction(m_commands.add(text, {}, [choice] {
      Theme::instance().apply(*qApp, choice);
      Theme::remember(choice);
    }));
  };
  addTheme(tr("Colours of the system"), Theme::Choice::kSystem);
  addTheme(tr("Light"), Theme::Choice::kLight);
  addTheme(tr("Dark"), Theme::Choice::kDark);
  addTheme(tr("High contrast"), Theme::Choice::kContrast);
  QAction* hood = m_commands.add(tr("Hood mode: large type"), QKeySequence(tr("F8")), [] {
    Theme::instance().setHoodMode(*qApp, !Theme::instance().isHoodMode());
  });
  menu.addAction(hood);
}

void MainWindow::nameUndo() {
  const bool has = m_workspace != nullptr;
  m_undo->setEnabled(has && m_workspace->history().canUndo());
  m_redo->setEnabled(has && m_workspace->history().canRedo());
  m_undo->setText(has ? tr("Undo %1").arg(m_workspace->history().undoName()) : tr("Undo"));
  m_redo->setText(has ? tr("Redo %1").arg(m_workspace->history().redoName()) : tr("Redo"));
}

void MainWindow::show(std::unique_ptr<app::Notebook> notebook, const QString& file) {
  closeNotebook();
  const auto only = app::whoWorks(*notebook, std::nullopt);
  QString person = m_recent.personOf(file);
  if (person.isEmpty() && only) person = toQt(*only);
  auto link = std::make_unique<NotebookLink>(m_workplace, std::move(notebook), file, person);
  connect(link.get(), &NotebookLink::personChanged, this, [this, raw = link.get()] {
    m_recent.remember(raw->file(), raw->person());
  });
  m_recent.remember(file, person);
  m_workspace = new Workspace(std::move(link));
  m_stack->addWidget(m_workspace);
  m_stack->setCurrentWidget(m_workspace);
  connect(&m_workspace->history(), &ActionHistory::changed, this, &MainWindow::nameUndo);
  connect(m_workspace, &Workspace::menuWanted, m_menu,
          [this](const QPoint& at) { m_menu->popup(at); });
  setWindowTitle(tr("%1 – Vialkeeper").arg(m_workspace->link().name()));
  nameUndo();
  if (!person.isEmpty()) m_workspace->focusRuns();
}

void MainWindow::openNotebook(const QString& file) {
  const QString whole = QFileInfo(file).absoluteFilePath();
  auto notebook = m_workplace.files.open(whole.toStdString(), NotebookFiles::Use::kWriting);
  if (!notebook) {
    closeNotebook();
    m_start->showMessage(sentences(notebook.error()), true);
    return;
  }
  show(*std::move(notebook), whole);
}

void MainWindow::createNotebook(const QString& file) {
  QString whole = QFileInfo(file).absoluteFilePath();
  if (!whole.endsWith(QStringLiteral(".vialbook"))) whole += QStringLiteral(".vialbook");
  auto notebook = m_workplace.files.create(whole.toStdString());
  if (!notebook) {
    closeNotebook();
    m_start->showMessage(sentences(notebook.error()), true);
    return;
  }
  show(*std::move(notebook), whole);
}

void MainWindow::chooseNotebook() {
  const QString file = QFileDialog::getOpenFileName(this, tr("Open a notebook"), {}, kFilter);
  if (!file.isEmpty()) openNotebook(file);
}

void MainWindow::chooseNewNotebook() {
  // A file that is there is never replaced: create() refuses it, so the chooser need not ask.
  const QString file = QFileDialog::getSaveFileName(this, tr("Where is the new notebook to lie?"),
                                                    {}, kFilter, nullptr,
                                                    QFileDialog::DontConfirmOverwrite);
  if (!file.isEmpty()) createNotebook(file);
}

void MainWindow::openDemo() {
  m_start->showMessage(tr("Making the invented notebook…"), false);
  inBackground(
      this, [files = &m_workplace.files] { return demoNotebook(*files); },
      [this](const text::Checked<QString>& file) {
        if (file) {
          m_start->showMessage({}, false);
          openNotebook(*file);
        } else {
          m_start->showMessage(sentences(file.error()), true);
        }
      });
}

void MainWindow::closeNotebook() {
  if (m_workspace != nullptr) {
    m_stack->removeWidget(m_workspace);
    delete m_workspace;
    m_workspace = nullptr;
  }
  setWindowTitle(tr("Vialkeeper"));
  m_start->showRecent();
  m_stack->setCurrentWidget(m_start);
  nameUndo();
}

void MainWindow::backUp() {
  if (m_workspace == nullptr) return;
  const QString file = QFileDialog::getSaveFileName(this, tr("Back up a copy"), {}, kFilter, nullptr,
                                                    QFileDialog::DontConfirmOverwrite);
  if (file.isEmpty()) return;
  m_workspace->messages().show(MessageBar::Kind::kNotice, tr("Copying and checking the copy…"));
  inBackground(
      m_workspace,
      [files = &m_workplace.files, from = m_workspace->link().file().toStdString(),
       to = file.toStdString()]() -> text::Checked<void> {
        auto notebook = files->open(from, NotebookFiles::Use::kReading);
        if (!notebook) return std::unexpected(notebook.error());
        return (*notebook)->backup(to);
      },
      [this, file](const text::Checked<void>& done) {
        if (done)
          m_workspace->messages().show(MessageBar::Kind::kGood,
                                       tr("The copy %1 was opened again and checked.").arg(file));
        else
          m_workspace->messages().show(MessageBar::Kind::kFault, sentences(done.error()));
      });
}

}  // namespace vialkeeper::ui
