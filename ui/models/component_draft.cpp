// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/component_draft.h"

#include "app/notebook/substance_cards.h"
#include "chem/cas_number.h"
#include "chem/solvents.h"
#include "ui/models/charge_row.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

const QString kSolvent = QStringLiteral("solvent");

/// The key that a sheet has and the other one has not.
std::string newKey(const app::RunSheet& before, const app::RunSheet& after) {
  for (const charge::ComponentPlan& each : after.planned.plan.components) {
    if (before.planned.plan.find(each.key) == nullptr) return each.key;
  }
  return {};
}

}  // namespace

ComponentDraft::ComponentDraft(OpenRun& run, ChangeReason& reason, QObject* parent)
    : QObject(parent), m_run(run), m_reason(reason) {
  connect(&m_run, &OpenRun::opened, this, &ComponentDraft::clear);
}

QStringList ComponentDraft::roles() {
  using enum charge::Role;
  QStringList names;
  for (const charge::Role role :
       {kAdditive, kAcid, kBase, kPhotocatalyst, kCocatalyst, kPartner, kOxidant, kReductant,
        kQuencher, kStandard, kSolvent, kSubstrate, kProduct, kOther})
    names += toQt(toText(role));
  return names;
}

void ComponentDraft::clear() {
  m_fromShelf.reset();
  for (QString* text : {&m_name, &m_smiles, &m_formula, &m_cas, &m_amount, &m_reading})
    text->clear();
  m_role = roles().front();
  m_faulty = false;
  emit changed();
}

void ComponentDraft::takeFromShelf(const app::SubstanceRecord& substance) {
  clear();
  m_fromShelf = substance;
  m_name = toQt(substance.name);
  m_smiles = toQt(substance.smiles);
  m_formula = toQt(substance.formula);
  m_cas = toQt(substance.cas);
  if (chem::findSolvent(substance.name) != nullptr) m_role = kSolvent;
  read();
}

void ComponentDraft::startNew(const QString& typed) {
  clear();
  const QString text = typed.trimmed();
  // A text that reads as a structure says no name yet; names such as `CO` are rare.
  const auto described = app::describeSubstance({.name = "new", .smiles = toUtf8(text)});
  if (chem::checkCasNumber(toUtf8(text)))
    m_cas = text;
  else if (described && text.size() > 2 && !text.contains(QLatin1Char(' ')))
    m_smiles = text;
  else
    m_name = text;
  read();
}

void ComponentDraft::describe(const QString& name, const QString& smiles, const QString& formula,
                              const QString& cas) {
  if (!isNew()) return;
  m_name = name.trimmed();
  m_smiles = smiles.trimmed();
  m_formula = formula.trimmed();
  m_cas = cas.trimmed();
  read();
}

void ComponentDraft::setRole(const QString& role) {
  m_role = role;
  read();
}

void ComponentDraft::setAmount(const QString& typed) {
  m_amount = typed.trimmed();
  read();
}

QString ComponentDraft::usualAmount() const {
  return m_role == kSolvent ? tr("1 part") : tr("1 equiv");
}

text::Checked<app::ComponentAddition> ComponentDraft::addition() const {
  app::ComponentAddition addition{
      .name = toUtf8(m_name), .role = toUtf8(m_role), .amount = toUtf8(m_amount)};
  if (m_fromShelf) {
    addition.substance = m_fromShelf->n;
    return addition;
  }
  auto described = app::describeSubstance({.name = toUtf8(m_name),
                                           .formula = toUtf8(m_formula),
                                           .smiles = toUtf8(m_smiles),
                                           .cas = toUtf8(m_cas)});
  if (!described) return std::unexpected(described.error());
  addition.description = *std::move(described);
  return addition;
}

/// What it would come to, worked out with every change.
void ComponentDraft::read() {
  m_reading.clear();
  m_faulty = false;
  if (isEmpty() || !m_run.isOpen()) {
    emit changed();
    return;
  }
  const auto wanted = addition();
  if (!wanted) return refuse(sentences(wanted.error(), false));
  const auto sheet = app::previewEdit(m_run.link().notebook(), m_run.run(), {*wanted});
  if (!sheet) return refuse(sentences(sheet.error(), false));
  const std::string key = newKey(m_run.sheet(), *sheet);
  if (!key.empty()) {
    const ChargeRow row = chargeRow(*sheet, sheet->planned.plan.indexOf(key));
    QStringList parts{row.mmol.isEmpty() ? QString() : row.mmol + QStringLiteral(" mmol"),
                      row.ratio, row.target};
    parts.removeAll(QString());
    m_reading = parts.join(QStringLiteral(" · "));
  }
  emit changed();
}

void ComponentDraft::refuse(const QString& sentence) {
  m_reading = sentence;
  m_faulty = true;
  emit changed();
}

void ComponentDraft::add() {
  if (isEmpty()) return;
  if (const QString refusal = m_run.refusal(app::Deed::kChangePlan); !refusal.isEmpty())
    return refuse(refusal);
  const auto wanted = addition();
  if (!wanted) return refuse(sentences(wanted.error(), false));
  const QString what = tr("add %1").arg(m_name);
  if (!m_reason.allows(app::Deed::kChangePlan, what, [this] { add(); }))
    return refuse(tr("Not added yet: say above why the plan is changed."));
  const app::RunSheet before = m_run.sheet();
  const Outcome outcome = m_run.edit(what, {*wanted}, {m_reason.text(), false});
  if (!outcome.faults.empty()) return refuse(sentences(outcome.faults, false));
  if (!outcome.done) return;
  const QString key = toQt(newKey(before, m_run.sheet()));
  clear();
  emit added(key);
}

}  // namespace vialkeeper::ui
