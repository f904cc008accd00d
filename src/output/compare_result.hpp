// Several molecules side by side: what each run of `compare` found, ready for the writers.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "analysis/d_block.hpp"
#include "analysis/level_flips.hpp"
#include "analysis/matching.hpp"
#include "analysis/metal_bonds.hpp"
#include "output/levels_result.hpp"

namespace irrepwise {

/// A metal with a d shell; of several equivalent ones the first stands for all.
struct MetalFacts {
  int atom = 0;
  int n_equivalent = 1;
  double charge = 0.0;
  double d_population = 0.0;
  std::vector<BondType> bonds;
  DBlock d_block;  // of all equivalent ones
};

struct VariantResult {
  std::string name;
  LevelsResult levels;
  Robustness robustness;
  std::vector<MetalFacts> metals;  // in the order of the atoms; none where no metal has a d shell
  std::vector<MetalBond> varied_bonds;  // of the first metal; see output/varied_bonds.hpp

  /// The one that stands in the summary; null where there is none.
  [[nodiscard]] const MetalFacts* metal() const {
    return metals.empty() ? nullptr : &metals.front();
  }
};

struct Comparison {
  std::vector<VariantResult> variants;
  int reference = 0;                // index of the variant that the others are matched with
  std::vector<Matching> matchings;  // per variant, with the reference (itself included)
};

[[nodiscard]] VariantResult analysed(std::string name, LevelsResult levels);

/// Levels closer than this share a place: errors of published H_ii are far larger, so that the
/// method tells no order of theirs. A choice of ours.
inline constexpr double tied_below_ev = 0.02;

/// What became of the reference's HOMO or LUMO in a variant.
struct FrontierFate {
  int reference_level = 0;
  std::optional<LevelMatch> match;  // its best, absent where nothing in the variant resembles it
  bool stays = false;               // one of its matches is the variant's HOMO (LUMO); levels tied
                                    // with either count as it
  std::optional<int> now;           // the variant's HOMO (LUMO)
  std::optional<int> now_was;       // the reference's level that this one was
};

enum class FrontierSide { Homo, Lumo };

/// @returns  nothing where the reference has no such level
[[nodiscard]] std::optional<FrontierFate> frontier_fate(const Comparison& comparison, int variant,
                                                        FrontierSide side);

/// The same in a sentence, where the identity changed: "HOMO of trans: 2b2g of the reference is now
/// 3b2, 0.31 eV below the HOMO 5a1, which was 3a1g." Empty where it stays.
[[nodiscard]] std::string crossing_words(const Comparison& comparison, int variant,
                                         FrontierSide side);

[[nodiscard]] std::string name_of_level(const VariantResult& variant, int level);

}  // namespace irrepwise
