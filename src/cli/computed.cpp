#include "cli/computed.hpp"

#include "core/error.hpp"

namespace irrepwise::cli {

LevelsResult computed(const Job& job, const std::string& file) {
  try {
    return levels_result(job);
  } catch (const Error& error) {
    throw error_in(job, file, error);
  }
}

}  // namespace irrepwise::cli
