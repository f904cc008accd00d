// What to say of an overlap block that is singular or nearly so.
#pragma once

#include <string>

#include "salc/symmetry_blocks.hpp"

namespace irrepwise {

/// Below this eigenvalue of an overlap block the energies lose digits, and users must know.
inline constexpr double near_singular_overlap = 1e-6;

struct SmallestOverlap {
  double eigenvalue = 1.0;
  std::string behind;  // the atoms and shells with most weight in its vector: "C1 2p and C2 2p"
};

/// @param block  overlap block of the irrep (the whole of it, identity included)
[[nodiscard]] SmallestOverlap smallest_overlap(const SymmetryBlock& block,
                                               const MolecularSymmetry& symmetry,
                                               const Basis& basis, const SalcBasis& salcs,
                                               int irrep);

}  // namespace irrepwise
