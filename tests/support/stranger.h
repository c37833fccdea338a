// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <functional>
#include <string>

namespace vialkeeper::tests {

/// What `work` answers in a process of its own that has no rights but everybody's: as the user
/// `nobody` where the tests run as root, whom no permission stops, else as who runs them. `died: …`
/// where it did not come back.
[[nodiscard]] std::string asStranger(const std::function<std::string()>& work);

/// What `work` answers in a process of its own, without giving any right up.
[[nodiscard]] std::string inChild(const std::function<std::string()>& work);

}  // namespace vialkeeper::tests
