// The ladder of groups that a structure climbs as the tolerance grows.
#pragma once

#include <string>
#include <vector>

#include "molecule/molecule.hpp"
#include "symmetry/options.hpp"
#include "symmetry/schoenflies.hpp"

namespace irrepwise {

/// At this tolerance and above it, up to the next rung, the group is the one `find_symmetry` finds.
struct Rung {
  Schoenflies group;
  double tolerance_angstrom = 0.0;  // 0: holds exactly (to 1e-6 Å)
};

/// From the group that holds exactly to the one at `options.limit_angstrom`. Operations are
/// sought once, at the limit; the tolerance of a group is the largest displacement among its
/// operations.
///
/// @source  derived by us
[[nodiscard]] std::vector<Rung> symmetry_ladder(const Molecule& molecule,
                                                const SymmetryOptions& options = {});

/// @returns  "C1 → C2v at 0.0040 Å → D4h at 0.1100 Å", tolerances rounded up
[[nodiscard]] std::string ladder_words(const std::vector<Rung>& ladder);

/// How far a structure is from being linear, and from having a centre as well.
struct LinearTolerances {
  double line_angstrom = 0.0;    // largest distance of an atom from the best line
  double centre_angstrom = 0.0;  // infinite where no reversal of the line could hold
};
[[nodiscard]] LinearTolerances linear_tolerances(const Molecule& molecule,
                                                 const std::vector<int>& kinds);

}  // namespace irrepwise
