#include "analysis/transitions.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "core/error.hpp"
#include "symmetry/vibrations.hpp"

namespace irrepwise {
namespace {

constexpr double no_electron = 1e-6;

double room(const Level& level) { return 2.0 * level.degeneracy - level.occupation; }

}  // namespace

std::vector<Transition> frontier_transitions(const PointGroup& group, const Levels& levels,
                                             int most) {
  std::vector<int> from, to;
  const int n = static_cast<int>(levels.levels.size());
  for (int i = n - 1; i >= 0 && static_cast<int>(from.size()) < most; --i) {
    if (levels.levels[i].occupation > no_electron) from.push_back(i);
  }
  for (int i = 0; i < n && static_cast<int>(to.size()) < most; ++i) {
    if (room(levels.levels[i]) > no_electron) to.push_back(i);
  }
  std::vector<Transition> transitions;
  for (const int a : from) {
    for (const int b : to) {
      if (a == b) continue;
      const auto& irreps = group.irreps();
      transitions.push_back({a, b,
                             transition_rule(group, irreps[levels.levels[a].irrep].label,
                                             irreps[levels.levels[b].irrep].label)});
    }
  }
  return transitions;
}

std::vector<OpenLevel> open_levels(const PointGroup& group, const Levels& levels) {
  std::vector<OpenLevel> open;
  for (const Level& level : levels.levels) {
    if (level.occupation <= no_electron || room(level) <= no_electron) continue;
    const double whole = std::round(level.occupation);
    if (std::abs(whole - level.occupation) > no_electron) {
      throw Error(fmt::format("{} holds {} electrons; terms need whole ones",
                              level_name(group, level), level.occupation));
    }
    open.push_back({group.irreps()[level.irrep].label, static_cast<int>(whole)});
  }
  return open;
}

std::vector<GroundTerm> ground_terms(const MolecularSymmetry& symmetry,
                                     const std::vector<Term>& terms) {
  const Reduction vibrations = displacement_irreps(symmetry).vibrations;
  std::vector<GroundTerm> ground;
  for (const Term& term : lowest_terms(symmetry.group, terms)) {
    ground.push_back({term, term_distortion(symmetry.group, term.irrep, vibrations)});
  }
  return ground;
}

}  // namespace irrepwise
