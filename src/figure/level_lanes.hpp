// Which levels of a diagram must step aside, so that bars, arrows and labels never collide.
#pragma once

#include <cstddef>
#include <vector>

namespace irrepwise {

/// @param heights      of the levels, px
/// @param least_apart  px between two levels of one lane
/// @param served_first  indices of levels that choose before the others
/// @returns            per level its lane, 0 the main one; each level takes the first that is free
[[nodiscard]] std::vector<int> level_lanes(const std::vector<double>& heights, double least_apart,
                                           const std::vector<std::size_t>& served_first = {});

/// Moves places apart as little as it takes (least squares), keeping their order.
/// @param places       px, ascending
/// @param least_apart  px
[[nodiscard]] std::vector<double> spread_apart(const std::vector<double>& places,
                                               double least_apart);

}  // namespace irrepwise
