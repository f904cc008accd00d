#include "core/error.hpp"

#include <fmt/format.h>

namespace irrepwise {

Error error_at(std::string_view place, const Error& error) {
  return Error(fmt::format("{}: {}", place, error.what()));
}

std::string file_place(std::string_view file, int line, int column) {
  if (line <= 0) return std::string(file);
  if (column <= 0) return fmt::format("{}:{}", file, line);
  return fmt::format("{}:{}:{}", file, line, column);
}

}  // namespace irrepwise
