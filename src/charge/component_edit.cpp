// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/plan_edit.h"

namespace vialkeeper::charge {
namespace {
std::unexpected<text::Faults> notYet() {
  return std::unexpected(text::Faults{{.what = "this does not work yet", .mend = "wait"}});
}
}  // namespace

text::Checked<std::string> withComponent(std::string_view, std::string_view,
                                         const std::vector<PlanField>&) {
  return notYet();
}
text::Checked<std::string> withoutComponent(std::string_view, std::string_view) { return notYet(); }
std::string freeKey(std::string_view name, const std::vector<std::string>&) {
  return std::string(name);
}

}  // namespace vialkeeper::charge
