// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/photo_view.h"

#include <QHBoxLayout>
#include <QKeyEvent>
#include <QLabel>
#include <QPushButton>
#include <QVBoxLayout>

#include "ui/models/qt_text.h"
#include "ui/widgets/label_style.h"
#include "ui/widgets/photo_decoding.h"

namespace vialkeeper::ui {
namespace {

constexpr QSize kLargest(4000, 4000);

}  // namespace

PhotoView::PhotoView(OpenRun& run, QWidget* parent)
    : QWidget(parent),
      m_run(run),
      m_title(styledLabel({"quiet"})),
      m_picture(new QLabel),
      m_back(new QPushButton(tr("&Back to the log"))) {
  m_picture->setAlignment(Qt::AlignCenter);
  m_picture->setSizePolicy(QSizePolicy::Ignored, QSizePolicy::Ignored);
  auto* heading = new QHBoxLayout;
  heading->addWidget(m_title, 1);
  heading->addWidget(m_back);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 0, 0, 0);
  column->addLayout(heading);
  column->addWidget(m_picture, 1);
  connect(m_back, &QPushButton::clicked, this, &PhotoView::backWanted);
}

void PhotoView::show(const PhotoEntry& photo) {
  m_title->setText(QStringLiteral("%1, %2").arg(photo.name, photo.when));
  m_picture->setAccessibleName(tr("Photo %1").arg(m_title->text()));
  m_back->setFocus();
  const auto bytes = m_run.link().notebook().attachment(photo.attachment);
  m_image = bytes ? decodedPhoto(*bytes, kLargest) : QImage();
  if (!bytes)
    m_picture->setText(sentences(bytes.error()));
  else if (m_image.isNull())
    m_picture->setText(
        tr("This file cannot be shown as a picture. It is kept as it came: save it "
           "from the page Evidence."));
  fit();
}

void PhotoView::fit() {
  if (m_image.isNull()) return;
  const qreal dense = devicePixelRatioF();
  QPixmap picture = QPixmap::fromImage(
      m_image.scaled(m_picture->size() * dense, Qt::KeepAspectRatio, Qt::SmoothTransformation));
  picture.setDevicePixelRatio(dense);
  m_picture->setPixmap(picture);
}

void PhotoView::resizeEvent(QResizeEvent* event) {
  QWidget::resizeEvent(event);
  fit();
}

void PhotoView::keyPressEvent(QKeyEvent* event) {
  if (event->key() == Qt::Key_Escape) return emit backWanted();
  QWidget::keyPressEvent(event);
}

}  // namespace vialkeeper::ui
