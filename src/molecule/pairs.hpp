// Pairs of atoms near each other, found without looking at every pair of a large molecule.
#pragma once

#include <vector>

#include "molecule/molecule.hpp"

namespace irrepwise {

struct NearPair {
  int a = 0;  // indices from 0, a < b
  int b = 0;
  double distance_angstrom = 0.0;
};

/// @returns  every pair at a distance of at most `cutoff_angstrom`, by a, then b
[[nodiscard]] std::vector<NearPair> near_pairs(const std::vector<Atom>& atoms,
                                               double cutoff_angstrom);

}  // namespace irrepwise
