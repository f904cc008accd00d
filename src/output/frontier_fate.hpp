// What became of the reference's HOMO or LUMO in a variant.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "output/compare_result.hpp"

namespace irrepwise {

/// Levels closer than this share a place: errors of published H_ii are far larger, so that the
/// method tells no order of theirs. A choice of ours.
inline constexpr double tied_below_ev = 0.02;

/// A level of the variant that the reference's frontier level, or one tied with it, became.
struct FatePart {
  LevelMatch match;
  bool at_frontier = false;  // it is the variant's HOMO (LUMO) or tied with that
};

enum class Stays { No, InPart, Whole };

/// @returns  "no", "in part", "yes"
[[nodiscard]] const char* stays_word(Stays stays);

struct FrontierFate {
  int reference_level = 0;
  std::vector<FatePart> parts;  // the HOMO (LUMO) first, then those tied with it, then by overlap;
                                // a degenerate level that splits has several. Of a level tied with
                                // the reference's, only what is at the frontier, where the
                                // reference's own is not there whole
  Stays stays = Stays::No;      // in part: some of the level's orbitals are at the frontier
  bool found_whole = true;      // as many orbitals of the variant resemble it as it has
  std::optional<int> now;       // the variant's HOMO (LUMO)
  std::optional<int> now_was;   // the reference's level that this one was
};

enum class FrontierSide { Homo, Lumo };

/// @returns  nothing where the reference has no such level
[[nodiscard]] std::optional<FrontierFate> frontier_fate(const Comparison& comparison, int variant,
                                                        FrontierSide side);

/// Energy of the variant's level less that of the reference's.
[[nodiscard]] double shift_ev(const Comparison& comparison, int variant, const LevelMatch& match);

/// The same in a sentence, where the identity changed: "HOMO of trans: 2b2g of the reference is now
/// 3b2, 0.31 eV below the HOMO 5a1, which was 3a1g." Empty where it stays whole.
[[nodiscard]] std::string crossing_words(const Comparison& comparison, int variant,
                                         FrontierSide side);

}  // namespace irrepwise
