// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>

#include "app/sheet_content.h"
#include "exports/page_flow.h"
#include "exports/qr_code.h"
#include "text/fault.h"

namespace vialkeeper::exports {

/// The label's page: 62 mm × 29 mm, all of it at the layout's disposal.
[[nodiscard]] PageGeometry vialLabelGeometry();

/// A page with the label of one vial, set as large as its texts allow. On the left the printed
/// code, person and date, on the right code, title, contents and conditions, at the foot over the
/// whole width the hazards and the caution.
/// Fault: the printed code's text is too long for a label, or code, hazards and caution are.
[[nodiscard]] text::Checked<PageFlow> layOutVialLabel(const Typesetter& typesetter,
                                                      const app::LabelContent& label,
                                                      const std::optional<QrCode>& qr);

}  // namespace vialkeeper::exports
