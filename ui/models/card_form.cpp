// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/card_form.h"

#include <QStringList>

#include "app/notebook/shelf_fields.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

QString hintFor(const app::ShelfField& field) {
  if (field.type == app::ShelfField::Type::kQuantity)
    return CardForm::tr("a number and its unit, such as %1").arg(toQt(field.shownUnit));
  if (field.type == app::ShelfField::Type::kNumber) return CardForm::tr("a number");
  return {};
}

std::vector<CardForm::Field> substanceFields() {
  return {{"name", CardForm::tr("name"), {}, true},
          {"synonyms", CardForm::tr("also called"), CardForm::tr("separated by semicolons")},
          {"cas", CardForm::tr("CAS number"), {}},
          {"smiles", CardForm::tr("SMILES"), {}},
          {"formula", CardForm::tr("formula"), CardForm::tr("such as C8H9N or NiCl2*6H2O")},
          {"molar_mass", CardForm::tr("molar mass"), CardForm::tr("such as 119.17 g/mol")},
          {"hazards", CardForm::tr("hazard codes"), CardForm::tr("such as H225 H319")},
          {"note", CardForm::tr("note"), {}}};
}

std::vector<CardForm::Field> cardFields(app::ShelfKind kind) {
  const app::ShelfKindInfo& info = app::shelfKind(kind);
  std::vector<CardForm::Field> fields{{"name", CardForm::tr("name"), {}, true}};
  if (info.ofSubstance)
    fields.push_back({"substance", CardForm::tr("substance"),
                      CardForm::tr("a name or CAS number of the shelf"), true});
  for (const app::ShelfField& field : info.fields) {
    QString label = toQt(field.name);
    label.replace(QLatin1Char('_'), QLatin1Char(' '));
    fields.push_back({std::string(field.name), label, hintFor(field), field.required});
  }
  return fields;
}

std::vector<std::string> parts(const QString& text, QChar separator) {
  std::vector<std::string> all;
  for (const QString& part : text.split(separator, Qt::SkipEmptyParts))
    if (!part.trimmed().isEmpty()) all.push_back(toUtf8(part.trimmed()));
  return all;
}

QString joined(const std::vector<std::string>& texts, const QString& separator) {
  QStringList all;
  for (const std::string& each : texts) all += toQt(each);
  return all.join(separator);
}

}  // namespace

CardForm::CardForm(NotebookLink& link, ShelfCompartment compartment, QObject* parent)
    : QObject(parent),
      m_link(link),
      m_compartment(std::move(compartment)),
      m_fields(m_compartment.kind ? cardFields(*m_compartment.kind) : substanceFields()) {}

QString CardForm::text(const std::string& field) const {
  const auto found = m_texts.find(field);
  return found == m_texts.end() ? QString() : found->second;
}

void CardForm::setText(const std::string& field, const QString& text) {
  if (text.isEmpty())
    m_texts.erase(field);
  else
    m_texts[field] = text;
}

void CardForm::show(Texts texts) {
  std::erase_if(texts, [](const auto& each) { return each.second.isEmpty(); });
  m_texts = std::move(texts);
  m_saved = m_texts;
  emit changed();
}

void CardForm::startNew() {
  m_substance.reset();
  m_card.reset();
  show(Texts{});
}

void CardForm::show(const app::SubstanceRecord& substance) {
  m_card.reset();
  m_substance = substance;
  const app::SubstanceDraft draft = app::draftOf(substance);
  show(Texts{{"name", toQt(draft.name)},
             {"synonyms", joined(draft.synonyms, QStringLiteral("; "))},
             {"cas", toQt(draft.cas)},
             {"smiles", toQt(draft.smiles)},
             {"formula", toQt(draft.formula)},
             {"molar_mass", toQt(draft.molarMass)},
             {"hazards", joined(draft.hazards, QStringLiteral(" "))},
             {"note", toQt(draft.note)}});
}

void CardForm::show(const app::ShelfCard& card) {
  m_substance.reset();
  m_card = card;
  Texts texts{{"name", toQt(card.name)}};
  for (const auto& [name, value] : app::typedFields(m_link.notebook(), card))
    texts[name] = toQt(value);
  show(std::move(texts));
}

text::Checked<std::string> CardForm::saveSubstance() {
  const auto of = [this](const char* field) { return toUtf8(text(field).trimmed()); };
  const app::SubstanceDraft draft{.name = of("name"),
                                  .synonyms = parts(text("synonyms"), QLatin1Char(';')),
                                  .formula = of("formula"),
                                  .smiles = of("smiles"),
                                  .cas = of("cas"),
                                  .molarMass = of("molar_mass"),
                                  .hazards = parts(text("hazards"), QLatin1Char(' ')),
                                  .note = of("note")};
  if (m_substance) {
    const auto changed = app::changeSubstanceCard(m_link.desk(), *m_substance, draft);
    if (!changed) return std::unexpected(changed.error());
    show(*changed);
    return changed->name;
  }
  const auto added = app::addSubstanceCard(m_link.desk(), draft);
  if (!added) return std::unexpected(added.error());
  show(added->substance);
  return added->substance.name;
}

text::Checked<std::string> CardForm::saveCard() {
  app::TypedFields typed;
  for (const Field& field : m_fields)
    if (field.name != "name" && !text(field.name).trimmed().isEmpty())
      typed.emplace_back(field.name, toUtf8(text(field.name).trimmed()));
  const std::string name = toUtf8(text("name").trimmed());
  const auto saved =
      m_card ? app::changeShelfCard(m_link.desk(), *m_card, name, typed)
             : app::addShelfCard(m_link.desk(), *m_compartment.kind, name, typed);
  if (!saved) return std::unexpected(saved.error());
  show(*saved);
  return saved->name;
}

text::Checked<std::string> CardForm::save() {
  auto saved = m_compartment.kind ? saveCard() : saveSubstance();
  m_link.lookForChanges();
  return saved;
}

text::Checked<app::ShelfImport> CardForm::importFile(const QString& file,
                                                     const std::string& bytes) {
  const bool structures = file.endsWith(QStringLiteral(".sdf"), Qt::CaseInsensitive) ||
                          file.endsWith(QStringLiteral(".sd"), Qt::CaseInsensitive);
  auto imported =
      structures && !m_compartment.kind
          ? app::importSubstancesFromSdf(m_link.desk(), bytes, toUtf8(file))
          : app::importShelf(m_link.desk(), toUtf8(m_compartment.word), bytes, toUtf8(file));
  m_link.lookForChanges();
  return imported;
}

}  // namespace vialkeeper::ui
