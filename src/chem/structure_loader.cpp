// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <dlfcn.h>

#include <cstdlib>
#include <expected>
#include <filesystem>
#include <memory>
#include <string>
#include <string_view>
#include <system_error>
#include <vector>

#include "chem/module_directories.h"
#include "chem/rdkit/structure_module.h"
#include "chem/structure.h"

namespace vialkeeper::chem {
namespace {

namespace fs = std::filesystem;

constexpr const char* kDirectoryVariable = "VIALKEEPER_MODULE_DIR";

/// The way to mend an installation, and the way to do without the module where there is one.
std::string reinstall(const StructureModule& module) {
  std::string mend = "install Vialkeeper again, program and modules together";
  if (module.detour != nullptr) mend.append(", or ").append(module.detour);
  return mend;
}

StructureFault missingModule(const StructureModule& module, const std::vector<fs::path>& sought) {
  StructureFault fault;
  fault.what = std::string("the structure module ") + module.file + " is not in ";
  for (std::size_t i = 0; i < sought.size(); ++i) {
    if (i > 0) fault.what += i + 1 == sought.size() ? " or " : ", ";
    fault.what += sought[i].string();
  }
  fault.mend = std::getenv(kDirectoryVariable) != nullptr
                   ? std::string("correct or unset ") + kDirectoryVariable
                   : reinstall(module);
  return fault;
}

std::string loaderMessage() {
  const char* message = dlerror();
  return message != nullptr ? message : "no reason given";
}

/// The engine that the rest of the program sees: hands each call to the module that serves it.
class LoadedEngine final : public StructureEngine {
 public:
  explicit LoadedEngine(StructureReader* reader) : m_reader(reader) {}

  std::expected<Structure, StructureFault> read(std::string_view smiles) override {
    return m_reader->read(smiles);
  }
  std::expected<std::string, StructureFault> readMolfile(std::string_view molfile) override {
    const auto opened = fileReader();
    if (!opened) return std::unexpected(opened.error());
    return (*opened)->readMolfile(molfile);
  }
  std::expected<Identity, StructureFault> identify(std::string_view smiles) override {
    return m_reader->identify(smiles);
  }
  std::expected<std::string, StructureFault> drawSvg(std::string_view smiles, int width_px,
                                                     int height_px) override {
    const auto opened = drawer();
    if (!opened) return std::unexpected(opened.error());
    return (*opened)->drawSvg(smiles, width_px, height_px);
  }
  std::expected<Extent, StructureFault> extent(std::string_view smiles) override {
    const auto opened = drawer();
    if (!opened) return std::unexpected(opened.error());
    return (*opened)->extent(smiles);
  }
  std::expected<std::string, StructureFault> fingerprint(std::string_view smiles) override {
    const auto opened = searcher();
    if (!opened) return std::unexpected(opened.error());
    return (*opened)->fingerprint(smiles);
  }
  std::expected<std::unique_ptr<Pattern>, StructureFault> readPattern(
      std::string_view smiles) override {
    const auto opened = searcher();
    if (!opened) return std::unexpected(opened.error());
    return (*opened)->readPattern(smiles);
  }

 private:
  std::expected<StructureFileReader*, StructureFault> fileReader() {
    return openOnce(m_fileReader, kFileReaderModule);
  }
  std::expected<StructureDrawer*, StructureFault> drawer() {
    return openOnce(m_drawer, kDrawerModule);
  }
  std::expected<StructureSearcher*, StructureFault> searcher() {
    return openOnce(m_searcher, kSearcherModule);
  }

  template <class Object>
  static std::expected<Object*, StructureFault> openOnce(Object*& object,
                                                         const StructureModule& module) {
    if (object == nullptr) {
      const auto opened = openStructureModule(module);
      if (!opened) return std::unexpected(opened.error());
      object = static_cast<Object*>(*opened);
    }
    return object;
  }

  StructureReader* m_reader;
  StructureFileReader* m_fileReader = nullptr;
  StructureDrawer* m_drawer = nullptr;
  StructureSearcher* m_searcher = nullptr;
};

}  // namespace

std::expected<void*, StructureFault> openStructureModule(const StructureModule& module,
                                                         int abiVersion) {
  const std::vector<fs::path> directories = moduleDirectories();
  for (const fs::path& directory : directories) {
    const fs::path file = directory / module.file;
    std::error_code unreadable;
    if (!fs::exists(file, unreadable)) continue;
    // All symbols now: a library that does not fit is told here, not by an abort in mid-use.
    void* handle = dlopen(file.c_str(), RTLD_NOW | RTLD_LOCAL);
    if (handle == nullptr) {
      return std::unexpected(StructureFault{
          "the structure module does not load: " + loaderMessage(),
          "install the RDKit and InChI libraries of this system (librdkit1 and libinchi1 on "
          "Debian), then Vialkeeper again"});
    }
    void* symbol = dlsym(handle, module.factory);
    void* object =
        symbol != nullptr ? reinterpret_cast<StructureModuleFactory*>(symbol)(abiVersion) : nullptr;
    if (object == nullptr) {
      return std::unexpected(StructureFault{
          "the structure module " + file.string() + " belongs to another version of Vialkeeper",
          reinstall(module)});
    }
    return object;
  }
  return std::unexpected(missingModule(module, directories));
}

std::expected<StructureEngine*, StructureFault> structureEngine() {
  // Never destroyed: the modules' own static objects may be gone before ours at exit.
  static StructureEngine* engine = nullptr;
  if (engine == nullptr) {
    const auto opened = openStructureModule(kReaderModule);
    if (!opened) return std::unexpected(opened.error());
    engine = new LoadedEngine(static_cast<StructureReader*>(*opened));
  }
  return engine;
}

}  // namespace vialkeeper::chem
