#include "analysis/populations.hpp"

#include <cmath>

#include "analysis/level_coefficients.hpp"
#include "core/constants.hpp"
#include "overlap/two_centre.hpp"

namespace irrepwise {
namespace {

// Occupied orbitals as columns, each times the root of its electrons, so that P = C C^T.
Eigen::MatrixXd weighted_orbitals(const MolecularSymmetry& symmetry, const Basis& basis,
                                  const Levels& levels) {
  Eigen::Index n_columns = 0;
  for (const Level& level : levels.levels) {
    if (level.occupation > 0.0) n_columns += level.degeneracy;
  }
  Eigen::MatrixXd columns(basis.n_orbitals, n_columns);
  Eigen::Index next = 0;
  for (std::size_t k = 0; k < levels.levels.size(); ++k) {
    const Level& level = levels.levels[k];
    if (level.occupation <= 0.0) continue;
    columns.middleCols(next, level.degeneracy) =
        std::sqrt(level.occupation / level.degeneracy) *
        level_orbitals(symmetry, basis, levels, static_cast<int>(k));
    next += level.degeneracy;
  }
  return columns;
}

struct AtomOrbitals {
  int first = 0;
  int count = 0;
};

AtomOrbitals orbitals_of(const Basis& basis, int atom) {
  AtomOrbitals range;
  const int first_shell = basis.first_shell[atom], end_shell = basis.first_shell[atom + 1];
  if (first_shell == end_shell) return range;
  range.first = basis.shells[first_shell].first_orbital;
  const Shell& last = basis.shells[end_shell - 1];
  range.count = last.first_orbital + last.size() - range.first;
  return range;
}

// 2 sum P_ij S_ij over the orbitals of two atoms; `density` holds the rows of P for atom a.
double pair_population(const Molecule& molecule, const Basis& basis, int a, int b,
                       const Eigen::MatrixXd& density) {
  const Eigen::Vector3d displacement =
      (molecule.atoms()[b].position - molecule.atoms()[a].position) / bohr_in_angstrom;
  const int first_a = orbitals_of(basis, a).first;
  double sum = 0.0;
  for (int i = basis.first_shell[a]; i < basis.first_shell[a + 1]; ++i) {
    for (int j = basis.first_shell[b]; j < basis.first_shell[b + 1]; ++j) {
      const Shell &shell_a = basis.shells[i], &shell_b = basis.shells[j];
      const OverlapBlock overlap = overlap_block(shell_a, shell_b, displacement);
      sum += overlap
                 .cwiseProduct(density.block(shell_a.first_orbital - first_a, shell_b.first_orbital,
                                             shell_a.size(), shell_b.size()))
                 .sum();
    }
  }
  return 2.0 * sum;
}

std::vector<OverlapPopulation> overlap_populations(const MolecularSymmetry& symmetry,
                                                   const Basis& basis, const Levels& levels) {
  const int n_atoms = symmetry.molecule.size();
  const Eigen::MatrixXd columns = weighted_orbitals(symmetry, basis, levels);

  // Pairs with a representative first; every other pair is the image of one of them.
  std::vector<int> set_of(static_cast<std::size_t>(n_atoms)), operation_to(set_of);
  std::vector<std::vector<double>> of_representative;
  for (std::size_t s = 0; s < levels.salcs.sets.size(); ++s) {
    const EquivalentAtoms& set = levels.salcs.sets[s];
    for (int position = 0; position < set.size(); ++position) {
      set_of[set.atoms[position]] = static_cast<int>(s);
      operation_to[set.atoms[position]] = set.from_representative[position];
    }
    const AtomOrbitals own = orbitals_of(basis, set.representative());
    const Eigen::MatrixXd density = columns.middleRows(own.first, own.count) * columns.transpose();
    std::vector<double> values(static_cast<std::size_t>(n_atoms), 0.0);
    for (int b = 0; b < n_atoms; ++b) {
      if (b != set.representative()) {
        values[b] = pair_population(symmetry.molecule, basis, set.representative(), b, density);
      }
    }
    of_representative.push_back(std::move(values));
  }

  std::vector<OverlapPopulation> populations;
  for (int a = 0; a < n_atoms; ++a) {
    const int back = symmetry.group.inverse(operation_to[a]);
    for (int b = a + 1; b < n_atoms; ++b) {
      populations.push_back(
          {a, b,
           (symmetry.molecule.atoms()[a].position - symmetry.molecule.atoms()[b].position).norm(),
           of_representative[set_of[a]][symmetry.images[back][b]],
           are_bonded(symmetry.molecule, a, b)});
    }
  }
  return populations;
}

}  // namespace

Populations mulliken_populations(const MolecularSymmetry& symmetry, const Basis& basis,
                                 const Levels& levels) {
  Populations populations;
  const auto n_levels = static_cast<Eigen::Index>(levels.levels.size());
  populations.shares.resize(basis.n_orbitals, n_levels);
  populations.gross_by_orbital = Eigen::VectorXd::Zero(basis.n_orbitals);
  for (Eigen::Index k = 0; k < n_levels; ++k) {
    const Level& level = levels.levels[static_cast<std::size_t>(k)];
    populations.shares.col(k) =
        level_coefficients(symmetry, basis, levels, static_cast<int>(k)).shares().rowwise().sum() /
        level.degeneracy;
    populations.gross_by_orbital += level.occupation * populations.shares.col(k);
  }
  const int n_atoms = symmetry.molecule.size();
  populations.gross_by_atom = Eigen::VectorXd::Zero(n_atoms);
  populations.charge.resize(n_atoms);
  for (int atom = 0; atom < n_atoms; ++atom) {
    const AtomOrbitals own = orbitals_of(basis, atom);
    populations.gross_by_atom[atom] =
        populations.gross_by_orbital.segment(own.first, own.count).sum();
    populations.charge[atom] = basis.valence_electrons[atom] - populations.gross_by_atom[atom];
  }
  populations.overlap_populations = overlap_populations(symmetry, basis, levels);
  return populations;
}

}  // namespace irrepwise
