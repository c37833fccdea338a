// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <optional>
#include <span>
#include <vector>

namespace vialkeeper::stats {

/// A cause of doubt: one reading, one pipette stroke, one molar mass. Causes are independent of
/// each other; what shares a cause is correlated through it.
class Cause {
 public:
  /// A cause whose standard uncertainty nobody stated.
  [[nodiscard]] bool isUnknown() const { return m_unknown; }
  auto operator<=>(const Cause&) const = default;

 private:
  friend class Causes;
  Cause(std::uint32_t number, bool unknown) : m_number(number), m_unknown(unknown) {}
  std::uint32_t m_number;
  bool m_unknown;
};

/// Hands out causes that are distinct within one calculation.
class Causes {
 public:
  [[nodiscard]] Cause add() { return {m_next++, false}; }
  [[nodiscard]] Cause addUnknown() { return {m_next++, true}; }

 private:
  std::uint32_t m_next = 0;
};

/// A number with its doubt, carried through a calculation by linear propagation.
///
/// Each value keeps its signed first-order share of every cause, \f$ (\partial f/\partial x_i) u_i
/// \f$, so that a cause that enters twice is added before it is squared: a ratio of a quantity to
/// itself has no doubt, and two results of one balance reading are correlated as they must be.
/// Model: JCGM 100:2008 (GUM), 5.1.2 and, through shared causes, 5.2.2.
/// Valid where the model is close to linear over ±2u; the caller knows where it is not.
class Uncertain {
 public:
  /// A number without doubt.
  // NOLINTNEXTLINE(google-explicit-constructor): exact numbers appear all over formulas
  Uncertain(double value) : m_value(value) {}

  /// A number whose standard uncertainty `u` has one cause.
  Uncertain(double value, double u, Cause cause);

  /// A number whose uncertainty was not stated: what is computed from it has none to show.
  [[nodiscard]] static Uncertain unstated(double value, Cause unknownCause);

  [[nodiscard]] double value() const { return m_value; }

  /// Combined standard uncertainty, in the unit of the value; nothing where a cause that matters
  /// is unknown.
  [[nodiscard]] std::optional<double> standardUncertainty() const;

  /// The value with the contribution of one more cause.
  [[nodiscard]] Uncertain withCause(double u, Cause cause) const;

  Uncertain& operator+=(const Uncertain& other);
  Uncertain& operator-=(const Uncertain& other);
  Uncertain& operator*=(const Uncertain& other);
  Uncertain& operator/=(const Uncertain& other);

  friend Uncertain operator+(Uncertain a, const Uncertain& b) { return a += b; }
  friend Uncertain operator-(Uncertain a, const Uncertain& b) { return a -= b; }
  friend Uncertain operator*(Uncertain a, const Uncertain& b) { return a *= b; }
  friend Uncertain operator/(Uncertain a, const Uncertain& b) { return a /= b; }

  /// Covariance of two results of one calculation, from the causes that they share.
  /// Nothing where a shared cause is unknown.
  [[nodiscard]] static std::optional<double> covariance(const Uncertain& a, const Uncertain& b);

  /// The result of a function of one number, given its value and slope there.
  [[nodiscard]] Uncertain mapped(double value, double slope) const;

 private:
  struct Share {
    Cause cause;
    double u;  ///< signed; for an unknown cause the bare partial derivative
  };
  /// m_shares = scale·own + otherScale·other, cause by cause.
  void combine(double scale, const Uncertain& other, double otherScale);

  double m_value;
  std::vector<Share> m_shares;  ///< sorted by cause
};

[[nodiscard]] Uncertain sqrt(const Uncertain& x);
[[nodiscard]] Uncertain exp(const Uncertain& x);
[[nodiscard]] Uncertain log(const Uncertain& x);
[[nodiscard]] Uncertain sin(const Uncertain& x);
[[nodiscard]] Uncertain cos(const Uncertain& x);

/// Standard uncertainty of a value known to lie within ± `halfWidth` with equal chance everywhere.
/// Source: JCGM 100:2008, 4.3.7.
[[nodiscard]] double rectangular(double halfWidth);

}  // namespace vialkeeper::stats
