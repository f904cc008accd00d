// From the SALC basis back to atomic orbitals, one partner after the other.
#pragma once

#include <Eigen/Core>

#include "basis/basis.hpp"
#include "salc/salc_basis.hpp"

namespace irrepwise {

/// A vector over the SALCs of one irrep, written out over atomic orbitals for every partner.
///
/// @param column  over the SALCs of the irrep
/// @returns       `n_orbitals x dimension`, standard frame; partners of a complex pair are √2 times
///                the real and the imaginary part
[[nodiscard]] Eigen::MatrixXd expanded(const MolecularSymmetry& symmetry, const Basis& basis,
                                       const SalcBasis& salcs, int irrep,
                                       const Eigen::Ref<const Eigen::VectorXd>& column);
[[nodiscard]] Eigen::MatrixXd expanded(const MolecularSymmetry& symmetry, const Basis& basis,
                                       const SalcBasis& salcs, int irrep,
                                       const Eigen::Ref<const Eigen::VectorXcd>& column);

}  // namespace irrepwise
