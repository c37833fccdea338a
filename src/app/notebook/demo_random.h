// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <cstdint>
#include <random>

namespace vialkeeper::app {

/// Chance that is the same everywhere: the distributions of the standard library are not, its
/// generators are.
class DemoRandom {
 public:
  /// `stream` tells the chances of one seed apart, such as those of one run from those of the next.
  DemoRandom(std::uint64_t seed, std::uint64_t stream);

  [[nodiscard]] double uniform();  ///< in [0, 1)
  [[nodiscard]] double between(double least, double most);
  /// Mean 0, standard deviation 1, never beyond 6: the sum of twelve uniform numbers less 6.
  [[nodiscard]] double normal();
  /// In [0, count), count > 0.
  [[nodiscard]] std::size_t below(std::size_t count);
  [[nodiscard]] bool once(double chance) { return uniform() < chance; }

  template <class List>
  [[nodiscard]] const auto& pick(const List& list) {
    return list[below(list.size())];
  }

 private:
  std::mt19937_64 m_generator;
};

}  // namespace vialkeeper::app
