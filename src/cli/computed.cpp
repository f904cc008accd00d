#include "cli/computed.hpp"

#include "core/at_place.hpp"

namespace irrepwise::cli {

LevelsResult computed(const Job& job, const std::string& file) {
  return at_place(file, [&] { return levels_result(job); });
}

}  // namespace irrepwise::cli
