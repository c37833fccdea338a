// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QColor>
#include <QHash>
#include <QObject>
#include <QString>

class QApplication;

namespace vialkeeper::ui {

/// The colours by their meaning, from `theme/theme.json`; nothing else in the desktop names one.
class Theme : public QObject {
  Q_OBJECT

 public:
  enum class Kind { kLight, kDark, kContrast };
  enum class Choice { kSystem, kLight, kDark, kContrast };

  /// The one theme of the process.
  [[nodiscard]] static Theme& instance();

  /// Sets palette, style sheet and fonts of the application.
  void apply(QApplication& application, Choice choice);
  /// Keeps the choice in the user's settings; chosen() gives it back.
  static void remember(Choice choice);
  [[nodiscard]] static Choice chosen();
  [[nodiscard]] Kind kind() const { return m_kind; }
  [[nodiscard]] bool isDark() const { return m_kind != Kind::kLight; }
  /// A colour by its name in the file. A wrong name is a mistake of the program's and throws.
  [[nodiscard]] QColor colour(const QString& name) const;

  /// Hood mode: all texts larger, to be read from two metres.
  void setHoodMode(QApplication& application, bool on);
  [[nodiscard]] bool isHoodMode() const { return m_hoodMode; }
  /// A length that was thought for a text of 10 points, in the size of text that is set.
  [[nodiscard]] int scaled(int px) const;

 signals:
  void changed();

 private:
  Theme();
  void set(QApplication& application);
  [[nodiscard]] QString styleSheet() const;

  QHash<QString, QHash<QString, QColor>> m_colours;
  Kind m_kind = Kind::kLight;
  bool m_hoodMode = false;
  double m_points = 10.0;
};

/// Shorthand for `Theme::instance().colour(name)`.
[[nodiscard]] inline QColor colour(const char* name) {
  return Theme::instance().colour(QString::fromLatin1(name));
}

}  // namespace vialkeeper::ui
