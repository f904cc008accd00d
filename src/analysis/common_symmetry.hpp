// The symmetry that two molecules have in common, and what their irreps become in it.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "symmetry/point_group.hpp"

namespace irrepwise {

struct CommonSymmetry {
  PointGroup group;
  std::vector<std::vector<int>> first;   // [irrep of the first group][irrep of the common one]
  std::vector<std::vector<int>> second;  // the same for the second
};

/// Operations are the same where no element of their matrices differs by more than 0.1, so that
/// variants of slightly different shape still share what they look like. Where the common group is
/// the whole of one of the two, its frame and labels are used.
///
/// @param turn  from the standard frame of the second to that of the first
[[nodiscard]] CommonSymmetry common_symmetry(const PointGroup& first, const PointGroup& second,
                                             const Eigen::Matrix3d& turn);

}  // namespace irrepwise
