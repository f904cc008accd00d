// Overlaps in the SALC basis: one block per irrep, one partner row of each.
#pragma once

#include <functional>
#include <variant>
#include <vector>

#include <Eigen/Core>

#include "salc/salc_basis.hpp"

namespace irrepwise {

/// `n_salcs x n_salcs`: real symmetric, or Hermitian for a pair of complex conjugate irreps.
using SymmetryBlock = std::variant<Eigen::MatrixXd, Eigen::MatrixXcd>;

/// What a rule makes of each overlap in the diatomic frame; the overlap itself by default.
using OverlapMap = std::function<double(double)>;

/// The part of the overlap between orbitals of different atoms, per irrep; within one atom shells
/// are orthonormal and the whole block is the identity plus this.
///
/// Only overlaps between one representative of each set and all other atoms are computed. With K =
/// sum_b D(g_b) ⊗ [S(a, b) D_l(g_b)] over the atoms b of a set, the block element of X and Y is
/// (n_a / d) sum X K Y, where d is 1 and D the phase for complex pairs.
///
/// @source  derived by us; see DEVELOPERS.md
[[nodiscard]] std::vector<SymmetryBlock> off_site_blocks(const MolecularSymmetry& symmetry,
                                                         const Basis& basis, const SalcBasis& salcs,
                                                         const OverlapMap& map = {});

}  // namespace irrepwise
