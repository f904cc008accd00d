// Names that tell the ways apart in which a subgroup lies in a group.
#pragma once

#include <string>
#include <vector>

#include "symmetry/point_group.hpp"

namespace irrepwise {

/// @param ways  for each way, [operation of the subgroup]: index in the group
/// @returns     the names as `Embedding` describes them, all different
[[nodiscard]] std::vector<std::string> embedding_names(const PointGroup& group,
                                                       const PointGroup& subgroup,
                                                       const std::vector<std::vector<int>>& ways);

}  // namespace irrepwise
