// Atoms of different ligands that come too near to each other.
#pragma once

#include <string>
#include <vector>

#include "complex/assembly.hpp"

namespace irrepwise {

/// Smallest distances between atoms that are not bonded: hydrogens 1.6 Å from each other and 1.9 Å
/// from other atoms; other atoms the sum of their covalent radii and 0.6 Å. Between a metal and
/// atoms that are not its donors: the sum of the covalent radii; between two metals, 1.5 Å.
/// Common practice: van der Waals contacts in crystals are never nearer by 0.6 Å than this.
inline constexpr double clash_hydrogens_angstrom = 1.6;
inline constexpr double clash_hydrogen_other_angstrom = 1.9;
inline constexpr double clash_beyond_radii_angstrom = 0.6;
inline constexpr double clash_metals_angstrom = 1.5;

/// The pair of atoms nearest to each other in units of the limit.
struct Contact {
  double relative = 0.0;  // distance over limit; below 1 is a clash
  double distance_angstrom = 0.0;
  double limit_angstrom = 0.0;
  double crowding = 0.0;  // how much all pairs lack of 1.3 times their limits: the sum of squares
  std::string first;      // "NH3 on vertex 2"
  std::string second;
};

/// @param metals  atomic numbers of the centres
/// @param poses   one for each site
/// @returns  the nearest contact; a relative distance of infinity where there is no pair
[[nodiscard]] Contact nearest_contact(const Assembly& assembly, const std::vector<int>& metals,
                                      const std::vector<Pose>& poses);

}  // namespace irrepwise
