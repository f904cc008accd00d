#include "output/compare_result.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

#include <fmt/format.h>

#include "analysis/donors.hpp"

namespace irrepwise {
namespace {

constexpr double weak_match = 0.3;  // below it, "is now" would say too much

MetalFacts metal_facts(const LevelsResult& result, int metal) {
  MetalFacts facts;
  facts.atom = metal;
  facts.charge = result.populations.charge[metal];
  for (const Shell& shell : result.basis.shells) {
    if (shell.atom != metal || shell.l != 2) continue;
    facts.d_population +=
        result.populations.gross_by_orbital.segment(shell.first_orbital, shell.size()).sum();
  }
  facts.bonds = bond_types(result.symmetry, result.basis, result.populations, metal);
  facts.d_block =
      find_d_block(result.symmetry, result.basis, result.levels, result.populations, metal);
  return facts;
}

std::vector<MetalFacts> all_metals(const LevelsResult& result) {
  std::vector<MetalFacts> metals;
  const std::vector<int> atoms = metal_atoms(result.symmetry.molecule, result.basis);
  for (const EquivalentAtoms& set : result.levels.salcs.sets) {
    if (std::find(atoms.begin(), atoms.end(), set.representative()) == atoms.end()) continue;
    metals.push_back(metal_facts(result, set.representative()));
    metals.back().n_equivalent = set.size();
  }
  std::sort(metals.begin(), metals.end(),
            [](const MetalFacts& a, const MetalFacts& b) { return a.atom < b.atom; });
  return metals;
}

std::optional<int> frontier_level(const VariantResult& variant, FrontierSide side) {
  const Frontier& frontier = variant.levels.levels.frontier;
  return side == FrontierSide::Homo ? frontier.homo : frontier.lumo;
}

double energy_of(const VariantResult& variant, int level) {
  return variant.levels.levels.levels[static_cast<std::size_t>(level)].energy_ev;
}

// Whether it is the HOMO (LUMO), or filled (empty) as that is and so near that the method cannot
// tell the two apart.
bool is_at_frontier(const VariantResult& variant, int level, FrontierSide side) {
  const std::optional<int> frontier = frontier_level(variant, side);
  if (!frontier) return false;
  if (level == *frontier) return true;
  const bool occupied =
      variant.levels.levels.levels[static_cast<std::size_t>(level)].occupation > 0.0;
  return occupied == (side == FrontierSide::Homo) &&
         std::abs(energy_of(variant, level) - energy_of(variant, *frontier)) < tied_below_ev;
}

}  // namespace

std::string name_of_level(const VariantResult& variant, int level) {
  return level_name(variant.levels.symmetry.group,
                    variant.levels.levels.levels[static_cast<std::size_t>(level)]);
}

VariantResult analysed(std::string name, LevelsResult levels) {
  Robustness robustness = find_robustness(levels.symmetry, levels.basis, levels.levels);
  VariantResult result{std::move(name), std::move(levels), std::move(robustness), {}, {}};
  result.metals = all_metals(result.levels);
  return result;
}

std::optional<FrontierFate> frontier_fate(const Comparison& comparison, int variant,
                                          FrontierSide side) {
  const VariantResult& reference =
      comparison.variants[static_cast<std::size_t>(comparison.reference)];
  const std::optional<int> level = frontier_level(reference, side);
  if (!level) return {};
  FrontierFate fate;
  fate.reference_level = *level;
  fate.now = frontier_level(comparison.variants[static_cast<std::size_t>(variant)], side);
  double best_now = 0.0;
  for (const LevelMatch& match : comparison.matchings[static_cast<std::size_t>(variant)].matches) {
    if (match.reference == *level) {
      if (!fate.match || match.overlap > fate.match->overlap) fate.match = match;
    }
    if (is_at_frontier(reference, match.reference, side) &&
        is_at_frontier(comparison.variants[static_cast<std::size_t>(variant)], match.variant,
                       side)) {
      fate.stays = true;
    }
    if (match.variant == fate.now && match.overlap > best_now) {
      best_now = match.overlap;
      fate.now_was = match.reference;
    }
  }
  return fate;
}

std::string crossing_words(const Comparison& comparison, int variant, FrontierSide side) {
  const std::optional<FrontierFate> fate = frontier_fate(comparison, variant, side);
  if (!fate || fate->stays || !fate->now) return {};
  const VariantResult& reference =
      comparison.variants[static_cast<std::size_t>(comparison.reference)];
  const VariantResult& other = comparison.variants[static_cast<std::size_t>(variant)];
  const char* const which = side == FrontierSide::Homo ? "HOMO" : "LUMO";
  const auto readable = [](const VariantResult& of, int level) {
    return readable_label(name_of_level(of, level));
  };
  std::string words = fmt::format("{} of {}: ", which, other.name);
  const std::string was = readable(reference, fate->reference_level);
  if (fate->match) {
    const double apart = energy_of(other, fate->match->variant) - energy_of(other, *fate->now);
    const std::string found = readable(other, fate->match->variant);
    words += fate->match->overlap < weak_match
                 ? fmt::format("what resembles {} of {} most is {} ({:.0f} %)", was, reference.name,
                               found, 100.0 * fate->match->overlap)
                 : fmt::format("{} of {} is now {}", was, reference.name, found);
    words += fmt::format(", {:.3f} eV {} the {} {}", std::abs(apart),
                         apart < 0.0 ? "below" : "above", which, readable(other, *fate->now));
  } else {
    words += fmt::format("nothing resembles {} of {}; the {} is {}", was, reference.name, which,
                         readable(other, *fate->now));
  }
  return words + (fate->now_was
                      ? fmt::format(", which was {}.", readable(reference, *fate->now_was))
                      : ", which has no counterpart there.");
}

}  // namespace irrepwise
