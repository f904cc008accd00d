#include <algorithm>
#include <cmath>

#include "figure/level_diagram.hpp"

namespace irrepwise {

DiagramColumn diagram_column(const PointGroup& group, const Levels& levels) {
  DiagramColumn column;
  for (std::size_t i = 0; i < levels.levels.size(); ++i) {
    const Level& level = levels.levels[i];
    DiagramLevel drawn;
    drawn.label = level_name(group, level);
    drawn.energy_ev = level.energy_ev;
    drawn.degeneracy = level.degeneracy;
    drawn.occupation = level.occupation;
    if (levels.frontier.homo == static_cast<int>(i)) drawn.frontier = FrontierMark::Homo;
    if (levels.frontier.lumo == static_cast<int>(i)) drawn.frontier = FrontierMark::Lumo;
    column.levels.push_back(std::move(drawn));
  }
  return column;
}

EnergyWindow frontier_window(const std::vector<DiagramColumn>& columns) {
  constexpr double below_ev = 7.0;
  constexpr double above_ev = 6.0;
  constexpr double edge_ev = 0.6;
  EnergyWindow window{1e9, -1e9};
  for (const DiagramColumn& column : columns) {
    std::vector<double> occupied;  // from the HOMO down
    std::vector<double> empty;     // from the LUMO up
    for (const DiagramLevel& level : column.levels) {
      if (level.occupation > 0.0) {
        occupied.insert(occupied.begin(), level.energy_ev);
      } else {
        empty.push_back(level.energy_ev);
      }
    }
    const auto reach = [](const std::vector<double>& energies, double range, std::size_t least,
                          std::size_t most) {
      std::size_t n = 0;
      while (n < energies.size() && n < most &&
             std::abs(energies[n] - energies.front()) <= (n < least ? 2.0 * range : range)) {
        ++n;
      }
      return n == 0 ? std::nan("") : energies[n - 1];
    };
    const double low = reach(occupied, below_ev, 3, 14);
    const double high = reach(empty, above_ev, 2, 10);
    const double homo = reach(occupied, 0.0, 1, 1);
    const double lumo = reach(empty, 0.0, 1, 1);
    for (const double energy : {low, homo, lumo, high}) {
      if (std::isnan(energy)) continue;  // a molecule without empty levels
      window.from_ev = std::min(window.from_ev, energy);
      window.to_ev = std::max(window.to_ev, energy);
    }
  }
  return {std::floor(2.0 * (window.from_ev - edge_ev)) / 2.0,
          std::ceil(2.0 * (window.to_ev + edge_ev)) / 2.0};
}

}  // namespace irrepwise
