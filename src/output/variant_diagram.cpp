#include "output/variant_diagram.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <map>
#include <set>
#include <string>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"
#include "figure/level_columns.hpp"
#include "figure/rich_text.hpp"
#include "output/orbital_pictures.hpp"

namespace irrepwise {
namespace {

constexpr std::size_t all_labelled = 3;  // columns, up to which every level bears its label

// The variants shown, by their indices in the comparison.
struct Shown {
  const Comparison& comparison;
  std::vector<std::size_t> at;

  [[nodiscard]] const VariantResult& variant(std::size_t column) const {
    return comparison.variants[at[column]];
  }
  [[nodiscard]] const VariantResult& reference() const {
    return comparison.variants[static_cast<std::size_t>(comparison.reference)];
  }
  [[nodiscard]] bool is_reference(std::size_t column) const {
    return static_cast<int>(at[column]) == comparison.reference;
  }
};

Shown shown_of(const Comparison& comparison, const std::vector<int>& variants) {
  Shown shown{comparison, {}};
  for (const int i : variants) shown.at.push_back(static_cast<std::size_t>(i));
  for (std::size_t i = 0; variants.empty() && i < comparison.variants.size(); ++i) {
    shown.at.push_back(i);
  }
  if (shown.at.size() > static_cast<std::size_t>(most_columns)) {
    throw Error(fmt::format("{} variants are too many for one diagram, which holds up to {}",
                            shown.at.size(), most_columns));
  }
  return shown;
}

// What all variants shown have in common, or nothing.
std::string common(const Shown& shown, std::string (*of)(const LevelsResult&)) {
  const std::string first = of(shown.variant(0).levels);
  for (std::size_t i = 1; i < shown.at.size(); ++i) {
    if (of(shown.variant(i).levels) != first) return {};
  }
  return first;
}

std::string diagram_title(const Shown& shown) {
  const std::string title = common(shown, [](const LevelsResult& result) { return result.title; });
  if (!title.empty()) return title;
  std::string names;
  for (std::size_t i = 0; i < shown.at.size(); ++i) {
    names += (i == 0 ? "" : " · ") + shown.variant(i).name;
  }
  return names;
}

std::string diagram_method(const Shown& shown) {
  const std::string words = common(shown, method_words);
  return words.empty() ? "extended Hückel; rule and parameters differ between the columns" : words;
}

std::vector<RichText> column_notes(const Shown& shown, std::size_t column) {
  const LevelsResult& result = shown.variant(column).levels;
  RichText group = group_text(result.symmetry.group.symbol().name());
  if (shown.is_reference(column)) group = group + plain_text(" · reference");
  std::vector<RichText> notes = {group};
  const Frontier& frontier = result.levels.frontier;
  if (frontier.homo && frontier.lumo && *frontier.homo != *frontier.lumo) {
    const auto energy = [&](int level) {
      return result.levels.levels[static_cast<std::size_t>(level)].energy_ev;
    };
    notes.push_back(
        plain_text("gap\u00A0" + energy_words(energy(*frontier.lumo) - energy(*frontier.homo), 2)));
  }
  return notes;
}

// Levels of a variant that are the reference's HOMO or LUMO.
std::set<int> fate(const Shown& shown, std::size_t column, std::optional<int> level) {
  std::set<int> levels;
  if (!level) return levels;
  for (const LevelMatch& match : shown.comparison.matchings[shown.at[column]].matches) {
    if (match.reference == *level && match.overlap >= least_drawn_overlap) {
      levels.insert(match.variant);
    }
  }
  return levels;
}

std::set<int> d_levels(const VariantResult& variant) {
  std::set<int> levels;
  for (const MetalFacts& metal : variant.metals) {
    for (const DLevel& level : metal.d_block.levels) levels.insert(level.level);
  }
  return levels;
}

Matching neighbours_matching(const Shown& shown, std::size_t left) {
  const std::vector<Matching>& with_reference = shown.comparison.matchings;
  if (shown.is_reference(left)) return with_reference[shown.at[left + 1]];
  if (shown.is_reference(left + 1)) {
    Matching matching = with_reference[shown.at[left]];
    for (LevelMatch& match : matching.matches) std::swap(match.reference, match.variant);
    return matching;
  }
  const LevelsResult& a = shown.variant(left).levels;
  const LevelsResult& b = shown.variant(left + 1).levels;
  return match_levels(make_match_reference(a.symmetry, a.basis, a.levels), b.symmetry, b.basis,
                      b.levels);
}

struct Trails {
  std::vector<std::set<int>> homo;  // per column
  std::vector<std::set<int>> lumo;
  std::vector<std::set<int>> d_block;
};

Trails find_trails(const Shown& shown) {
  const Frontier& frontier = shown.reference().levels.levels.frontier;
  Trails trails;
  for (std::size_t i = 0; i < shown.at.size(); ++i) {
    trails.homo.push_back(fate(shown, i, frontier.homo));
    trails.lumo.push_back(fate(shown, i, frontier.lumo));
    trails.d_block.push_back(d_levels(shown.variant(i)));
  }
  return trails;
}

std::vector<DiagramLink> links_between(const Shown& shown, const Trails& trails, std::size_t left) {
  std::vector<DiagramLink> links;
  for (const LevelMatch& match : neighbours_matching(shown, left).matches) {
    if (match.overlap < least_drawn_overlap) continue;
    const auto both = [&](const std::vector<std::set<int>>& trail) {
      return trail[left].count(match.reference) != 0 && trail[left + 1].count(match.variant) != 0;
    };
    DiagramLink link{static_cast<int>(left), match.reference, match.variant, match.overlap,
                     LinkWeight::Plain};
    if (both(trails.d_block)) link.weight = LinkWeight::Strong;
    if (both(trails.lumo)) link.weight = LinkWeight::Lumo;
    if (both(trails.homo)) link.weight = LinkWeight::Homo;
    links.push_back(link);
  }
  return links;
}

bool same_irrep(const std::string& level, const std::string& irrep) {
  return level.substr(std::min(level.size(), level.find_first_not_of("0123456789"))) == irrep;
}

DiagramColumn variant_column(const Shown& shown, const Trails& trails, std::size_t i) {
  const VariantResult& variant = shown.variant(i);
  DiagramColumn column = diagram_column(variant.levels.symmetry.group, variant.levels.levels);
  column.title = variant.name;
  column.notes = column_notes(shown, i);
  std::map<int, double> d_share;  // of levels in the d block of several metals the largest counts
  for (const MetalFacts& metal : variant.metals) {
    for (const DLevel& level : metal.d_block.levels) {
      double& known = d_share[level.level];
      if (level.d_share <= known) continue;
      known = level.d_share;
      DiagramLevel& drawn = column.levels[static_cast<std::size_t>(level.level)];
      // Where the molecule has the symmetry of its parent, "2t2g (t2g)" would say nothing more.
      drawn.parent = same_irrep(drawn.label, level.parent_label) ? "" : level.parent_label;
    }
  }
  for (std::size_t k = 0; k < column.levels.size(); ++k) {
    DiagramLevel& level = column.levels[k];
    const int index = static_cast<int>(k);
    level.labelled = shown.at.size() <= all_labelled || level.frontier != FrontierMark::None ||
                     trails.homo[i].count(index) != 0 || trails.lumo[i].count(index) != 0 ||
                     trails.d_block[i].count(index) != 0;
  }
  return column;
}

// A link to a level so near a labelled one would seem to mean that: it is labelled too.
void label_neighbours(LevelDiagram& diagram) {
  constexpr double near_ev = 0.2;
  std::vector<std::set<int>> linked(diagram.columns.size());
  for (const DiagramLink& link : diagram.links) {
    linked[static_cast<std::size_t>(link.column)].insert(link.left_level);
    linked[static_cast<std::size_t>(link.column) + 1].insert(link.right_level);
  }
  for (std::size_t i = 0; i < diagram.columns.size(); ++i) {
    std::vector<DiagramLevel>& levels = diagram.columns[i].levels;
    std::vector<double> labelled_ev;
    for (const DiagramLevel& level : levels) {
      if (level.labelled) labelled_ev.push_back(level.energy_ev);
    }
    for (const int k : linked[i]) {
      DiagramLevel& level = levels[static_cast<std::size_t>(k)];
      level.labelled = level.labelled ||
                       std::any_of(labelled_ev.begin(), labelled_ev.end(), [&](double energy_ev) {
                         return std::abs(energy_ev - level.energy_ev) < near_ev;
                       });
    }
  }
}

// What bears a label for its own sake, and some room around it.
EnergyWindow variant_window(const LevelDiagram& diagram, const Trails& trails) {
  constexpr double below_ev = 2.5;
  constexpr double above_ev = 2.0;
  double lowest = std::numeric_limits<double>::infinity();
  double highest = -lowest;
  for (std::size_t i = 0; i < diagram.columns.size(); ++i) {
    const std::vector<DiagramLevel>& levels = diagram.columns[i].levels;
    for (std::size_t k = 0; k < levels.size(); ++k) {
      if (levels[k].frontier == FrontierMark::None &&
          trails.d_block[i].count(static_cast<int>(k)) == 0) {
        continue;
      }
      lowest = std::min(lowest, levels[k].energy_ev);
      highest = std::max(highest, levels[k].energy_ev);
    }
  }
  if (lowest > highest) return frontier_window(diagram.columns);
  return {std::floor(2.0 * (lowest - below_ev)) / 2.0, std::ceil(2.0 * (highest + above_ev)) / 2.0};
}

// The groups of the ideal polyhedra, each once.
RichText parent_groups(const Shown& shown) {
  std::set<std::string> known;
  RichText words;
  for (std::size_t i = 0; i < shown.at.size(); ++i) {
    for (const MetalFacts& metal : shown.variant(i).metals) {
      const std::string& parent = metal.d_block.parent_group;
      if (parent.empty() || !known.insert(parent).second) continue;
      words = words + plain_text(words.empty() ? "" : ", ") + group_text(parent);
    }
  }
  return words;
}

std::vector<RichText> diagram_notes(const Shown& shown, const LevelDiagram& diagram) {
  std::vector<RichText> notes;
  bool has_parents = false;
  bool has_arrows = false;
  for (const DiagramColumn& column : diagram.columns) {
    for (const DiagramLevel& level : column.levels) {
      has_parents = has_parents || !level.parent.empty();
      has_arrows = has_arrows || is_partly_filled(level);
    }
  }
  RichText levels = plain_text("Strongly drawn levels are occupied, pale ones empty");
  if (has_arrows) levels = levels + plain_text("; arrows stand where a level is partly filled");
  if (has_parents) {
    levels = levels +
             plain_text(
                 ". In parentheses: what a level of the d block is called in the ideal "
                 "polyhedron of the donor atoms (") +
             parent_groups(shown) + plain_text(")");
  }
  notes.push_back(levels + plain_text("."));
  if (shown.at.size() > 1) {
    notes.push_back(plain_text(fmt::format(
        "Lines join levels of neighbours that share a symmetry and at least {:.0f}\u00A0% of their "
        "orbitals on atoms in the same places; dashed below {:.0f}\u00A0%. Where levels crowd, "
        "lines "
        "run from name to name. Blue and orange: what became of HOMO and LUMO of {}.",
        100.0 * least_drawn_overlap, 100.0 * dashed_below, shown.reference().name)));
  }
  return notes;
}

}  // namespace

LevelDiagram variant_diagram(const Comparison& comparison, const VariantDiagramChoice& choice) {
  const Shown shown = shown_of(comparison, choice.variants);
  LevelDiagram diagram;
  diagram.title = diagram_title(shown);
  diagram.method = plain_text(diagram_method(shown));
  const Trails trails = find_trails(shown);
  for (std::size_t i = 0; i < shown.at.size(); ++i) {
    diagram.columns.push_back(variant_column(shown, trails, i));
    if (i == 0) continue;
    for (const DiagramLink& link : links_between(shown, trails, i - 1)) {
      diagram.links.push_back(link);
    }
  }
  label_neighbours(diagram);
  diagram.notes = diagram_notes(shown, diagram);
  const EnergyWindow window = variant_window(diagram, trails);
  diagram.from_ev = choice.from_ev.value_or(window.from_ev);
  diagram.to_ev = choice.to_ev.value_or(window.to_ev);
  return diagram;
}

}  // namespace irrepwise
