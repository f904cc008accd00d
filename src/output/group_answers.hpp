// Tables of products, terms, descents and transitions.
#pragma once

#include <vector>

#include "analysis/symmetry_result.hpp"
#include "output/table.hpp"

namespace irrepwise {

/// Products, terms and descents that were asked for.
[[nodiscard]] std::vector<Table> answer_tables(const PointGroup& group,
                                               const GroupAnswers& answers);

/// Transitions between frontier levels; terms and distortions of an open shell.
[[nodiscard]] std::vector<Table> frontier_tables(const PointGroup& group,
                                                 const FrontierSymmetry& frontier);

}  // namespace irrepwise
