// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/kept_title.h"

#include <fmt/format.h>

#include <algorithm>

#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

bool isLetterOrDigit(char c) {
  return (c >= 'a' && c <= 'z') || (c >= '0' && c <= '9') ||
         (static_cast<unsigned char>(c) >= 0x80);
}

/// Whether the text holds the word by itself, both in lower case; `figure`: behind a figure.
bool holdsWord(std::string_view text, std::string_view word, bool figure) {
  if (word.empty()) return false;
  for (std::size_t at = text.find(word); at != std::string_view::npos;
       at = text.find(word, at + 1)) {
    const std::string_view before = text::trimmed(text.substr(0, at));
    const bool begins = figure ? !before.empty() && before.back() >= '0' && before.back() <= '9'
                               : at == 0 || !isLetterOrDigit(text[at - 1]);
    const std::size_t end = at + word.size();
    if (begins && (end == text.size() || !isLetterOrDigit(text[end]))) return true;
  }
  return false;
}

/// The unit in which a field's value is told, as a title would: `nm` of `455 nm`, `mol%`, `equiv`.
std::string unitOf(const PlanOverride& override) {
  if (override.path.ends_with(".mol_percent")) return "mol%";
  if (override.path.ends_with(".equiv")) return "equiv";
  const std::size_t figures = override.value.find_last_of("0123456789.,");
  if (figures == std::string::npos) return {};
  return text::asciiLowered(text::trimmed(std::string_view(override.value).substr(figures + 1)));
}

/// Whether the title speaks of what was set: of the component by key, role or name, or of a figure
/// in the same unit that is not the new one.
bool speaksOf(const charge::Plan& plan, const PlanOverride& override) {
  const std::string title = text::asciiLowered(plan.title);
  constexpr std::string_view kComponent = "component.";
  if (override.path.starts_with(kComponent)) {
    const std::string_view rest = std::string_view(override.path).substr(kComponent.size());
    const charge::ComponentPlan* component = plan.find(rest.substr(0, rest.find('.')));
    if (component != nullptr) {
      for (const std::string_view word : {std::string_view(component->key), toText(component->role),
                                          std::string_view(component->name)}) {
        if (holdsWord(title, text::asciiLowered(word), false)) return true;
      }
    }
  }
  const std::string unit = unitOf(override);
  const std::string value = text::asciiLowered(override.value);
  return holdsWord(title, unit, true) && title.find(value) == std::string::npos;
}

}  // namespace

void noteKeptTitle(const NewRun& wanted, const charge::Plan& plan, text::Notices& notices) {
  const bool isSet = std::ranges::any_of(
      wanted.overrides, [](const PlanOverride& each) { return each.path == "title"; });
  if (!wanted.title.empty() || isSet) return;
  for (const PlanOverride& override : wanted.overrides) {
    if (!speaksOf(plan, override)) continue;
    notices.push_back({"title-kept",
                       fmt::format("{} is the title of the plan and may speak of another {}: give "
                                   "this run its own with --title",
                                   text::quoted(plan.title), override.path),
                       "title"});
    return;
  }
}

}  // namespace vialkeeper::app
