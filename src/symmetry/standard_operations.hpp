// The operations of every point group as matrices in the standard frame of the conventions.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "symmetry/schoenflies.hpp"

namespace irrepwise {

/// Number of equidistant angles that stand for the turns about the axis of a linear molecule.
/// Products of two functions with |m| <= 3 have |m| <= 6, and the mean over 8 angles is exact
/// below |m| = 8.
inline constexpr int linear_quadrature_angles = 8;

/// Identity first. z is the principal axis; x lies along a C2' (Dn, Dnh, Dnd) or in a σv (Cnv); the
/// mirror of Cs is xy; cubic axes are x, y, z; icosahedral groups have C2 axes along x, y, z and a
/// C5 axis along (0, 1, φ). Infinite groups: nodes of a quadrature over the group (see
/// `PointGroup`).
///
/// @accuracy  elements within 2 eps of the exact ones; 0, ±1/2, ±1 exact
[[nodiscard]] std::vector<Eigen::Matrix3d> standard_operations(const Schoenflies& symbol);

}  // namespace irrepwise
