#include "output/levels_result.hpp"

#include <cstdlib>

#include <fmt/format.h>

#include "basis/atom_kinds.hpp"
#include "harmonics/real_harmonics.hpp"
#include "job/job.hpp"

namespace irrepwise {

LevelsResult levels_result(const Job& job) {
  Basis basis = make_basis(job.molecule, job.parameters, job.overrides);
  SymmetryOptions symmetry_options = job.symmetry;
  symmetry_options.kinds = atom_kinds(basis);
  MolecularSymmetry symmetry = find_symmetry(job.molecule, symmetry_options);
  Levels levels = solve_levels(symmetry, basis, job.hueckel);
  Populations populations = mulliken_populations(symmetry, basis, levels);
  std::vector<std::string> warnings = geometry_warnings(job.molecule);
  warnings.insert(warnings.end(), levels.warnings.begin(), levels.warnings.end());
  return {job.title,        job.parameters.name(), job.molecule,           std::move(symmetry),
          std::move(basis), std::move(levels),     std::move(populations), std::move(warnings)};
}

Molecule computed_molecule(const LevelsResult& result) {
  const MolecularSymmetry& symmetry = result.symmetry;
  const Eigen::Matrix3Xd positions =
      (symmetry.rotation.transpose() * symmetry.molecule.positions()).colwise() + symmetry.origin;
  return symmetry.molecule.with_positions(positions);
}

Eigen::MatrixXd input_frame_orbitals(const LevelsResult& result, int level) {
  Eigen::MatrixXd orbitals = level_orbitals(result.symmetry, result.basis, result.levels, level);
  const Eigen::Matrix3d back = result.symmetry.rotation.transpose();
  std::vector<Eigen::MatrixXd> turn;
  for (int l = 0; l <= max_l; ++l) turn.push_back(harmonic_rotation(l, back));
  for (const Shell& shell : result.basis.shells) {
    auto rows = orbitals.middleRows(shell.first_orbital, shell.size());
    rows = (turn[static_cast<std::size_t>(shell.l)] * rows).eval();
  }
  return orbitals;
}

std::string charged_formula(const Molecule& molecule) {
  const int charge = molecule.charge();
  if (charge == 0) return hill_formula(molecule);
  const std::string size = std::abs(charge) == 1 ? "" : std::to_string(std::abs(charge));
  return hill_formula(molecule) + " " + size + (charge > 0 ? "+" : "−");
}

std::string shell_orbital_name(const Shell& shell, int component) {
  return fmt::format("{}{}", shell.n(), orbital_name(shell.l, component));
}

}  // namespace irrepwise
