// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/plan_edits.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <optional>

#include "charge/amount_cell.h"
#include "charge/plan_edit.h"
#include "charge/plan_reader.h"
#include "text/utf8.h"
#include "units/toml_section.h"

namespace vialkeeper::app {
namespace {

using charge::Basis;
using charge::PlanField;
using charge::Role;

std::vector<Role> allRoles() {
  std::vector<Role> roles;
  for (int i = 0; i <= static_cast<int>(Role::kOther); ++i) roles.push_back(static_cast<Role>(i));
  return roles;
}

std::string listed(const std::vector<std::string>& codes) {
  std::vector<std::string> quoted;
  for (const std::string& code : codes) quoted.push_back(fmt::format("\"{}\"", code));
  return fmt::format("[{}]", fmt::join(quoted, ", "));
}

class TextEditor {
 public:
  TextEditor(Notebook& notebook, std::string planText, std::string file)
      : m_notebook(notebook), m_file(std::move(file)) {
    m_edited.text = std::move(planText);
    readAgain();
  }

  Checked<void> operator()(const PlanOverride& edit) {
    take(charge::withField(m_edited.text, edit.path, edit.value));
    return {};
  }

  Checked<void> operator()(const AmountEdit& edit) {
    const charge::ComponentPlan* component = m_plan ? m_plan->find(edit.key) : nullptr;
    if (component == nullptr) {
      noComponent(edit.key);
      return {};
    }
    m_edited.amountKeys.push_back(edit.key);
    const auto cell = charge::readAmountCell(edit.typed, component->role, component->amount.basis);
    if (!cell) {
      amountFault(edit.key, edit.typed, cell.error());
      return {};
    }
    take(charge::withField(m_edited.text, fmt::format("component.{}.{}", edit.key, cell->field),
                           cell->value));
    return {};
  }

  Checked<void> operator()(const ComponentAddition& edit) {
    SubstanceRecord substance = edit.description;
    if (edit.substance != 0) {
      auto card = m_notebook.substance(edit.substance);
      if (!card) return std::unexpected(card.error());
      substance = *std::move(card);
    }
    const std::string name(
        text::trimmed(edit.name.empty() ? std::string_view(substance.name) : edit.name));
    const std::string key = charge::freeKey(name, keys());
    const std::string path = "component." + key;
    text::Faults faults;
    if (name.empty())
      faults.push_back({.field = path + ".name",
                        .what = "the component has no name",
                        .mend = "give the name you call it by"});
    const auto role = roleOf(edit.role, path, faults);
    if (!edit.supply.empty() && edit.supply != "solid" && edit.supply != "liquid")
      faults.push_back({.field = path + ".supply",
                        .what = fmt::format("{} is no supply here", text::quoted(edit.supply)),
                        .mend = "choose solid or liquid, or edit the plan's text"});
    std::optional<charge::AmountCell> amount;
    if (role) amount = addedAmount(edit.amount, *role, key, faults);
    if (!faults.empty()) {
      tell(std::move(faults));
      return {};
    }
    std::vector<PlanField> fields{{"role", std::string(toText(*role))}, {"name", name}};
    describe(substance, fields);
    fields.push_back({amount->field, amount->value});
    if (!edit.supply.empty())
      fields.push_back({"supply", fmt::format("{{ kind = \"{}\" }}", edit.supply)});
    if (!substance.hazards.empty()) fields.push_back({"hazards", listed(substance.hazards)});
    if (take(charge::withComponent(m_edited.text, key, fields))) {
      m_edited.amountKeys.push_back(key);
      if (edit.substance != 0) m_edited.cards[key] = edit.substance;
    }
    return {};
  }

  Checked<void> operator()(const ComponentRemoval& edit) {
    if (m_plan && m_plan->find(edit.key) == nullptr) {
      noComponent(edit.key);
    } else if (take(charge::withoutComponent(m_edited.text, edit.key))) {
      m_edited.cards.erase(edit.key);
    }
    return {};
  }

  Checked<void> operator()(const WholePlan& edit) {
    m_edited.text = edit.text;
    m_edited.cards.clear();
    readAgain();
    return {};
  }

  EditedText result() { return std::move(m_edited); }

 private:
  /// The plan as it is now, for roles and bases; the one before where an edit has broken it.
  void readAgain() {
    if (auto plan = charge::readPlan(m_edited.text, m_file)) m_plan = *std::move(plan);
  }

