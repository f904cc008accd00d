// Orbitals that somebody chose: a level and a partner of it.
#pragma once

#include <string>
#include <vector>

#include "hueckel/levels.hpp"

namespace irrepwise {

struct OrbitalChoice {
  int level = 0;    // index in the levels
  int partner = 0;  // from 0
};

/// Every partner of one level.
[[nodiscard]] std::vector<OrbitalChoice> partners_of(const Levels& levels, int level);

/// Every partner of the HOMO, then of the LUMO, as far as there are such levels.
[[nodiscard]] std::vector<OrbitalChoice> frontier_orbitals(const Levels& levels);

/// @returns  "2b2g", "2eg:1": as the user names it
[[nodiscard]] std::string orbital_choice_name(const PointGroup& group, const Levels& levels,
                                              const OrbitalChoice& choice);

}  // namespace irrepwise
