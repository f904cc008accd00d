// From a job to its levels and populations, the same for every command that needs them.
#pragma once

#include <string>

#include "job/job.hpp"
#include "output/levels_result.hpp"

namespace irrepwise::cli {

/// @param file    how messages call the job
/// @throws Error  with the file as its place
[[nodiscard]] LevelsResult computed(const Job& job, const std::string& file);

}  // namespace irrepwise::cli
