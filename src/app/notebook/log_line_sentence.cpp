// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/log_line_sentence.h"

#include <fmt/format.h>

#include "app/notebook/log_line_kinds.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

/// Six digits show every figure that an instrument gives and hide the last bit of a conversion.
std::string figure(double value) { return fmt::format("{:.6g}", value); }

std::string volumeOf(const EventRecord& event) {
  if (!event.volume_uL) return {};
  return *event.volume_uL < 1000.0 ? figure(*event.volume_uL) + " µL"
                                   : figure(*event.volume_uL / 1000.0) + " mL";
}

std::string pressureOf(const EventRecord& event) {
  return fmt::format("{} bar {}", figure(event.pressure_bar.value_or(0.0)), event.pressureKind);
}

/// ` at 1.43 bar abs and 35 °C`, with as many of the two as there are.
std::string conditions(const EventRecord& event) {
  std::string words;
  if (event.pressure_bar) words += " at " + pressureOf(event);
  if (event.temperature_C) {
    words +=
        fmt::format("{} {} °C", event.pressure_bar ? " and" : " at", figure(*event.temperature_C));
  }
  return words;
}

std::string temperature(const EventRecord& event) {
  return event.temperature_C ? fmt::format(" at {} °C", figure(*event.temperature_C))
                             : std::string();
}

std::string remark(const EventRecord& event) {
  return event.note.empty() ? std::string() : ": " + text::quoted(event.note);
}

std::string collected(const EventRecord& event) {
  return fmt::format("collected over water {}{}, {}{}", volumeOf(event), temperature(event),
                     event.pressure_bar ? "barometer " + pressureOf(event) : "barometer at ambient",
                     remark(event));
}

std::string opened(const EventRecord& event) {
  std::string words(event.kind);
  if (event.kind == event_kind::kPurge) {
    words += event.gas.empty() ? " with the gas of the seal" : " with " + event.gas;
  }
  const bool vent = event.kind == event_kind::kVent;
  if (event.pressure_bar) {
    words += " to " + pressureOf(event);
  } else if (vent) {
    words += " to ambient";
  }
  if (vent && !event.gas.empty()) words += " under " + event.gas;
  return words + temperature(event) + remark(event);
}

std::string gasAdded(const EventRecord& event) {
  const std::string quantity =
      event.amount_mmol ? figure(*event.amount_mmol) + " mmol" : volumeOf(event);
  return fmt::format("gas added: {} {}{}{}", quantity, event.gas, conditions(event), remark(event));
}

}  // namespace

std::string eventSentence(const EventRecord& event) {
  using namespace event_kind;
  const std::string_view kind = event.kind;
  if (kind == kPressure)
    return "pressure " + pressureOf(event) + temperature(event) + remark(event);
  if (kind == kTemperature) {
    return fmt::format("temperature {} °C{}", figure(event.temperature_C.value_or(0.0)),
                       remark(event));
  }
  if (kind == kHeadspace) {
    return fmt::format("headspace {} % H2{}{}", figure(event.fraction.value_or(0.0) * 100.0),
                       conditions(event), remark(event));
  }
  if (kind == kGasSample || kind == kLiquidSample) {
    return fmt::format("{} {}{}{}", kind, volumeOf(event), temperature(event), remark(event));
  }
  if (kind == kVent || kind == kPurge) return opened(event);
  if (kind == kCollected) return collected(event);
  if (kind == kGasAdded) return gasAdded(event);
  if (kind == kLiquidAdded)
    return fmt::format("liquid added: {} {}", volumeOf(event), text::oneLine(event.note));
  if (kind == kPhoto) return "photo " + text::quoted(event.attachmentName);
  return std::string(kind) + temperature(event) + remark(event);
}

}  // namespace vialkeeper::app
