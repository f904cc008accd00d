// The irreps of a molecule's vibrations.
#pragma once

#include "symmetry/molecular_symmetry.hpp"
#include "symmetry/reduction.hpp"

namespace irrepwise {

/// Displacements = translations + rotations + vibrations.
struct DisplacementIrreps {
  Reduction displacements;  // 3N
  Reduction translations;   // x, y, z
  Reduction rotations;      // Rx, Ry, Rz; without Rz for a linear molecule; none for an atom
  Reduction vibrations;     // 3N - 6; 3N - 5 for a linear molecule
};

/// From the atoms that each operation leaves in place.
/// @source  Wilson, Decius and Cross, Molecular Vibrations (from memory)
[[nodiscard]] DisplacementIrreps displacement_irreps(const MolecularSymmetry& symmetry);

}  // namespace irrepwise
