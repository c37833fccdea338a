// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <utility>
#include <variant>
#include <vector>

#include "charge/devices.h"
#include "units/quantity.h"
#include "units/toml_section.h"

/// A plan as its author gave it: nothing here is computed. Text is kept where people will want to
/// see what was typed; every section remembers its place in the file for later faults.
namespace vialkeeper::charge {

enum class Role {
  kSubstrate,
  kPartner,
  kPhotocatalyst,
  kCocatalyst,
  kAdditive,
  kAcid,
  kBase,
  kOxidant,
  kReductant,
  kQuencher,
  kStandard,
  kProduct,
  kSolvent,
  kGas,
  kOther,
};

/// The role as it is written in a plan: `photocatalyst`.
[[nodiscard]] std::string_view toText(Role role);

/// How an amount is fixed.
enum class Basis { kAmount, kMass, kVolume, kEquiv, kMolPercent, kConcentration, kShare };

/// The basis as its field is called in a plan: `mol_percent`.
[[nodiscard]] std::string_view toText(Basis basis);

/// A basis with its value: coherent SI, or the bare number of equiv, mol% or parts.
struct AmountPlan {
  Basis basis;
  double value;
  std::string asWritten;
};

/// What the author says a substance is. Several descriptions must agree.
struct Identity {
  std::string smiles = {};
  std::string formula = {};
  std::optional<units::MolarMass> molarMass = {};
  units::MolarMass molarMassLastDigit =
      units::MolarMass::fromGramsPerMole(0.0);  ///< one unit of the last digit written
  std::string cas = {};

  [[nodiscard]] bool isEmpty() const { return smiles.empty() && formula.empty() && !molarMass; }
};

/// A weighed solid; assay w/w of the active species.
struct SolidSupply {
  double assay = 1.0;
  std::optional<double> assayUncertainty = {};
  std::optional<units::Density> density = {};  ///< if given, the solid takes up room in the liquid
};

/// A neat liquid, weighed or pipetted.
struct LiquidSupply {
  double assay = 1.0;
  std::optional<double> assayUncertainty = {};
  std::optional<units::Density> density = {};  ///< left out: from the solvent table
  std::optional<units::Density> densityUncertainty = {};
  std::optional<units::Temperature> densityTemperature = {};
};

/// A stock solution: mol/L, or w/w with the density.
struct StockSupply {
  std::optional<units::Concentration> concentration = {};
  std::optional<units::Concentration> concentrationUncertainty = {};
  std::optional<double> massFraction = {};
  std::optional<units::Density> density = {};
  std::string solvent = {};  ///< key or name of a solvent component, or a name of the solvent table
};

/// A gas put in after sealing.
struct GasSupply {
  units::Pressure pressure;  ///< absolute
  units::Temperature temperature;
};

using Supply = std::variant<SolidSupply, LiquidSupply, StockSupply, GasSupply>;

struct ComponentPlan {
  std::string key;
  Role role = Role::kOther;
  std::string name;
  Identity identity;
  AmountPlan amount;
  Supply supply;
  bool supplyGiven = false;  ///< false: the rule of the role chose it
  double perLimiting = 0.0;  ///< moles consumed per mole of limiting component
  std::optional<Device> device;
  std::optional<double> tolerancePercent;
  std::vector<std::string> hazards;
  units::SectionPlace place;

  [[nodiscard]] bool isSolvent() const { return role == Role::kSolvent; }
};

struct ProductPlan {
  std::string key;
  std::string name;
  Identity identity;
  double perLimiting = 1.0;
  units::SectionPlace place;
};

/// A gas that the reaction gives off.
struct EvolvedGas {
  std::string species;  ///< H2 N2 O2 Ar CO2 CO CH4
  double perLimiting = 1.0;
};

struct VialPlan {
  std::string name;
  units::Volume volume;
  units::Volume volumeUncertainty;
  units::Volume displaced;
  std::optional<units::Pressure> ratedGauge;
  double derating;
};

/// How the vial was closed.
struct SealPlan {
  std::vector<std::pair<std::string, double>> atmosphere;  ///< species and mole fraction, sum 1
  std::string atmosphereAsWritten;
  units::Temperature temperature;
  units::Pressure pressure;  ///< absolute
  bool saturated;
  units::Pressure ambient;
};

struct IrradiationPlan {
  std::string lamp = {};
  std::optional<units::Length> wavelength = {};
  std::optional<units::Temperature> temperature = {};
  std::optional<units::Duration> duration = {};
};

/// Measured vapour pressure of the liquid at one temperature.
struct VapourPressurePoint {
  units::Temperature temperature;
  units::Pressure pressure;
};

struct LiquidPlan {
  std::optional<units::Volume> total = {};
  std::optional<units::Concentration> limitingConcentration = {};
  std::vector<VapourPressurePoint> vapourPressure = {};
  std::vector<std::pair<std::string, double>> ostwald = {};  ///< species and coefficient
  bool ostwaldGiven = false;
  units::SectionPlace place = {};
};

/// Standard uncertainties of the gas side.
struct InstrumentsPlan {
  units::Pressure pressure = units::Pressure::fromBar(0.005);
  units::Pressure pressureShared = units::Pressure::fromBar(0.0);
  double temperature_K = 0.5;
};

struct Plan {
  std::string title;
  std::string series;
  std::string code;      ///< the run's code, once it has one
  std::string chemist;   ///< who will weigh it
  std::string date;      ///< ISO day for which it is planned
  std::string limiting;  ///< a component's key
  std::vector<ProductPlan> products;
  std::vector<EvolvedGas> gases;
  std::optional<VialPlan> vial;
  std::optional<SealPlan> seal;
  IrradiationPlan irradiation;
  LiquidPlan liquid;
  InstrumentsPlan instruments;
  std::vector<std::string> additionOrder;  ///< keys; empty: by the rule of the sheet
  int additionOrderLine = 0;
  std::vector<ComponentPlan> components;
  std::string file;
  units::SectionPlace reactionPlace;

  /// The component of that key, or nullptr.
  [[nodiscard]] const ComponentPlan* find(std::string_view key) const;
  /// Its place in `components`; the key must be there.
  [[nodiscard]] std::size_t indexOf(std::string_view key) const;
  [[nodiscard]] const ComponentPlan& limitingComponent() const {
    return components[indexOf(limiting)];
  }
  /// The place of a stock's solvent in `components`, or nothing where it is none of them.
  [[nodiscard]] std::optional<std::size_t> solventOf(const StockSupply& stock) const;
};

}  // namespace vialkeeper::charge
