// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/random_plan.h"

#include <fmt/format.h>

#include <random>
#include <vector>

namespace vialkeeper::tests {
namespace {

class PlanWriter {
 public:
  PlanWriter(std::uint64_t seed, int spelling) : m_random(seed), m_spelling(spelling) {}

  std::string write() {
    const double total_mL = between(2.0, 10.0);
    const double limiting_mmol = between(0.05, 1.0);
    const std::size_t solvents = 1 + m_random() % 3;
    const std::size_t others = 1 + m_random() % 6;
    // The solvents' shares differ by less than a factor three, and all stocks and liquids together
    // take a fifth at most.
    m_room_mL = 0.2 * total_mL / static_cast<double>(others + 1) / static_cast<double>(solvents);
    m_solvents = solvents;
    std::string text = "format = \"vialkeeper-plan/1\"\n[reaction]\nlimiting = \"a\"\n[liquid]\n";
    text += m_random() % 2 == 0
                ? line("total", volume(total_mL))
                : line("limiting_concentration", concentration(limiting_mmol / total_mL));
    text += component("a", limiting_mmol, limiting_mmol, total_mL, true);
    for (std::size_t i = 0; i < others; ++i) {
      text += component(fmt::format("c{}", i), limiting_mmol * between(0.01, 2.0), limiting_mmol,
                        total_mL, false);
    }
    constexpr const char* kNames[] = {"acetonitrile", "water", "methanol"};
    for (std::size_t i = 0; i < solvents; ++i) {
      text += fmt::format(
          "[[component]]\nkey = \"s{}\"\nrole = \"solvent\"\nname = \"{}\"\nshare = {}\n", i,
          kNames[i], between(1.0, 3.0));
    }
    return text;
  }

 private:
  double between(double low, double high) {
    return std::uniform_real_distribution<double>(low, high)(m_random);
  }

  static std::string line(const char* field, const std::string& quantity) {
    return fmt::format("{} = \"{}\"\n", field, quantity);
  }

  std::string scaled(double value, const char* small, double factor, const char* large) const {
    return m_spelling == 0 ? fmt::format("{:.17g} {}", value, small)
                           : fmt::format("{:.17g}{}", value / factor, large);
  }
  std::string volume(double mL) const { return scaled(mL * 1e3, "uL", 1e3, "mL"); }
  std::string mass(double mg) const { return scaled(mg, "mg", 1e3, "g"); }
  std::string amount(double mmol) const { return scaled(mmol * 1e3, "umol", 1e3, "mmol"); }
  std::string concentration(double molPerL) const {
    return scaled(molPerL * 1e3, "mM", 1e3, "mol/L");
  }
  std::string density(double gPerML) const { return scaled(gPerML * 1e3, "g/L", 1e3, "g/mL"); }

  std::string component(const std::string& key, double mmol, double limiting_mmol, double total_mL,
                        bool limiting) {
    const double M = between(50.0, 800.0);
    const double assay = between(0.5, 1.0);
    std::string text = fmt::format(
        "[[component]]\nkey = \"{}\"\nrole = \"other\"\nname = \"{}\"\nmolar_mass = \"{:.17g} "
        "g/mol\"\n",
        key, key, M);
    double mg = mmol * M / assay;
    double mL = 0.0;
    const std::size_t supply = m_random() % 4;
    if (supply == 0) {
      text += fmt::format(
          "supply = {{ kind = \"solid\", assay = {:.17g} }}\ndevice = \"balance-0.1mg\"\n", assay);
    } else if (supply == 1) {
      mL = between(0.1, 1.0) * m_room_mL;
      text += fmt::format("supply = {{ kind = \"liquid\", assay = {:.17g}, density = \"{}\" }}\n",
                          assay, density(mg / 1e3 / mL));
      text += m_random() % 2 == 0 ? "device = \"balance-0.1mg\"\n" : "device = \"pipette-100uL\"\n";
    } else if (supply == 2) {
      mL = between(0.1, 1.0) * m_room_mL;
      const std::size_t solvent = m_random() % (m_solvents + 1);  // one of the plan's, or toluene
      text += fmt::format(
          "supply = {{ kind = \"stock\", concentration = \"{}\", solvent = \"{}\" }}\ndevice = "
          "\"pipette-1000uL\"\n",
          concentration(mmol / mL),
          solvent == m_solvents ? "toluene" : fmt::format("s{}", solvent));
    } else {
      text += "supply = { kind = \"gas\", pressure = \"" + scaled(1500.0, "mbar", 1e3, "bar") +
              "\", temperature = \"295 K\" }\n";
      mL = mmol * 8.31446261815324 * 295.0 / 1.5e5 * 1e3;
      mg = mmol * M;
    }
    const bool hasVolume = supply != 0;
    const bool hasMass = supply != 2;
    for (;;) {
      switch (m_random() % 6) {
        case 0:
          return text + line("amount", amount(mmol));
        case 1:
          if (!limiting) return text + fmt::format("equiv = {:.17g}\n", mmol / limiting_mmol);
          break;
        case 2:
          if (!limiting)
            return text + fmt::format("mol_percent = {:.17g}\n", 100.0 * mmol / limiting_mmol);
          break;
        case 3:
          if (!limiting) return text + line("concentration", concentration(mmol / total_mL));
          break;
        case 4:
          if (hasMass) return text + line("mass", mass(mg));
          break;
        default:
          if (hasVolume) return text + line("volume", volume(mL));
          break;
      }
    }
  }

  std::mt19937_64 m_random;
  int m_spelling;
  double m_room_mL = 0.0;
  std::size_t m_solvents = 1;
};

}  // namespace

std::string randomPlanText(std::uint64_t seed, int spelling) {
  return PlanWriter(seed, spelling).write();
}

}  // namespace vialkeeper::tests
