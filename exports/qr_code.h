// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QPainterPath>
#include <optional>
#include <string>

namespace vialkeeper::exports {

/// A printed code: dark modules as one path, one unit a module, without its quiet zone.
struct QrCode {
  QPainterPath path;
  int modules = 0;  ///< along one side

  /// The side of the dark part: 18 mm, more for texts so long that their modules would be smaller
  /// than 0.45 mm, which telephones and scanners then miss.
  [[nodiscard]] double side_mm() const;
  /// What has to stay white on all sides.
  [[nodiscard]] double quietZone_mm() const { return 4.0 * side_mm() / modules; }
};

/// The text as a code of error correction level M; nothing where it is too long (2331 bytes).
[[nodiscard]] std::optional<QrCode> makeQrCode(const std::string& text);

}  // namespace vialkeeper::exports
