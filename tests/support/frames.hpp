// From a molecule to the local frames of its atoms, for tests.
#pragma once

#include <algorithm>
#include <cstddef>
#include <optional>
#include <utility>
#include <vector>

#include <Eigen/Core>

#include "salc/orbital_reductions.hpp"

struct Framed {
  irrepwise::MolecularSymmetry symmetry;
  std::vector<irrepwise::EquivalentAtoms> sets;
  std::vector<std::optional<irrepwise::LocalFrames>> frames;

  [[nodiscard]] std::optional<Eigen::Matrix3d> of_atom(int atom) const {
    for (std::size_t s = 0; s < sets.size(); ++s) {
      const auto at = std::find(sets[s].atoms.begin(), sets[s].atoms.end(), atom);
      if (at == sets[s].atoms.end() || !frames[s]) continue;
      return frames[s]->frames[static_cast<std::size_t>(at - sets[s].atoms.begin())];
    }
    return std::nullopt;
  }
  [[nodiscard]] Eigen::Vector3d position(int atom) const {
    return symmetry.molecule.atoms()[static_cast<std::size_t>(atom)].position;
  }
};

inline Framed framed(const irrepwise::Molecule& molecule) {
  irrepwise::MolecularSymmetry symmetry = irrepwise::find_symmetry(molecule);
  auto sets = irrepwise::equivalent_atoms(symmetry);
  auto frames = irrepwise::frames_of_sets(symmetry, sets);
  return {std::move(symmetry), std::move(sets), std::move(frames)};
}
