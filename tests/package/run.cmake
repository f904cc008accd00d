# Builds the outside program against the installed tree, runs it, and looks at what was installed.
function(step)
  execute_process(COMMAND ${ARGV} RESULT_VARIABLE code OUTPUT_VARIABLE text ERROR_VARIABLE text)
  if(NOT code EQUAL 0)
    message(FATAL_ERROR "failed (${code}): ${ARGV}\n${text}")
  endif()
  set(text "${text}" PARENT_SCOPE)
endfunction()

file(REMOVE_RECURSE ${built})
step(${CMAKE_COMMAND} -S ${source} -B ${built} -G ${generator}
  -D CMAKE_PREFIX_PATH=${installed} -D CMAKE_CXX_COMPILER=${compiler}
  -D CMAKE_CXX_COMPILER_LAUNCHER=${launcher} -D CMAKE_CXX_FLAGS=${flags})
step(${CMAKE_COMMAND} --build ${built})
step(${built}/outside)
# H2 at 0.74 Å: its one occupied level is the even combination, sigma g.
if(NOT text STREQUAL "Dinfh 1sigmag+\n")
  message(FATAL_ERROR "the outside program says: ${text}")
endif()
step(${installed}/bin/irrepwise --version)
file(GLOB_RECURSE headers ${installed}/include/irrepwise/*.hpp)
foreach(header IN LISTS headers)
  file(STRINGS ${header} private REGEX "#include <(fmt/|yaml-cpp/|nlohmann/|CLI/)")
  if(private)
    message(FATAL_ERROR "${header} is public but includes ${private}")
  endif()
endforeach()
