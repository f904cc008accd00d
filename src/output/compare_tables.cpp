#include "output/compare_tables.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <optional>
#include <string>
#include <utility>

#include <fmt/format.h>

#include "molecule/molecule.hpp"
#include "output/frontier_fate.hpp"

namespace irrepwise {
namespace {

Cell percent(double share) { return Number{100.0 * share, 0}; }

Row flip_row(const VariantResult& variant, const char* side, const LevelFlip& flip) {
  const auto parameter = [&](int index) {
    return variant.robustness.parameters[static_cast<std::size_t>(index)].name;
  };
  const std::string lower = readable_label(name_of_level(variant, flip.lower));
  const std::string upper = readable_label(name_of_level(variant, flip.upper));
  Row row{{variant.name, side, lower + (flip.coincide() ? " = " : " < ") + upper,
           Number{flip.gap_ev, 3}}};
  if (flip.parameter) {
    row.cells.emplace_back(parameter(*flip.parameter));
    row.cells.emplace_back(Number{flip.first_order_ev, 3, true});
    row.cells.emplace_back(flip.change_ev ? Cell(Number{*flip.change_ev, 3, true}) : Cell());
  } else {
    row.cells.resize(row.cells.size() + 3);
  }
  row.cells.emplace_back(flip.other ? Cell(fmt::format("{} {:+.1f} %", parameter(*flip.other),
                                                       100.0 * flip.other_relative))
                                    : Cell());
  row.cells.emplace_back(flip.coincide() ? "coincide" : flip.fragile ? "fragile" : "");
  return row;
}

// Level, shift, overlap and whether it is still the frontier level: of one of those that the
// reference's became, or blank where there are fewer.
void add_part(const Comparison& comparison, int index, const std::optional<FrontierFate>& fate,
              std::size_t which, Row& row) {
  if (!fate || which >= fate->parts.size()) {
    row.cells.resize(row.cells.size() + 3);
    row.cells.emplace_back(fate && which == 0 ? Cell(stays_word(fate->stays)) : Cell());
    return;
  }
  const VariantResult& variant = comparison.variants[static_cast<std::size_t>(index)];
  const FatePart& part = fate->parts[which];
  row.cells.emplace_back(SymmetryLabel{name_of_level(variant, part.match.variant)});
  row.cells.emplace_back(Number{shift_ev(comparison, index, part.match), 3, true});
  row.cells.emplace_back(percent(part.match.overlap));
  row.cells.emplace_back(stays_word(part.at_frontier ? fate->stays : Stays::No));
}

// Neighbours in energy: "a1g–eg 0.015, eg–b2g 0.216".
std::string splitting_words(const DBlock& block) {
  std::string words;
  for (std::size_t i = 0; i + 1 < block.means.size(); ++i) {
    words += fmt::format("{}{}–{} {:.3f}", i == 0 ? "" : ", ", readable_label(block.means[i].label),
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
  return fmt::format("{} {} ({})", block.shape->symbol, block.shape->name, group);
}

// Names the metal where there are others.
std::string metal_words(const VariantResult& variant, const MetalFacts& metal) {
  const std::string name = atom_name(variant.levels.molecule, metal.atom);
  if (metal.n_equivalent > 1) {
    return fmt::format("{} and {} equivalent: ", name, metal.n_equivalent - 1);
  }
  return variant.metals.size() > 1 ? name + ": " : "";
}

}  // namespace

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
    for (const MetalFacts& metal : variant.metals) {
      if (!metal.has_d_shell) continue;
      const DBlock& block = metal.d_block;
      table.lines.emplace_back(Separator{metal_words(variant, metal) + parent_words(block)});
      for (auto entry = block.levels.rbegin(); entry != block.levels.rend(); ++entry) {
        const Level& level = level_of(variant, entry->level);
        const bool whole = level.occupation == std::round(level.occupation);
        const bool labelled = !entry->parent_label.empty();
        table.lines.emplace_back(
            Row{{variant.name, SymmetryLabel{name_of_level(variant, entry->level)},
                 labelled ? Cell(SymmetryLabel{entry->parent_label}) : Cell(),
                 Number{level.energy_ev, 3}, percent(entry->d_share),
                 labelled ? percent(entry->parent_weight) : Cell(),
                 Number{level.occupation, whole ? 0 : 2}}});
      }
    }
  }
  table.notes = {
      "parent: the irrep whose d orbitals the level stands for in the ideal polyhedron of the "
      "donor "
      "atoms; d share: of the whole level, Mulliken's."};
  return table;
}

Table splittings_table(const Comparison& comparison) {
  Table table;
  table.caption = "Splittings of the d block";
  table.columns = {{"name", "variant", "", Align::Left, 0, true},
                   {"metal", "metal", "", Align::Left, 4, false},
                   {"polyhedron", "ideal", "", Align::Left, 1, false},
                   {"deviation_degrees", "off", "°", Align::Decimal, 2, false},
                   {"splittings", "means of parents, apart", "eV", Align::Left, 0, true}};
  for (const VariantResult& variant : comparison.variants) {
    for (const MetalFacts& metal : variant.metals) {
      const DBlock& block = metal.d_block;
      if (block.means.size() < 2) continue;
      table.lines.emplace_back(
          Row{{variant.name, atom_name(variant.levels.molecule, metal.atom),
               block.shape ? Cell(std::string(block.shape->symbol)) : Cell(),
               block.shape ? Cell(Number{block.shape->deviation_degrees, 1}) : Cell(),
               splitting_words(block)}});
    }
  }
  table.notes = {
      "Differences of the mean energies of neighbouring parents, means weighted by d share and "
      "degeneracy; of parents that σ donors span, all antibonding levels with much d. off: root "
      "mean square of the angles between donors and the ideal vertices."};
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
                   {"replaced_donors", "donors replaced", "", Align::Right, 5, false},
                   {"homo", title("HOMO", frontier.homo), "", Align::Right, 0, false},
                   {"homo_shift_ev", "shift", "eV", Align::Decimal, 0, false},
                   {"homo_overlap", "HOMO overlap", "%", Align::Decimal, 3, false},
                   {"homo_change", "still HOMO", "", Align::Left, 2, false},
                   {"lumo", title("LUMO", frontier.lumo), "", Align::Right, 0, false},
                   {"lumo_shift_ev", "shift", "eV", Align::Decimal, 0, false},
                   {"lumo_overlap", "LUMO overlap", "%", Align::Decimal, 3, false},
                   {"lumo_change", "still LUMO", "", Align::Left, 2, false}};
  for (int i = 0; i < static_cast<int>(comparison.variants.size()); ++i) {
    if (i == comparison.reference) continue;
    const Matching& matching = comparison.matchings[static_cast<std::size_t>(i)];
    const std::optional<FrontierFate> homo = frontier_fate(comparison, i, FrontierSide::Homo);
    const std::optional<FrontierFate> lumo = frontier_fate(comparison, i, FrontierSide::Lumo);
    const std::size_t n_rows =
        std::max({std::size_t{1}, homo ? homo->parts.size() : 0, lumo ? lumo->parts.size() : 0});
    for (std::size_t part = 0; part < n_rows; ++part) {
      Row row{{comparison.variants[static_cast<std::size_t>(i)].name, matching.common_group,
               Number{static_cast<double>(matching.shared_atoms), 0},
               Number{static_cast<double>(matching.replaced_donors), 0}}};
      add_part(comparison, i, homo, part, row);
      add_part(comparison, i, lumo, part, row);
      table.lines.emplace_back(std::move(row));
    }
    for (const FrontierSide side : {FrontierSide::Homo, FrontierSide::Lumo}) {
      std::string words = crossing_words(comparison, i, side);
      if (!words.empty()) table.notes.push_back(std::move(words));
    }
  }
  table.notes.push_back(fmt::format(
      "What resembles the reference's HOMO or LUMO most in each variant, of a degenerate one as "
      "many "
      "levels as it splits into: by the overlap on the atoms that both molecules have and on "
      "donors "
      "in the same places, among levels that share an irrep of the common group. shift: its energy "
      "less the reference's. Levels within {} eV of the HOMO or LUMO count as it; in part: other "
      "parts of the level do not.",
      tied_below_ev));
  return table;
}

