// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractListModel>
#include <QList>
#include <QString>

namespace vialkeeper::ui {

struct SavedFilter {
  QString name;
  QString text;
};

/// Searches that the user keeps under a name, in the settings, for every notebook; by name.
class SavedFilters : public QAbstractListModel {
  Q_OBJECT

 public:
  explicit SavedFilters(QObject* parent = nullptr);

  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;

  [[nodiscard]] const QList<SavedFilter>& filters() const { return m_filters; }
  /// The name under which this text is kept; empty where it is not.
  [[nodiscard]] QString nameOf(const QString& text) const;
  /// Keeps a text; one of the same name is replaced. False: the name or the text is empty.
  bool save(const QString& name, const QString& text);
  void remove(const QString& name);

 private:
  void setFilters(QList<SavedFilter> filters);

  QList<SavedFilter> m_filters;
};

}  // namespace vialkeeper::ui
