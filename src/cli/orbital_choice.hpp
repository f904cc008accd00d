// Orbitals as the user names them: "2e1g", "2e1g:2", "homo", "lumo+1", "homo-2..lumo+2",
// "frontier".
#pragma once

#include <span>
#include <string>
#include <vector>

#include "hueckel/levels.hpp"
#include "output/orbital_pictures.hpp"

namespace irrepwise::cli {

/// @param words  each a level (then every partner is meant), a partner of it, a range of levels, or
///               "frontier" for HOMO and LUMO; homo and lumo count levels, not orbitals
/// @returns      in the order of the words, each orbital once
/// @throws Error for a label that no level has (with the nearest), a partner or frontier level that
///               is not there, a range that runs backwards
[[nodiscard]] std::vector<OrbitalChoice> choose_orbitals(std::span<const std::string> words,
                                                         const PointGroup& group,
                                                         const Levels& levels);

}  // namespace irrepwise::cli
