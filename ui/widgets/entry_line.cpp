// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/entry_line.h"

#include <QApplication>
#include <QClipboard>
#include <QDateTime>
#include <QDir>
#include <QHBoxLayout>
#include <QImage>
#include <QKeyEvent>
#include <QLabel>
#include <QMimeData>
#include <QPushButton>
#include <QVBoxLayout>

#include "ui/widgets/label_style.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kReadAgain_ms = 15'000;
constexpr int kTimeWidth_px = 128;
using Standing = LogEntryModel::Standing;

}  // namespace

bool EntryField::pastePicture() {
  const QMimeData* clip = QApplication::clipboard()->mimeData();
  if (clip == nullptr || !clip->hasImage() || clip->hasText()) return false;
  const QString name =
      QStringLiteral("clipboard-%1.png")
          .arg(QDateTime::currentDateTime().toString(QStringLiteral("yyyyMMdd-HHmmss")));
  const QString file = QDir::temp().filePath(name);
  if (!qvariant_cast<QImage>(clip->imageData()).save(file, "PNG")) return false;
  emit pictureFilePasted(file);
  return true;
}

bool EntryField::event(QEvent* event) {
  if (event->type() == QEvent::ShortcutOverride && text().isEmpty()) {
    auto* key = static_cast<QKeyEvent*>(event);
    if (key->matches(QKeySequence::Undo) || key->matches(QKeySequence::Redo)) {
      event->ignore();
      return false;
    }
  }
  return QLineEdit::event(event);
}

void EntryField::keyPressEvent(QKeyEvent* event) {
  if (event->matches(QKeySequence::Paste) && pastePicture()) return;
  if (event->key() == Qt::Key_Down) return emit downWanted();
  if (event->key() == Qt::Key_Escape) return emit escaped();
  QLineEdit::keyPressEvent(event);
}

EntryLine::EntryLine(LogEntryModel& model, QWidget* parent)
    : QWidget(parent),
      m_model(model),
      m_line(new EntryField),
      m_at(new QLineEdit),
      m_log(new QPushButton(tr("Log"))),
      m_task(styledLabel({"notice"})),
      m_cancel(new QPushButton(tr("Leave it"))),
      m_reading(styledLabel({"quiet"})),
      m_keep(new QPushButton(tr("&Keep it as an observation"))),
      m_reasonRow(new QWidget),
      m_reason(new QLineEdit) {
  m_line->setObjectName(QStringLiteral("entryLine"));
  m_line->setAccessibleName(tr("What happened"));
  m_line->setPlaceholderText(tr("p 0.38 bar 35 C · aliquot 50 uL · vent · or what you see"));
  m_line->setMaxLength(1 << 20);
  m_at->setAccessibleName(tr("When it happened"));
  m_at->setPlaceholderText(tr("now, or 14:20"));
  m_at->setToolTip(
      tr("When it happened: 14:20, yesterday 17:05, 20 min ago, 2026-03-04T14:20+01:00. "
         "Empty: now."));
  m_log->setProperty("main", true);
  m_reading->setWordWrap(true);
  m_reading->setObjectName(QStringLiteral("entryReading"));
  m_task->setWordWrap(true);
  m_reason->setAccessibleName(tr("Reason"));
  m_reason->setPlaceholderText(tr("why; kept with the change"));
  m_cancel->setProperty("flat", true);
  layOut();
  wire();
  follow();
}

void EntryLine::layOut() {
  auto* task = new QHBoxLayout;
  task->addWidget(m_task, 1);
  task->addWidget(m_cancel);
  auto* line = new QHBoxLayout;
  line->setSpacing(8);
  line->addWidget(m_line, 1);
  m_at->setFixedWidth(Theme::instance().scaled(kTimeWidth_px));
  line->addWidget(m_at);
  line->addWidget(m_log);
  auto* reading = new QHBoxLayout;
  reading->addWidget(m_reading, 1);
  reading->addWidget(m_keep, 0, Qt::AlignTop);
  auto* reason = new QHBoxLayout(m_reasonRow);
  reason->setContentsMargins(0, 0, 0, 0);
  auto* label = new QLabel(tr("Reas&on"));
  label->setBuddy(m_reason);
  reason->addWidget(label);
  reason->addWidget(m_reason, 1);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 0, 0, 0);
  column->setSpacing(4);
  column->addLayout(task);
  column->addLayout(line);
  column->addWidget(m_reasonRow);
  column->addLayout(reading);
  setSizePolicy(QSizePolicy::Preferred, QSizePolicy::Fixed);
}

