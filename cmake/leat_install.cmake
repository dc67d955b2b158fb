# Install rules: library, headers, CMake package and pkg-config file, all of which may be moved together afterwards.
include(GNUInstallDirs)
include(CMakePackageConfigHelpers)
set(leat_package_folder ${CMAKE_INSTALL_LIBDIR}/cmake/leat)

install(TARGETS leat EXPORT leat_targets COMPONENT leat_library INCLUDES DESTINATION ${CMAKE_INSTALL_INCLUDEDIR})
install(DIRECTORY lib/leat DESTINATION ${CMAKE_INSTALL_INCLUDEDIR} COMPONENT leat_library FILES_MATCHING PATTERN *.hpp)
install(EXPORT leat_targets NAMESPACE leat:: FILE leat_targets.cmake DESTINATION ${leat_package_folder}
        COMPONENT leat_library)

# Only a static leat passes its own needs on to whoever links it.
get_target_property(leat_type leat TYPE)
if(leat_type STREQUAL STATIC_LIBRARY)
  set(leat_find_dependencies "include(\${CMAKE_CURRENT_LIST_DIR}/leat_hdf5.cmake)")
  set(leat_pkg_config_dependencies " ${LEAT_HDF5_LIBRARY}")
else()
  set(leat_find_dependencies "# A shared leat brings its own dependencies.")
  set(leat_pkg_config_dependencies "")
endif()
configure_package_config_file(cmake/leat_config.cmake.in ${CMAKE_CURRENT_BINARY_DIR}/leat-config.cmake
                              INSTALL_DESTINATION ${leat_package_folder}
                              NO_SET_AND_CHECK_MACRO NO_CHECK_REQUIRED_COMPONENTS_MACRO)
write_basic_package_version_file(${CMAKE_CURRENT_BINARY_DIR}/leat-config-version.cmake COMPATIBILITY SameMinorVersion)
install(FILES ${CMAKE_CURRENT_BINARY_DIR}/leat-config.cmake ${CMAKE_CURRENT_BINARY_DIR}/leat-config-version.cmake
              cmake/leat_hdf5.cmake
        DESTINATION ${leat_package_folder} COMPONENT leat_library)

# The way from the .pc file up to the prefix, so that a moved tree is found.
file(RELATIVE_PATH leat_pkg_config_prefix ${CMAKE_INSTALL_FULL_LIBDIR}/pkgconfig ${CMAKE_INSTALL_PREFIX})
string(REGEX REPLACE "/$" "" leat_pkg_config_prefix "${leat_pkg_config_prefix}")
configure_file(cmake/leat.pc.in ${CMAKE_CURRENT_BINARY_DIR}/leat.pc @ONLY)
install(FILES ${CMAKE_CURRENT_BINARY_DIR}/leat.pc DESTINATION ${CMAKE_INSTALL_LIBDIR}/pkgconfig COMPONENT leat_library)
