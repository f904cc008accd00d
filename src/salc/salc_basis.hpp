// Symmetry-adapted linear combinations (SALCs) of the orbitals of equivalent atoms.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "basis/basis.hpp"
#include "salc/equivalent_atoms.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

/// One SALC of one shell on one set of equivalent atoms, all partners at once. With X the matrix
/// kept here, D the irrep's matrices and D_l those of the shell, the coefficients of partner r on
/// the image of the representative under g are row r of D(g) X D_l(g)^T. Each partner has the sum
/// of squares 1 over the whole set, which fixes |X|^2 = dimension / number of atoms.
struct Salc {
  int set = 0;                     // index in SalcBasis::sets
  int shell = 0;                   // index in the basis of the representative's shell
  Eigen::MatrixXd representative;  // X: `dimension x (2l + 1)`
};

struct SalcBasis {
  std::vector<EquivalentAtoms> sets;
  std::vector<std::vector<Salc>> by_irrep;  // ordered by set, then shell
};

/// SALCs by projection. What the projection operators leave of a shell is an invariant of the site
/// group: D(h) X D_l(h)^T = X for every h that keeps the representative. Their number is checked
/// against (1/|site group|) sum_h χ(h) χ_l(h) (Frobenius reciprocity), and the total of all
/// partners against the number of orbitals.
///
/// For a pair of complex conjugate irreps X holds the real and the imaginary part of one complex
/// row; i X, which spans the same pair of partners, is not listed.
///
/// @param basis  equal atoms of a set must have equal shells
[[nodiscard]] SalcBasis make_salcs(const MolecularSymmetry& symmetry, const Basis& basis);

/// @returns  the coefficients of all partners over the atom's shell, `dimension x (2l + 1)`
/// @param position  index of the atom in its set
[[nodiscard]] Eigen::MatrixXd salc_on_atom(const MolecularSymmetry& symmetry,
                                           const SalcBasis& salcs, int irrep,
                                           const Eigen::MatrixXd& representative, int set,
                                           int position, int l);

}  // namespace irrepwise
