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

/// An atom of the d or f block; of several equivalent ones the first stands for all.
struct MetalFacts {
  int atom = 0;
  int n_equivalent = 1;
  double charge = 0.0;
  bool has_d_shell = false;  // in the parameters: zinc has none
  double d_population = 0.0;
  std::vector<BondType> bonds;
  DBlock d_block;  // of all equivalent ones; empty without a d shell
};

struct VariantResult {
  std::string name;
  LevelsResult levels;
  Robustness robustness;
  std::vector<MetalFacts> metals;  // those with a d shell first, then in the order of the atoms
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

[[nodiscard]] const Level& level_of(const VariantResult& variant, int level);

[[nodiscard]] std::string name_of_level(const VariantResult& variant, int level);

}  // namespace irrepwise
