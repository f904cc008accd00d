#include "output/compare_result.hpp"

#include <algorithm>
#include <utility>

#include "analysis/donors.hpp"
#include "molecule/metals.hpp"

namespace irrepwise {
namespace {

MetalFacts metal_facts(const LevelsResult& result, int metal) {
  MetalFacts facts;
  facts.atom = metal;
  facts.charge = result.populations.charge[metal];
  for (const Shell& shell : result.basis.shells) {
    if (shell.atom != metal || shell.l != 2) continue;
    facts.has_d_shell = true;
    facts.d_population +=
        result.populations.gross_by_orbital.segment(shell.first_orbital, shell.size()).sum();
  }
  facts.bonds = bond_types(result.symmetry, result.populations, metal);
  if (!facts.has_d_shell) return facts;
  facts.d_block =
      find_d_block(result.symmetry, result.basis, result.levels, result.populations, metal);
  return facts;
}

std::vector<MetalFacts> all_metals(const LevelsResult& result) {
  std::vector<MetalFacts> metals;
  const std::vector<int> atoms = centre_atoms(result.symmetry.molecule);
  for (const EquivalentAtoms& set : result.levels.salcs.sets) {
    if (std::find(atoms.begin(), atoms.end(), set.representative()) == atoms.end()) continue;
    metals.push_back(metal_facts(result, set.representative()));
    metals.back().n_equivalent = set.size();
  }
  std::sort(metals.begin(), metals.end(), [](const MetalFacts& a, const MetalFacts& b) {
    return a.has_d_shell != b.has_d_shell ? a.has_d_shell : a.atom < b.atom;
  });
  return metals;
}

}  // namespace

const Level& level_of(const VariantResult& variant, int level) {
  return variant.levels.levels.levels[static_cast<std::size_t>(level)];
}

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

}  // namespace irrepwise
