// S and H over atomic orbitals, for those who ask for the matrices; the levels never need them.
#pragma once

#include <optional>

#include <Eigen/Core>

#include "basis/basis.hpp"
#include "hueckel/options.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

struct DenseMatrices {
  Eigen::MatrixXd overlap;         // `n_orbitals x n_orbitals`, symmetric, unit diagonal
  Eigen::MatrixXd hamiltonian_ev;  // the same shape, eV
};

/// In the frame of the molecule as given, orbitals in the order of the basis.
[[nodiscard]] DenseMatrices dense_matrices(const Molecule& molecule, const Basis& basis, Rule rule,
                                           std::optional<double> k = {});

/// @returns  S only
[[nodiscard]] Eigen::MatrixXd dense_overlap(const Molecule& molecule, const Basis& basis);

}  // namespace irrepwise
