// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <functional>
#include <memory>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "app/notebook/find_completion.h"
#include "app/notebook/find_query.h"
#include "app/notebook/records.h"
#include "text/fault.h"

/// The port to the notebook file: what use cases ask of storage. Implemented in `db` over SQLite.
/// Every fault is of FaultKind::kNotebook where the file is at fault, kInput where what was asked
/// is.
namespace vialkeeper::app {

using text::Checked;

/// What a user does, for the trail.
struct Action {
  Author author;
  std::string name;  ///< the verb: `log`, `weigh`
  std::string reason = {};
};

/// The writing half, alive within one action.
/// `change…` takes a record with the version that was read; if the notebook holds a newer one, the
/// action fails with a fault that shows both.
class Writing {
 public:
  Writing() = default;
  Writing(const Writing&) = delete;
  Writing& operator=(const Writing&) = delete;
  virtual ~Writing() = default;

  virtual Checked<RowNumber> addPerson(const Person& person) = 0;
  virtual Checked<RowNumber> addSubstance(const SubstanceRecord& substance) = 0;
  virtual Checked<void> changeSubstance(const SubstanceRecord& substance) = 0;
  virtual Checked<RowNumber> addCard(const ShelfCard& card) = 0;
  virtual Checked<void> changeCard(const ShelfCard& card) = 0;
  /// The bytes once: an attachment with the same SHA-256 is used again.
  virtual Checked<RowNumber> addAttachment(std::string_view bytes) = 0;
  /// The next code of this person, `KW-0043`; taken only if the run is added in the same action.
  virtual Checked<std::string> nextRunCode(std::string_view person) = 0;
  virtual Checked<RowNumber> addRun(const RunRecord& run,
                                    std::span<const ComponentRecord> components) = 0;
  virtual Checked<void> changeRun(const RunRecord& run) = 0;
  virtual Checked<void> changeComponent(const ComponentRecord& component) = 0;
  /// A component more of a run that is there already; the record names the run and its position.
  virtual Checked<RowNumber> addComponent(const ComponentRecord& component) = 0;
  /// Takes a component out; the trail keeps it whole.
  virtual Checked<void> removeComponent(const ComponentRecord& component) = 0;
  virtual Checked<RowNumber> addEvent(const EventRecord& event) = 0;
  virtual Checked<std::string> nextDatasetCode() = 0;
  /// `values[c]` are the numbers of column c; all have `record.rows` of them.
  virtual Checked<RowNumber> addDataset(const DatasetRecord& record,
                                        std::span<const std::vector<double>> values) = 0;
  virtual Checked<void> linkDataset(RowNumber run, RowNumber dataset) = 0;
  virtual Checked<RowNumber> addSigningKey(const SigningKey& key) = 0;
  virtual Checked<RowNumber> addSeal(const SealRecord& seal) = 0;
};

/// One thing that `verify` found.
struct Finding {
  std::string where;  ///< `revision 17`, `event 4 of KW-0042`
  std::string what;
};

/// The last link of the chain: what must be known from elsewhere to notice that links were cut off.
struct ChainHead {
  std::int64_t seq = 0;   ///< of the revision; 0 where there is none
  std::string hash = {};  ///< lower-case hexadecimal
};

/// What `verify` compares the chain with, besides looking at the file itself.
struct VerifyRequest {
  std::optional<ChainHead> head = {};  ///< as somebody wrote it down; the hash may be its beginning
  std::string against = {};            ///< an earlier copy of the notebook
};

/// What `verify` looked at and found.
struct VerifyReport {
  std::int64_t revisions = 0;
  std::int64_t records = 0;
  std::int64_t attachments = 0;
  std::int64_t seals = 0;
  ChainHead head = {};
  std::optional<std::int64_t> compared =
      {};                                    ///< revisions of the earlier copy that are in this one
  bool isNewerForm = false;                  ///< the file's form is unknown to this program
  std::vector<std::string> notChecked = {};  ///< what could not be looked at, and why
  std::vector<Finding> findings;
};

/// What a notebook holds, in figures.
struct NotebookSummary {
  std::int64_t runs = 0;
  std::int64_t substances = 0;
  std::int64_t events = 0;
  std::int64_t datasets = 0;
  std::int64_t revisions = 0;
};

class Notebook {
 public:
  Notebook() = default;
  Notebook(const Notebook&) = delete;
  Notebook& operator=(const Notebook&) = delete;
  virtual ~Notebook() = default;

