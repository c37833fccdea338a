// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/find_runs.h"

#include <fmt/format.h>

#include <memory>
#include <optional>
#include <utility>
#include <vector>

#include "app/notebook/find_language.h"
#include "app/notebook/fold_name.h"
#include "chem/fingerprint.h"
#include "chem/structure.h"
#include "text/text_fault.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

/// Looks substances up in a notebook; a fault of the file is kept until the search is over.
class NotebookResolver final : public SubstanceResolver {
 public:
  explicit NotebookResolver(Notebook& notebook) : m_notebook(notebook) {}

  std::vector<RowNumber> numbersByName(std::string_view folded) override {
    std::vector<RowNumber> numbers;
    for (const SubstanceRecord& substance : kept(m_notebook.substancesByName(folded)))
      numbers.push_back(substance.n);
    return numbers;
  }

  std::vector<RowNumber> numbersByNameBeginning(std::string_view folded) override {
    std::vector<RowNumber> numbers;
    for (const auto& [name, n] : foldedNames()) {
      if (name.starts_with(folded)) numbers.push_back(n);
    }
    return numbers;
  }

  std::vector<RowNumber> numbersByCas(std::string_view cas) override {
    const auto found = m_notebook.substanceByCas(cas);
    if (!found) m_faults = found.error();
    return found && *found ? std::vector{(*found)->n} : std::vector<RowNumber>{};
  }

  std::expected<std::vector<RowNumber>, text::TextFault> numbersBySubstructure(
      std::string_view smiles) override {
    const auto fault = [smiles](const chem::StructureFault& why) {
      return text::textFault(0, smiles.size(), why.what, why.mend);
    };
    const auto engine = chem::structureEngine();
    if (!engine) return fault(engine.error());
    const auto pattern = (*engine)->readPattern(smiles);
    if (!pattern) return fault(pattern.error());
    const std::string bits = (*pattern)->fingerprint();
    std::vector<RowNumber> numbers;
    for (const SubstanceRecord& substance : kept(m_notebook.substances())) {
      const bool candidate =
          !substance.canonicalSmiles.empty() &&
          (substance.fingerprint.empty() || chem::mayContain(substance.fingerprint, bits));
      if (candidate && (*pattern)->isIn(substance.canonicalSmiles)) numbers.push_back(substance.n);
    }
    return numbers;
  }

  std::vector<std::string> names() override {
    std::vector<std::string> list;
    for (const auto& [name, n] : kept(m_notebook.substanceNames())) list.push_back(name);
    return list;
  }

  [[nodiscard]] const text::Faults& faults() const { return m_faults; }

 private:
  template <class T>
  std::vector<T> kept(Checked<std::vector<T>> list) {
    if (list) return *std::move(list);
    m_faults = list.error();
    return {};
  }

  /// Every name and synonym folded, worked out once for all beginnings of a search.
  const std::vector<std::pair<std::string, RowNumber>>& foldedNames() {
    if (m_folded) return *m_folded;
    m_folded = kept(m_notebook.substanceNames());
    for (auto& [name, n] : *m_folded) name = foldName(name);
    return *m_folded;
  }

  Notebook& m_notebook;
  text::Faults m_faults;
  std::optional<std::vector<std::pair<std::string, RowNumber>>> m_folded;
};

std::unexpected<FindRefusal> refused(const text::TextFault& fault, std::string_view text) {
  return std::unexpected(FindRefusal{
      fault,
      {{.field = "query",
        .what = fmt::format("{}: {}", text::quoted(text), whatWithPosition(fault, text)),
        .mend = fault.mend}}});
}

std::unexpected<FindRefusal> refused(text::Faults faults) {
  return std::unexpected(FindRefusal{std::nullopt, std::move(faults)});
}

}  // namespace

std::expected<FindResult, FindRefusal> findRunsPointing(Notebook& notebook, std::string_view text,
                                                        const FindOptions& options,
                                                        bool asYouType) {
  const auto parsed = parseFind(text, {.asYouType = asYouType});
  if (!parsed) return refused(parsed.error(), text);
  NotebookResolver resolver(notebook);
  const auto query = resolveQuery(*parsed, resolver, {.unknownMatchesNothing = asYouType});
  if (!resolver.faults().empty()) return refused(resolver.faults());
  if (!query) return refused(query.error(), text);
  auto found = notebook.find(*query, options);
  if (!found) return refused(std::move(found.error()));
  return *std::move(found);
}

Checked<FindResult> findRuns(Notebook& notebook, std::string_view text, const FindOptions& options,
                             bool asYouType) {
  auto found = findRunsPointing(notebook, text, options, asYouType);
  if (!found) return std::unexpected(std::move(found.error().faults));
  return *std::move(found);
}

}  // namespace vialkeeper::app
