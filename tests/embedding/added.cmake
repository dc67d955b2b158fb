# Configures a foreign project that adds leat as a folder and checks what leat did to it; then the same project with a
# guest that offends against every rule, which must be told of each.
include(${CMAKE_CURRENT_LIST_DIR}/step.cmake)
file(REMOVE_RECURSE ${WORK})
set(configure ${CMAKE_COMMAND} -S ${CMAKE_CURRENT_LIST_DIR}/added -G ${GENERATOR} -DCMAKE_CXX_COMPILER=${COMPILER})

# count_tests(FOLDER): how many tests the project that was configured there offers.
function(count_tests folder)
  step("listing the tests" ${CMAKE_CTEST_COMMAND} --test-dir ${folder} -N)
  string(REGEX MATCH "Total Tests: ([0-9]+)" matched "${step_output}")
  set(test_count ${CMAKE_MATCH_1} PARENT_SCOPE)
endfunction()

step("configuring" ${configure} -B ${WORK}/good -DGUEST=${LEAT_SOURCE})
count_tests(${WORK}/good)
if(NOT test_count EQUAL 0)
  message(FATAL_ERROR "leat adds tests to a foreign project: ${test_count}")
endif()

set(offender ${CMAKE_CURRENT_LIST_DIR}/added/offender)
execute_process(COMMAND ${configure} -B ${WORK}/offender -DGUEST=${offender}
                RESULT_VARIABLE status OUTPUT_QUIET ERROR_VARIABLE told)
foreach(offence "changed CMAKE_CXX_FLAGS" "new CMAKE_OFFENDER" "new OFFENDER_OPTION" "targets: leat;offender"
                "options: -march=native")
  string(FIND "${told}" "${offence}" position)
  if(position EQUAL -1)
    message(FATAL_ERROR "the offender was not told of '${offence}' but only:\n${told}")
  endif()
endforeach()
if(status EQUAL 0)
  message(FATAL_ERROR "the offender passed")
endif()
step("configuring the offender unchecked" ${configure} -B ${WORK}/offender -DGUEST=${offender} -DGUEST_UNCHECKED=ON)
count_tests(${WORK}/offender)
if(NOT test_count EQUAL 1)
  message(FATAL_ERROR "the offender's test was not seen")
endif()
