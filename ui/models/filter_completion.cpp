// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/filter_completion.h"

#include "ui/models/background.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

/// A name that is wholly written already needs no proposal.
bool saysNothingNew(const std::string& text, const app::Completion& completion) {
  const std::string written = text.substr(completion.replace.offset, completion.replace.length);
  return completion.insert == written + " " || completion.insert == written;
}

bool isAsked(const std::string& text, std::size_t cursor, const app::Completion& completion) {
  return completion.replace.length > 0 || (cursor > 0 && text[cursor - 1] == ':');
}

}  // namespace

FilterCompletion::FilterCompletion(NotebookLink& link, QObject* parent)
    : QAbstractListModel(parent), m_link(link) {
  connect(&m_link, &NotebookLink::changed, this, [this] { m_isStale = true; });
  load();
}

int FilterCompletion::rowCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_completions.size());
}

QVariant FilterCompletion::data(const QModelIndex& index, int role) const {
  if (!checkIndex(index, CheckIndexOption::IndexIsValid)) return {};
  const app::Completion& completion = m_completions[static_cast<std::size_t>(index.row())];
  if (role == Qt::DisplayRole || role == Qt::AccessibleTextRole) return toQt(completion.label);
  return {};
}

void FilterCompletion::load() {
  if (m_isLoading) return;
  m_isLoading = true;
  m_isStale = false;
  inBackground(
      this,
      [files = &m_link.workplace().files,
       file = toUtf8(m_link.file())]() -> std::shared_ptr<const app::FindVocabulary> {
        auto notebook = files->open(file, NotebookFiles::Use::kReading);
        if (!notebook) return nullptr;
        auto vocabulary = (*notebook)->vocabulary();
        if (!vocabulary) return nullptr;
        app::prepareVocabulary(*vocabulary);
        return std::make_shared<const app::FindVocabulary>(*std::move(vocabulary));
      },
      [this](std::shared_ptr<const app::FindVocabulary> vocabulary) {
        m_isLoading = false;
        if (!vocabulary) {
          m_isStale = true;
          return;
        }
        m_vocabulary = std::move(vocabulary);
        emit loaded();
      });
}

void FilterCompletion::complete(const QString& text, qsizetype cursor, bool all) {
  if (m_isStale) load();
  static const app::FindVocabulary kNothing;
  m_text = toUtf8(text);
  const std::size_t at = toUtf8(text.left(cursor)).size();
  auto completions = app::completeFind(m_text, at, m_vocabulary ? *m_vocabulary : kNothing);
  std::erase_if(completions, [&](const app::Completion& each) {
    return saysNothingNew(m_text, each) || !(all || isAsked(m_text, at, each));
  });
  fill(std::move(completions));
}

void FilterCompletion::clear() { fill({}); }

void FilterCompletion::fill(std::vector<app::Completion> completions) {
  beginResetModel();
  m_completions = std::move(completions);
  endResetModel();
}

FilterCompletion::Taken FilterCompletion::taken(int row) const {
  const app::Completion& completion = m_completions.at(static_cast<std::size_t>(row));
  const std::string before = m_text.substr(0, completion.replace.offset) + completion.insert;
  std::string behind = m_text.substr(completion.replace.offset + completion.replace.length);
  // A value brings its blank with it.
  if (completion.insert.ends_with(' ') && behind.starts_with(' ')) behind.erase(0, 1);
  return {toQt(before + behind), toQt(before).size()};
}

}  // namespace vialkeeper::ui
