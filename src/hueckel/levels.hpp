// The levels of a molecule: energies, irreps, occupations, and their orbitals on request.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include <Eigen/Core>

#include "basis/basis.hpp"
#include "hueckel/options.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

struct Level {
  int irrep = 0;            // index in the group's irreps
  int number = 1;           // in order of energy within the irrep, from 1
  double energy_ev = 0.0;
  int degeneracy = 1;
  double occupation = 0.0;  // electrons in the whole level, 0 to 2 * degeneracy
  int column = 0;           // index within the block of its irrep
};

struct Frontier {
  std::optional<int> homo;  // index of the highest level that holds electrons
  std::optional<int> lumo;  // index of the lowest level that holds none
  bool open_shell = false;  // homo is not full
};

struct Levels {
  std::vector<Level> levels;  // ascending energy; ties in the order of the irreps
  std::vector<Eigen::MatrixXd> orbitals;  // per level: `n_orbitals x degeneracy`, standard frame
  int electrons = 0;
  Rule rule = Rule::Weighted;
  std::optional<double> k;
  Frontier frontier;
  double sum_of_occupied_ev = 0.0;
  std::vector<std::string> warnings;
};

/// @returns  "2e1g" in ASCII, as in JSON
[[nodiscard]] std::string level_name(const PointGroup& group, const Level& level);

/// @param symmetry  of the molecule whose basis is given
/// @throws Error    for an overlap block that is not positive definite (names the atoms and shells
///                  behind it), more electrons than the orbitals hold or fewer than none, an
///                  impossible multiplicity or occupation
[[nodiscard]] Levels solve_levels(const MolecularSymmetry& symmetry, const Basis& basis,
                                  const HueckelOptions& options = {});

}  // namespace irrepwise
