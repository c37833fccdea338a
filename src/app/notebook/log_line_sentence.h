// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "app/notebook/records.h"

namespace vialkeeper::app {

/// What the event says, in words with units, as one line without a full stop:
/// `gas sample 250 µL at 35 °C`. Long texts are cut; they stand whole in the note.
[[nodiscard]] std::string eventSentence(const EventRecord& event);

}  // namespace vialkeeper::app
