// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QImage>
#include <QSizeF>
#include <string>
#include <vector>

#include "app/notebook/run_plan.h"
#include "text/fault.h"

namespace vialkeeper::ui {

/// What can be printed of a run.
enum class Printed { kSheetA4, kSheetLetter, kLabel };

struct PageImage {
  QImage image;
  QSizeF size_mm;
};

/// The pages as pictures. Fault: the pages module or a font is missing, a structure cannot be
/// drawn.
[[nodiscard]] text::Checked<std::vector<PageImage>> pageImages(const app::RunSheet& sheet,
                                                               Printed what, double resolution_dpi);

/// The same pages as a PDF's bytes.
[[nodiscard]] text::Checked<std::string> pagePdf(const app::RunSheet& sheet, Printed what);

/// Saves them whole or not at all; an empty text when that was done, else what went wrong.
[[nodiscard]] QString savePdf(const app::RunSheet& sheet, Printed what, const QString& file);

}  // namespace vialkeeper::ui
