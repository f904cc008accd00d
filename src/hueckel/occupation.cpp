#include "hueckel/occupation.hpp"

#include <algorithm>
#include <numeric>

#include <fmt/format.h>

#include "core/error_about.hpp"

namespace irrepwise {
namespace {

void fill_from_below(std::vector<Level>& levels, int electrons) {
  for (Level& level : levels) {
    const int here = std::min(electrons, 2 * level.degeneracy);
    level.occupation = here;
    electrons -= here;
  }
}

void fill_by_multiplicity(std::vector<Level>& levels, int electrons, int multiplicity) {
  const int orbitals = std::accumulate(levels.begin(), levels.end(), 0,
                                       [](int sum, const Level& l) { return sum + l.degeneracy; });
  if (multiplicity < 1) {
    throw ErrorAbout(
        "multiplicity",
        fmt::format("multiplicity = {}, expected 2S + 1, that is 1 or more", multiplicity));
  }
  const int unpaired = multiplicity - 1;
  if ((electrons - unpaired) % 2 != 0) {
    throw ErrorAbout("multiplicity",
                     fmt::format("multiplicity {} is impossible with {} electrons: it must be {} "
                                 "(1, 3, 5 … with an even "
                                 "number of electrons, 2, 4, 6 … with an odd one)",
                                 multiplicity, electrons, electrons % 2 == 0 ? "odd" : "even"));
  }
  int doubly = (electrons - unpaired) / 2;
  int singly = unpaired;
  if (doubly < 0 || doubly + singly > orbitals) {
    throw ErrorAbout(
        "multiplicity",
        fmt::format("multiplicity {} is impossible: {} electrons in {} orbitals allow at most {}",
                    multiplicity, electrons, orbitals,
                    std::min(electrons, 2 * orbitals - electrons) + 1));
  }
  for (Level& level : levels) {
    const int full = std::min(doubly, level.degeneracy);
    const int half = std::min(singly, level.degeneracy - full);
    level.occupation = 2 * full + half;
    doubly -= full;
    singly -= half;
  }
}

void fill_by_irrep(std::vector<Level>& levels, const PointGroup& group, int electrons,
                   const std::map<std::string, int>& by_irrep) {
  std::vector<int> wanted(group.irreps().size(), 0);
  int sum = 0;
  for (const auto& [label, count] : by_irrep) {
    if (count < 0) {
      throw ErrorAbout(
          "occupations",
          fmt::format("occupations: {} electrons in {}, expected 0 or more", count, label));
    }
    wanted[about("occupations", [&] { return group.irrep_index(label); })] += count;
    sum += count;
  }
  if (sum != electrons) {
    throw ErrorAbout("occupations", fmt::format("occupations: the irreps hold {} electrons "
                                                "together, the molecule has {}; name every irrep "
                                                "that holds valence electrons",
                                                sum, electrons));
  }
  for (Level& level : levels) {
    const int here = std::min(wanted[level.irrep], 2 * level.degeneracy);
    level.occupation = here;
    wanted[level.irrep] -= here;
  }
  for (std::size_t i = 0; i < wanted.size(); ++i) {
    if (wanted[i] > 0) {
      throw ErrorAbout("occupations",
                       fmt::format("occupations: {} has room for {} electrons less than asked",
                                   level_label(group.irreps()[i].label), wanted[i]));
    }
  }
}

}  // namespace

void occupy(std::vector<Level>& levels, const PointGroup& group, int electrons,
            const HueckelOptions& options) {
  int room = 0;
  for (const Level& level : levels) room += 2 * level.degeneracy;
  if (electrons < 1) {
    throw ErrorAbout(
        "charge",
        fmt::format("the charge leaves {} valence electrons, expected at least 1; check the "
                    "charge",
                    electrons));
  }
  if (electrons > room) {
    throw ErrorAbout(
        "charge",
        fmt::format("{} valence electrons, but the orbitals hold {} at most; check the charge",
                    electrons, room));
  }
  if (options.multiplicity && !options.electrons_by_irrep.empty()) {
    throw ErrorAbout("multiplicity",
                     "both a multiplicity and occupations by irrep are given; keep one of them");
  }
  if (options.multiplicity) {
    fill_by_multiplicity(levels, electrons, *options.multiplicity);
  } else if (!options.electrons_by_irrep.empty()) {
    fill_by_irrep(levels, group, electrons, options.electrons_by_irrep);
  } else {
    fill_from_below(levels, electrons);
  }
}

bool is_partly_filled(double electrons, int degeneracy) {
  constexpr double rounding = 1e-9;  // electrons, of fractions spread over partners
  return electrons > rounding && electrons < 2 * degeneracy - rounding;
}

Frontier find_frontier(const std::vector<Level>& levels) {
  Frontier frontier;
  for (std::size_t i = 0; i < levels.size(); ++i) {
    if (levels[i].occupation > 0.0) frontier.homo = static_cast<int>(i);
    if (levels[i].occupation == 0.0 && !frontier.lumo) frontier.lumo = static_cast<int>(i);
  }
  if (frontier.homo) {
    const Level& homo = levels[*frontier.homo];
    frontier.open_shell = homo.occupation < 2.0 * homo.degeneracy;
  }
  return frontier;
}

}  // namespace irrepwise
