// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "app/notebook/desk.h"

namespace vialkeeper::app {

/// The wall clock with the offset of the local time zone.
class SystemClock final : public Clock {
 public:
  [[nodiscard]] units::Moment now() override;
};

/// `20260304-142005`, for the name of a copy made before a migration.
[[nodiscard]] std::string fileStamp(const units::Moment& now);

}  // namespace vialkeeper::app
