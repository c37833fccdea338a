# SPDX-FileCopyrightText: The Vialkeeper developers
# SPDX-License-Identifier: GPL-3.0-or-later
# Run as a script by vialkeeper_embed: writes OUTPUT from FILES (separated by |), named relative to BASE.
string(REPLACE "|" ";" files "${FILES}")
set(text "// Generated from the files named below; edit those.\n#include \"text/embedded_file.h\"\n\n")
string(APPEND text "namespace vialkeeper::text {\n\nextern const EmbeddedFile ${SYMBOL}[];\nextern const std::size_t ${SYMBOL}Count;\n\nconst EmbeddedFile ${SYMBOL}[] = {\n")
set(count 0)
foreach(file IN LISTS files)
  file(READ "${BASE}/${file}" bytes HEX)
  string(LENGTH "${bytes}" length)
  math(EXPR length "${length} / 2")
  string(REGEX REPLACE "(..)" "\\\\x\\1" escaped "${bytes}")
  # A string literal in chunks: no compiler limit on one literal is met.
  string(REGEX REPLACE "(................................................................)" "\\1\"\n    \"" escaped "${escaped}")
  get_filename_component(name "${file}" NAME)
  string(APPEND text "  {\"${name}\", std::string_view(\n    \"${escaped}\", ${length})},\n")
  math(EXPR count "${count} + 1")
endforeach()
string(APPEND text "};\n\nconst std::size_t ${SYMBOL}Count = ${count};\n\n}  // namespace vialkeeper::text\n")
file(WRITE "${OUTPUT}" "${text}")
