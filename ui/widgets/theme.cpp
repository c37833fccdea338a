// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/theme.h"

#include <QApplication>
#include <QFile>
#include <QFont>
#include <QJsonDocument>
#include <QJsonObject>
#include <QPalette>
#include <QSettings>
#include <QStyleFactory>
#include <stdexcept>

/// A resource of a static library is left out of the program unless it is asked for by name, and
/// that not from within a namespace.
static void takeResources() { Q_INIT_RESOURCE(resources); }

namespace vialkeeper::ui {
namespace {

constexpr double kPlainPoints = 10.0;
constexpr double kHoodPoints = 16.0;

QString nameOf(Theme::Kind kind) {
  switch (kind) {
    case Theme::Kind::kDark:
      return QStringLiteral("dark");
    case Theme::Kind::kContrast:
      return QStringLiteral("contrast");
    case Theme::Kind::kLight:
      break;
  }
  return QStringLiteral("light");
}

Theme::Kind kindFor(Theme::Choice choice, const QApplication& application) {
  switch (choice) {
    case Theme::Choice::kLight:
      return Theme::Kind::kLight;
    case Theme::Choice::kDark:
      return Theme::Kind::kDark;
    case Theme::Choice::kContrast:
      return Theme::Kind::kContrast;
    case Theme::Choice::kSystem:
      break;
  }
  // The palette before ours is the system's.
  static const bool systemIsDark = application.palette().color(QPalette::Window).lightness() < 128;
  return systemIsDark ? Theme::Kind::kDark : Theme::Kind::kLight;
}

}  // namespace

Theme::Theme() {
  takeResources();
  QFile file(QStringLiteral(":/vialkeeper/theme.json"));
  if (!file.open(QIODevice::ReadOnly)) throw std::logic_error("the theme is not in the program");
  const QJsonObject kinds = QJsonDocument::fromJson(file.readAll()).object();
  for (auto kind = kinds.begin(); kind != kinds.end(); ++kind) {
    const QJsonObject colours = kind.value().toObject();
    for (auto each = colours.begin(); each != colours.end(); ++each)
      m_colours[kind.key()][each.key()] = QColor(each.value().toString());
  }
}

Theme& Theme::instance() {
  static Theme theme;
  return theme;
}

QColor Theme::colour(const QString& name) const {
  const auto kind = m_colours.constFind(nameOf(m_kind));
  const auto found = kind->constFind(name);
  if (found == kind->constEnd())
    throw std::logic_error("the theme has no colour " + name.toStdString());
  return *found;
}

int Theme::scaled(int px) const { return qRound(px * m_points / kPlainPoints); }

void Theme::apply(QApplication& application, Choice choice) {
  m_kind = kindFor(choice, application);
  set(application);
}

void Theme::remember(Choice choice) {
  QSettings().setValue(QStringLiteral("theme"), static_cast<int>(choice));
}

Theme::Choice Theme::chosen() {
  const int kept = QSettings().value(QStringLiteral("theme"), 0).toInt();
  return kept >= 0 && kept <= static_cast<int>(Choice::kContrast) ? static_cast<Choice>(kept)
                                                                  : Choice::kSystem;
}

void Theme::setHoodMode(QApplication& application, bool on) {
  m_hoodMode = on;
  set(application);
}

void Theme::set(QApplication& application) {
  m_points = m_hoodMode ? kHoodPoints : kPlainPoints;
  QFont font = application.font();
  font.setPointSizeF(m_points);
  QApplication::setFont(font);
  QApplication::setStyle(QStyleFactory::create(QStringLiteral("Fusion")));
  const auto of = [this](const char* name) { return colour(QString::fromLatin1(name)); };
  QPalette palette;
  palette.setColor(QPalette::Window, of("window"));
  palette.setColor(QPalette::WindowText, of("text"));
  palette.setColor(QPalette::Base, of("field"));
  palette.setColor(QPalette::AlternateBase, of("hover"));
  palette.setColor(QPalette::Text, of("text"));
  palette.setColor(QPalette::Button, of("panel"));
  palette.setColor(QPalette::ButtonText, of("text"));
  palette.setColor(QPalette::BrightText, of("limit"));
  palette.setColor(QPalette::Highlight, of("selected"));
  palette.setColor(QPalette::HighlightedText, of("selectedText"));
  palette.setColor(QPalette::ToolTipBase, of("panel"));
  palette.setColor(QPalette::ToolTipText, of("text"));
  palette.setColor(QPalette::PlaceholderText, of("quiet"));
  palette.setColor(QPalette::Link, of("hydrogen"));
  palette.setColor(QPalette::LinkVisited, of("hydrogen"));
  palette.setColor(QPalette::Mid, of("line"));
  for (const auto role : {QPalette::WindowText, QPalette::Text, QPalette::ButtonText})
    palette.setColor(QPalette::Disabled, role, of("quiet"));
  QApplication::setPalette(palette);
  application.setStyleSheet(styleSheet());
  emit changed();
}

QString Theme::styleSheet() const {
  QFile file(QStringLiteral(":/vialkeeper/style.qss"));
  if (!file.open(QIODevice::ReadOnly)) throw std::logic_error("the style is not in the program");
  QString sheet = QString::fromUtf8(file.readAll());
  const auto colours = m_colours.value(nameOf(m_kind));
  for (auto each = colours.begin(); each != colours.end(); ++each)
    sheet.replace(QLatin1Char('@') + each.key() + QLatin1Char(';'),
                  each.value().name() + QLatin1Char(';'));
  sheet.replace(QStringLiteral("@small"), QStringLiteral("%1pt").arg(m_points * 0.85));
  sheet.replace(QStringLiteral("@large"), QStringLiteral("%1pt").arg(m_points * 1.45));
  sheet.replace(QStringLiteral("@huge"), QStringLiteral("%1pt").arg(m_points * 2.2));
  return sheet;
}

}  // namespace vialkeeper::ui
