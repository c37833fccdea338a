// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <map>
#include <vector>

#include "app/notebook/shelf_cards.h"
#include "app/notebook/substance_cards.h"
#include "ui/models/action_history.h"
#include "ui/models/shelf_model.h"

namespace vialkeeper::ui {

/// A card of the shelf as a form: new, or one that is there. Nothing is written before save().
class CardForm : public QObject {
  Q_OBJECT

 public:
  struct Field {
    std::string name;  ///< as the use cases call it: `rated_gauge`
    QString label;
    QString hint;  ///< an example of what to type
    bool required = false;
  };

  CardForm(NotebookLink& link, ShelfCompartment compartment, QObject* parent = nullptr);

  [[nodiscard]] const std::vector<Field>& fields() const { return m_fields; }
  [[nodiscard]] QString text(const std::string& field) const;
  void setText(const std::string& field, const QString& text);
  [[nodiscard]] bool isNew() const { return !m_substance && !m_card; }
  [[nodiscard]] bool isChanged() const { return m_texts != m_saved; }

  void startNew();
  void show(const app::SubstanceRecord& substance);
  void show(const app::ShelfCard& card);
  /// Writes the card as one action. Faults, by field; nothing is written then. A card that somebody
  /// else changed since it was shown is a fault that shows both.
  [[nodiscard]] text::Checked<std::string> save();
  /// Adds the cards of a CSV, or of an SD file of substances; one action.
  [[nodiscard]] text::Checked<app::ShelfImport> importFile(const QString& file,
                                                           const std::string& bytes);

 signals:
  void changed();

 private:
  using Texts = std::map<std::string, QString>;
  [[nodiscard]] text::Checked<std::string> saveSubstance();
  [[nodiscard]] text::Checked<std::string> saveCard();
  void show(Texts texts);

  NotebookLink& m_link;
  ShelfCompartment m_compartment;
  std::vector<Field> m_fields;
  std::optional<app::SubstanceRecord> m_substance;
  std::optional<app::ShelfCard> m_card;
  Texts m_texts;
  Texts m_saved;
};

}  // namespace vialkeeper::ui
