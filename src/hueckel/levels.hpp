// The levels of a molecule: energies, irreps, occupations, and their orbitals on request.
#pragma once

#include <optional>
#include <string>
#include <variant>
#include <vector>

#include <Eigen/Core>

#include "basis/basis.hpp"
#include "hueckel/options.hpp"
#include "salc/salc_basis.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

struct Level {
  int irrep = 0;   // index in the group's irreps
  int number = 1;  // in order of energy within the irrep, from 1
  double energy_ev = 0.0;
  int degeneracy = 1;
  double occupation = 0.0;  // electrons in the whole level, 0 to 2 * degeneracy
  int column = 0;           // index within the block of its irrep
};

/// Orbitals of one irrep in the SALC basis, a column per level, `n_salcs x n_levels`: real, or
/// complex for a pair of complex conjugate irreps. Normalised (C^H S C = 1), phases fixed.
struct LevelVectors {
  std::variant<Eigen::MatrixXd, Eigen::MatrixXcd> coefficients;
  std::variant<Eigen::MatrixXd, Eigen::MatrixXcd> times_overlap;  // S times the same
};

struct Frontier {
  std::optional<int> homo;  // index of the highest level that holds electrons
  std::optional<int> lumo;  // index of the lowest level that holds none
  bool open_shell = false;  // homo is not full
};

struct Levels {
  std::vector<Level> levels;  // ascending energy; ties in the order of the irreps
  SalcBasis salcs;
  std::vector<LevelVectors> vectors;  // per irrep
  int electrons = 0;
  Rule rule = Rule::Weighted;
  std::optional<double> k;
  Frontier frontier;
  double sum_of_occupied_ev = 0.0;
  std::vector<std::string> warnings;
};

/// The orbitals of one level, one column per partner, phases by the conventions.
/// @returns  `n_orbitals x degeneracy`, standard frame, orbitals in the order of the basis
[[nodiscard]] Eigen::MatrixXd level_orbitals(const MolecularSymmetry& symmetry, const Basis& basis,
                                             const Levels& levels, int level);

/// @returns  "2e1g" in ASCII, as in JSON
[[nodiscard]] std::string level_name(const PointGroup& group, const Level& level);

/// @param symmetry  of the molecule whose basis is given
/// @throws Error    for an overlap block that is not positive definite (names the atoms and shells
///                  behind it), more electrons than the orbitals hold or fewer than none, an
///                  impossible multiplicity or occupation
[[nodiscard]] Levels solve_levels(const MolecularSymmetry& symmetry, const Basis& basis,
                                  const HueckelOptions& options = {});

}  // namespace irrepwise
