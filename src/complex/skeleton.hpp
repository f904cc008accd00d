// The operations that the metals, donors and directions of a complex allow.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "complex/assembly.hpp"

namespace irrepwise {

/// A group of operations p -> matrix (p - origin) + origin, each with what it does to the sites.
struct SkeletonGroup {
  Eigen::Vector3d origin = Eigen::Vector3d::Zero();
  std::vector<Eigen::Matrix3d> matrices;  // identity first
  std::vector<std::vector<int>> images;   // [operation][site] -> site
  std::vector<int> products;              // [g * order + h]: g after h

  [[nodiscard]] int order() const { return static_cast<int>(matrices.size()); }
};

/// Ligands stand for their directions only. Where all lies on one line, the infinite group is
/// replaced by the finite one that holds the axes of every ligand, and twice their order so that
/// two ligands can stand staggered.
[[nodiscard]] SkeletonGroup skeleton_group(const Assembly& assembly,
                                           const std::vector<int>& metals);

/// @returns  every subgroup as ascending lists of operations, the largest first
[[nodiscard]] std::vector<std::vector<int>> subgroups_largest_first(const SkeletonGroup& group);

}  // namespace irrepwise
