// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/run_templates.h"

namespace vialkeeper::text {
// Defined in the file that the build generates from templates/runs.
extern const EmbeddedFile runTemplateFiles[];
extern const std::size_t runTemplateFilesCount;
}  // namespace vialkeeper::text

namespace vialkeeper::app {

std::span<const text::EmbeddedFile> runTemplates() {
  return {text::runTemplateFiles, text::runTemplateFilesCount};
}

}  // namespace vialkeeper::app
