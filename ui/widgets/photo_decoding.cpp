// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/photo_decoding.h"

#include <QBuffer>
#include <QImageReader>

namespace vialkeeper::ui {

QImage decodedPhoto(const std::string& bytes, const QSize& within) {
  QByteArray view = QByteArray::fromRawData(bytes.data(), static_cast<qsizetype>(bytes.size()));
  QBuffer buffer(&view);
  buffer.open(QIODevice::ReadOnly);
  QImageReader reader(&buffer);
  reader.setAutoTransform(true);
  const QSize whole = reader.size();
  if (whole.isValid() && (whole.width() > within.width() || whole.height() > within.height()))
    reader.setScaledSize(whole.scaled(within, Qt::KeepAspectRatio).expandedTo({1, 1}));
  const QImage image = reader.read();
  if (image.isNull() || (image.width() <= within.width() && image.height() <= within.height()))
    return image;
  return image.scaled(within, Qt::KeepAspectRatio, Qt::SmoothTransformation);
}

}  // namespace vialkeeper::ui
