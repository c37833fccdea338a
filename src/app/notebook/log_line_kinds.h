// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <algorithm>
#include <array>
#include <string_view>

/// The kinds of a log's events, by the words in which files and the notebook keep them.
namespace vialkeeper::app::event_kind {

inline constexpr std::string_view kLampOn = "lamp on";
inline constexpr std::string_view kLampOff = "lamp off";
inline constexpr std::string_view kPressure = "pressure";
inline constexpr std::string_view kTemperature = "temperature";
inline constexpr std::string_view kHeadspace = "headspace";
inline constexpr std::string_view kGasSample = "gas sample";
inline constexpr std::string_view kLiquidSample = "liquid sample";
inline constexpr std::string_view kVent = "vent";
inline constexpr std::string_view kCollected = "collected";
inline constexpr std::string_view kPurge = "purge";
inline constexpr std::string_view kGasAdded = "gas added";
inline constexpr std::string_view kLiquidAdded = "liquid added";
inline constexpr std::string_view kObservation = "observation";
inline constexpr std::string_view kPhoto = "photo";  ///< with an attachment; idle for the ledger
inline constexpr std::string_view kWithdrawn =
    "withdrawn";  ///< in the place of an entry that was taken back; idle for the ledger
inline constexpr std::string_view kAddendum =
    "addendum";  ///< text on a sealed run; idle for the ledger

/// Those of a log file: what the ledger replays.
inline constexpr auto kOfLogFile = std::to_array<std::string_view>(
    {kLampOn, kLampOff, kPressure, kTemperature, kHeadspace, kGasSample, kLiquidSample, kVent,
     kCollected, kPurge, kGasAdded, kLiquidAdded, kObservation});

/// Whether a log file may name the kind.
[[nodiscard]] constexpr bool isOfLogFile(std::string_view kind) {
  return std::ranges::find(kOfLogFile, kind) != kOfLogFile.end();
}

/// Whether the notebook may hold an event of the kind.
[[nodiscard]] constexpr bool isKnown(std::string_view kind) {
  return isOfLogFile(kind) || kind == kPhoto || kind == kWithdrawn || kind == kAddendum;
}

}  // namespace vialkeeper::app::event_kind
