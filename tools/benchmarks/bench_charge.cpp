// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
// Works out the charge of one plan so many times, each time from its text: `bench_charge PLAN
// COUNT`. Prints the sum of the limiting targets, so that nothing can be left out.
#include <cstdlib>
#include <iostream>
#include <string>

#include "app/plan_charge.h"
#include "app/text_files.h"

int main(int argc, char** argv) {
  if (argc != 3) {
    std::cerr << "usage: bench_charge PLAN COUNT\n";
    return 2;
  }
  const std::string file = argv[1];
  const auto text = vialkeeper::app::readFile(file);
  if (!text) {
    std::cerr << vialkeeper::text::toLine(text.error().front()) << '\n';
    return 1;
  }
  double sum_mg = 0.0;
  for (long i = std::atol(argv[2]); i > 0; --i) {
    const auto run = vialkeeper::app::planCharge(*text, file, {});
    if (!run) {
      std::cerr << vialkeeper::text::toLine(run.error().front()) << '\n';
      return 1;
    }
    for (const auto& component : run->charge.components) {
      if (component.targetMass) sum_mg += component.targetMass->milligrams();
    }
  }
  std::cout << sum_mg << '\n';
  return 0;
}
