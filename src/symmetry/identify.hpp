// Which point group a closed set of operations is, and some frame in which it is the standard one.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "symmetry/schoenflies.hpp"
#include "symmetry/subgroups.hpp"

namespace irrepwise {

/// Orders of the operations come from the table and are exact; the matrices only tell kinds and
/// directions, so they may be distorted.
///
/// @param operations  of a closed subset of the table, by its indices
[[nodiscard]] Schoenflies identify_group(const PartialTable& table,
                                         const std::vector<Eigen::Matrix3d>& operations,
                                         const Subset& subset);

/// Some proper rotation R (not yet the one of the conventions) such that R g R^T, over the subset,
/// are the standard operations of the group, as near as distorted matrices allow.
[[nodiscard]] Eigen::Matrix3d some_standard_frame(const Schoenflies& symbol,
                                                  const PartialTable& table,
                                                  const std::vector<Eigen::Matrix3d>& operations,
                                                  const Subset& subset);

}  // namespace irrepwise
