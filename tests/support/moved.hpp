// The same molecule seen otherwise: turned, shifted, renumbered; or with noise on its atoms.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "molecule/molecule.hpp"

/// A molecule after r -> rotation r + shift and renumbering.
struct MovedMolecule {
  irrepwise::Molecule molecule;
  std::vector<int> permutation;  // [atom here] -> atom in the original
  Eigen::Matrix3d rotation;      // proper
  Eigen::Vector3d shift;         // Å, up to 5 along each axis
};

/// At random, but the same for the same seed on every machine and compiler.
[[nodiscard]] MovedMolecule moved(const irrepwise::Molecule& molecule, unsigned seed);

/// @returns  each atom shifted by exactly `amplitude_angstrom` in a direction at random
[[nodiscard]] irrepwise::Molecule with_noise(const irrepwise::Molecule& molecule,
                                             double amplitude_angstrom, unsigned seed);
