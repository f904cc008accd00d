// Making coordinates exactly symmetric: the average over the group, in the frame that fits best.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "symmetry/point_group.hpp"

namespace irrepwise {

struct SymmetrisedPositions {
  Eigen::Matrix3d rotation;              // refined: from the input frame to the standard one
  Eigen::Matrix3Xd positions;            // Å, standard frame, exactly symmetric
  std::vector<std::vector<int>> images;  // [operation of the group][atom]
};

/// Alternates between averaging the images of each atom and turning the input onto the average,
/// until neither moves.
///
/// @param positions  Å, input frame, centre of the group at the origin, `3 x n_atoms`
/// @param rotation   a frame in which the group is roughly standard
/// @param held       matrices of the operations found, input frame, one for each of the group
/// @param held_images  [held operation][atom]
[[nodiscard]] SymmetrisedPositions symmetrise(const PointGroup& group,
                                              const Eigen::Ref<const Eigen::Matrix3Xd>& positions,
                                              const Eigen::Matrix3d& rotation,
                                              const std::vector<Eigen::Matrix3d>& held,
                                              const std::vector<std::vector<int>>& held_images);

}  // namespace irrepwise
