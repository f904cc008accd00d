// Overlap integrals of Slater-type orbitals on two centres.
#pragma once

#include <Eigen/Core>

#include "basis/shell.hpp"
#include "overlap/diatomic_frame.hpp"

namespace irrepwise {

/// One normalised Slater function. Unlike `SlaterRadial` it may have n = 8, which derivatives with
/// respect to the exponent of a 7s or 7p shell lead to.
struct SlaterFunction {
  int n = 1;
  double zeta = 1.0;  // 1/bohr
};

/// Overlaps of two single functions, as below.
/// @param a, b  no more than one of them with n = 8
[[nodiscard]] DiatomicOverlaps slater_overlaps(const SlaterFunction& a, int l_a,
                                               const SlaterFunction& b, int l_b,
                                               double distance_bohr);

/// Overlaps in the diatomic frame: both frames parallel, z from a to b, so the sigma overlap of two
/// p shells far apart is negative. Exchanging a and b changes the sign by (-1)^(l_a + l_b), and
/// nothing else but rounding.
///
/// @param l_a, l_b       0 to 3, smaller than the n of their radial function
/// @param distance_bohr  positive and finite
/// @returns              no unit, by |m|, never NaN: far apart they fall to zero
/// @accuracy             2e-14 absolute for n <= 7, l <= 3, 0.5 <= zeta <= 20, distance >= 0.5;
///                       worst found 1.1e-14. The same for every zeta that a SlaterRadial admits,
///                       distance >= 0.1
/// @source               see overlap_table.hpp
[[nodiscard]] DiatomicOverlaps diatomic_overlaps(const ContractedRadial& radial_a, int l_a,
                                                 const ContractedRadial& radial_b, int l_b,
                                                 double distance_bohr);

/// Overlaps of two shells in the molecular frame.
///
/// @param displacement_bohr  from the centre of a to that of b
/// @returns                  `(2 l_a + 1) x (2 l_b + 1)`, orders and phases of the conventions
[[nodiscard]] OverlapBlock overlap_block(const Shell& a, const Shell& b,
                                         const Eigen::Vector3d& displacement_bohr);

}  // namespace irrepwise
