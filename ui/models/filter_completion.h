// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractListModel>
#include <memory>
#include <vector>

#include "app/notebook/find_completion.h"
#include "ui/models/notebook_link.h"

namespace vialkeeper::ui {

/// What the filter line proposes for the word at the cursor. What the notebook holds is read in
/// another thread, and again once it changed and is wanted.
class FilterCompletion : public QAbstractListModel {
  Q_OBJECT

 public:
  explicit FilterCompletion(NotebookLink& link, QObject* parent = nullptr);

  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  [[nodiscard]] bool isLoaded() const { return m_vocabulary != nullptr; }

  /// Fills the list for a text with its cursor. Where no word is begun and no field named there is
  /// nothing to propose, unless all is asked for.
  void complete(const QString& text, qsizetype cursor, bool all = false);
  void clear();

  /// The text with a proposal taken.
  struct Taken {
    QString text;
    qsizetype cursor;
  };
  [[nodiscard]] Taken taken(int row) const;

 signals:
  void loaded();

 private:
  void load();
  void fill(std::vector<app::Completion> completions);

  NotebookLink& m_link;
  std::shared_ptr<const app::FindVocabulary> m_vocabulary;
  bool m_isStale = true;
  bool m_isLoading = false;
  std::string m_text;  ///< that the proposals are for
  std::vector<app::Completion> m_completions;
};

}  // namespace vialkeeper::ui
