#include "support/paths.hpp"

std::string source_path(const std::string& name) { return IRREPWISE_SOURCE "/" + name; }

std::string reference_path(const std::string& name) {
  return source_path("tests/reference/" + name);
}
