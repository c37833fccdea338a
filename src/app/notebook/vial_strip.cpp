// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/vial_strip.h"

namespace vialkeeper::app {

VialStrip vialStrip(const RunSheet&, const std::vector<NumberedEvent>&, const units::Moment&) {
  return {};
}

}  // namespace vialkeeper::app
