// Irreps of a point group, generated from its operations: matrices, characters, labels.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "symmetry/irrep.hpp"
#include "symmetry/schoenflies.hpp"

namespace irrepwise {

/// All irreps over the real numbers, in the customary order: g before u and ' before ", A, B, E, T,
/// G, H, then by subscript. Infinite groups: the irreps of functions with |m| (Kh: l) up to 3, and
/// Sigma-.
///
/// Axial groups: an operation is a turn or flip M of the xy plane and a sign s of z; every irrep is
/// the restriction of one of the functions 1, det M, or the pair cos kφ, sin kφ, times 1 or s.
/// Cubic and icosahedral groups: from the real harmonics of l = 1, 2, 3.
///
/// @param operations  those of `standard_operations(symbol)`
/// @source            derived by us from the definition of an irrep; labels as in the conventions
[[nodiscard]] std::vector<Irrep> generate_irreps(const Schoenflies& symbol,
                                                 const std::vector<Eigen::Matrix3d>& operations);

/// The two halves of the above.
[[nodiscard]] std::vector<Irrep> axial_irreps(const Schoenflies& symbol,
                                              const std::vector<Eigen::Matrix3d>& operations);
[[nodiscard]] std::vector<Irrep> polyhedral_irreps(const Schoenflies& symbol,
                                                   const std::vector<Eigen::Matrix3d>& operations);

}  // namespace irrepwise