Table robustness_table(const Comparison& comparison) {
  Table table;
  table.caption = "Smallest change of one parameter that turns the order of two frontier levels";
  table.columns = {{"name", "variant", "", Align::Left, 0, true},
                   {"side", "side", "", Align::Left, 3, false},
                   {"pair", "order", "", Align::Left, 0, false},
                   {"gap_ev", "apart", "eV", Align::Decimal, 2, false},
                   {"parameter", "parameter", "", Align::Left, 0, false},
                   {"first_order_ev", "by slope", "eV", Align::Decimal, 1, false},
                   {"change_ev", "solved", "eV", Align::Decimal, 0, false},
                   {"other", "other parameter and change", "", Align::Left, 4, false},
                   {"fragile", "", "", Align::Left, 0, false}};
  for (const VariantResult& variant : comparison.variants) {
    const Robustness& robustness = variant.robustness;
    if (robustness.occupied) {
      table.lines.emplace_back(flip_row(variant, "occupied", *robustness.occupied));
    }
    if (robustness.empty) {
      table.lines.emplace_back(flip_row(variant, "empty", *robustness.empty));
    }
  }
  table.notes = {fmt::format(
      "The two highest occupied and the two lowest empty levels of different symmetry. by slope: "
      "what "
      "the parameter must change by, first order; solved: the same computed again until the levels "
      "meet, where less than 1 eV is expected; other parameter: the exponent or K that does it "
      "soonest, first order. fragile: turns for less than {} eV in one H_ii; coincide: less than "
      "{} eV apart, thus without an order.",
      fragile_below_ev, coincide_below_ev)};
  return table;
}

Table slopes_table(const VariantResult& variant) {
  Table table;
  table.caption = "Derivatives by parameter: " + variant.name;
  table.columns = {{"parameter", "parameter", "", Align::Left, 0, false},
                   {"value", "value", "", Align::Decimal, 0, false},
                   {"unit", "unit", "", Align::Left, 1, false},
                   {"homo", "HOMO", "eV/unit", Align::Decimal, 0, false},
                   {"lumo", "LUMO", "eV/unit", Align::Decimal, 0, false},
                   {"gap", "gap", "eV/unit", Align::Decimal, 0, false}};
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
