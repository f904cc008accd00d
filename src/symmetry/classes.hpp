// Conjugacy classes of a point group, with the symbols that character tables print.
#pragma once

#include <string>
#include <vector>

#include <Eigen/Core>

#include "symmetry/schoenflies.hpp"

namespace irrepwise {

struct ConjugacyClass {
  std::string symbol;           // "E", "2C4", "2C2'", "3sigmad": ASCII, the size included
  std::vector<int> operations;  // indices, ascending
};

/// Identity first, then rotations by falling order, inversion, rotoreflections, mirrors.
/// Infinite groups: classes of the continuous group, "2Cphi" standing for every angle; their
/// operations are the nodes that fall into the class.
///
/// @param products  [g * order + h]: index of g after h
[[nodiscard]] std::vector<ConjugacyClass> find_classes(
    const Schoenflies& symbol, const std::vector<Eigen::Matrix3d>& operations,
    const std::vector<int>& products, const std::vector<int>& inverses);

}  // namespace irrepwise
