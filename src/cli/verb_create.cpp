// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/desk.h"
#include "cli/json_text.h"
#include "cli/notebook_session.h"
#include "cli/verb.h"
#include "db/sqlite_notebook.h"
#include "text/utf8.h"

namespace vialkeeper::cli {
namespace {

VerbResult runCreate(const std::string& name, const CommonOptions& common) {
  const auto file = bookFile(common);
  if (!file) return std::unexpected(file.error());
  const auto initials = namedPerson(common);
  if (!initials) {
    return std::unexpected(text::Faults{
        usageFault("--person", "nobody is named", "say who keeps the notebook: --person KW")});
  }
  if (!app::areInitials(*initials)) {
    return std::unexpected(text::Faults{
        usageFault("--person", fmt::format("{} are no initials", text::quoted(*initials)),
                   "use 1 to 8 capital letters and digits, such as KW")});
  }
  const auto done = db::makeNotebook(*file, [&](app::Notebook& notebook) {
    const app::Desk desk{notebook, common.around->clock, *initials};
    return notebook.act(desk.action("create"), [&](app::Writing& writing) -> text::Checked<void> {
      const auto n = writing.addPerson({.code = *initials, .name = name});
      if (!n) return std::unexpected(n.error());
      return {};
    });
  });
  if (!done) return std::unexpected(done.error());
  if (common.json)
    return toJsonText(
        {{"file", *file}, {"person", *initials}, {"notices", nlohmann::ordered_json::array()}});
  return fmt::format("{}: a new notebook, kept by {}\n", *file, *initials);
}

}  // namespace

Verb createVerb(CLI::App& program) {
  auto name = std::make_shared<std::string>();
  CLI::App* parser = program.add_subcommand("create", "Make a new notebook file");
  parser->add_option("--name", *name, "the full name behind the initials");
  return {parser, [name](const CommonOptions& common) { return runCreate(*name, common); }};
}

}  // namespace vialkeeper::cli
