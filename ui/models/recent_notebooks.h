// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>
#include <QStringList>

namespace vialkeeper::ui {

/// The notebooks that were open before, newest first, and who worked in each; kept in the user's
/// settings, apart from any notebook.
class RecentNotebooks {
 public:
  static constexpr int kMost = 8;

  /// Those whose file is still there.
  [[nodiscard]] QStringList files() const;
  [[nodiscard]] QString personOf(const QString& file) const;
  void remember(const QString& file, const QString& person);
  void forget(const QString& file);
};

}  // namespace vialkeeper::ui
