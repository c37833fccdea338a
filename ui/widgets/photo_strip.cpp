// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/photo_strip.h"

#include <QScrollArea>
#include <QToolButton>
#include <QVBoxLayout>

#include "ui/models/background.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/photo_decoding.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr QSize kThumbnail(192, 144);  // twice as large as shown, for dense screens
constexpr int kWidth_px = 124;

}  // namespace

PhotoStrip::PhotoStrip(OpenRun& run, QWidget* parent) : QWidget(parent), m_run(run) {
  auto* inside = new QWidget;
  m_column = new QVBoxLayout(inside);
  m_column->setContentsMargins(0, 0, 0, 0);
  m_column->setSpacing(4);
  auto* scroll = new QScrollArea;
  scroll->setWidget(inside);
  scroll->setWidgetResizable(true);
  scroll->setFocusPolicy(Qt::NoFocus);
  scroll->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
  auto* whole = new QVBoxLayout(this);
  whole->setContentsMargins(0, 0, 0, 0);
  whole->addWidget(scroll);
  setFixedWidth(Theme::instance().scaled(kWidth_px));
  hide();
  connect(&m_run, &OpenRun::reloaded, this, &PhotoStrip::follow);
  connect(&m_run, &OpenRun::opened, this, [this] { m_thumbnails.clear(); });
  connect(&Theme::instance(), &Theme::changed, this, [this] {
    setFixedWidth(Theme::instance().scaled(kWidth_px));
    rebuild();
  });
  follow();
}

void PhotoStrip::follow() {
  std::vector<PhotoEntry> photos;
  if (m_run.isOpen()) photos = photoEntries(m_run.events());
  if (photos == m_photos) return;
  m_photos = std::move(photos);
  setVisible(!m_photos.empty());
  rebuild();
  loadMissing();
}

void PhotoStrip::rebuild() {
  while (QLayoutItem* item = m_column->takeAt(0)) {
    delete item->widget();
    delete item;
  }
  for (const PhotoEntry& photo : m_photos) {
    auto* button = new QToolButton;
    button->setAccessibleName(tr("Photo %1 of %2").arg(photo.name, photo.when));
    button->setToolTip(button->accessibleName());
    button->setText(photo.when);
    button->setToolButtonStyle(Qt::ToolButtonTextUnderIcon);
    button->setSizePolicy(QSizePolicy::Expanding, QSizePolicy::Fixed);
    const QSize size = kThumbnail / 2;
    button->setIconSize(
        {Theme::instance().scaled(size.width()), Theme::instance().scaled(size.height())});
    const QImage image = m_thumbnails.value(photo.attachment);
    if (!image.isNull())
      button->setIcon(QPixmap::fromImage(image));
    else if (m_thumbnails.contains(photo.attachment))
      button->setText(tr("%1\nno preview").arg(photo.when));
    connect(button, &QToolButton::clicked, this, [this, photo] { emit photoChosen(photo); });
    m_column->addWidget(button);
  }
  m_column->addStretch(1);
}

void PhotoStrip::loadMissing() {
  std::vector<app::RowNumber> missing;
  for (const PhotoEntry& photo : m_photos)
    if (!m_thumbnails.contains(photo.attachment)) missing.push_back(photo.attachment);
  if (missing.empty()) return;
  const NotebookLink& link = m_run.link();
  inBackground(
      this,
      [files = &link.workplace().files, book = toUtf8(link.file()), missing] {
        QHash<app::RowNumber, QImage> images;
        const auto notebook = files->open(book, NotebookFiles::Use::kReading);
        if (!notebook) return images;
        for (const app::RowNumber n : missing) {
          const auto bytes = (*notebook)->attachment(n);
          if (bytes) images.insert(n, decodedPhoto(*bytes, kThumbnail));
        }
        return images;
      },
      [this](const QHash<app::RowNumber, QImage>& images) {
        m_thumbnails.insert(images);
        rebuild();
      });
}

}  // namespace vialkeeper::ui
