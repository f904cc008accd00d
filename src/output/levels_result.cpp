#include "output/levels_result.hpp"

#include <algorithm>
#include <cstddef>
#include <cstdlib>
#include <utility>

#include <fmt/format.h>

#include "analysis/donors.hpp"
#include "basis/atom_kinds.hpp"
#include "core/text.hpp"
#include "harmonics/real_harmonics.hpp"
#include "hueckel/occupation.hpp"
#include "job/job.hpp"

namespace irrepwise {
namespace {

double metal_d_share(const std::vector<int>& metals, const Basis& basis, const Populations& found,
                     Eigen::Index level) {
  double share = 0.0;
  for (const Shell& shell : basis.shells) {
    const bool of_metal = std::find(metals.begin(), metals.end(), shell.atom) != metals.end();
    if (!of_metal || shell.l != 2) continue;
    share += found.shares.col(level).segment(shell.first_orbital, shell.size()).sum();
  }
  return share;
}

// A spin state meant for one molecule, carried over to another whose d levels lie elsewhere, puts
// electrons into orbitals of the ligands.
std::vector<std::string> spin_warnings(const HueckelOptions& stated,
                                       const MolecularSymmetry& symmetry, const Basis& basis,
                                       const Levels& levels, const Populations& populations) {
  constexpr double half = 0.5;
  const bool high_spin = stated.multiplicity.value_or(1) > 1;
  if (!high_spin && stated.electrons_by_irrep.empty()) return {};
  const std::vector<int> metals = metal_atoms(symmetry.molecule, basis);
  if (metals.empty()) return {};
  std::vector<std::string> outside;
  for (std::size_t i = 0; i < levels.levels.size(); ++i) {
    const Level& level = levels.levels[i];
    if (!is_partly_filled(level.occupation, level.degeneracy)) continue;
    const double share = metal_d_share(metals, basis, populations, static_cast<Eigen::Index>(i));
    if (share >= half) continue;
    outside.push_back(
        fmt::format("{} ({:.0f} %)", level_name(symmetry.group, level), 100.0 * share));
  }
  if (outside.empty()) return {};
  return {fmt::format(
      "{} partly filled although less than half metal d: {}; check that this spin state is meant "
      "for this molecule",
      high_spin ? fmt::format("the multiplicity {} leaves levels", *stated.multiplicity)
                : std::string("the occupations leave levels"),
      joined(outside))};
}

}  // namespace

LevelsResult levels_result(const Job& job) {
  Basis basis = make_basis(job.molecule, job.parameters, job.overrides);
  SymmetryOptions symmetry_options = job.symmetry;
  symmetry_options.kinds = atom_kinds(basis);
  MolecularSymmetry symmetry = find_symmetry(job.molecule, symmetry_options);
  Levels levels = solve_levels(symmetry, basis, job.hueckel);
  Populations populations = mulliken_populations(symmetry, basis, levels);
  std::vector<std::string> warnings = geometry_warnings(job.molecule);
  warnings.insert(warnings.end(), levels.warnings.begin(), levels.warnings.end());
  for (std::string& warning : spin_warnings(job.hueckel, symmetry, basis, levels, populations)) {
    warnings.push_back(std::move(warning));
  }
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
