# leat_catch_tests(PROGRAM ROOM): every test case of a Catch2 program becomes a test of its own, "ROOM: NAME".
# Cases tagged [long] get the label `long` and more time. Done here, because one pass then serves both major versions
# of Catch2 and both labels, and because a program without a single case is an error.
set(LEAT_TEST_TIMEOUT 300 CACHE STRING "Seconds that one test may take; a long test six times as many")
set(leat_list_catch_tests ${CMAKE_CURRENT_LIST_DIR}/leat_list_catch_tests.cmake)

function(leat_catch_tests program room)
  math(EXPR long_timeout "6 * ${LEAT_TEST_TIMEOUT}")
  set(list_file ${CMAKE_CURRENT_BINARY_DIR}/${program}_tests.cmake)
  add_custom_command(
    TARGET ${program} POST_BUILD
    BYPRODUCTS ${list_file}
    COMMAND ${CMAKE_COMMAND} -DPROGRAM=$<TARGET_FILE:${program}> -DROOM=${room} -DLIST_FILE=${list_file}
            -DCATCH_VERSION=${Catch2_VERSION} -DTIMEOUT=${LEAT_TEST_TIMEOUT} -DLONG_TIMEOUT=${long_timeout}
            -P ${leat_list_catch_tests}
    VERBATIM)
  set(include_file ${CMAKE_CURRENT_BINARY_DIR}/${program}_include.cmake)
  file(WRITE ${include_file} "if(EXISTS \"${list_file}\")\n  include(\"${list_file}\")\nelse()\n"
                             "  add_test(\"${room}: not built\" \"${program}_not_built\")\nendif()\n")
  set_property(DIRECTORY APPEND PROPERTY TEST_INCLUDE_FILES ${include_file})
endfunction()
