// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/notebook_bench.h"

#include <catch2/catch.hpp>
#include <optional>
#include <sstream>

#include "cli/command_line.h"
#include "cli/surroundings.h"

namespace vialkeeper::tests {

Book::Book() : m_file(m_folder.path("book.vialbook")) {
  REQUIRE(verb({"create"}).status == 0);
  REQUIRE(verb({"add", m_folder.write("plan.toml", soundPlan())}).status == 0);
}

Ran Book::verb(const std::vector<std::string>& arguments) { return verbAs("KW", arguments); }

Ran Book::verbAs(const std::string& person, const std::vector<std::string>& arguments) {
  return verbWithInput(person, arguments, "");
}

Ran Book::verbWithInput(const std::string& person, const std::vector<std::string>& arguments,
                        const std::string& input) {
  std::vector<std::string> all{"--book", m_file};
  if (!person.empty()) all.insert(all.end(), {"--person", person});
  all.insert(all.end(), arguments.begin(), arguments.end());
  std::istringstream in(input);
  cli::Surroundings around{
      m_clock, [](const std::string&) -> std::optional<std::string> { return std::nullopt; }, in};
  std::ostringstream out;
  std::ostringstream err;
  const int status = cli::run(all, out, err, around);
  return {status, out.str(), err.str()};
}

}  // namespace vialkeeper::tests
