// Shipped inputs computed to the end, for tests of what is written about them.
#pragma once

#include <string>

#include "job/job.hpp"
#include "output/levels_result.hpp"
#include "support/paths.hpp"

/// @param name  a file of inputs/
inline irrepwise::LevelsResult input_result(const std::string& name) {
  return irrepwise::levels_result(irrepwise::read_job(source_path("inputs/" + name)));
}
