// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <dlfcn.h>

#include <cstdlib>
#include <filesystem>
#include <string>
#include <system_error>
#include <vector>

#include "chem/module_directories.h"
#include "exports/pages_module.h"

namespace vialkeeper::exports {
namespace {

namespace fs = std::filesystem;

constexpr const char* kDirectoryVariable = "VIALKEEPER_MODULE_DIR";
constexpr const char* kReinstall = "install Vialkeeper again, program and modules together";

std::unexpected<text::Faults> moduleFault(std::string what, std::string mend) {
  return std::unexpected(text::Faults{
      {.kind = text::FaultKind::kUsage, .what = std::move(what), .mend = std::move(mend)}});
}

std::unexpected<text::Faults> missingModule(const std::vector<fs::path>& sought) {
  std::string what = std::string("the pages module ") + kPagesModuleFile + " is not in ";
  for (std::size_t i = 0; i < sought.size(); ++i) {
    if (i > 0) what += i + 1 == sought.size() ? " or " : ", ";
    what += sought[i].string();
  }
  const char* named = std::getenv(kDirectoryVariable);
  return moduleFault(std::move(what), named != nullptr && *named != '\0'
                                          ? std::string("correct or unset ") + kDirectoryVariable
                                          : std::string(kReinstall));
}

text::Checked<PagePrinter*> open(const fs::path& file) {
  // All symbols now: a library that does not fit is told here, not by an abort in mid-use.
  void* handle = dlopen(file.c_str(), RTLD_NOW | RTLD_LOCAL);
  if (handle == nullptr) {
    const char* message = dlerror();
    return moduleFault(std::string("the pages module does not load: ") +
                           (message != nullptr ? message : "no reason given"),
                       "install Qt 6 Gui and Svg and libqrencode (libqt6gui6, libqt6svg6 and "
                       "libqrencode4 on Debian), then Vialkeeper again");
  }
  void* symbol = dlsym(handle, kPagesModuleFactory);
  PagePrinter* printer =
      symbol != nullptr ? reinterpret_cast<PagesModuleFactory*>(symbol)(kPagesModuleAbi) : nullptr;
  if (printer == nullptr) {
    return moduleFault(
        "the pages module " + file.string() + " belongs to another version of Vialkeeper",
        kReinstall);
  }
  return printer;
}

}  // namespace

text::Checked<PagePrinter*> pagePrinter() {
  static PagePrinter* printer = nullptr;
  if (printer != nullptr) return printer;
  const std::vector<fs::path> directories = chem::moduleDirectories();
  for (const fs::path& directory : directories) {
    const fs::path file = directory / kPagesModuleFile;
    std::error_code unreadable;
    if (!fs::exists(file, unreadable)) continue;
    const auto opened = open(file);
    if (opened) printer = *opened;
    return opened;
  }
  return missingModule(directories);
}

}  // namespace vialkeeper::exports
