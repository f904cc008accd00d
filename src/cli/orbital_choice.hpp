// Orbitals as the user names them: "2e1g", "2e1g:2", "homo", "homo-2..lumo+2", "frontier+5", "eg",
// "-14..-8", "d", "all".
#pragma once

#include <span>
#include <string>
#include <vector>

#include "output/levels_result.hpp"
#include "output/orbital_choice.hpp"

namespace irrepwise::cli {

/// What a word may be, for the help of a command.
inline constexpr const char* orbital_words_help =
    "2e1g, one partner of it 2e1g:1, homo, lumo+2, a range homo-2..lumo+2, frontier, frontier+5 "
    "(five more on either side), an irrep eg, energies in eV -14..-8, the d block d, all";

/// A word is a level, which means every partner, or a partner of it, "2e1g:2"; homo and lumo count
/// levels, not orbitals. A range of levels is "2e1g..lumo", of energies in eV "-14..-8"; either end
/// may be left out. "frontier" is HOMO and LUMO, "frontier+5" (or "frontier+-5") so many more on
/// either side, fewer where the levels end. An irrep, "eg", means all its levels, "eg:1" one
/// partner of each; "d" the d block of every metal; "all" is all.
///
/// @returns      in the order of the words, each orbital once
/// @throws Error  for a label that no level has (with the nearest), a partner or frontier level
/// that
///                is not there, a range that runs backwards or holds nothing, "d" without a metal
[[nodiscard]] std::vector<OrbitalChoice> choose_orbitals(std::span<const std::string> words,
                                                         const LevelsResult& result);

}  // namespace irrepwise::cli
