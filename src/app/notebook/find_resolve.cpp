// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <algorithm>
#include <utility>

#include "app/notebook/find_language.h"
#include "app/notebook/fold_name.h"
#include "chem/cas_number.h"
#include "text/utf8.h"
#include "units/toml_section.h"

namespace vialkeeper::app {
namespace {

using text::textFault;
using text::TextFault;

template <class T>
using Reading = std::expected<T, TextFault>;

/// Names that begin with or hold the folded text, shortest first, at most three.
std::vector<std::string> namesThatHold(std::string_view folded,
                                       const std::vector<std::string>& names,
                                       const std::vector<std::string>& foldedNames) {
  std::vector<std::pair<std::size_t, std::size_t>> found;  // rank, index
  for (std::size_t i = 0; i < names.size(); ++i) {
    const std::size_t at = foldedNames[i].find(folded);
    if (at != std::string::npos)
      found.emplace_back((at == 0 ? 0 : 100'000) + foldedNames[i].size(), i);
  }
  const auto last =
      found.begin() + static_cast<std::ptrdiff_t>(std::min<std::size_t>(found.size(), 3));
  std::partial_sort(found.begin(), last, found.end());
  std::vector<std::string> shown;
  for (auto each = found.begin(); each != last; ++each) shown.push_back(names[each->second]);
  return shown;
}

/// `did you mean "pivalic acid" or TFA?`, or how to find the name otherwise.
std::string nearMisses(std::string_view written, SubstanceResolver& resolver) {
  const std::string folded = foldName(written);
  const std::vector<std::string> names = resolver.names();
  std::vector<std::string> foldedNames;
  foldedNames.reserve(names.size());
  for (const std::string& name : names) foldedNames.push_back(foldName(name));
  std::vector<std::string> near;
  if (const auto nearest = units::nearestName(folded, foldedNames)) {
    near.push_back(names[static_cast<std::size_t>(std::ranges::find(foldedNames, *nearest) -
                                                  foldedNames.begin())]);
  }
  if (near.empty() && folded.size() >= 3) near = namesThatHold(folded, names, foldedNames);
  if (near.empty())
    return "write a name, synonym or CAS number that is on the shelf, or search for it as a word";
  std::string list;
  for (std::size_t i = 0; i < near.size(); ++i) {
    if (i > 0) list += i + 1 == near.size() ? " or " : ", ";
    list += asFindValue(near[i]);
  }
  return fmt::format("did you mean {}?", list);
}

class QueryBuilder {
 public:
  QueryBuilder(SubstanceResolver& resolver, const ResolveOptions& options)
      : m_resolver(resolver), m_options(options) {}

  Reading<FindConditions> build(const ParsedConditions& parsed) {
    FindConditions conditions;
    conditions.reserve(parsed.size());
    for (const ParsedCondition& each : parsed) {
      auto condition = std::visit([this](const auto& data) { return make(data); }, each.data);
      if (!condition) return std::unexpected(condition.error());
      conditions.push_back(std::move(*condition));
    }
    return conditions;
  }

 private:
  Reading<FindCondition> make(const WordsCondition& words) { return FindCondition{words}; }
  Reading<FindCondition> make(const TextFieldCondition& field) { return FindCondition{field}; }
  Reading<FindCondition> make(const MeasureCondition& measure) { return FindCondition{measure}; }
  Reading<FindCondition> make(const ParsedAll& all) { return list<AllOf>(all.conditions); }
  Reading<FindCondition> make(const ParsedAny& any) { return list<AnyOf>(any.conditions); }
  Reading<FindCondition> make(const ParsedNot& none) { return list<NoneOf>(none.conditions); }

  template <class List>
  Reading<FindCondition> list(const ParsedConditions& parsed) {
    auto conditions = build(parsed);
    if (!conditions) return std::unexpected(conditions.error());
    return FindCondition{List{std::move(*conditions)}};
  }

  Reading<FindCondition> make(const SubstanceName& name) {
    SubstanceCondition condition{.role = name.role,
                                 .written = name.written,
                                 .substances = {},
                                 .loading_molPercent = name.loading.molPercent,
                                 .concentration_mol_L = name.loading.concentration_mol_L,
                                 .anySubstance = name.written.empty() && name.isPrefix};
    if (condition.anySubstance) return FindCondition{std::move(condition)};
    condition.substances = numbersOf(name);
    if (condition.substances.empty() && !m_options.unknownMatchesNothing) {
      const bool isCas = chem::checkCasNumber(name.written).has_value();
      return textFault(
          name.place.offset, name.place.length,
          fmt::format("no substance of this notebook {} {}{}",
                      isCas ? "has the CAS number" : "is called", text::quoted(name.written),
                      name.isPrefix ? " or begins so" : ""),
          nearMisses(name.written, m_resolver));
    }
    return FindCondition{std::move(condition)};
  }

  Reading<FindCondition> make(const StructurePattern& pattern) {
    auto numbers = m_resolver.numbersBySubstructure(pattern.smiles);
    if (!numbers) {
      TextFault fault = std::move(numbers.error());
      // Within quotation marks the text begins one further on.
      const std::size_t marks = pattern.place.length > pattern.smiles.size() ? 1 : 0;
      fault.offset = std::min(fault.offset + marks, pattern.place.length) + pattern.place.offset;
      fault.length =
          std::min(fault.length, pattern.place.offset + pattern.place.length - fault.offset);
      return std::unexpected(std::move(fault));
    }
    return FindCondition{
        SubstanceCondition{.role = {},
                           .written = pattern.smiles,
                           .substances = std::move(*numbers),
                           .loading_molPercent = pattern.loading.molPercent,
                           .concentration_mol_L = pattern.loading.concentration_mol_L}};
  }

  /// By name; by CAS number if it is one; by the beginning of a name if asked for, or if nobody has
  /// finished typing it and it is no whole name yet.
  std::vector<RowNumber> numbersOf(const SubstanceName& name) {
    const std::string folded = foldName(name.written);
    if (folded.empty()) return {};
    std::vector<RowNumber> numbers = m_resolver.numbersByName(folded);
    if (chem::checkCasNumber(name.written)) append(numbers, m_resolver.numbersByCas(name.written));
    if (name.isPrefix || (!name.isFinished && numbers.empty())) {
      append(numbers, m_resolver.numbersByNameBeginning(folded));
    }
    std::ranges::sort(numbers);
    const auto repeated = std::ranges::unique(numbers);
    numbers.erase(repeated.begin(), repeated.end());
    return numbers;
  }

  static void append(std::vector<RowNumber>& numbers, const std::vector<RowNumber>& more) {
    numbers.insert(numbers.end(), more.begin(), more.end());
  }

  SubstanceResolver& m_resolver;
  ResolveOptions m_options;
};

}  // namespace

std::expected<FindQuery, TextFault> resolveQuery(const ParsedQuery& parsed,
                                                 SubstanceResolver& resolver,
                                                 const ResolveOptions& options) {
  auto conditions = QueryBuilder(resolver, options).build(parsed.conditions);
  if (!conditions) return std::unexpected(conditions.error());
  return FindQuery{std::move(*conditions)};
}

}  // namespace vialkeeper::app
