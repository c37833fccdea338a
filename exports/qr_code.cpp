// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/qr_code.h"

#include <qrencode.h>

#include <algorithm>
#include <memory>

namespace vialkeeper::exports {

double QrCode::side_mm() const { return std::max(18.0, 0.45 * modules); }

std::optional<QrCode> makeQrCode(const std::string& text) {
  const std::unique_ptr<QRcode, decltype(&QRcode_free)> encoded(
      QRcode_encodeData(static_cast<int>(text.size()),
                        reinterpret_cast<const unsigned char*>(text.data()), 0, QR_ECLEVEL_M),
      &QRcode_free);
  if (encoded == nullptr) return std::nullopt;
  QrCode code;
  code.modules = encoded->width;
  code.path.setFillRule(Qt::WindingFill);
  const auto isDark = [&](int row, int column) {
    return (encoded->data[row * encoded->width + column] & 1) != 0;
  };
  for (int row = 0; row < code.modules; ++row) {
    for (int column = 0; column < code.modules; ++column) {
      if (!isDark(row, column)) continue;
      const int first = column;
      while (column + 1 < code.modules && isDark(row, column + 1)) ++column;
      code.path.addRect(first, row, column - first + 1, 1);
    }
  }
  return code;
}

}  // namespace vialkeeper::exports
