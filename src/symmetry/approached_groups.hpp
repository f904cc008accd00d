// Every group that a structure approaches, with the tolerance at which it would hold.
#pragma once

#include <vector>

#include "molecule/molecule.hpp"
#include "symmetry/held_operations.hpp"
#include "symmetry/schoenflies.hpp"
#include "symmetry/subgroups.hpp"

namespace irrepwise {

/// A closed set of operations.
struct ApproachedGroup {
  Subset operations;                // indices, ascending
  double tolerance_angstrom = 0.0;  // largest displacement of its operations
};

struct ApproachedGroups {
  std::vector<HeldOperation> operations;
  PartialTable table;
  std::vector<ApproachedGroup> groups;  // by tolerance; of equal ones the largest first
};

/// @param molecule  of Shape::General
/// @param kinds     as in `SymmetryOptions`
/// @returns         at least the group of the identity
[[nodiscard]] ApproachedGroups approached_groups(const Molecule& molecule,
                                                 const std::vector<int>& kinds,
                                                 double limit_angstrom);

[[nodiscard]] Schoenflies symbol_of(const ApproachedGroups& approached,
                                    const ApproachedGroup& group);

}  // namespace irrepwise
