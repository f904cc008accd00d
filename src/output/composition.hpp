// What levels are made of: shares of single orbitals, and of shells on sets of equivalent atoms.
#pragma once

#include <string>
#include <vector>

#include "output/equivalence.hpp"
#include "output/levels_result.hpp"

namespace irrepwise {

/// Mulliken's share of one orbital in a level, mean over its partners.
struct OrbitalShare {
  int orbital = 0;  // in the order of the basis
  int shell = 0;    // index in the basis
  double share = 0.0;
};

/// @param threshold  shares smaller than this in size are left out
/// @returns          the largest first; equal ones (to 1e-9) in the order of the basis
[[nodiscard]] std::vector<OrbitalShare> orbital_shares(const LevelsResult& result, int level,
                                                       double threshold);

/// One kind of shell on one set of equivalent atoms: "5d of Pt".
struct ShellGroup {
  int set = 0;  // index in the sets
  int n = 0;
  int l = 0;
  std::vector<int> shells;  // one per atom of the set, indices in the basis
  std::string name;         // "Pt 5d"
};

/// @returns  in the order of the sets, then of the shells of an atom
[[nodiscard]] std::vector<ShellGroup> shell_groups(const LevelsResult& result,
                                                   const std::vector<AtomSet>& sets);

/// @returns  the group's whole share in the level
[[nodiscard]] double group_share(const LevelsResult& result, const ShellGroup& group, int level);

/// In words, the largest first: "62 % Pt 5dx2-y2, 38 % Cl 3p", with no-break spaces inside the
/// parts. The orbitals are named where no more than half of the shell's take part, the same ones of
/// the standard frame on every atom of the set.
///
/// @param threshold  groups with a smaller share are left out, but never the first
[[nodiscard]] std::string composition_words(const LevelsResult& result,
                                            const std::vector<AtomSet>& sets,
                                            const std::vector<ShellGroup>& groups, int level,
                                            double threshold = 0.05);

}  // namespace irrepwise
