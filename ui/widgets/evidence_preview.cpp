// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/evidence_preview.h"

#include <QHeaderView>
#include <QLabel>
#include <QSplitter>
#include <QStackedWidget>
#include <QTableView>
#include <QVBoxLayout>

#include "ui/charts/plot_widget.h"
#include "ui/charts/reading_plot.h"
#include "ui/widgets/label_style.h"
#include "ui/widgets/photo_decoding.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr QSize kLargestPicture(1200, 800);

}  // namespace

EvidencePreview::EvidencePreview(QWidget* parent)
    : QWidget(parent),
      m_stack(new QStackedWidget),
      m_nothing(styledLabel({"quiet"})),
      m_plot(new PlotWidget),
      m_table(new QTableView),
      m_recipe(styledLabel({"quiet", "small"})),
      m_picture(new QLabel),
      m_file(styledLabel({"quiet", "small"})) {
  m_nothing->setAlignment(Qt::AlignCenter);
  m_nothing->setWordWrap(true);
  m_picture->setAlignment(Qt::AlignCenter);
  m_picture->setSizePolicy(QSizePolicy::Ignored, QSizePolicy::Ignored);
  m_stack->addWidget(m_nothing);
  m_stack->addWidget(makeDataset());
  m_stack->addWidget(m_picture);
  m_file->setWordWrap(true);
  m_file->setTextInteractionFlags(Qt::TextSelectableByMouse);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 0, 0, 0);
  column->addWidget(m_stack, 1);
  column->addWidget(m_file);
  connect(&Theme::instance(), &Theme::changed, this, [this] {
    if (m_content && m_content->isDataset()) m_plot->setContent(datasetPlot(*m_content));
  });
}

QWidget* EvidencePreview::makeDataset() {
  m_plot->setAccessibleName(tr("Chart of the dataset"));
  m_plot->setMinimumHeight(Theme::instance().scaled(120));
  m_table->setModel(&m_values);
  m_table->setAccessibleName(tr("Numbers of the dataset"));
  m_table->setTabKeyNavigation(false);
  m_table->verticalHeader()->setDefaultSectionSize(Theme::instance().scaled(24));
  m_table->horizontalHeader()->setSectionResizeMode(QHeaderView::Interactive);
  m_recipe->setWordWrap(true);
  m_recipe->setTextInteractionFlags(Qt::TextSelectableByMouse);
  auto* below = new QWidget;
  auto* column = new QVBoxLayout(below);
  column->setContentsMargins(0, 0, 0, 0);
  column->addWidget(m_recipe);
  column->addWidget(m_table, 1);
  auto* split = new QSplitter(Qt::Vertical);
  split->addWidget(m_plot);
  split->addWidget(below);
  split->setStretchFactor(0, 3);
  split->setStretchFactor(1, 2);
  split->setChildrenCollapsible(false);
  return split;
}

void EvidencePreview::showNothing(const QString& words) {
  m_content.reset();
  m_nothing->setText(words);
  m_file->clear();
  m_stack->setCurrentWidget(m_nothing);
}

void EvidencePreview::showPicture() {
  const QImage image = decodedPhoto(m_content->bytes, kLargestPicture);
  if (image.isNull()) {
    m_nothing->setText(tr("This file cannot be shown here. It is kept as it came."));
    m_stack->setCurrentWidget(m_nothing);
    return;
  }
  m_picture->setPixmap(QPixmap::fromImage(
      image.scaled(m_stack->size(), Qt::KeepAspectRatio, Qt::SmoothTransformation)));
  m_picture->setAccessibleName(tr("Photo %1").arg(m_content->item.rawName));
  m_stack->setCurrentWidget(m_picture);
}

void EvidencePreview::show(EvidenceContentPtr content) {
  m_content = std::move(content);
  m_file->setText(fileSentence(*m_content));
  if (!m_content->isDataset()) return showPicture();
  m_values.show(m_content);
  m_table->resizeColumnsToContents();
  m_recipe->setText(recipeOf(*m_content));
  m_plot->setContent(datasetPlot(*m_content), true);
  m_stack->setCurrentIndex(1);
}

}  // namespace vialkeeper::ui
