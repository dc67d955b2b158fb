# Finds the serial HDF5 C library, 1.10 or later, as the imported target leat::hdf5. Used by the build and, when leat
# is static, by its installed package. CMake's own module wants the C language enabled, which a C++ project that
# embeds leat need not have.
if(NOT TARGET leat::hdf5)
  find_path(LEAT_HDF5_INCLUDE_DIR hdf5.h PATH_SUFFIXES hdf5/serial DOC "Folder of hdf5.h (serial)")
  find_library(LEAT_HDF5_LIBRARY NAMES hdf5_serial hdf5 PATH_SUFFIXES hdf5/serial DOC "The serial HDF5 C library")
  mark_as_advanced(LEAT_HDF5_INCLUDE_DIR LEAT_HDF5_LIBRARY)
  if(NOT LEAT_HDF5_INCLUDE_DIR OR NOT LEAT_HDF5_LIBRARY)
    message(FATAL_ERROR "leat needs the HDF5 C library (Debian: libhdf5-dev); "
                        "set LEAT_HDF5_INCLUDE_DIR and LEAT_HDF5_LIBRARY when it is in an unusual place")
  endif()
  set(leat_hdf5_version 0)
  if(EXISTS "${LEAT_HDF5_INCLUDE_DIR}/H5public.h")
    file(STRINGS "${LEAT_HDF5_INCLUDE_DIR}/H5public.h" leat_hdf5_line REGEX "#define[ \t]+H5_VERS_INFO")
    string(REGEX MATCH "[0-9]+\\.[0-9]+\\.[0-9]+" leat_hdf5_version "${leat_hdf5_line}")
  endif()
  if(leat_hdf5_version VERSION_LESS 1.10)
    message(FATAL_ERROR "leat needs HDF5 1.10 or later; ${LEAT_HDF5_INCLUDE_DIR} holds '${leat_hdf5_version}'")
  endif()
  # Global, because the foreign project that links a static leat resolves this name in its own folders.
  add_library(leat::hdf5 UNKNOWN IMPORTED GLOBAL)
  set_target_properties(leat::hdf5 PROPERTIES
    IMPORTED_LOCATION "${LEAT_HDF5_LIBRARY}"
    INTERFACE_INCLUDE_DIRECTORIES "${LEAT_HDF5_INCLUDE_DIR}")
endif()
