// Real spherical harmonics for l = 0 to 3, in the order and with the phases of the conventions:
// s; px py pz; dz2 dx2-y2 dxy dxz dyz; fz3 fxz2 fyz2 fz(x2-y2) fxyz fx(x2-3y2) fy(3x2-y2).
#pragma once

#include <Eigen/Core>

namespace irrepwise {

/// A matrix or vector over the functions of one l, at most 7: it lives without allocation.
using HarmonicMatrix = Eigen::Matrix<double, Eigen::Dynamic, Eigen::Dynamic, Eigen::ColMajor, 7, 7>;
using HarmonicVector = Eigen::Matrix<double, Eigen::Dynamic, 1, Eigen::ColMajor, 7, 1>;

/// How the harmonics of one l turn: Y_i(g^-1 r) = sum_j Y_j(r) D_ji(g), so D(gh) = D(g) D(h) and
/// column i holds what the operation makes of function i.
///
/// @param l          0 to 3
/// @param operation  orthogonal, proper or improper
/// @returns          orthogonal, `(2l+1) x (2l+1)`; for an operation that permutes the axes up to
///                   sign, elements that are 0, 1 or -1 are exactly so
/// @accuracy         2e-15 per element for an operation orthogonal to rounding
/// @source           our derivation: images as symmetric tensors, projected on the harmonic ones
[[nodiscard]] HarmonicMatrix harmonic_rotation(int l, const Eigen::Matrix3d& operation);

/// Values of the 2l + 1 functions, normalised over the unit sphere.
/// @param l          0 to 3
/// @param direction  unit vector
/// @accuracy         8 eps of the largest value a function of this l takes
[[nodiscard]] HarmonicVector real_harmonics(int l, const Eigen::Vector3d& direction);

}  // namespace irrepwise
