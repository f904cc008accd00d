#include "output/frontier_fate.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include <doctest/doctest.h>

#include "output/compare_json.hpp"
#include "output/compare_tables.hpp"
#include "output/example.hpp"
#include "output/variant_diagram.hpp"

using namespace irrepwise;

namespace {

// d9 in six fluorides, those on z at their own distance in Å.
Molecule copper_fluoride(double axial) {
  std::vector<Atom> atoms = {{29, {0, 0, 0}}};
  for (const double sign : {-1.0, 1.0}) {
    atoms.push_back({9, {1.95 * sign, 0, 0}});
    atoms.push_back({9, {0, 1.95 * sign, 0}});
    atoms.push_back({9, {0, 0, axial * sign}});
  }
  return {atoms, -4, ""};
}

// Every variant matched with the first.
Comparison compared(std::vector<VariantResult> variants) {
  Comparison comparison;
  comparison.variants = std::move(variants);
  const LevelsResult& a = comparison.variants.front().levels;
  const MatchReference reference = make_match_reference(a.symmetry, a.basis, a.levels);
  for (const VariantResult& variant : comparison.variants) {
    const LevelsResult& b = variant.levels;
    comparison.matchings.push_back(match_levels(reference, b.symmetry, b.basis, b.levels));
  }
  return comparison;
}

// The last as the one before, its two levels brought together until they share a place.
Comparison from_regular() {
  VariantResult hardly = analysed("hardly", result_of(copper_fluoride(1.85)));
  std::vector<Level>& levels = hardly.levels.levels.levels;
  const auto homo = static_cast<std::size_t>(*hardly.levels.levels.frontier.homo);
  levels[homo - 1].energy_ev = levels[homo].energy_ev - 0.019;
  return compared({analysed("regular", result_of(copper_fluoride(1.95))),
                   analysed("long", result_of(copper_fluoride(2.30))),
                   analysed("short", result_of(copper_fluoride(1.85))), std::move(hardly)});
}

std::string irrep(const std::string& level) {
  return level.substr(level.find_first_not_of("0123456789"));
}

std::vector<std::string> names(const Comparison& comparison, int variant,
                               const FrontierFate& fate) {
  std::vector<std::string> out;
  for (const FatePart& part : fate.parts) {
    out.push_back(irrep(
        name_of_level(comparison.variants[static_cast<std::size_t>(variant)], part.match.variant)));
  }
  return out;
}

// A molecule beside itself: every level is its own match. In the copy the next level takes the
// place of the frontier by a chosen distance.
Comparison shifted_copy(const Comparison& same, FrontierSide side, double apart_ev,
                        bool in_reference) {
  Comparison comparison;
  comparison.variants = {same.variants[0], same.variants[0]};
  comparison.matchings = {same.matchings[0], same.matchings[0]};
  Levels& levels = comparison.variants[in_reference ? 0 : 1].levels.levels;
  const bool homo = side == FrontierSide::Homo;
  std::optional<int>& frontier = homo ? levels.frontier.homo : levels.frontier.lumo;
  const double energy_ev = levels.levels[static_cast<std::size_t>(*frontier)].energy_ev;
  *frontier += homo ? -1 : 1;
  levels.levels[static_cast<std::size_t>(*frontier)].energy_ev =
      energy_ev + (homo ? apart_ev : -apart_ev);
  return comparison;
}

}  // namespace

TEST_CASE("of a degenerate level that splits every part is told, the frontier level first") {
  // eg of Oh becomes a1g + b1g in D4h (character tables). Without the ligands on z, z2 sinks below
  // x2-y2; with them pressed in it rises above (common practice).
  const Comparison comparison = from_regular();
  const std::optional<FrontierFate> far = frontier_fate(comparison, 1, FrontierSide::Homo);
  const std::optional<FrontierFate> near = frontier_fate(comparison, 2, FrontierSide::Homo);
  REQUIRE(far);
  REQUIRE(near);
  using Names = std::vector<std::string>;
  CHECK(names(comparison, 1, *far) == Names{"b1g", "a1g"});
  CHECK(names(comparison, 2, *near) == Names{"a1g", "b1g"});
  for (const int variant : {1, 2}) {
    CAPTURE(variant);
    const FrontierFate& fate = variant == 1 ? *far : *near;
    CHECK(fate.stays == Stays::InPart);
    CHECK(fate.found_whole);
    CHECK(fate.parts[0].match.variant == fate.now);
    CHECK(fate.parts[0].at_frontier);
    CHECK_FALSE(fate.parts[1].at_frontier);
    const VariantResult& result = comparison.variants[static_cast<std::size_t>(variant)];
    const std::string words = crossing_words(comparison, variant, FrontierSide::Homo);
    for (const FatePart& part : fate.parts) {
      CHECK(words.find(readable_label(name_of_level(result, part.match.variant))) !=
            std::string::npos);
    }
    CHECK(words.find(" is the HOMO, ") != std::string::npos);
    CHECK(words.find(" eV below it.") != std::string::npos);
  }
}

