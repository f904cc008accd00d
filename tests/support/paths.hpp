// Where tests find the files of the project.
#pragma once

#include <string>

/// @param name  "params/published.yaml": relative to the top of the project
[[nodiscard]] std::string source_path(const std::string& name);

/// @param name  of a table in tests/reference
[[nodiscard]] std::string reference_path(const std::string& name);
