# step(WHAT COMMAND...): runs one step of an embedding test; stops with its output when it fails.
function(step what)
  execute_process(COMMAND ${ARGN} RESULT_VARIABLE status OUTPUT_VARIABLE output ERROR_VARIABLE output)
  if(NOT status EQUAL 0)
    message(FATAL_ERROR "${what} failed (${status}):\n${output}")
  endif()
  set(step_output "${output}" PARENT_SCOPE)
endfunction()

# require_version(PROGRAM): the program runs and prints the version of the library that it was linked with.
function(require_version program)
  step("running ${program}" ${program})
  if(NOT step_output STREQUAL "leat ${LEAT_VERSION}\n")
    message(FATAL_ERROR "${program} printed '${step_output}', not 'leat ${LEAT_VERSION}'")
  endif()
endfunction()

# use_install_tree(PREFIX): builds and runs a foreign program by find_package, and one by pkg-config.
function(use_install_tree prefix)
  step("configuring by find_package" ${CMAKE_COMMAND} -S ${CMAKE_CURRENT_LIST_DIR}/installed -B ${WORK}/found
       -G ${GENERATOR} -DCMAKE_CXX_COMPILER=${COMPILER} -DCMAKE_CXX_FLAGS=${FLAGS} -DCMAKE_PREFIX_PATH=${prefix})
  step("building by find_package" ${CMAKE_COMMAND} --build ${WORK}/found)
  require_version(${WORK}/found/foreign)

  if(NOT PKG_CONFIG)
    message("pkg-config is not there; that way of finding leat was not tried")
    return()
  endif()
  file(GLOB_RECURSE description ${prefix}/*/leat.pc)
  get_filename_component(folder ${description} DIRECTORY)
  set(ENV{PKG_CONFIG_PATH} ${folder})
  step("asking pkg-config" ${PKG_CONFIG} --cflags --libs leat)
  separate_arguments(found_flags UNIX_COMMAND "${step_output}")
  separate_arguments(own_flags UNIX_COMMAND "${FLAGS}")
  get_filename_component(library_folder ${folder} DIRECTORY)
  step("compiling by pkg-config" ${COMPILER} ${own_flags} -std=c++20 ${CMAKE_CURRENT_LIST_DIR}/foreign/foreign.cpp
       -o ${WORK}/by_pkg_config ${found_flags} -Wl,-rpath,${library_folder})
  require_version(${WORK}/by_pkg_config)
endfunction()