TEST_CASE("parts that hardly part are the HOMO still, without a word") {
  const Comparison comparison = from_regular();
  const std::optional<FrontierFate> fate = frontier_fate(comparison, 3, FrontierSide::Homo);
  REQUIRE(fate);
  CHECK(fate->parts.size() == 2);
  CHECK(fate->stays == Stays::Whole);
  CHECK(crossing_words(comparison, 3, FrontierSide::Homo).empty());
}

TEST_CASE("table, JSON and diagram tell the same of the frontier levels") {
  const Comparison comparison = from_regular();
  const Table table = frontier_match_table(comparison);
  const LevelDiagram diagram = variant_diagram(comparison);
  const std::string json = compare_json(comparison);
  const auto cell = [&](std::size_t line, std::size_t column) {
    return cell_exact(std::get<Row>(table.lines[line]).cells[column]);
  };
  std::size_t line = 0;
  for (int variant = 1; variant < 4; ++variant) {
    CAPTURE(variant);
    const VariantResult& result = comparison.variants[static_cast<std::size_t>(variant)];
    const Frontier& frontier = result.levels.levels.frontier;
    const FrontierFate fate = *frontier_fate(comparison, variant, FrontierSide::Homo);
    REQUIRE(fate.parts.size() == 2);  // the LUMO, not degenerate, needs no more rows
    CHECK(cell(line, 4) == name_of_level(result, *frontier.homo));
    for (const FatePart& part : fate.parts) {
      const std::string name = name_of_level(result, part.match.variant);
      CHECK(cell(line, 0) == result.name);
      CHECK(cell(line, 4) == name);
      CHECK(cell(line, 7) == (part.at_frontier ? stays_word(fate.stays) : "no"));
      CHECK(json.find("\"variant\":\"" + name + "\",\"overlap\":") != std::string::npos);
      ++line;
    }
    // Links marked for the HOMO end at these levels and no others.
    if (variant != 1) continue;
    for (const DiagramLink& link : diagram.links) {
      if (link.column != 0 || link.weight != LinkWeight::Homo) continue;
      CHECK(std::any_of(fate.parts.begin(), fate.parts.end(), [&](const FatePart& part) {
        return part.match.variant == link.right_level;
      }));
    }
  }
  CHECK(line == table.lines.size());
}

TEST_CASE("a level tied with the HOMO or LUMO counts as it; one further off does not") {
  const Comparison same = compared({analysed("square", result_of(skew_square()))});
  for (const FrontierSide side : {FrontierSide::Homo, FrontierSide::Lumo}) {
    const char* const which = side == FrontierSide::Homo ? "HOMO" : "LUMO";
    for (const double apart_ev : {0.019, 0.021}) {
      CAPTURE(apart_ev);
      const bool tied = apart_ev < 0.02;
      const Comparison variant = shifted_copy(same, side, apart_ev, false);
      const std::optional<FrontierFate> fate = frontier_fate(variant, 1, side);
      REQUIRE(fate);
      CHECK(fate->stays == (tied ? Stays::Whole : Stays::No));
      CHECK(crossing_words(variant, 1, side).empty() == tied);
      // The reference's frontier is two levels that share a place; one of them left it.
      const Comparison reference = shifted_copy(same, side, apart_ev, true);
      const std::optional<FrontierFate> other = frontier_fate(reference, 1, side);
      REQUIRE(other);
      CHECK(other->stays == (tied ? Stays::InPart : Stays::No));
      REQUIRE(other->parts.size() == (tied ? 2u : 1u));
      CHECK(other->parts[0].at_frontier == tied);
      const std::string words = crossing_words(reference, 1, side);
      CHECK((words.find(" share a place; ") != std::string::npos) == tied);
      CHECK((words.find(std::string(", is the ") + which + ", ") != std::string::npos) == tied);
    }
  }
}
