# A foreign project that adds leat as a shared library: built, run, installed, moved, and used from there.
include(${CMAKE_CURRENT_LIST_DIR}/step.cmake)
file(REMOVE_RECURSE ${WORK})
step("configuring" ${CMAKE_COMMAND} -S ${CMAKE_CURRENT_LIST_DIR}/added -B ${WORK}/build -G ${GENERATOR}
     -DCMAKE_CXX_COMPILER=${COMPILER} -DCMAKE_CXX_FLAGS=${FLAGS} -DCMAKE_BUILD_TYPE=Release -DGUEST=${LEAT_SOURCE}
     -DBUILD_SHARED_LIBS=ON -DLEAT_INSTALL=ON)
step("building" ${CMAKE_COMMAND} --build ${WORK}/build --parallel 2)
require_version(${WORK}/build/foreign)
step("installing" ${CMAKE_COMMAND} --install ${WORK}/build --prefix ${WORK}/first --component leat_library)
file(RENAME ${WORK}/first ${WORK}/moved)
file(GLOB_RECURSE libraries ${WORK}/moved/*/libleat.so)
if(NOT libraries)
  message(FATAL_ERROR "no shared library was installed")
endif()
use_install_tree(${WORK}/moved)
