// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <expected>
#include <string_view>

#include "app/notebook/records.h"
#include "text/text_fault.h"

/// What may and must stand behind the word of an event. Used by log_line alone.
namespace vialkeeper::app {

/// Whether a label or the name of a liquid is looked through for a second event; not within that
/// look.
enum class LabelCheck { kNo, kYes };

/// Reads the rest of a line, from a byte on, as an event of the kind; the event gets the kind too.
/// Fault: a quantity that cannot be read, is not of this kind, is missing or stands twice, or a
/// word that is not known here. The event is then half filled and must be dropped.
[[nodiscard]] std::expected<void, text::TextFault> readLogForm(std::string_view line,
                                                               std::size_t from,
                                                               std::string_view kind,
                                                               EventRecord& event,
                                                               LabelCheck check);

/// Whether a text would be read as an event other than an observation: a second event in one line.
[[nodiscard]] bool readsAsEvent(std::string_view line);

}  // namespace vialkeeper::app
