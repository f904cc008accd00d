// Sets of equivalent atoms: the orbits of the group, with the site group of each.
#pragma once

#include <vector>

#include "symmetry/molecular_symmetry.hpp"
#include "symmetry/schoenflies.hpp"

namespace irrepwise {

struct EquivalentAtoms {
  std::vector<int> atoms;  // ascending; the first is the representative
  std::vector<int>
      from_representative;      // per atom: an operation that takes the representative to it
  std::vector<int> site_group;  // operations that keep the representative in place

  [[nodiscard]] int representative() const { return atoms.front(); }
  [[nodiscard]] int size() const { return static_cast<int>(atoms.size()); }
};

/// @returns  sets in the order of their representatives
[[nodiscard]] std::vector<EquivalentAtoms> equivalent_atoms(const MolecularSymmetry& symmetry);

/// @returns  the symbol of the group that keeps the representative in place
[[nodiscard]] Schoenflies site_symbol(const PointGroup& group, const EquivalentAtoms& set);

}  // namespace irrepwise
