// The neighbours of an atom.
#pragma once

#include <vector>

#include "molecule/molecule.hpp"

namespace irrepwise {

/// @returns  the atoms bonded to this one, by `are_bonded`; ascending
[[nodiscard]] std::vector<int> bonded_atoms(const Molecule& molecule, int atom);

}  // namespace irrepwise
