// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/pages_module.h"

/// Stands in for the loader in a build without VIALKEEPER_WITH_PAGES.
namespace vialkeeper::exports {

text::Checked<PagePrinter*> pagePrinter() {
  return std::unexpected(text::Faults{
      {.kind = text::FaultKind::kUsage,
       .what = "this build of Vialkeeper prints no pages",
       .mend = "use a build with VIALKEEPER_WITH_PAGES=ON, which needs Qt 6 and libqrencode"}});
}

}  // namespace vialkeeper::exports
