// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "app/notebook/desk.h"
#include "app/notebook/notebook.h"
#include "text/notice.h"

namespace vialkeeper::app {

/// What a person says of a substance; all but the name may be left out.
struct SubstanceDraft {
  std::string name;
  std::vector<std::string> synonyms = {};
  std::string formula = {};
  std::string smiles = {};
  std::string cas = {};
  std::string molarMass = {};  ///< with its unit, `119.17 g/mol`
  std::vector<std::string> hazards = {};
  std::string note = {};
};

/// Works the draft out: formula, molar mass, canonical structure, InChIKey, fingerprint.
/// Faults, together: no name, a CAS number that fails its check, an unreadable formula or
/// structure, descriptions that disagree.
[[nodiscard]] Checked<SubstanceRecord> describeSubstance(const SubstanceDraft& draft);

/// Which substance of the shelf this is.
struct SubstanceMatch {
  std::vector<SubstanceRecord>
      same;  ///< by structure, else CAS number, else name; several if names clash
  std::vector<std::string>
      nearMisses;  ///< names that look like it, to be offered and never assumed
};

/// Looks for a described substance on the shelf. A name that belongs to a card of another structure
/// or CAS number is no match but a fault: the same name for two things.
[[nodiscard]] Checked<SubstanceMatch> matchSubstance(Notebook& notebook,
                                                     const SubstanceRecord& substance);

/// The notice `near-miss` of a substance that is new on the shelf though a name there looks like
/// it.
[[nodiscard]] std::optional<text::Notice> nearMissNotice(const SubstanceMatch& match,
                                                         std::string_view name, std::string at);

/// The substances that a person may mean by a name, CAS number or synonym.
[[nodiscard]] Checked<SubstanceMatch> lookUpSubstance(Notebook& notebook,
                                                      std::string_view nameOrCas);

/// A substance that was put on the shelf.
struct AddedSubstance {
  SubstanceRecord substance;
  text::Notices notices;  ///< `near-miss`: a name on the shelf that looks like it
};

/// Puts a substance on the shelf. Fault: it is there already.
[[nodiscard]] Checked<AddedSubstance> addSubstanceCard(const Desk& desk,
                                                       const SubstanceDraft& draft);

/// Changes a card as it was read (its version is checked). Faults as describeSubstance's.
[[nodiscard]] Checked<SubstanceRecord> changeSubstanceCard(const Desk& desk,
                                                           const SubstanceRecord& read,
                                                           const SubstanceDraft& draft);

/// The draft from which a card would be described in the same way, for a form.
[[nodiscard]] SubstanceDraft draftOf(const SubstanceRecord& substance);

/// Substances of the shelf for what somebody has typed so far: those whose name, synonym or CAS
/// number begins with it, then those in which a word begins so, then those that hold it; a SMILES
/// finds its structure. At most `most`. Never fails on any text.
[[nodiscard]] Checked<std::vector<SubstanceRecord>> suggestSubstances(Notebook& notebook,
                                                                      std::string_view typed,
                                                                      std::size_t most = 8);

}  // namespace vialkeeper::app
