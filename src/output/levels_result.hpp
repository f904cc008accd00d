// Everything that one run of `levels` found, ready for the writers.
#pragma once

#include <string>
#include <vector>

#include "analysis/populations.hpp"
#include "basis/basis.hpp"
#include "hueckel/levels.hpp"
#include "molecule/molecule.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

struct Job;

struct LevelsResult {
  std::string title;
  std::string parameter_set;
  Molecule molecule;  // as read, in the input frame
  MolecularSymmetry symmetry;
  Basis basis;
  Levels levels;
  Populations populations;
  std::vector<std::string> warnings;
};

/// From a job to its levels and populations.
/// @throws Error  as `make_basis`, `find_symmetry` and `solve_levels`
[[nodiscard]] LevelsResult levels_result(const Job& job);

/// @returns  the symmetrised molecule, turned and shifted back to where the input had it
[[nodiscard]] Molecule computed_molecule(const LevelsResult& result);

/// Orbital coefficients of one level, turned from the standard frame to that of the input.
/// @returns  `n_orbitals x degeneracy`
[[nodiscard]] Eigen::MatrixXd input_frame_orbitals(const LevelsResult& result, int level);

/// @returns  "Cl4Pt 2−": the formula in Hill order with its charge
[[nodiscard]] std::string charged_formula(const Molecule& molecule);

/// @returns  "5dx2-y2": one orbital of the shell, without its atom
[[nodiscard]] std::string shell_orbital_name(const Shell& shell, int component);

}  // namespace irrepwise
