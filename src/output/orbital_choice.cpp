#include "output/orbital_choice.hpp"

#include <optional>

namespace irrepwise {

std::vector<OrbitalChoice> partners_of(const Levels& levels, int level) {
  std::vector<OrbitalChoice> out;
  const int degeneracy = levels.levels[static_cast<std::size_t>(level)].degeneracy;
  for (int partner = 0; partner < degeneracy; ++partner) out.push_back({level, partner});
  return out;
}

std::vector<OrbitalChoice> frontier_orbitals(const Levels& levels) {
  std::vector<OrbitalChoice> out;
  for (const std::optional<int>& level : {levels.frontier.homo, levels.frontier.lumo}) {
    if (!level) continue;
    const std::vector<OrbitalChoice> partners = partners_of(levels, *level);
    out.insert(out.end(), partners.begin(), partners.end());
  }
  return out;
}

std::string orbital_choice_name(const PointGroup& group, const Levels& levels,
                                const OrbitalChoice& choice) {
  const Level& level = levels.levels[static_cast<std::size_t>(choice.level)];
  std::string name = level_name(group, level);
  if (level.degeneracy > 1) name += ":" + std::to_string(choice.partner + 1);
  return name;
}

}  // namespace irrepwise
