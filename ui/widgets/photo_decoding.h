// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QImage>
#include <QSize>
#include <string>

namespace vialkeeper::ui {

/// The picture in these bytes, turned upright and no larger than `within`; a null image where they
/// hold none. May be called from any thread.
[[nodiscard]] QImage decodedPhoto(const std::string& bytes, const QSize& within);

}  // namespace vialkeeper::ui
