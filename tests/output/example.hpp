// Results to write: the whole way from a molecule, so that writers are tested on real values.
#pragma once

#include <cmath>

#include <Eigen/Geometry>

#include "output/levels_result.hpp"

inline irrepwise::LevelsResult result_of(const irrepwise::Molecule& molecule,
                                         const irrepwise::HueckelOptions& options = {}) {
  using namespace irrepwise;
  MolecularSymmetry symmetry = find_symmetry(molecule);
  Basis basis = make_basis(molecule, published_parameters());
  Levels levels = solve_levels(symmetry, basis, options);
  Populations populations = mulliken_populations(symmetry, basis, levels);
  return {molecule.title(),
          published_parameters().name(),
          molecule,
          std::move(symmetry),
          std::move(basis),
          std::move(levels),
          std::move(populations),
          {}};
}

/// A square MX4, Pt–Cl 2.32 Å, turned and shifted out of every special position.
inline irrepwise::Molecule skew_square() {
  using namespace irrepwise;
  const Eigen::Matrix3d turn =
      (Eigen::AngleAxisd(0.7, Eigen::Vector3d(1.0, 2.0, -0.5).normalized()) *
       Eigen::AngleAxisd(2.1, Eigen::Vector3d(0.3, -1.0, 1.0).normalized()))
          .toRotationMatrix();
  const Eigen::Vector3d shift(0.4, -1.3, 2.2);
  std::vector<Atom> atoms = {{78, shift}};
  for (int i = 0; i < 4; ++i) {
    const double angle = i * std::acos(0.0);
    atoms.push_back(
        {17, turn * Eigen::Vector3d(2.32 * std::cos(angle), 2.32 * std::sin(angle), 0) + shift});
  }
  return {atoms, -2, "a square"};
}

inline irrepwise::Molecule benzene() {
  using namespace irrepwise;
  std::vector<Atom> atoms;
  for (const auto& [element, radius] : {std::pair{6, 1.40}, std::pair{1, 2.48}}) {
    for (int i = 0; i < 6; ++i) {
      const double angle = i * std::acos(-1.0) / 3.0;
      atoms.push_back({element, {radius * std::cos(angle), radius * std::sin(angle), 0.0}});
    }
  }
  return {atoms, 0, "benzene"};
}
