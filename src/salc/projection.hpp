// Projection on one site: which combinations of an atom's functions belong to an irrep of the
// group.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "harmonics/real_harmonics.hpp"
#include "salc/equivalent_atoms.hpp"
#include "symmetry/point_group.hpp"

namespace irrepwise {

/// Functions of one l on the representative of a set, with what the site group makes of them.
struct SiteFunctions {
  int l = 0;
  std::vector<HarmonicMatrix> rotations;  // D_l by operation of the site group
  HarmonicMatrix span;  // orthonormal columns over the shell: the functions in question, which the
                        // site group must not mix with others
};

/// All 2l + 1 functions of a shell.
[[nodiscard]] SiteFunctions whole_shell(const PointGroup& group, const EquivalentAtoms& set, int l);

/// How often the irrep occurs in the functions on the whole set, by Frobenius reciprocity:
/// (1/|site group|) sum_h χ(h) χ_site(h); for a pair of complex conjugates, each of the two.
[[nodiscard]] int multiplicity(const Irrep& irrep, const EquivalentAtoms& set,
                               const SiteFunctions& functions);

/// Orthonormal matrices X, `dimension x (2l + 1)`, with D(h) X D_l(h)^T = X for every h of the site
/// group, as many as `wanted`, chosen so that each keeps as few functions as may be. For a complex
/// pair X holds the real and the imaginary part of a row; i X is not listed.
[[nodiscard]] std::vector<Eigen::MatrixXd> site_invariants(const Irrep& irrep,
                                                           const EquivalentAtoms& set,
                                                           const SiteFunctions& functions,
                                                           int wanted);

}  // namespace irrepwise
