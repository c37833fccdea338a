# SPDX-FileCopyrightText: The Vialkeeper developers
# SPDX-License-Identifier: GPL-3.0-or-later

# find_package(RDKit [VERSION] COMPONENTS NAME...): Debian's RDKit brings neither a CMake
# configuration nor a pkg-config file. Defines RDKit_FOUND, RDKit_VERSION, RDKit_INCLUDE_DIR and one
# imported target RDKit::NAME for each component, NAME as in libRDKitNAME.so. RDKIT_ROOT or
# CMAKE_PREFIX_PATH point to an installation elsewhere.

find_path(RDKit_INCLUDE_DIR GraphMol/ROMol.h PATH_SUFFIXES rdkit)
# RDKit's headers include those of Boost, which its package does not depend on.
find_path(RDKit_Boost_INCLUDE_DIR boost/config.hpp)
mark_as_advanced(RDKit_INCLUDE_DIR RDKit_Boost_INCLUDE_DIR)

set(RDKit_library_variables)
foreach(component IN LISTS RDKit_FIND_COMPONENTS)
  find_library(RDKit_${component}_LIBRARY RDKit${component})
  mark_as_advanced(RDKit_${component}_LIBRARY)
  list(APPEND RDKit_library_variables RDKit_${component}_LIBRARY)
  if(RDKit_${component}_LIBRARY)
    set(RDKit_${component}_FOUND TRUE)
  endif()
endforeach()

# Debian's RDGeneral/versions.h has its placeholders unfilled: the file name tells the version.
find_library(RDKit_RDGeneral_LIBRARY RDKitRDGeneral)
get_filename_component(RDKit_version_file "${RDKit_RDGeneral_LIBRARY}" REALPATH)
if(RDKit_version_file MATCHES "\\.so\\.[0-9]+\\.([0-9]+\\.[0-9]+\\.[0-9]+)$")
  set(RDKit_VERSION ${CMAKE_MATCH_1})
endif()
unset(RDKit_version_file)

include(FindPackageHandleStandardArgs)
find_package_handle_standard_args(RDKit
  REQUIRED_VARS RDKit_INCLUDE_DIR RDKit_Boost_INCLUDE_DIR ${RDKit_library_variables}
  VERSION_VAR RDKit_VERSION
  HANDLE_COMPONENTS
  REASON_FAILURE_MESSAGE
    "On Debian and Ubuntu: apt-get install librdkit-dev libboost-dev. \
To build without structures: -DVIALKEEPER_WITH_STRUCTURES=OFF.")

if(RDKit_FOUND)
  foreach(component IN LISTS RDKit_FIND_COMPONENTS)
    if(NOT TARGET RDKit::${component})
      add_library(RDKit::${component} UNKNOWN IMPORTED)
      set_target_properties(RDKit::${component} PROPERTIES
        IMPORTED_LOCATION ${RDKit_${component}_LIBRARY})
      # As system headers: their warnings are not ours. Boost's directory may be /usr/include, which
      # CMake leaves out by itself.
      target_include_directories(RDKit::${component} SYSTEM INTERFACE
        ${RDKit_INCLUDE_DIR} ${RDKit_Boost_INCLUDE_DIR})
    endif()
  endforeach()
endif()
unset(RDKit_library_variables)