void EntryLine::wire() {
  connect(m_line, &QLineEdit::textChanged, this, [this](const QString& text) {
    forgetMessages();
    m_model.setLine(text);
  });
  connect(m_at, &QLineEdit::textChanged, this, [this](const QString& text) {
    forgetMessages();
    m_model.setAt(text);
  });
  connect(m_reason, &QLineEdit::textChanged, this, [this](const QString& text) {
    forgetMessages();
    m_model.setReason(text);
  });
  for (QLineEdit* field : {static_cast<QLineEdit*>(m_line), m_at, m_reason})
    connect(field, &QLineEdit::returnPressed, this, &EntryLine::commit);
  connect(m_log, &QPushButton::clicked, this, &EntryLine::commit);
  connect(m_keep, &QPushButton::clicked, this, [this] {
    m_model.commit(true);
    focusLine();
  });
  connect(m_cancel, &QPushButton::clicked, this, &EntryLine::giveUp);
  connect(m_line, &EntryField::escaped, this, &EntryLine::giveUp);
  connect(m_line, &EntryField::downWanted, this, &EntryLine::downWanted);
  connect(m_line, &EntryField::pictureFilePasted, this, &EntryLine::pictureFilePasted);
  connect(&m_model, &LogEntryModel::changed, this, &EntryLine::follow);
  connect(&m_model, &LogEntryModel::failed, this, &EntryLine::showFailure);
  connect(&m_model, &LogEntryModel::written, this, [this] {
    m_failure.clear();
    m_written = true;
    showReading();
  });
  connect(&Theme::instance(), &Theme::changed, this,
          [this] { m_at->setFixedWidth(Theme::instance().scaled(kTimeWidth_px)); });
  // “now (14:20)” goes on while a line stands.
  m_clock.setInterval(kReadAgain_ms);
  connect(&m_clock, &QTimer::timeout, &m_model, &LogEntryModel::readAgain);
}

void EntryLine::focusLine() {
  m_line->setFocus(Qt::OtherFocusReason);
  m_line->setCursorPosition(static_cast<int>(m_line->text().size()));
}

void EntryLine::begin(const StampDeed& deed) {
  m_line->setFocus(Qt::OtherFocusReason);
  forgetMessages();
  m_line->selectAll();
  m_line->insert(deed.line);
  m_model.begin(deed.line);
  m_line->setCursorPosition(deed.cursor);
}

QString EntryLine::reading() const { return m_reading->text(); }

void EntryLine::forgetMessages() {
  m_failure.clear();
  m_written = false;
}

void EntryLine::commit() {
  forgetMessages();
  const bool done = m_model.commit().done;
  if (!done && m_model.wantsReason() && m_model.reason().trimmed().isEmpty() &&
      m_model.standing() == Standing::kReads)
    m_reason->setFocus();
  else if (done)
    focusLine();
}

void EntryLine::giveUp() {
  forgetMessages();
  m_model.clear();
  focusLine();
}

void EntryLine::showFailure(const QString& sentences) {
  const Standing standing = m_model.standing();
  // What is in doubt says so itself, with the place.
  if (standing == Standing::kDoubtful || standing == Standing::kBadTime) return;
  m_failure = sentences;
  showReading();
}

void EntryLine::follow() {
  if (m_line->text() != m_model.line()) m_line->setText(m_model.line());
  if (m_at->text() != m_model.at()) m_at->setText(m_model.at());
  if (m_reason->text() != m_model.reason()) m_reason->setText(m_model.reason());
  const auto task = m_model.task();
  const QString refusal = m_model.refusal();
  m_line->setReadOnly(!refusal.isEmpty() || task == LogEntryModel::Task::kWithdrawal);
  m_at->setEnabled(refusal.isEmpty() && task != LogEntryModel::Task::kWithdrawal);
  m_log->setEnabled(refusal.isEmpty());
  m_log->setText(task == LogEntryModel::Task::kNew          ? tr("Log")
                 : task == LogEntryModel::Task::kCorrection ? tr("Correct")
                                                            : tr("Take back"));
  m_task->setText(m_model.taskSentence());
  m_task->setVisible(!m_task->text().isEmpty());
  m_cancel->setVisible(m_task->isVisibleTo(this));
  m_reasonRow->setVisible(m_model.wantsReason());
  const bool waits = m_model.standing() != Standing::kEmpty;
  if (waits && !m_clock.isActive()) m_clock.start();
  if (!waits) m_clock.stop();
  showReading();
}

void EntryLine::showReading() {
  const Standing standing = m_model.standing();
  const bool doubtful = standing == Standing::kDoubtful || standing == Standing::kBadTime;
  QString words = m_model.sentence();
  if (!m_failure.isEmpty()) words = m_failure;
  if (words.isEmpty()) words = m_model.refusal();
  // Never empty, so that the page does not jump with the first key.
  if (words.isEmpty())
    words = m_written ? tr("Logged. Ctrl+Z takes it back.")
                      : tr("Enter logs the line; it is read as you type.");
  m_reading->setText(words);
  m_reading->setAccessibleName(m_reading->text());
  setStyleProperty(*m_reading, "fault", doubtful || !m_failure.isEmpty());
  setStyleProperty(*m_reading, "quiet", !doubtful && m_failure.isEmpty());
  setStyleProperty(*m_line, "faulty", standing == Standing::kDoubtful);
  setStyleProperty(*m_at, "faulty", standing == Standing::kBadTime);
  m_keep->setText(m_model.isQuestioned() ? tr("&Yes, log it as it stands")
                                         : tr("&Keep it as an observation"));
  m_keep->setVisible(m_model.canKeepAsText() || m_model.isQuestioned());
}

}  // namespace vialkeeper::ui
