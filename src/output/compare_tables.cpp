#include "output/compare_tables.hpp"

#include <cmath>
#include <optional>
#include <string>
#include <utility>

#include <fmt/format.h>

#include "molecule/molecule.hpp"

namespace irrepwise {
namespace {

const Level& level_of(const VariantResult& variant, int level) {
  return variant.levels.levels.levels[static_cast<std::size_t>(level)];
}

Cell percent(double share) { return Number{100.0 * share, 0}; }

Row flip_row(const VariantResult& variant, const std::string& name, const char* side,
             const LevelFlip& flip) {
  const std::vector<Parameter>& parameters = variant.robustness.parameters;
  Row row{{name, side,
           readable_label(name_of_level(variant, flip.lower)) + " < " +
               readable_label(name_of_level(variant, flip.upper)),
           Number{flip.gap_ev, 3}, parameters[static_cast<std::size_t>(flip.parameter)].name,
           Number{flip.first_order_ev, 3, true},
           flip.change_ev ? Cell(Number{*flip.change_ev, 3, true}) : Cell()}};
  if (flip.other) {
    row.cells.emplace_back(parameters[static_cast<std::size_t>(*flip.other)].name);
    row.cells.emplace_back(Number{100.0 * flip.other_relative, 1, true});
  } else {
    row.cells.resize(9);
  }
  row.cells.emplace_back(flip.fragile ? "fragile" : "");
  return row;
}

// Two cells, the level and its shift, of what the reference's frontier level became.
void add_fate(const Comparison& comparison, int index, FrontierSide side, Row& row) {
  const VariantResult& variant = comparison.variants[static_cast<std::size_t>(index)];
  const VariantResult& reference =
      comparison.variants[static_cast<std::size_t>(comparison.reference)];
  const std::optional<FrontierFate> fate = frontier_fate(comparison, index, side);
  if (!fate || !fate->match) {
    row.cells.resize(row.cells.size() + 4);
    return;
  }
  row.cells.emplace_back(SymmetryLabel{name_of_level(variant, fate->match->variant)});
  row.cells.emplace_back(Number{level_of(variant, fate->match->variant).energy_ev -
                                    level_of(reference, fate->reference_level).energy_ev,
                                3, true});
  row.cells.emplace_back(percent(fate->match->overlap));
  row.cells.emplace_back(fate->stays ? "" : "no longer");
}

}  // namespace

std::string splitting_words(const DBlock& block) {
  std::string words;
  for (std::size_t i = 0; i + 1 < block.means.size(); ++i) {
    words +=
        fmt::format("{}{}–{} {:.3f} eV", i == 0 ? "" : ", ", readable_label(block.means[i].label),
                    readable_label(block.means[i + 1].label),
                    block.means[i + 1].energy_ev - block.means[i].energy_ev);
  }
  return words;
}

std::string parent_words(const DBlock& block) {
  if (block.parent_group.empty()) return "no ideal polyhedron";
  std::string group = block.parent_group;
  if (const std::size_t at = group.find("inf"); at != std::string::npos) group.replace(at, 3, "∞");
  if (!block.shape) return "one donor (" + group + ")";
  return fmt::format("{} {} ({}), {:.1f}° off", block.shape->symbol, block.shape->name, group,
                     block.shape->deviation_degrees);
}

Table d_block_table(const Comparison& comparison) {
  Table table;
  table.caption = "d block";
  table.columns = {{"name", "variant", "", Align::Left, 0, true},
                   {"label", "level", "", Align::Right, 0, false},
                   {"parent_label", "parent", "", Align::Left, 0, false},
                   {"energy_ev", "energy", "eV", Align::Decimal, 0, false},
                   {"d_share", "d share", "%", Align::Decimal, 0, false},
                   {"parent_weight", "of it in parent", "%", Align::Decimal, 2, false},
                   {"occupation", "electrons", "", Align::Decimal, 1, false}};
  for (const VariantResult& variant : comparison.variants) {
    if (!variant.d_block) continue;
    const DBlock& block = *variant.d_block;
    const std::string splittings = splitting_words(block);
    table.lines.emplace_back(
        Separator{parent_words(block) + (splittings.empty() ? "" : "; " + splittings)});
    for (auto entry = block.levels.rbegin(); entry != block.levels.rend(); ++entry) {
      const Level& level = level_of(variant, entry->level);
      const bool whole = level.occupation == std::round(level.occupation);
      const bool labelled = !entry->parent_label.empty();
      table.lines.emplace_back(Row{
          {variant.name, SymmetryLabel{name_of_level(variant, entry->level)},
           labelled ? Cell(SymmetryLabel{entry->parent_label}) : Cell(), Number{level.energy_ev, 3},
           percent(entry->d_share), labelled ? percent(entry->parent_weight) : Cell(),
           Number{level.occupation, whole ? 0 : 2}}});
    }
  }
  table.notes = {
      "parent: the irrep that the metal d part has most of in the ideal polyhedron of the donor "
      "atoms. Splittings: differences of means over the levels of each parent label, weighted by d "
      "share and degeneracy."};
  return table;
}

Table frontier_match_table(const Comparison& comparison) {
  const VariantResult& reference =
      comparison.variants[static_cast<std::size_t>(comparison.reference)];
  const Frontier& frontier = reference.levels.levels.frontier;
  const auto title = [&](const char* which, const std::optional<int>& level) {
    return level ? fmt::format("{} {}", which, readable_label(name_of_level(reference, *level)))
                 : std::string(which);
  };
  Table table;
  table.caption = "Frontier levels of " + reference.name + " found again";
  table.columns = {{"name", "variant", "", Align::Left, 0, true},
                   {"common_group", "common group", "", Align::Left, 1, false},
                   {"shared_atoms", "atoms shared", "", Align::Right, 4, false},
                   {"homo", title("HOMO", frontier.homo), "", Align::Right, 0, false},
                   {"homo_shift_ev", "shift", "eV", Align::Decimal, 0, false},
                   {"homo_overlap", "overlap", "%", Align::Decimal, 3, false},
                   {"homo_change", "HOMO?", "", Align::Left, 2, false},
                   {"lumo", title("LUMO", frontier.lumo), "", Align::Right, 0, false},
                   {"lumo_shift_ev", "shift", "eV", Align::Decimal, 0, false},
                   {"lumo_overlap", "overlap", "%", Align::Decimal, 3, false},
                   {"lumo_change", "LUMO?", "", Align::Left, 2, false}};
  for (int i = 0; i < static_cast<int>(comparison.variants.size()); ++i) {
    if (i == comparison.reference) continue;
    const Matching& matching = comparison.matchings[static_cast<std::size_t>(i)];
    Row row{{comparison.variants[static_cast<std::size_t>(i)].name, matching.common_group,
             Number{static_cast<double>(matching.shared_atoms), 0}}};
    add_fate(comparison, i, FrontierSide::Homo, row);
    add_fate(comparison, i, FrontierSide::Lumo, row);
    table.lines.emplace_back(std::move(row));
    for (const FrontierSide side : {FrontierSide::Homo, FrontierSide::Lumo}) {
      std::string words = crossing_words(comparison, i, side);
      if (!words.empty()) table.notes.push_back(std::move(words));
    }
  }
  return table;
}

Table robustness_table(const Comparison& comparison) {
  Table table;
  table.caption = "Smallest change of one parameter that turns the order of two frontier levels";
  table.columns = {{"name", "variant", "", Align::Left, 0, true},
                   {"side", "side", "", Align::Left, 3, false},
                   {"pair", "order", "", Align::Left, 0, false},
                   {"gap_ev", "apart", "eV", Align::Decimal, 2, false},
                   {"parameter", "change", "", Align::Left, 0, false},
                   {"first_order_ev", "by slope", "eV", Align::Decimal, 1, false},
                   {"change_ev", "solved", "eV", Align::Decimal, 0, false},
                   {"other", "or", "", Align::Left, 4, false},
                   {"other_percent", "by", "%", Align::Decimal, 4, false},
                   {"fragile", "", "", Align::Left, 0, false}};
  for (const VariantResult& variant : comparison.variants) {
    const Robustness& robustness = variant.robustness;
    if (robustness.occupied) {
      table.lines.emplace_back(flip_row(variant, variant.name, "occupied", *robustness.occupied));
    }
    if (robustness.empty) {
      table.lines.emplace_back(flip_row(variant, variant.name, "empty", *robustness.empty));
    }
  }
  table.notes = {fmt::format(
      "The two highest occupied and the two lowest empty levels of different symmetry. by slope: "
      "first order in the parameter; solved: computed again until the levels meet, where less than "
      "1 eV is expected. fragile: turns for less than {} eV in one H_ii.",
      fragile_below_ev)};
  return table;
}

Table slopes_table(const VariantResult& variant) {
  Table table;
  table.caption = "Derivatives by parameter: " + variant.name;
  table.columns = {{"parameter", "parameter", "", Align::Left, 0, false},
                   {"value", "value", "", Align::Decimal, 0, false},
                   {"unit", "unit", "", Align::Left, 1, false},
                   {"homo", "HOMO", "eV per unit", Align::Decimal, 0, false},
                   {"lumo", "LUMO", "eV per unit", Align::Decimal, 0, false},
                   {"gap", "gap", "eV per unit", Align::Decimal, 0, false}};
  for (std::size_t p = 0; p < variant.robustness.parameters.size(); ++p) {
    const Parameter& parameter = variant.robustness.parameters[p];
    const auto row = variant.robustness.slopes.row(static_cast<Eigen::Index>(p));
    table.lines.emplace_back(
        Row{{parameter.name, Number{parameter.value, 3}, parameter.unit, Number{row[0], 4, true},
             Number{row[1], 4, true}, Number{row[2], 4, true}}});
  }
  return table;
}

}  // namespace irrepwise
