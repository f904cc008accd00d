#include "cli/computed.hpp"

#include "cli/in_job.hpp"

namespace irrepwise::cli {

LevelsResult computed(const Job& job, const std::string& file) {
  return in_job(job, file, [&] { return levels_result(job); });
}

}  // namespace irrepwise::cli