  /// Carries out one action: all of it in one transaction with its revision, or nothing.
  /// `work` may be called with the notebook as it is then; a fault from it rolls everything back.
  virtual Checked<void> act(const Action& action,
                            const std::function<Checked<void>(Writing&)>& work) = 0;

  virtual Checked<std::vector<Person>> people() = 0;
  virtual Checked<std::optional<Person>> findPerson(std::string_view code) = 0;

  virtual Checked<std::vector<SubstanceRecord>> substances() = 0;
  virtual Checked<SubstanceRecord> substance(RowNumber n) = 0;
  virtual Checked<std::optional<SubstanceRecord>> substanceByCas(std::string_view cas) = 0;
  virtual Checked<std::optional<SubstanceRecord>> substanceByStructure(
      std::string_view canonicalSmiles) = 0;
  /// By name or synonym, folded (fold_name.h): there may be several.
  virtual Checked<std::vector<SubstanceRecord>> substancesByName(std::string_view foldedName) = 0;
  /// Every name and synonym with its substance, for near misses and completion.
  virtual Checked<std::vector<std::pair<std::string, RowNumber>>> substanceNames() = 0;

  virtual Checked<std::vector<ShelfCard>> cards(ShelfKind kind) = 0;
  virtual Checked<std::optional<ShelfCard>> findCard(ShelfKind kind, std::string_view name) = 0;

  virtual Checked<std::optional<RunRecord>> findRun(std::string_view code) = 0;
  virtual Checked<RunRecord> run(RowNumber n) = 0;
  virtual Checked<std::vector<ComponentRecord>> components(RowNumber run) = 0;
  /// In the order in which they happened, superseded ones among them.
  virtual Checked<std::vector<EventRecord>> events(RowNumber run) = 0;
  virtual Checked<std::string> attachment(RowNumber n) = 0;
  virtual Checked<std::vector<DatasetRecord>> datasetsOf(RowNumber run) = 0;
  virtual Checked<std::optional<DatasetRecord>> findDataset(std::string_view code) = 0;
  virtual Checked<std::vector<std::vector<double>>> datasetValues(const DatasetRecord& record) = 0;
  virtual Checked<std::vector<RevisionRecord>> history(RowNumber run) = 0;

  virtual Checked<FindResult> find(const FindQuery& query, const FindOptions& options) = 0;

  virtual Checked<std::optional<SigningKey>> signingKey(std::string_view person) = 0;
  virtual Checked<std::vector<SealRecord>> seals(RowNumber run) = 0;
  /// Canonical JSON (RFC 8785) of the run and all it links to, as it is now.
  virtual Checked<std::string> canonicalRun(RowNumber run) = 0;

  virtual Checked<NotebookSummary> summary() = 0;
  /// A number that differs after any change of the file, by whomever. Cheap enough to be asked
  /// every second.
  virtual Checked<std::int64_t> changeMark() = 0;
  /// What the filter line completes from, with how often each is used; not prepared yet.
  virtual Checked<FindVocabulary> vocabulary() = 0;
  /// Makes a search that runs in another thread stop soon, with a fault of code `interrupted` in
  /// its field. The only function that may be called from another thread.
  virtual void interrupt() noexcept = 0;
  /// Fault: the earlier copy cannot be opened.
  virtual Checked<VerifyReport> verify(const VerifyRequest& request) = 0;
  /// A copy that was opened again and checked before it got its name. Fault: the file is there
  /// already.
  virtual Checked<void> backup(const std::string& file) = 0;
  /// Everything, as text and raw files, into a new folder from which importAll makes the same
  /// notebook.
  virtual Checked<void> exportAll(const std::string& folder) = 0;
  /// Fills this notebook, which must be empty, from such a folder.
  virtual Checked<void> importAll(const std::string& folder) = 0;

  /// Fault: the notebook is open for reading only, why, and what would let it be written.
  [[nodiscard]] virtual Checked<void> mayWrite() const = 0;
  /// Why the notebook is open for reading only; empty where it may be written.
  [[nodiscard]] virtual std::string readOnlyReason() const = 0;
};

}  // namespace vialkeeper::app
