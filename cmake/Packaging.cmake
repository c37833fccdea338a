# SPDX-FileCopyrightText: The Vialkeeper developers
# SPDX-License-Identifier: GPL-3.0-or-later

# What an installation holds besides programs and modules, and how CPack makes a Debian package of
# it: `cpack --config build/release/CPackConfig.cmake`.
set(packaging ${PROJECT_SOURCE_DIR}/packaging)
install(FILES ${packaging}/vialkeeper.1 DESTINATION ${CMAKE_INSTALL_MANDIR}/man1)
install(FILES ${PROJECT_SOURCE_DIR}/README.md ${PROJECT_SOURCE_DIR}/CHANGELOG.md
        DESTINATION ${CMAKE_INSTALL_DOCDIR})
install(FILES ${PROJECT_SOURCE_DIR}/LICENSE DESTINATION ${CMAKE_INSTALL_DOCDIR} RENAME copyright)
if(VIALKEEPER_WITH_DESKTOP)
  install(FILES ${packaging}/vialkeeper-desktop.1 DESTINATION ${CMAKE_INSTALL_MANDIR}/man1)
  install(FILES ${packaging}/vialkeeper.desktop DESTINATION ${CMAKE_INSTALL_DATADIR}/applications)
  install(FILES ${packaging}/vialkeeper.svg
          DESTINATION ${CMAKE_INSTALL_DATADIR}/icons/hicolor/scalable/apps)
  install(FILES ${packaging}/vialkeeper-mime.xml
          DESTINATION ${CMAKE_INSTALL_DATADIR}/mime/packages RENAME vialkeeper.xml)
endif()

set(CPACK_GENERATOR DEB)
set(CPACK_PACKAGE_NAME vialkeeper)
set(CPACK_PACKAGE_VENDOR "The Vialkeeper developers")
set(CPACK_PACKAGE_CONTACT "The Vialkeeper developers <vialkeeper@example.org>")
set(CPACK_PACKAGE_DESCRIPTION_SUMMARY ${PROJECT_DESCRIPTION})
set(CPACK_PACKAGE_INSTALL_DIRECTORY vialkeeper)
set(CPACK_PACKAGING_INSTALL_PREFIX /usr)
set(CPACK_STRIP_FILES ON)
set(CPACK_DEBIAN_FILE_NAME DEB-DEFAULT)
set(CPACK_DEBIAN_PACKAGE_SECTION science)
set(CPACK_DEBIAN_PACKAGE_SHLIBDEPS ON)
# What is opened at run time only, or read as a file: no linker knows of it.
set(CPACK_DEBIAN_PACKAGE_DEPENDS "fonts-dejavu-core, libqt6svg6")
set(CPACK_DEBIAN_PACKAGE_SHLIBDEPS_PRIVATE_DIRS ${VIALKEEPER_MODULE_OUTPUT_DIRECTORY})
include(CPack)
