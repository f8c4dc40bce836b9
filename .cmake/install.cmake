# Installs the program, the floors as static libraries with their headers, and a package file:
#   find_package(ringwright) gives ringwright::models, ::solver, ::postprocess, ::cases.
include(GNUInstallDirs)
include(CMakePackageConfigHelpers)

set(package_dir ${CMAKE_INSTALL_LIBDIR}/cmake/ringwright)
set(floors models solver postprocess cases)
list(TRANSFORM floors PREPEND ringwright_ OUTPUT_VARIABLE floor_targets)

install(TARGETS ringwright)
install(FILES cases/command/shell/ringwright.1 DESTINATION ${CMAKE_INSTALL_MANDIR}/man1)
install(FILES cases/command/shell/ringwright.bash RENAME ringwright
  DESTINATION ${CMAKE_INSTALL_DATADIR}/bash-completion/completions)
install(TARGETS ${floor_targets} EXPORT ringwright_targets)
foreach(floor IN LISTS floors)
  install(DIRECTORY ${floor} DESTINATION ${CMAKE_INSTALL_INCLUDEDIR}/ringwright
    FILES_MATCHING PATTERN "*.hpp")
endforeach()
install(EXPORT ringwright_targets NAMESPACE ringwright:: DESTINATION ${package_dir})

configure_package_config_file(.cmake/ringwright-config.cmake.in
  ${CMAKE_CURRENT_BINARY_DIR}/ringwright-config.cmake INSTALL_DESTINATION ${package_dir})
write_basic_package_version_file(${CMAKE_CURRENT_BINARY_DIR}/ringwright-config-version.cmake
  COMPATIBILITY SameMinorVersion)
install(FILES
  ${CMAKE_CURRENT_BINARY_DIR}/ringwright-config.cmake
  ${CMAKE_CURRENT_BINARY_DIR}/ringwright-config-version.cmake
  .cmake/FindKLU.cmake .cmake/FindUDUNITS2.cmake
  DESTINATION ${package_dir})
