# SPDX-FileCopyrightText: The Vialkeeper developers
# SPDX-License-Identifier: GPL-3.0-or-later

# vialkeeper_compiler_settings(TARGET): warnings and instrumentation, per target, so that
# no setting of ours leaks into a library's headers.
function(vialkeeper_compiler_settings target)
  target_compile_options(${target} PRIVATE
    -Wall -Wextra -Wpedantic -Wshadow -Wconversion -Wold-style-cast
    -Woverloaded-virtual -Wnon-virtual-dtor
    -Wno-restrict  # false alarms on std::string in g++ 12, GCC bug 105651
    -fpch-preprocess  # lets ccache keep what was compiled with a precompiled header
    $<$<BOOL:${VIALKEEPER_WARNINGS_AS_ERRORS}>:-Werror>)
  if(VIALKEEPER_SANITIZE)
    target_compile_options(${target} PRIVATE -fsanitize=address,undefined -fno-omit-frame-pointer
                                             -fno-sanitize-recover=all)
    target_link_options(${target} PUBLIC -fsanitize=address,undefined)
  endif()
  if(VIALKEEPER_COVERAGE)
    target_compile_options(${target} PRIVATE --coverage)
    target_link_options(${target} PUBLIC --coverage)
  endif()
endfunction()

# vialkeeper_library(NAME SOURCES ...): a static library of one layer. Includes are written
# from the top of the source tree ("units/quantity.h"), so the include itself names the layer.
function(vialkeeper_library name)
  cmake_parse_arguments(ARG "" "" "SOURCES;LINK" ${ARGN})
  add_library(${name} STATIC ${ARG_SOURCES})
  target_include_directories(${name} PUBLIC ${PROJECT_SOURCE_DIR}/src)
  target_link_libraries(${name} PUBLIC ${ARG_LINK})
  vialkeeper_compiler_settings(${name})
endfunction()

# vialkeeper_module(NAME SOURCES ... LINK ...): a shared object of this program's own that is
# opened on first use, because loading its libraries takes longer than most verbs run.
function(vialkeeper_module name)
  cmake_parse_arguments(ARG "" "" "SOURCES;LINK" ${ARGN})
  add_library(${name} MODULE ${ARG_SOURCES})
  target_include_directories(${name} PRIVATE ${PROJECT_SOURCE_DIR}/src)
  target_link_libraries(${name} PRIVATE ${ARG_LINK})
  set_target_properties(${name} PROPERTIES
    PREFIX "" LIBRARY_OUTPUT_DIRECTORY ${VIALKEEPER_MODULE_OUTPUT_DIRECTORY})
  vialkeeper_compiler_settings(${name})
  install(TARGETS ${name} LIBRARY DESTINATION ${VIALKEEPER_MODULE_INSTALL_DIR})
endfunction()
