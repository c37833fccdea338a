// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/weigh_run.h"

namespace vialkeeper::app {

Checked<WeighingPreview> previewWeighing(const RunSheet&, const std::string&, const std::string&) {
  return askedFault("", "this does not work yet", "wait");
}
std::vector<std::string> weighingOrder(const RunSheet& sheet) {
  std::vector<std::string> keys;
  for (const ComponentRecord& component : sheet.components) keys.push_back(component.key);
  return keys;
}

}  // namespace vialkeeper::app
