// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include <array>
#include <cmath>

#include "stats/uncertain.h"

using namespace vialkeeper;
using stats::Causes;
using stats::Uncertain;

namespace {

constexpr std::size_t kReadings = 5;
using Readings = std::array<double, kReadings>;

double meanOf(const Readings& x) {
  double sum = 0.0;
  for (const double value : x) sum += value;
  return sum / kReadings;
}

/// Covariance of two means.
double covarianceOfMeans(const Readings& x, const Readings& y) {
  double sum = 0.0;
  for (std::size_t i = 0; i < kReadings; ++i) sum += (x[i] - meanOf(x)) * (y[i] - meanOf(y));
  return sum / (kReadings * (kReadings - 1));
}

double correlation(const Uncertain& a, const Uncertain& b) {
  return *Uncertain::covariance(a, b) / (*a.standardUncertainty() * *b.standardUncertainty());
}

}  // namespace

TEST_CASE("resistance, reactance and impedance of the GUM come out with their correlations",
          "[stats][published]") {
  // JCGM 100:2008, H.2: the five sets of readings of table H.2, the results of table H.4. The
  // readings and the correlation coefficients of the results are from memory; means, their u and r
  // as well as R, X, Z with their u were compared with sandialabs/suncal test/test_examples.py and
  // the GTC example GUM_H2.
  const Readings volts = {5.007, 4.994, 5.005, 4.990, 4.999};
  const Readings amperes = {19.663e-3, 19.639e-3, 19.640e-3, 19.685e-3, 19.678e-3};
  const Readings radians = {1.0456, 1.0438, 1.0468, 1.0428, 1.0433};

  // Three correlated means as sums over three independent causes: Cholesky's factors of their
  // covariance.
  Causes causes;
  const std::array cause = {causes.add(), causes.add(), causes.add()};
  const std::array<const Readings*, 3> readings = {&volts, &amperes, &radians};
  std::array<std::array<double, 3>, 3> factor{};
  std::array<Uncertain, 3> mean = {meanOf(volts), meanOf(amperes), meanOf(radians)};
  for (std::size_t i = 0; i < 3; ++i) {
    for (std::size_t j = 0; j <= i; ++j) {
      double rest = covarianceOfMeans(*readings[i], *readings[j]);
      for (std::size_t k = 0; k < j; ++k) rest -= factor[i][k] * factor[j][k];
      factor[i][j] = i == j ? std::sqrt(rest) : rest / factor[j][j];
      mean[i] = mean[i].withCause(factor[i][j], cause[j]);
    }
  }
  const auto& [V, I, phi] = mean;

  // Table H.2: u(V) 0.0032, u(I) 0.0095 mA, u(phi) 0.00075; r(V,I) -0.36, r(V,phi) 0.86, r(I,phi)
  // -0.65.
  CHECK(V.value() == Approx(4.9990).margin(5e-5));
  CHECK(I.value() == Approx(19.6610e-3).margin(5e-8));
  CHECK(phi.value() == Approx(1.04446).margin(5e-6));
  CHECK(*V.standardUncertainty() == Approx(0.0032).margin(5e-5));
  CHECK(*I.standardUncertainty() == Approx(0.0095e-3).margin(5e-8));
  CHECK(*phi.standardUncertainty() == Approx(0.00075).margin(5e-6));
  CHECK(correlation(V, I) == Approx(-0.36).margin(5e-3));
  CHECK(correlation(V, phi) == Approx(0.86).margin(5e-3));
  CHECK(correlation(I, phi) == Approx(-0.65).margin(5.1e-3));

  const Uncertain R = V / I * cos(phi);
  const Uncertain X = V / I * sin(phi);
  const Uncertain Z = V / I;
  CHECK(R.value() == Approx(127.732).margin(5e-4));
  CHECK(X.value() == Approx(219.847).margin(5e-4));
  CHECK(Z.value() == Approx(254.260).margin(5e-4));
  CHECK(*R.standardUncertainty() == Approx(0.071).margin(5e-4));
  CHECK(*X.standardUncertainty() ==
        Approx(0.295).margin(1e-3));  // 0.29558 from these readings; one unit of the digit printed
  CHECK(*Z.standardUncertainty() == Approx(0.236).margin(5e-4));
  CHECK(correlation(R, X) == Approx(-0.588).margin(5e-4));
  CHECK(correlation(R, Z) == Approx(-0.485).margin(5.1e-4));
  CHECK(correlation(X, Z) == Approx(0.993).margin(5e-4));
}

TEST_CASE("a cadmium standard has the uncertainty that Eurachem prints", "[stats][published]") {
  // Eurachem/CITAC guide QUAM, example A1, table A1.1 (seen at
  // measurementuncertainty.org/guide/app_a_example1.html): m 100.28 mg u 0.05, P 0.9999 u 0.000058,
  // V 100.0 mL u 0.07; c = 1000 m P/V = 1002.7 mg/L, u 0.9 mg/L.
  Causes causes;
  const Uncertain m(100.28, 0.05, causes.add());
  const Uncertain P(0.9999, 0.000058, causes.add());
  const Uncertain V(100.0, 0.07, causes.add());
  const Uncertain c = 1000.0 * m * P / V;
  CHECK(c.value() == Approx(1002.7).margin(0.05));
  CHECK(*c.standardUncertainty() == Approx(0.9).margin(0.05));
  // By hand: 1002.6997 sqrt(0.000498604^2 + 0.0000580058^2 + 0.0007^2) = 0.86372 mg/L.
  CHECK(*c.standardUncertainty() == Approx(0.86372).epsilon(1e-4));
}

TEST_CASE("the purity of that cadmium has the standard uncertainty of a rectangle",
          "[stats][published]") {
  // Same example, A1.3: purity 99.99 % +- 0.01 %, u = 0.0001/sqrt(3) = 0.000058.
  CHECK(stats::rectangular(0.0001) == Approx(0.000058).margin(5e-7));
}
