// Contacts between atoms judged by covalent radii: bonds, and distances that look like a slip.
// `are_bonded` and `geometry_warnings` stand with the molecule.
#pragma once

#include <string>

#include "molecule/molecule.hpp"

namespace irrepwise {

/// @returns  in a sentence, up to which distances `are_bonded` sees a bond; nothing for a molecule
///           with fewer than two metals, where no reader misses a bond
[[nodiscard]] std::string bond_criterion(const Molecule& molecule);

}  // namespace irrepwise
