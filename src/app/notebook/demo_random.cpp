// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_random.h"

#include <algorithm>

namespace vialkeeper::app {
namespace {

/// Spreads neighbouring numbers over all 64 bits (the finaliser of SplitMix64).
std::uint64_t spread(std::uint64_t number) {
  number += 0x9E3779B97F4A7C15U;
  number = (number ^ (number >> 30U)) * 0xBF58476D1CE4E5B9U;
  number = (number ^ (number >> 27U)) * 0x94D049BB133111EBU;
  return number ^ (number >> 31U);
}

}  // namespace

DemoRandom::DemoRandom(std::uint64_t seed, std::uint64_t stream)
    : m_generator(seed ^ spread(stream)) {}

double DemoRandom::uniform() { return static_cast<double>(m_generator() >> 11U) * 0x1.0p-53; }

double DemoRandom::between(double least, double most) { return least + (most - least) * uniform(); }

double DemoRandom::normal() {
  double sum = 0.0;
  for (int i = 0; i < 12; ++i) sum += uniform();
  return sum - 6.0;
}

std::size_t DemoRandom::below(std::size_t count) {
  return std::min(static_cast<std::size_t>(uniform() * static_cast<double>(count)), count - 1);
}

}  // namespace vialkeeper::app
