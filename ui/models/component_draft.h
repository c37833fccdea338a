// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <QStringList>
#include <optional>

#include "app/notebook/records.h"
#include "ui/models/change_reason.h"
#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// A component that is about to be added: a substance of the shelf or a new one, its role and its
/// amount, what that would come to, and adding it.
class ComponentDraft : public QObject {
  Q_OBJECT

 public:
  ComponentDraft(OpenRun& run, ChangeReason& reason, QObject* parent = nullptr);

  /// The roles as plans write them, the usual ones of an addition first.
  [[nodiscard]] static QStringList roles();

  void takeFromShelf(const app::SubstanceRecord& substance);
  /// A substance that is not on the shelf. What was typed is its CAS number or its SMILES if it
  /// reads as one, else its name.
  void startNew(const QString& typed);
  void clear();
  [[nodiscard]] bool isNew() const { return !m_fromShelf.has_value(); }
  [[nodiscard]] bool isEmpty() const {
    return !m_fromShelf && m_name.isEmpty() && m_smiles.isEmpty();
  }

  [[nodiscard]] const QString& name() const { return m_name; }
  [[nodiscard]] const QString& smiles() const { return m_smiles; }
  [[nodiscard]] const QString& formula() const { return m_formula; }
  [[nodiscard]] const QString& cas() const { return m_cas; }
  void describe(const QString& name, const QString& smiles, const QString& formula,
                const QString& cas);
  void setRole(const QString& role);
  [[nodiscard]] const QString& role() const { return m_role; }
  void setAmount(const QString& typed);
  /// What stands for an empty amount.
  [[nodiscard]] QString usualAmount() const;

  /// What it would come to, or why it cannot be added.
  [[nodiscard]] const QString& reading() const { return m_reading; }
  [[nodiscard]] bool isFaulty() const { return m_faulty; }

 public slots:
  void add();

 signals:
  void changed();
  /// It is in the plan now; `key` is its own.
  void added(const QString& key);

 private:
  [[nodiscard]] text::Checked<app::ComponentAddition> addition() const;
  void read();
  void refuse(const QString& sentence);

  OpenRun& m_run;
  ChangeReason& m_reason;
  std::optional<app::SubstanceRecord> m_fromShelf;
  QString m_name;
  QString m_smiles;
  QString m_formula;
  QString m_cas;
  QString m_role = QStringLiteral("additive");
  QString m_amount;
  QString m_reading;
  bool m_faulty = false;
};

}  // namespace vialkeeper::ui
