# What `cmake --install` puts where: program, library, public headers, CMake package.
# The parameter data is installed by the room that owns it.
include(CMakePackageConfigHelpers)

set(package_dir ${CMAKE_INSTALL_LIBDIR}/cmake/irrepwise)

install(TARGETS irrepwise EXPORT irrepwiseTargets
  ARCHIVE DESTINATION ${CMAKE_INSTALL_LIBDIR}
  LIBRARY DESTINATION ${CMAKE_INSTALL_LIBDIR})
install(TARGETS irrepwise_program RUNTIME DESTINATION ${CMAKE_INSTALL_BINDIR})

# Headers that show fmt, yaml-cpp, JSON or CLI11 are for our own sources only.
install(DIRECTORY ${CMAKE_CURRENT_SOURCE_DIR}/ DESTINATION ${CMAKE_INSTALL_INCLUDEDIR}/irrepwise
  FILES_MATCHING PATTERN "*.hpp"
  PATTERN "cli" EXCLUDE
  PATTERN "core/yaml.hpp" EXCLUDE
  PATTERN "molecule/atoms_yaml.hpp" EXCLUDE
  PATTERN "basis/parameter_yaml.hpp" EXCLUDE
  PATTERN "job/job_file.hpp" EXCLUDE
  PATTERN "output/json_text.hpp" EXCLUDE
  PATTERN "output/table_document.hpp" EXCLUDE)

install(EXPORT irrepwiseTargets NAMESPACE irrepwise:: DESTINATION ${package_dir})
configure_package_config_file(${CMAKE_CURRENT_SOURCE_DIR}/irrepwiseConfig.cmake.in
  ${PROJECT_BINARY_DIR}/irrepwiseConfig.cmake INSTALL_DESTINATION ${package_dir})
write_basic_package_version_file(${PROJECT_BINARY_DIR}/irrepwiseConfigVersion.cmake
  COMPATIBILITY SameMinorVersion)
install(FILES ${PROJECT_BINARY_DIR}/irrepwiseConfig.cmake
  ${PROJECT_BINARY_DIR}/irrepwiseConfigVersion.cmake DESTINATION ${package_dir})
