// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <chrono>
#include <compare>

/// Quantities as types. Inside every one is the coherent SI value; it is made by a named unit and
/// read by a unit, so that a volume cannot stand for an amount, nor a Celsius for a kelvin.
/// Inside a formula, in arrays and in columns plain doubles with the unit in their name are used.
namespace vialkeeper::units {

/// What a text with a unit measures. The ratios are for people's texts only.
enum class Kind {
  kMass,
  kAmount,
  kVolume,
  kPressure,
  kTemperature,
  kConcentration,
  kDensity,
  kDuration,
  kLength,
  kMolarMass,
  kSecondOrderRate,
  kMolarAbsorptivity,
  kPower,
  kIrradiance,
  kEquivalents,
  kMolPercent,
  kParts,
  kPercent,
};

/// Base of the quantities: comparison, sums and scaling within one kind, ratio as a plain number.
/// Multiplication by a power of ten, not by its reciprocal, reads a unit: one rounding, so that
/// `0.2 mmol` reads back as 0.2.
template <class Self, Kind kindOfSelf>
class ScalarQuantity {
 public:
  static constexpr Kind kKind = kindOfSelf;

  /// From the coherent SI unit; for code that reads a unit table, not for formulas.
  [[nodiscard]] static constexpr Self fromSi(double value) {
    Self quantity;
    quantity.m_si = value;
    return quantity;
  }
  [[nodiscard]] constexpr double si() const { return m_si; }

  [[nodiscard]] friend constexpr auto operator<=>(const Self& a, const Self& b) {
    return a.m_si <=> b.m_si;
  }
  [[nodiscard]] friend constexpr bool operator==(const Self& a, const Self& b) {
    return a.m_si == b.m_si;
  }
  [[nodiscard]] friend constexpr Self operator+(const Self& a, const Self& b) {
    return fromSi(a.m_si + b.m_si);
  }
  [[nodiscard]] friend constexpr Self operator-(const Self& a, const Self& b) {
    return fromSi(a.m_si - b.m_si);
  }
  [[nodiscard]] friend constexpr Self operator*(double factor, const Self& a) {
    return fromSi(factor * a.m_si);
  }
  [[nodiscard]] friend constexpr double operator/(const Self& a, const Self& b) {
    return a.m_si / b.m_si;
  }

 protected:
  constexpr ScalarQuantity() = default;
  double m_si = 0.0;
};

/// Mass [kg].
class Mass : public ScalarQuantity<Mass, Kind::kMass> {
 public:
  [[nodiscard]] static constexpr Mass fromGrams(double g) { return fromSi(g / 1e3); }
  [[nodiscard]] static constexpr Mass fromMilligrams(double mg) { return fromSi(mg / 1e6); }
  [[nodiscard]] constexpr double grams() const { return m_si * 1e3; }
  [[nodiscard]] constexpr double milligrams() const { return m_si * 1e6; }

 private:
  friend class ScalarQuantity<Mass, Kind::kMass>;
  constexpr Mass() = default;
};

/// Amount of substance [mol].
class Amount : public ScalarQuantity<Amount, Kind::kAmount> {
 public:
  [[nodiscard]] static constexpr Amount fromMoles(double mol) { return fromSi(mol); }
  [[nodiscard]] static constexpr Amount fromMillimoles(double mmol) { return fromSi(mmol / 1e3); }
  [[nodiscard]] constexpr double moles() const { return m_si; }
  [[nodiscard]] constexpr double millimoles() const { return m_si * 1e3; }

 private:
  friend class ScalarQuantity<Amount, Kind::kAmount>;
  constexpr Amount() = default;
};

/// Volume [m3].
class Volume : public ScalarQuantity<Volume, Kind::kVolume> {
 public:
  [[nodiscard]] static constexpr Volume fromMillilitres(double mL) { return fromSi(mL / 1e6); }
  [[nodiscard]] static constexpr Volume fromMicrolitres(double uL) { return fromSi(uL / 1e9); }
  [[nodiscard]] constexpr double litres() const { return m_si * 1e3; }
  [[nodiscard]] constexpr double millilitres() const { return m_si * 1e6; }
  [[nodiscard]] constexpr double microlitres() const { return m_si * 1e9; }

 private:
  friend class ScalarQuantity<Volume, Kind::kVolume>;
  constexpr Volume() = default;
};

/// Pressure [Pa], absolute or gauge as the name of the variable says.
class Pressure : public ScalarQuantity<Pressure, Kind::kPressure> {
 public:
  [[nodiscard]] static constexpr Pressure fromPascals(double Pa) { return fromSi(Pa); }
  [[nodiscard]] static constexpr Pressure fromKilopascals(double kPa) { return fromSi(kPa * 1e3); }
  [[nodiscard]] static constexpr Pressure fromBar(double bar) { return fromSi(bar * 1e5); }
  [[nodiscard]] constexpr double pascals() const { return m_si; }
  [[nodiscard]] constexpr double bar() const { return m_si / 1e5; }

