// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/print_page.h"

#include <QApplication>
#include <QComboBox>
#include <QFileDialog>
#include <QHBoxLayout>
#include <QKeyEvent>
#include <QLabel>
#include <QPageSize>
#include <QPainter>
#include <QPrintDialog>
#include <QPrinter>
#include <QPushButton>
#include <QScrollArea>

#include "ui/models/qt_text.h"
#include "ui/widgets/message_bar.h"

namespace vialkeeper::ui {
namespace {

constexpr double kPreview_dpi = 84.0;
constexpr double kLabelPreview_dpi = 200.0;
constexpr double kPrinter_dpi = 300.0;
constexpr double kLabelPrinter_dpi = 600.0;

/// An empty text when it was done, else what went wrong.
QString printOn(QPrinter& printer, const app::RunSheet& sheet, Printed what,
                double resolution_dpi) {
  const auto images = pageImages(sheet, what, resolution_dpi);
  if (!images) return sentences(images.error());
  QPainter painter;
  if (!painter.begin(&printer))
    return PrintPage::tr("The printer does not take the page: save it as a PDF and print that.");
  for (std::size_t i = 0; i < images->size(); ++i) {
    if (i > 0) printer.newPage();
    painter.drawImage(QRectF(printer.paperRect(QPrinter::DevicePixel)), (*images)[i].image);
  }
  return {};
}

}  // namespace

PrintPage::PrintPage(OpenRun& run, QWidget* parent)
    : QWidget(parent),
      m_run(run),
      m_messages(new MessageBar),
      m_choice(new QComboBox),
      m_scroll(new QScrollArea) {
  auto* inside = new QWidget;
  m_column = new QVBoxLayout(inside);
  m_column->setSpacing(14);
  m_column->setAlignment(Qt::AlignHCenter | Qt::AlignTop);
  m_scroll->setWidget(inside);
  m_scroll->setWidgetResizable(true);
  m_scroll->setAccessibleName(tr("The page as it will be printed"));
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 8, 0, 0);
  column->addWidget(makeHead());
  column->addWidget(m_messages);
  column->addWidget(m_scroll, 1);
  connect(&m_run, &OpenRun::reloaded, this, [this] {
    if (isVisible()) showPages();
  });
}

QWidget* PrintPage::makeHead() {
  m_choice->addItem(tr("Weighing sheet, A4"), static_cast<int>(Printed::kSheetA4));
  m_choice->addItem(tr("Weighing sheet, Letter"), static_cast<int>(Printed::kSheetLetter));
  m_choice->addItem(tr("Label for the vial"), static_cast<int>(Printed::kLabel));
  m_choice->setAccessibleName(tr("What is printed"));
  connect(m_choice, &QComboBox::currentIndexChanged, this, [this] {
    if (isVisible()) showPages();
  });
  auto* print = new QPushButton(tr("&Print…"));
  auto* save = new QPushButton(tr("Save as P&DF…"));
  auto* back = new QPushButton(tr("Back to the table (Esc)"));
  back->setProperty("flat", true);
  connect(print, &QPushButton::clicked, this, &PrintPage::print);
  connect(save, &QPushButton::clicked, this, &PrintPage::saveAsPdf);
  connect(back, &QPushButton::clicked, this, &PrintPage::left);
  auto* head = new QWidget;
  auto* row = new QHBoxLayout(head);
  row->setContentsMargins(0, 0, 0, 0);
  row->addWidget(m_choice);
  row->addWidget(print);
  row->addWidget(save);
  row->addStretch(1);
  row->addWidget(back);
  return head;
}

Printed PrintPage::chosen() const { return static_cast<Printed>(m_choice->currentData().toInt()); }

void PrintPage::choose(Printed what) {
  m_choice->setCurrentIndex(m_choice->findData(static_cast<int>(what)));
  m_choice->setFocus(Qt::OtherFocusReason);
}

int PrintPage::pages() const { return static_cast<int>(m_pictures.size()); }

void PrintPage::clear() {
  for (QLabel* picture : m_pictures) picture->deleteLater();
  m_pictures.clear();
}

void PrintPage::showPages() {
  clear();
  if (!m_run.isOpen()) return;
  const double ratio = devicePixelRatioF();
  const double dpi = (chosen() == Printed::kLabel ? kLabelPreview_dpi : kPreview_dpi) * ratio;
  const auto images = pageImages(m_run.sheet(), chosen(), dpi);
  if (!images) {
    m_messages->show(MessageBar::Kind::kFault, sentences(images.error()));
    return;
  }
  if (!images->empty()) m_size_mm = images->front().size_mm;
  for (std::size_t i = 0; i < images->size(); ++i) {
    QPixmap pixmap = QPixmap::fromImage((*images)[i].image);
    pixmap.setDevicePixelRatio(ratio);
    auto* picture = new QLabel;
    picture->setPixmap(pixmap);
    picture->setObjectName(QStringLiteral("printedPage"));
    picture->setAccessibleName(tr("Page %1 of %2").arg(i + 1).arg(images->size()));
    m_column->addWidget(picture);
    m_pictures.push_back(picture);
  }
}

void PrintPage::saveAsPdf() {
  const QString name = toQt(m_run.run().code) +
                       (chosen() == Printed::kLabel ? tr("-label") : tr("-weighing-sheet")) +
                       QStringLiteral(".pdf");
  const QString file =
      QFileDialog::getSaveFileName(this, tr("Save as PDF"), name, QStringLiteral("PDF (*.pdf)"));
  if (file.isEmpty()) return;
  const QString fault = savePdf(m_run.sheet(), chosen(), file);
  if (fault.isEmpty())
    m_messages->show(MessageBar::Kind::kGood, tr("Saved as %1.").arg(file));
  else
    m_messages->show(MessageBar::Kind::kFault, fault);
}

void PrintPage::print() {
  const bool isLabel = chosen() == Printed::kLabel;
  if (m_pictures.empty()) return;
  QPrinter printer(QPrinter::HighResolution);
  printer.setDocName(toQt(m_run.run().code));
  printer.setFullPage(true);
  printer.setPageSize(QPageSize(m_size_mm, QPageSize::Millimeter, QString(),
                                isLabel ? QPageSize::ExactMatch : QPageSize::FuzzyMatch));
  QPrintDialog dialog(&printer, this);
  if (dialog.exec() != QDialog::Accepted) return;
  QApplication::setOverrideCursor(Qt::WaitCursor);
  const QString fault =
      printOn(printer, m_run.sheet(), chosen(), isLabel ? kLabelPrinter_dpi : kPrinter_dpi);
  QApplication::restoreOverrideCursor();
  if (fault.isEmpty())
    m_messages->show(MessageBar::Kind::kGood, tr("Sent to %1.").arg(printer.printerName()));
  else
    m_messages->show(MessageBar::Kind::kFault, fault);
}

void PrintPage::showEvent(QShowEvent* event) {
  QWidget::showEvent(event);
  m_messages->dismiss();
  showPages();
}

void PrintPage::keyPressEvent(QKeyEvent* event) {
  if (event->key() == Qt::Key_Escape)
    emit left();
  else
    QWidget::keyPressEvent(event);
}

}  // namespace vialkeeper::ui
