// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/substance_cards.h"

namespace vialkeeper::app {

Checked<SubstanceRecord> changeSubstanceCard(const Desk&, const SubstanceRecord&,
                                             const SubstanceDraft&) {
  return askedFault("", "this does not work yet", "wait");
}
SubstanceDraft draftOf(const SubstanceRecord& substance) { return {.name = substance.name}; }

}  // namespace vialkeeper::app
