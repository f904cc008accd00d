// Which atoms, and which pairs of atoms, are the same by symmetry, and how people call them.
#pragma once

#include <string>
#include <utility>
#include <vector>

#include "molecule/molecule.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

/// Atoms that the group maps onto each other.
struct AtomSet {
  std::vector<int> atoms;  // indices from 0, ascending
  std::string name;        // "Pt", "Cl" where the element has one set; "C2", "H3×6" where several
};

/// @returns  in the order of their first atoms; every atom is in one set
[[nodiscard]] std::vector<AtomSet> atom_sets(const MolecularSymmetry& symmetry);

/// @returns  per atom, the index of its set
[[nodiscard]] std::vector<int> set_of_atom(const std::vector<AtomSet>& sets, int n_atoms);

/// @returns  for the pair (a, b), the first pair (by a, then b) that the group maps onto it
[[nodiscard]] std::pair<int, int> first_equivalent_pair(const MolecularSymmetry& symmetry, int a,
                                                        int b);

/// @returns  "H3, H7–H9, H12": runs of three and more by their ends
[[nodiscard]] std::string atom_list(const Molecule& molecule, const std::vector<int>& atoms);

}  // namespace irrepwise
