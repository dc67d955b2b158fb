# Private compile options of every target of this project; nothing here but the C++ standard reaches a consumer.
function(leat_compile_options target)
  target_compile_features(${target} PUBLIC cxx_std_20)
  set_target_properties(${target} PROPERTIES CXX_EXTENSIONS OFF)
  target_compile_options(${target} PRIVATE -Wall -Wextra -Wpedantic -Wshadow -Wconversion -Wno-sign-conversion)
  if(CMAKE_CXX_COMPILER_ID STREQUAL GNU AND CMAKE_CXX_COMPILER_VERSION VERSION_LESS 13)
    # GCC 12 gives this warning without reason for "literal" + std::string (its bug 105651).
    target_compile_options(${target} PRIVATE -Wno-restrict)
  endif()
  # Lets loops with comparisons and roots vectorise; changes no result of finite arithmetic.
  target_compile_options(${target} PRIVATE -fno-math-errno -fno-trapping-math)
  if(LEAT_WARNINGS_AS_ERRORS)
    target_compile_options(${target} PRIVATE -Werror)
  endif()
  if(LEAT_SANITIZE)
    target_compile_options(${target} PRIVATE -fsanitize=${LEAT_SANITIZE} -fno-omit-frame-pointer -fno-sanitize-recover=all)
    target_link_options(${target} PRIVATE -fsanitize=${LEAT_SANITIZE})
  endif()
endfunction()

# This machine's instructions, fused multiply-add included. Results then differ in the last bits between machines,
# so it is a choice of whoever builds, and never part of what an installed leat asks of its users.
function(leat_native_options target)
  if(LEAT_NATIVE)
    target_compile_options(${target} PRIVATE -march=native -ffp-contract=fast)
  endif()
endfunction()
