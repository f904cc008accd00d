# Compiles a text file into the library, so that the program finds it wherever it runs.
#
#   irrepwise_embed(published_yaml ${PROJECT_SOURCE_DIR}/params/published.yaml)
#
# defines, for sources that declare it, `extern const std::string_view published_yaml` in namespace
# irrepwise. Run as a script (cmake -P) this same file writes that source.

if(CMAKE_SCRIPT_MODE_FILE)
  file(READ "${TEXT_FILE}" rest)
  set(source "// Written by the build from a data file: change that file, not this one.\n")
  string(APPEND source "#include <string_view>\n\nnamespace irrepwise {\n\n")
  string(APPEND source "extern const std::string_view ${NAME};\nconst std::string_view ${NAME} =\n")
  # Compilers need not take a literal of more than 64 KiB: whole lines in pieces well below that.
  set(longest 12000)
  string(LENGTH "${rest}" length)
  while(length GREATER 0)
    set(size ${length})
    if(size GREATER longest)
      string(SUBSTRING "${rest}" 0 ${longest} piece)
      string(FIND "${piece}" "\n" size REVERSE)
      if(size LESS 0)
        message(FATAL_ERROR "${TEXT_FILE}: a line is longer than ${longest} bytes")
      endif()
      math(EXPR size "${size} + 1")
    endif()
    string(SUBSTRING "${rest}" 0 ${size} piece)
    string(SUBSTRING "${rest}" ${size} -1 rest)
    string(LENGTH "${rest}" length)
    string(APPEND source "R\"embedded(${piece})embedded\"\n")
  endwhile()
  string(APPEND source "    ;\n\n}  // namespace irrepwise\n")
  file(WRITE "${CPP_FILE}" "${source}")
  return()
endif()

set(irrepwise_embed_script ${CMAKE_CURRENT_LIST_FILE} CACHE INTERNAL "")

function(irrepwise_embed name text_file)
  set(cpp_file ${CMAKE_CURRENT_BINARY_DIR}/${name}.cpp)
  add_custom_command(OUTPUT ${cpp_file}
    COMMAND ${CMAKE_COMMAND} -DNAME=${name} -DTEXT_FILE=${text_file} -DCPP_FILE=${cpp_file}
      -P ${irrepwise_embed_script}
    DEPENDS ${text_file} ${irrepwise_embed_script}
    COMMENT "Embedding ${text_file}"
    VERBATIM)
  # The library is defined in another folder, where a rule of this one is not seen: a target is.
  add_custom_target(irrepwise_embed_${name} DEPENDS ${cpp_file})
  add_dependencies(irrepwise irrepwise_embed_${name})
  set_source_files_properties(${cpp_file} TARGET_DIRECTORY irrepwise PROPERTIES GENERATED TRUE)
  target_sources(irrepwise PRIVATE ${cpp_file})
endfunction()
