// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_people.h"

#include <fmt/format.h>

namespace vialkeeper::app {

Checked<void> addDemoPeople(Notebook& notebook, const units::Moment& at) {
  for (const std::string_view code : kDemoPeople) {
    const auto present = notebook.findPerson(code);
    if (!present) return std::unexpected(present.error());
    if (*present) continue;
    const Person person{.code = std::string(code),
                        .name = fmt::format("{}. {}. (invented)", code[0], code[1])};
    const auto done =
        notebook.act({{person.code, at}, "create"}, [&](Writing& writing) -> Checked<void> {
          const auto n = writing.addPerson(person);
          if (!n) return std::unexpected(n.error());
          return {};
        });
    if (!done) return done;
  }
  return {};
}

}  // namespace vialkeeper::app