  bool take(Checked<std::string> edited) {
    if (!edited) {
      tell(std::move(edited.error()));
      return false;
    }
    m_edited.text = *std::move(edited);
    readAgain();
    return true;
  }

  void tell(text::Faults faults) {
    for (text::Fault& fault : faults) {
      if (fault.file == "plan") fault.file = m_file;
      m_edited.faults.push_back(std::move(fault));
    }
  }

  [[nodiscard]] std::vector<std::string> keys() const {
    std::vector<std::string> list;
    if (!m_plan) return list;
    for (const charge::ComponentPlan& component : m_plan->components) list.push_back(component.key);
    for (const charge::ProductPlan& product : m_plan->products) list.push_back(product.key);
    return list;
  }

  void noComponent(const std::string& key) {
    const auto nearest = units::nearestName(key, keys());
    tell({{.field = "component." + key,
           .what = fmt::format("the run has no component {}", text::quoted(key)),
           .mend = nearest ? fmt::format("did you mean {}?", *nearest)
                           : fmt::format("its keys are {}", fmt::join(keys(), ", "))}});
  }

  static text::Fault amountFaultOf(const std::string& key, const std::string& typed,
                                   const text::TextFault& fault) {
    return {.field = fmt::format("component.{}.amount", key),
            .what = fmt::format("{}: {}", text::quoted(typed), whatWithPosition(fault, typed)),
            .mend = fault.mend};
  }
  void amountFault(const std::string& key, const std::string& typed, const text::TextFault& fault) {
    m_edited.faults.push_back(amountFaultOf(key, typed, fault));
  }

  static std::optional<Role> roleOf(const std::string& written, const std::string& path,
                                    text::Faults& faults) {
    if (written.empty()) return Role::kAdditive;
    std::vector<std::string> names;
    for (const Role role : allRoles()) {
      if (toText(role) == written) return role;
      names.emplace_back(toText(role));
    }
    const auto nearest = units::nearestName(written, names);
    faults.push_back({.field = path + ".role",
                      .what = fmt::format("{} is no role", text::quoted(written)),
                      .mend = nearest ? fmt::format("did you mean {}?", *nearest)
                                      : fmt::format("choose among {}", fmt::join(names, ", "))});
    return std::nullopt;
  }

  static std::optional<charge::AmountCell> addedAmount(const std::string& typed, Role role,
                                                       const std::string& key,
                                                       text::Faults& faults) {
    const bool solvent = role == Role::kSolvent;
    const std::string amount = !typed.empty() ? typed : solvent ? "1 part" : "1 equiv";
    auto cell = charge::readAmountCell(amount, role, solvent ? Basis::kShare : Basis::kEquiv);
    if (cell) return *std::move(cell);
    faults.push_back(amountFaultOf(key, amount, cell.error()));
    return std::nullopt;
  }

  /// A structure says the formula too; the molar mass is worked out where either is known.
  static void describe(const SubstanceRecord& substance, std::vector<PlanField>& fields) {
    if (!substance.smiles.empty())
      fields.push_back({"smiles", substance.smiles});
    else if (!substance.formula.empty())
      fields.push_back({"formula", substance.formula});
    else if (substance.molarMass_g_mol)
      fields.push_back({"molar_mass", fmt::format("{:.6g} g/mol", *substance.molarMass_g_mol)});
    if (!substance.cas.empty()) fields.push_back({"cas", substance.cas});
  }

  Notebook& m_notebook;
  std::string m_file;
  EditedText m_edited;
  std::optional<charge::Plan> m_plan;
};

}  // namespace

Checked<EditedText> editPlanText(Notebook& notebook, std::string planText, const std::string& file,
                                 const std::vector<PlanEdit>& edits) {
  TextEditor editor(notebook, std::move(planText), file);
  for (const PlanEdit& edit : edits) {
    if (const auto done = std::visit(editor, edit); !done) return std::unexpected(done.error());
  }
  return editor.result();
}

void nameAmountCell(text::Fault& fault, const std::vector<std::string>& amountKeys) {
  for (const std::string& key : amountKeys) {
    for (int i = 0; i <= static_cast<int>(Basis::kShare); ++i) {
      if (fault.field == fmt::format("component.{}.{}", key, toText(static_cast<Basis>(i)))) {
        fault.field = fmt::format("component.{}.amount", key);
        return;
      }
    }
  }
}

}  // namespace vialkeeper::app
