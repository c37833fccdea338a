// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "app/sheet_content.h"
#include "exports/pages_module.h"
#include "text/fault.h"

namespace vialkeeper::exports {

/// The structures of a scheme, drawn. Loads the structure modules where the scheme has a SMILES.
/// Fault: the modules are missing, or a structure cannot be drawn; all that fail are told.
[[nodiscard]] text::Checked<SchemePictures> drawStructures(const app::SchemeContent& scheme);

}  // namespace vialkeeper::exports