 private:
  friend class ScalarQuantity<Pressure, Kind::kPressure>;
  constexpr Pressure() = default;
};

/// Thermodynamic temperature [K]. Differences are plain kelvins in a double.
class Temperature : public ScalarQuantity<Temperature, Kind::kTemperature> {
 public:
  [[nodiscard]] static constexpr Temperature fromKelvin(double K) { return fromSi(K); }
  [[nodiscard]] static constexpr Temperature fromCelsius(double degC) {
    return fromSi(degC + 273.15);
  }
  [[nodiscard]] constexpr double kelvin() const { return m_si; }
  [[nodiscard]] constexpr double celsius() const { return m_si - 273.15; }

 private:
  friend class ScalarQuantity<Temperature, Kind::kTemperature>;
  constexpr Temperature() = default;
};

/// Amount-of-substance concentration [mol/m3].
class Concentration : public ScalarQuantity<Concentration, Kind::kConcentration> {
 public:
  [[nodiscard]] static constexpr Concentration fromMolPerLitre(double molPerL) {
    return fromSi(molPerL * 1e3);
  }
  [[nodiscard]] constexpr double molPerLitre() const { return m_si / 1e3; }
  [[nodiscard]] constexpr double millimolPerLitre() const { return m_si; }

 private:
  friend class ScalarQuantity<Concentration, Kind::kConcentration>;
  constexpr Concentration() = default;
};

/// Mass density [kg/m3].
class Density : public ScalarQuantity<Density, Kind::kDensity> {
 public:
  [[nodiscard]] static constexpr Density fromGramsPerMillilitre(double gPerML) {
    return fromSi(gPerML * 1e3);
  }
  [[nodiscard]] constexpr double gramsPerMillilitre() const { return m_si / 1e3; }

 private:
  friend class ScalarQuantity<Density, Kind::kDensity>;
  constexpr Density() = default;
};

/// Molar mass [kg/mol].
class MolarMass : public ScalarQuantity<MolarMass, Kind::kMolarMass> {
 public:
  [[nodiscard]] static constexpr MolarMass fromGramsPerMole(double gPerMol) {
    return fromSi(gPerMol / 1e3);
  }
  [[nodiscard]] constexpr double gramsPerMole() const { return m_si * 1e3; }

 private:
  friend class ScalarQuantity<MolarMass, Kind::kMolarMass>;
  constexpr MolarMass() = default;
};

/// Length [m], of a wavelength or a light path.
class Length : public ScalarQuantity<Length, Kind::kLength> {
 public:
  [[nodiscard]] static constexpr Length fromNanometres(double nm) { return fromSi(nm / 1e9); }
  [[nodiscard]] constexpr double nanometres() const { return m_si * 1e9; }

 private:
  friend class ScalarQuantity<Length, Kind::kLength>;
  constexpr Length() = default;
};

/// Time span [s].
class Duration : public ScalarQuantity<Duration, Kind::kDuration> {
 public:
  [[nodiscard]] static constexpr Duration fromSeconds(double s) { return fromSi(s); }
  [[nodiscard]] static constexpr Duration fromHours(double h) { return fromSi(h * 3600.0); }
  [[nodiscard]] static constexpr Duration fromChrono(std::chrono::duration<double> span) {
    return fromSi(span.count());
  }
  [[nodiscard]] constexpr double seconds() const { return m_si; }
  [[nodiscard]] constexpr double hours() const { return m_si / 3600.0; }

 private:
  friend class ScalarQuantity<Duration, Kind::kDuration>;
  constexpr Duration() = default;
};

// The products of the trade; nothing more general is needed.
[[nodiscard]] constexpr Concentration operator/(Amount n, Volume V) {
  return Concentration::fromSi(n.si() / V.si());
}
[[nodiscard]] constexpr Amount operator*(Concentration c, Volume V) {
  return Amount::fromSi(c.si() * V.si());
}
[[nodiscard]] constexpr Volume operator/(Amount n, Concentration c) {
  return Volume::fromSi(n.si() / c.si());
}
[[nodiscard]] constexpr Mass operator*(Amount n, MolarMass M) {
  return Mass::fromSi(n.si() * M.si());
}
[[nodiscard]] constexpr Amount operator/(Mass m, MolarMass M) {
  return Amount::fromSi(m.si() / M.si());
}
[[nodiscard]] constexpr Mass operator*(Density rho, Volume V) {
  return Mass::fromSi(rho.si() * V.si());
}
[[nodiscard]] constexpr Volume operator/(Mass m, Density rho) {
  return Volume::fromSi(m.si() / rho.si());
}

}  // namespace vialkeeper::units
