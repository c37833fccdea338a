// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <memory>
#include <string>
#include <string_view>

#include "chem/structure.h"

/// What the program and its structure modules have agreed on. Nothing of RDKit is named here.
namespace vialkeeper::chem {

/// Raised whenever a class of this file or of chem/structure.h changes: a module of another
/// number is refused before any of its functions is called.
inline constexpr int kStructureModuleAbi = 3;

/// Reads and names structures; the functions are those of StructureEngine.
class StructureReader {
 public:
  StructureReader() = default;
  StructureReader(const StructureReader&) = delete;
  StructureReader& operator=(const StructureReader&) = delete;
  virtual ~StructureReader() = default;
  [[nodiscard]] virtual std::expected<Structure, StructureFault> read(std::string_view smiles) = 0;
  [[nodiscard]] virtual std::expected<Identity, StructureFault> identify(
      std::string_view smiles) = 0;
};

/// Reads structures out of files; the function is that of StructureEngine.
class StructureFileReader {
 public:
  StructureFileReader() = default;
  StructureFileReader(const StructureFileReader&) = delete;
  StructureFileReader& operator=(const StructureFileReader&) = delete;
  virtual ~StructureFileReader() = default;
  [[nodiscard]] virtual std::expected<std::string, StructureFault> readMolfile(
      std::string_view molfile) = 0;
};

/// Draws structures; the functions are those of StructureEngine.
class StructureDrawer {
 public:
  StructureDrawer() = default;
  StructureDrawer(const StructureDrawer&) = delete;
  StructureDrawer& operator=(const StructureDrawer&) = delete;
  virtual ~StructureDrawer() = default;
  [[nodiscard]] virtual std::expected<std::string, StructureFault> drawSvg(std::string_view smiles,
                                                                           int width_px,
                                                                           int height_px) = 0;
  [[nodiscard]] virtual std::expected<StructureEngine::Extent, StructureFault> extent(
      std::string_view smiles) = 0;
};

/// Searches structures; the functions are those of StructureEngine.
class StructureSearcher {
 public:
  StructureSearcher() = default;
  StructureSearcher(const StructureSearcher&) = delete;
  StructureSearcher& operator=(const StructureSearcher&) = delete;
  virtual ~StructureSearcher() = default;
  [[nodiscard]] virtual std::expected<std::string, StructureFault> fingerprint(
      std::string_view smiles) = 0;
  [[nodiscard]] virtual std::expected<std::unique_ptr<Pattern>, StructureFault> readPattern(
      std::string_view smiles) = 0;
};

/// A module's file, without directory, and the one function that it exports. The function takes
/// the caller's ABI number and returns the module's object, which it keeps, or null where the
/// numbers differ.
struct StructureModule {
  const char* file = nullptr;
  const char* factory = nullptr;
  const char* detour = nullptr;  ///< what a user can do without the module, for the fault; or null
};
using StructureModuleFactory = void*(int abiVersion);

inline constexpr StructureModule kReaderModule{
    "vialkeeper_structures.so", "vialkeeper_open_structure_reader",
    "give a formula or molar mass in place of the SMILES"};
inline constexpr StructureModule kDrawerModule{"vialkeeper_drawings.so",
                                               "vialkeeper_open_structure_drawer"};
inline constexpr StructureModule kFileReaderModule{
    "vialkeeper_molfiles.so", "vialkeeper_open_structure_file_reader",
    "give the SMILES in a CSV file in place of the SD file"};
inline constexpr StructureModule kSearcherModule{"vialkeeper_search.so",
                                                 "vialkeeper_open_structure_searcher"};

/// The object of a module: a StructureReader*, StructureFileReader*, StructureDrawer* or
/// StructureSearcher* behind `void*`.
/// Sought in the directory that the environment variable VIALKEEPER_MODULE_DIR names and nowhere
/// else if that is set; otherwise beside the program (`../lib/vialkeeper`), then where it was
/// installed. An opened module stays for the life of the process.
/// Fault: missing, not loadable, or of another ABI number; says where and how to mend it.
[[nodiscard]] std::expected<void*, StructureFault> openStructureModule(
    const StructureModule& module, int abiVersion = kStructureModuleAbi);

}  // namespace vialkeeper::chem
