// Which atoms are alike in their parameters: only those can be equivalent by symmetry.
#pragma once

#include <vector>

#include "basis/basis.hpp"

namespace irrepwise {

/// For `SymmetryOptions::kinds`: an override of one atom makes it unlike others of its element, so
/// the symmetry of the Hamiltonian is lower than that of the geometry.
///
/// @returns  per atom, the index of the first atom with the same shells and valence electrons
[[nodiscard]] std::vector<int> atom_kinds(const Basis& basis);

}  // namespace irrepwise
