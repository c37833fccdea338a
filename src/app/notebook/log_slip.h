// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "app/notebook/records.h"
#include "units/quantity.h"

namespace vialkeeper::app {

/// What a line of the log is held against: the vial and what is in it.
struct VialContext {
  std::optional<units::Volume> vial = {};  ///< brim-full, closed
  units::Volume displaced = units::Volume::fromSi(0.0);
  units::Volume liquid = units::Volume::fromSi(0.0);  ///< in the vial now
  std::optional<units::Pressure> ratedGauge = {};
  units::Pressure ambient = units::Pressure::fromBar(1.01325);
  std::optional<units::Temperature> planned = {};
  units::Moment created{};  ///< when the run was set up
};

enum class LogSlipKind {
  kPressure,      ///< above the vial's rating, or what glass holds; no barometer's
  kTemperature,   ///< outside -100 to 250 °C
  kLiquidSample,  ///< more than the vial's liquid
  kGasSample,     ///< more than the vial
  kLiquidAdded,   ///< more than the room that is left
  kGasAmount,     ///< gas added or collected that the vial could not hold
  kTime,          ///< before the run was set up
};

/// The code of a kind, which never changes: `slip-pressure`.
[[nodiscard]] std::string_view toText(LogSlipKind kind);

/// One question to ask before an entry is kept.
struct LogSlip {
  LogSlipKind kind;
  std::string what;  ///< what is odd: `420 bar gauge is above the vial's rating of 2.00 bar gauge`
  std::string ask;   ///< `did you mean 420 mbar?`
  std::string likelyText;  ///< the quantity that was probably meant, as typed: `420 mbar`; or empty
};

/// Looks whether an entry says something that can hardly be: at most one slip of each kind, none
/// where all is well. `event` is a line as readLogLine reads it, with the moment when it happened.
/// Pure and quick, so that a field may call it with every key.
[[nodiscard]] std::vector<LogSlip> logSlips(const VialContext& vial, const EventRecord& event);

}  // namespace vialkeeper::app
