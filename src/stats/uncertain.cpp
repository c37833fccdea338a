// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "stats/uncertain.h"

#include <cmath>
#include <numbers>
#include <utility>

namespace vialkeeper::stats {
namespace {

/// A share that cancelled: what rounding leaves of it must not count as doubt.
bool isCancelled(double sum, double a, double b) {
  constexpr double kRounding = 1e-12;
  return std::abs(sum) <= kRounding * (std::abs(a) + std::abs(b));
}

}  // namespace

Uncertain::Uncertain(double value, double u, Cause cause) : m_value(value) {
  if (u != 0.0) m_shares.push_back({cause, u});
}

Uncertain Uncertain::unstated(double value, Cause unknownCause) {
  Uncertain number(value);
  number.m_shares.push_back({unknownCause, 1.0});
  return number;
}

std::optional<double> Uncertain::standardUncertainty() const {
  double variance = 0.0;
  for (const Share& share : m_shares) {
    if (share.cause.isUnknown()) return std::nullopt;
    variance += share.u * share.u;
  }
  return std::sqrt(variance);
}

Uncertain Uncertain::withCause(double u, Cause cause) const {
  return *this + Uncertain(0.0, u, cause);
}

void Uncertain::combine(double scale, const Uncertain& other, double otherScale) {
  std::vector<Share> merged;
  merged.reserve(m_shares.size() + other.m_shares.size());
  auto mine = m_shares.begin();
  auto theirs = other.m_shares.begin();
  while (mine != m_shares.end() || theirs != other.m_shares.end()) {
    const bool takeMine =
        theirs == other.m_shares.end() || (mine != m_shares.end() && mine->cause <= theirs->cause);
    const bool takeTheirs =
        mine == m_shares.end() || (theirs != other.m_shares.end() && theirs->cause <= mine->cause);
    const Cause cause = takeMine ? mine->cause : theirs->cause;
    const double a = takeMine ? scale * (mine++)->u : 0.0;
    const double b = takeTheirs ? otherScale * (theirs++)->u : 0.0;
    if (!isCancelled(a + b, a, b)) merged.push_back({cause, a + b});
  }
  m_shares = std::move(merged);
}

Uncertain& Uncertain::operator+=(const Uncertain& other) {
  combine(1.0, other, 1.0);
  m_value += other.m_value;
  return *this;
}

Uncertain& Uncertain::operator-=(const Uncertain& other) {
  combine(1.0, other, -1.0);
  m_value -= other.m_value;
  return *this;
}

Uncertain& Uncertain::operator*=(const Uncertain& other) {
  combine(other.m_value, other, m_value);
  m_value *= other.m_value;
  return *this;
}

Uncertain& Uncertain::operator/=(const Uncertain& other) {
  const double quotient = m_value / other.m_value;
  combine(1.0 / other.m_value, other, -quotient / other.m_value);
  m_value = quotient;
  return *this;
}

std::optional<double> Uncertain::covariance(const Uncertain& a, const Uncertain& b) {
  double sum = 0.0;
  auto left = a.m_shares.begin();
  auto right = b.m_shares.begin();
  while (left != a.m_shares.end() && right != b.m_shares.end()) {
    if (left->cause < right->cause) {
      ++left;
    } else if (right->cause < left->cause) {
      ++right;
    } else {
      if (left->cause.isUnknown()) return std::nullopt;
      sum += (left++)->u * (right++)->u;
    }
  }
  return sum;
}

Uncertain Uncertain::mapped(double value, double slope) const {
  Uncertain result = *this;
  result.combine(slope, Uncertain(0.0), 0.0);
  result.m_value = value;
  return result;
}

Uncertain sqrt(const Uncertain& x) {
  const double root = std::sqrt(x.value());
  return x.mapped(root, 0.5 / root);
}

Uncertain exp(const Uncertain& x) {
  const double power = std::exp(x.value());
  return x.mapped(power, power);
}

Uncertain log(const Uncertain& x) { return x.mapped(std::log(x.value()), 1.0 / x.value()); }

Uncertain sin(const Uncertain& x) { return x.mapped(std::sin(x.value()), std::cos(x.value())); }

Uncertain cos(const Uncertain& x) { return x.mapped(std::cos(x.value()), -std::sin(x.value())); }

double rectangular(double halfWidth) { return halfWidth / std::numbers::sqrt3; }

}  // namespace vialkeeper::stats
