// How two-centre overlaps change with the exponents of a shell.
#pragma once

#include <vector>

#include "basis/shell.hpp"
#include "overlap/diatomic_frame.hpp"

namespace irrepwise {

/// Derivatives of `diatomic_overlaps` with respect to each exponent of a, in bohr. The ratio of the
/// coefficients is kept and the contraction stays normalised:
///   dR(n,ζ)/dζ = [(2n+1) R(n,ζ) - √((2n+1)(2n+2)) R(n+1,ζ)] / (2ζ),
///   dχ/dζ_p = c_p dR_p/dζ_p - ½ χ dN/dζ_p, N the norm of the contraction.
///
/// @returns   one entry for each term of radial_a; zero beyond the smaller l
/// @accuracy  1e-11 bohr for exponents from 0.5 1/bohr on
/// @source    derived by us from the form of R
[[nodiscard]] std::vector<DiatomicOverlaps> exponent_slopes(const ContractedRadial& radial_a,
                                                            int l_a,
                                                            const ContractedRadial& radial_b,
                                                            int l_b, double distance_bohr);

}  // namespace irrepwise
