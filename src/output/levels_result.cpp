#include "output/levels_result.hpp"

#include <cstdlib>

#include <fmt/format.h>

#include "harmonics/real_harmonics.hpp"

namespace irrepwise {

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
