// Overlap integrals of Slater-type orbitals on two centres.
#pragma once

#include <array>

#include <Eigen/Core>

#include "basis/shell.hpp"

namespace irrepwise {

/// sigma, pi, delta, phi: the overlaps for |m| = 0 to 3; zero beyond the smaller l.
using DiatomicOverlaps = std::array<double, 4>;

/// Overlaps in the diatomic frame: both frames parallel, z from a to b, so the sigma overlap of two
/// p shells far apart is negative.
///
/// @param distance_bohr  positive
/// @returns              no unit, by |m|
/// @accuracy             1e-13 absolute for n <= 7, l <= 3, 0.5 <= zeta <= 20, distance >= 0.5
[[nodiscard]] DiatomicOverlaps diatomic_overlaps(const ContractedRadial& radial_a, int l_a,
                                                 const ContractedRadial& radial_b, int l_b,
                                                 double distance_bohr);

/// Overlaps of two shells in the molecular frame.
///
/// @param displacement_bohr  from the centre of a to that of b
/// @returns                  `(2 l_a + 1) x (2 l_b + 1)`, orders and phases of the conventions
[[nodiscard]] Eigen::MatrixXd overlap_block(const Shell& a, const Shell& b,
                                            const Eigen::Vector3d& displacement_bohr);

}  // namespace irrepwise
