// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "app/notebook/shelf_cards.h"
#include "app/notebook/substance_cards.h"
#include "db/work_desk.h"
#include "support/molfiles.h"

namespace vialkeeper {
namespace {

using tests::good;
using tests::told;
using tests::WorkDesk;

std::string ending(const std::string& items = {}) { return items + "$$$$\n"; }

TEST_CASE("an SD file's records become substances of the shelf", "[app][shelf][regression]") {
  WorkDesk work;
  const std::string file =
      tests::ethanolMolfile() + ending("> <CAS>\n64-17-5\n\n> <SYNONYMS>\nEtOH; spirit\n\n") +
      tests::acetonitrileMolfile() + ending("> <NAME>\nMeCN\n\n> <SYNONYM>\nacetonitrile\n\n") +
      tests::ethanolMolfile() + ending();
  const auto imported = good(app::importSubstancesFromSdf(work.desk(), file, "shelf.sdf"));
  CHECK(imported.added == 2);
  CHECK(imported.known == 1);
  const auto ethanol = good(app::lookUpSubstance(work.notebook(), "EtOH")).same;
  REQUIRE(ethanol.size() == 1);
  CHECK(ethanol.front().name == "ethanol");
  CHECK(ethanol.front().cas == "64-17-5");
  CHECK(ethanol.front().formula == "C2H6O");
  CHECK(ethanol.front().synonyms == std::vector<std::string>{"EtOH", "spirit"});
  CHECK(ethanol.front().inchiKey == "LFQSCWFLJHTTHZ-UHFFFAOYSA-N");
  CHECK(good(app::lookUpSubstance(work.notebook(), "acetonitrile")).same.front().name == "MeCN");
  // Once more: all are there.
  const auto again = good(app::importSubstancesFromSdf(work.desk(), file, "shelf.sdf"));
  CHECK(again.added == 0);
  CHECK(again.known == 3);
  CHECK(tests::findings(work.notebook()).empty());
}

TEST_CASE("all faults of an SD file come with their record, and nothing is written",
          "[app][shelf][regression]") {
  WorkDesk work;
  std::string nameless = tests::ethanolMolfile();
  nameless.erase(0, nameless.find('\n'));
  std::string broken = tests::acetonitrileMolfile();
  broken.replace(broken.find("V30 2 3 2 3"), 11, "V30 2 3 2 9");
  const auto done =
      app::importSubstancesFromSdf(work.desk(),
                                   tests::ethanolMolfile() + ending() + nameless +
                                       ending("> <CAS>\n64-17-6\n\n") + broken + ending(),
                                   "shelf.sdf");
  const std::string lines = told(done);
  INFO(lines);
  CHECK(lines.find("record 2.name: ") != std::string::npos);
  CHECK(lines.find("record 2.cas: ") != std::string::npos);
  CHECK(lines.find("record 3.structure: ") != std::string::npos);
  CHECK(done.error().front().line == 12);
  CHECK(good(work.notebook().substances()).empty());
}

}  // namespace
}  // namespace vialkeeper
