# Private compile options of every target of this project; nothing here reaches a consumer.
function(leat_compile_options target)
  target_compile_features(${target} PUBLIC cxx_std_20)
  target_compile_options(${target} PRIVATE -Wall -Wextra -Wpedantic -Wshadow -Wconversion -Wno-sign-conversion)
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
