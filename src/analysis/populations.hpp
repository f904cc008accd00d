// Mulliken's populations: gross, net charges, overlap populations, and what each level is made of.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "hueckel/levels.hpp"

namespace irrepwise {

struct OverlapPopulation {
  int atom_a = 0;  // indices from 0, a < b
  int atom_b = 0;
  double distance_angstrom = 0.0;
  double value = 0.0;   // electrons; positive binds
  bool bonded = false;  // near enough to count as a bond by covalent radii
};

/// Orbitals are those of the standard frame, in the order of the basis.
struct Populations {
  Eigen::VectorXd gross_by_orbital;  // electrons, n_orbitals
  Eigen::VectorXd gross_by_atom;     // electrons, n_atoms
  Eigen::VectorXd charge;            // e, n_atoms: valence electrons minus gross population
  std::vector<OverlapPopulation> overlap_populations;  // all pairs, ordered by a then b
  Eigen::MatrixXd shares;  // `n_orbitals x n_levels`: share of each orbital in each level, mean
                           // over partners; each column sums to 1
};

/// @source  Mulliken, J. Chem. Phys. 23, 1833 (1955)
[[nodiscard]] Populations mulliken_populations(const MolecularSymmetry& symmetry,
                                               const Basis& basis, const Levels& levels);

}  // namespace irrepwise
