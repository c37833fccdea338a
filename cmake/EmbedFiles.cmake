# SPDX-FileCopyrightText: The Vialkeeper developers
# SPDX-License-Identifier: GPL-3.0-or-later

# vialkeeper_embed(TARGET SYMBOL FILES...): links the named text files into TARGET, byte for byte.
# Generates SYMBOL.cpp, which defines `const EmbeddedFile SYMBOL[]` and `const std::size_t SYMBOLCount`;
# declare them where they are used (see text/embedded_file.h).
function(vialkeeper_embed target symbol)
  set(generated ${CMAKE_CURRENT_BINARY_DIR}/${symbol}.cpp)
  list(JOIN ARGN "|" files)
  add_custom_command(
    OUTPUT ${generated}
    COMMAND ${CMAKE_COMMAND} -DOUTPUT=${generated} -DSYMBOL=${symbol} "-DFILES=${files}"
            -DBASE=${CMAKE_CURRENT_SOURCE_DIR} -P ${PROJECT_SOURCE_DIR}/cmake/WriteEmbeddedFiles.cmake
    DEPENDS ${ARGN} ${PROJECT_SOURCE_DIR}/cmake/WriteEmbeddedFiles.cmake
    COMMENT "Embedding ${symbol}" VERBATIM)
  target_sources(${target} PRIVATE ${generated})
endfunction()
