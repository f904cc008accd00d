#include "output/levels_report.hpp"

#include <algorithm>
#include <cmath>
#include <optional>

#include <fmt/format.h>

#include "analysis/d_block.hpp"
#include "analysis/donors.hpp"
#include "core/error.hpp"
#include "core/text.hpp"
#include "hueckel/occupation.hpp"
#include "output/caption_words.hpp"
#include "output/composition.hpp"
#include "output/equivalence.hpp"
#include "output/population_tables.hpp"

namespace irrepwise {
namespace {

constexpr int show_all_up_to = 24;  // levels; a table that still fits a screen
constexpr int occupied_shown = 10;  // otherwise so many from the HOMO down
constexpr int empty_shown = 6;      // and from the LUMO up, and all of the d block

std::string method_words(const Levels& levels) {
  std::string words = rule_name(levels.rule);
  if (levels.k) words += fmt::format(", K = {}", *levels.k);
  return words;
}

std::string group_words(const MolecularSymmetry& symmetry) {
  const std::string name = symmetry.group.symbol().name();
  std::string words = readable_group(name);
  if (!symmetry.full_group.empty() && symmetry.full_group != name) {
    words += ", a subgroup of " + readable_group(symmetry.full_group);
  }
  return fmt::format("{} at tolerance {:.4g} Å; largest shift of an atom {:.4f} Å", words,
                     symmetry.tolerance_angstrom, symmetry.largest_shift_angstrom);
}

std::vector<Fact> header(const LevelsResult& result, const std::vector<AtomSet>& sets) {
  const MolecularSymmetry& symmetry = result.symmetry;
  std::vector<Fact> facts;
  facts.push_back({"formula", {readable_formula(result.molecule)}});
  facts.push_back({"electrons",
                   {fmt::format("{} in {} valence orbitals", result.levels.electrons,
                                result.basis.n_orbitals)}});
  facts.push_back({"group", {group_words(symmetry)}});
  if (!symmetry.axes.empty()) facts.push_back({"axes", symmetry.axes});
  std::vector<std::string> listed;
  for (const AtomSet& set : sets) {
    const bool explains = set.atoms.size() > 1 && set.name.find("×") != std::string::npos;
    if (explains) listed.push_back(set.name + " = " + atom_list(symmetry.molecule, set.atoms));
  }
  if (!listed.empty()) facts.push_back({"equivalent atoms", listed});
  facts.push_back({"parameters", {result.parameter_set}});
  facts.push_back({"rule", {method_words(result.levels)}});
  return facts;
}

std::string range_words(const LevelWindow& window) {
  if (!window.to_ev) return fmt::format("above {} eV", *window.from_ev);
  if (!window.from_ev) return fmt::format("below {} eV", *window.to_ev);
  return fmt::format("between {} and {} eV", *window.from_ev, *window.to_ev);
}

// First and one past the last level to show, in order of energy.
struct Range {
  int first;
  int end;
};

// Widened until it holds the d block of every metal.
Range with_d_blocks(Range range, const LevelsResult& result) {
  const std::vector<int> metals = metal_atoms(result.symmetry.molecule, result.basis);
  for (const EquivalentAtoms& set : result.levels.salcs.sets) {
    if (std::find(metals.begin(), metals.end(), set.representative()) == metals.end()) continue;
    const DBlock block = find_d_block(result.symmetry, result.basis, result.levels,
                                      result.populations, set.representative());
    for (const DLevel& level : block.levels) {
      range.first = std::min(range.first, level.level);
      range.end = std::max(range.end, level.level + 1);
    }
  }
  return range;
}

Range shown_levels(const LevelsResult& result, const LevelWindow& window) {
  const Levels& levels = result.levels;
  const int n = static_cast<int>(levels.levels.size());
  if (window.from_ev || window.to_ev) {
    Range range{n, 0};
    for (int i = 0; i < n; ++i) {
      const double energy = levels.levels[static_cast<std::size_t>(i)].energy_ev;
      if ((window.from_ev && energy < *window.from_ev) ||
          (window.to_ev && energy > *window.to_ev)) {
        continue;
      }
      range.first = std::min(range.first, i);
      range.end = i + 1;
    }
    if (range.first >= range.end) {
      throw Error(fmt::format("no level lies {}; they run from {:.3f} to {:.3f} eV",
                              range_words(window), levels.levels.front().energy_ev,
                              levels.levels.back().energy_ev));
    }
    return range;
  }
  if (window.all || n <= show_all_up_to) return {0, n};
  const int homo = levels.frontier.homo.value_or(-1);
  const int first_empty = homo + 1;
  return with_d_blocks(
      {std::max(0, first_empty - occupied_shown), std::min(n, first_empty + empty_shown)}, result);
}

std::string frontier_mark(const Frontier& frontier, int level) {
  if (frontier.homo == level) return "HOMO";
  if (frontier.lumo == level) return "LUMO";
  return {};
}

// Between HOMO and LUMO; an excited occupation may leave the LUMO below the HOMO, then nowhere.
std::optional<Separator> line_below(const Levels& levels, int level) {
  const Frontier& frontier = levels.frontier;
  if (frontier.lumo != level || !frontier.homo || *frontier.homo > level) return {};
  const double gap = levels.levels[static_cast<std::size_t>(level)].energy_ev -
                     levels.levels[static_cast<std::size_t>(*frontier.homo)].energy_ev;
  return Separator{fmt::format("gap {:.3f} eV", gap)};
}

Table level_table(const LevelsResult& result, const std::vector<AtomSet>& sets,
                  const LevelWindow& window) {
  const Levels& levels = result.levels;
  const Range range = shown_levels(result, window);
  const int n = static_cast<int>(levels.levels.size());
  Table table;
  table.caption = range.end - range.first == n
                      ? "Levels"
                      : fmt::format("Levels {} to {} of {}", range.first + 1, range.end, n);
  const bool left_out = range.end - range.first < n;
  if (left_out && window.hint == LevelsHint::NameAllOption) {
    table.caption += " (--all shows every one)";
  }
  table.columns = {{"frontier", "", "", Align::Left, 0, false},
                   {"label", "level", "", Align::Right, 0, false},
                   {"energy_ev", "energy", "eV", Align::Decimal, 0, false},
                   {"occupation", "electrons", "", Align::Decimal, 2, false},
                   {"degeneracy", "degeneracy", "", Align::Right, 3, false},
                   {"composition", "made of", "", Align::Left, 1, true}};
  const std::vector<ShellGroup> groups = shell_groups(result, sets);
  for (int i = range.end - 1; i >= range.first; --i) {
    const Level& level = levels.levels[static_cast<std::size_t>(i)];
    const bool whole = level.occupation == std::round(level.occupation);
    table.lines.emplace_back(Row{
        {frontier_mark(levels.frontier, i), SymmetryLabel{level_name(result.symmetry.group, level)},
         Number{level.energy_ev, 3}, Number{level.occupation, whole ? 0 : 2},
         Number{double(level.degeneracy), 0}, composition_words(result, sets, groups, i)}});
    const std::optional<Separator> line = line_below(levels, i);
    if (line && i > range.first) table.lines.emplace_back(*line);
  }
  return table;
}

// The HOMO, and what a multiplicity or the user's own occupation leaves open besides it.
std::string words_on_partly_filled(const LevelsResult& result) {
  const std::optional<int> homo = result.levels.frontier.homo;
  std::vector<std::string> holds;
  for (std::size_t i = result.levels.levels.size(); i-- > 0;) {
    const Level& level = result.levels.levels[i];
    const int room = 2 * level.degeneracy;
    if (!is_partly_filled(level.occupation, level.degeneracy)) continue;
    const bool is_homo = homo == static_cast<int>(i);
    holds.push_back(
        fmt::format("{} holds {:g} of {} electrons",
                    is_homo ? "the HOMO" : readable_label(level_name(result.symmetry.group, level)),
                    level.occupation, room));
  }
  return joined(holds);
}

std::vector<std::string> remarks(const LevelsResult& result) {
  std::vector<std::string> words;
  if (result.levels.frontier.open_shell) {
    words.push_back("Open shell: " + words_on_partly_filled(result) +
                    ". The method has no electron repulsion and cannot tell which spin state lies "
                    "lowest.");
  }
  words.push_back(
      "Extended Hückel ranks levels by symmetry, overlap and electronegativity. Do not read bond "
      "lengths, reaction energies, spin states or excitation energies from it; charges of ions and "
      "of very polar molecules come out too large.");
  words.push_back(
      "Orbital energies say nothing about toxicity, stability or how to handle a compound: there, "
      "safety data, local codes and licensed practice decide.");
  return words;
}

}  // namespace

Report levels_report(const LevelsResult& result, const LevelWindow& window) {
  const std::vector<AtomSet> sets = atom_sets(result.symmetry);
  Report report;
  report.title = result.title.empty() ? readable_formula(result.molecule) : result.title;
  report.facts = header(result, sets);
  report.tables.push_back(level_table(result, sets, window));
  const Grouping grouping = window.all ? Grouping::Single : Grouping::Equivalent;
  report.tables.push_back(charge_table(result, sets, grouping));
  Table bonds = overlap_population_table(result, grouping);
  if (!bonds.lines.empty()) report.tables.push_back(std::move(bonds));
  report.warnings = result.warnings;
  report.remarks = remarks(result);
  return report;
}

}  // namespace irrepwise
