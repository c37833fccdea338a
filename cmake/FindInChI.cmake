# SPDX-FileCopyrightText: The Vialkeeper developers
# SPDX-License-Identifier: GPL-3.0-or-later

# find_package(InChI): the IUPAC InChI library, which brings no CMake configuration. Defines
# InChI_FOUND, InChI_INCLUDE_DIR, InChI_LIBRARY and the imported target InChI::InChI.

find_path(InChI_INCLUDE_DIR inchi_api.h PATH_SUFFIXES inchi)
find_library(InChI_LIBRARY inchi)
mark_as_advanced(InChI_INCLUDE_DIR InChI_LIBRARY)

include(FindPackageHandleStandardArgs)
find_package_handle_standard_args(InChI
  REQUIRED_VARS InChI_LIBRARY InChI_INCLUDE_DIR
  REASON_FAILURE_MESSAGE
    "On Debian and Ubuntu: apt-get install libinchi-dev. \
To build without structures: -DVIALKEEPER_WITH_STRUCTURES=OFF.")

if(InChI_FOUND AND NOT TARGET InChI::InChI)
  add_library(InChI::InChI UNKNOWN IMPORTED)
  set_target_properties(InChI::InChI PROPERTIES IMPORTED_LOCATION ${InChI_LIBRARY})
  target_include_directories(InChI::InChI SYSTEM INTERFACE ${InChI_INCLUDE_DIR})
endif()
