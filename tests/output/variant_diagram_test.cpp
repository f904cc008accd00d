#include "output/variant_diagram.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <set>
#include <string>
#include <tuple>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "figure/collisions.hpp"
#include "figure/svg.hpp"
#include "job/variants.hpp"
#include "output/frontier_fate.hpp"
#include "support/paths.hpp"

using namespace irrepwise;

namespace {

VariantResult computed_variant(const VariantJob& variant) {
  return analysed(variant.name, levels_result(variant.read()));
}

Matching matching(const VariantResult& reference, const VariantResult& variant) {
  const LevelsResult& a = reference.levels;
  const LevelsResult& b = variant.levels;
  return match_levels(make_match_reference(a.symmetry, a.basis, a.levels), b.symmetry, b.basis,
                      b.levels);
}

Comparison comparison_of(const std::vector<std::string>& files, int reference = 0) {
  Comparison comparison;
  comparison.reference = reference;
  for (const std::string& file : files) {
    for (const VariantJob& job : variant_jobs(source_path("inputs/" + file))) {
      comparison.variants.push_back(computed_variant(job));
    }
  }
  for (const VariantResult& variant : comparison.variants) {
    comparison.matchings.push_back(
        matching(comparison.variants[static_cast<std::size_t>(reference)], variant));
  }
  return comparison;
}

std::string fact(const Group& group, const std::string& key) {
  for (const auto& [name, value] : group.facts) {
    if (name == key) return value;
  }
  return {};
}

// Bars of every level, by column and label; of these those that touch each other.
struct DrawnBars {
  std::map<std::pair<std::string, std::string>, int> count;
  std::set<std::string> twice;
  std::string collision;
};

DrawnBars drawn_bars(const Figure& figure) {
  DrawnBars out;
  std::vector<NamedBox> boxes = text_boxes(figure);
  for (const Group& group : figure.groups) {
    if (group.kind != "level") continue;
    const std::pair<std::string, std::string> name{fact(group, "column"), group.name};
    if (out.count.count(name) != 0) out.twice.insert(name.first + " " + name.second);
    for (const Element& element : group.elements) {
      const auto* path = std::get_if<Path>(&element);
      if (path == nullptr || path->lines[0].size() != 2) continue;
      const Point2 a = path->lines[0][0];
      const Point2 b = path->lines[0][1];
      if (a.y != b.y || path->stroke->width < 1.0) continue;  // a leader to its label
      ++out.count[name];
      const double half = 0.5 * path->stroke->width;
      const NamedBox bar{name.first + " " + name.second, {a.x, a.y - half, b.x, b.y + half}};
      for (const NamedBox& other : boxes) {
        if (overlap(bar.box, other.box)) out.collision = bar.name + " over " + other.name;
      }
      boxes.push_back(bar);
    }
  }
  return out;
}

std::map<std::pair<std::string, std::string>, int> expected_bars(const LevelDiagram& diagram) {
  std::map<std::pair<std::string, std::string>, int> bars;
  for (const DiagramColumn& column : diagram.columns) {
    for (const DiagramLevel& level : column.levels) {
      if (level.energy_ev < diagram.from_ev || level.energy_ev > diagram.to_ev) continue;
      bars[{column.title, level.label}] = level.degeneracy;
    }
  }
  return bars;
}

using LinkEnds = std::tuple<std::string, std::string, std::string, std::string>;

std::multiset<LinkEnds> drawn_links(const Figure& figure) {
  std::multiset<LinkEnds> links;
  for (const Group& group : figure.groups) {
    if (group.kind != "link") continue;
    links.insert({fact(group, "from-column"), fact(group, "from-level"), fact(group, "to-column"),
                  fact(group, "to-level")});
  }
  return links;
}

// Whether a line from a to b touches the box, by walking along it.
bool runs_through(const Box& box, const Point2& a, const Point2& b) {
  constexpr int steps = 400;
  for (int i = 0; i <= steps; ++i) {
    const double t = double(i) / steps;
    const double x = a.x + t * (b.x - a.x);
    const double y = a.y + t * (b.y - a.y);
    if (box.left < x && x < box.right && box.top < y && y < box.bottom) return true;
  }
  return false;
}

// The first link that runs through the name of a level.
std::string crossed_text(const Figure& figure) {
  const Font font;
  std::vector<NamedBox> texts;
  for (const Group& group : figure.groups) {
    if (group.kind != "level") continue;
    for (const Element& element : group.elements) {
      if (const auto* text = std::get_if<Text>(&element))
        texts.push_back({group.name, font.box(*text)});
    }
  }
  for (const Group& group : figure.groups) {
    if (group.kind != "link") continue;
    const auto& way = std::get<Path>(group.elements.front()).lines[0];
    for (std::size_t i = 1; i < way.size(); ++i) {
      for (const NamedBox& text : texts) {
        if (runs_through(text.box, way[i - 1], way[i]))
          return group.title + " through " + text.name;
      }
    }
  }
  return {};
}

// The first two links that end too near each other to be told apart, at different levels with
// names.
std::string doubtful_link(const Figure& figure, const LevelDiagram& diagram) {
  constexpr double apart_px = 10.0;  // about the height of the letters
  std::set<std::pair<std::string, std::string>> labelled;
  for (const DiagramColumn& column : diagram.columns) {
    for (const DiagramLevel& level : column.levels) {
      if (level.labelled) labelled.insert({column.title, level.label});
    }
  }
  struct End {
    std::pair<std::string, std::string> level;
    double y;
  };
  for (const bool start : {true, false}) {
    const std::string which = start ? "from" : "to";
    std::vector<End> ends;
    for (const Group& group : figure.groups) {
      if (group.kind != "link") continue;
      const auto& way = std::get<Path>(group.elements.front()).lines[0];
      const End end{{fact(group, which + "-column"), fact(group, which + "-level")},
                    start ? way.front().y : way.back().y};
      if (labelled.count(end.level) == 0) continue;
      for (const End& other : ends) {
        if (other.level.first != end.level.first || other.level == end.level) continue;
        if (std::abs(other.y - end.y) < apart_px) {
          return group.title + ": " + end.level.second + " and " + other.level.second;
        }
      }
      ends.push_back(end);
    }
  }
  return {};
}

}  // namespace

TEST_CASE(
    "in a diagram of two, three, six, eight, ten or twelve variants nothing overlaps, links "
    "end apart, and every level of the window appears once in its column, with a bar for each "
    "partner") {
  const Comparison platform = comparison_of({"trans_to_hydride.yaml"});
  const Comparison stepwise = comparison_of({"stepwise_octahedron.yaml"});
  Comparison mixed = comparison_of({"ligand_series.yaml", "trans_to_hydride.yaml"}, 9 - 2);
  for (std::size_t i = 7; i < mixed.variants.size(); ++i) mixed.variants[i].name += " on platinum";
  const Comparison open_shells =
      comparison_of({"high_spin_octahedron.yaml", "high_spin_tetrahedron.yaml"});
  const Comparison plain = comparison_of({"benzene.xyz", "ethane_staggered.xyz", "cage_c60.xyz"});
  struct Case {
    const Comparison& comparison;
    std::vector<int> variants;
  };
  const Case cases[] = {{platform, {0, 5}},
                        {platform, {7, 3, 0}},
                        {platform, {0, 1, 2, 3, 4, 5}},
                        {platform, {}},
                        {stepwise, {}},
                        {mixed, {0, 1, 2, 3, 4, 5, 6, 7, 8, 10, 12, 14}},
                        {open_shells, {}},
                        {plain, {}}};
  for (const Case& test : cases) {
    for (const bool wide : {false, true}) {
      VariantDiagramChoice choice;
      choice.variants = test.variants;
      if (wide) choice.from_ev = -30.0;
      if (wide) choice.to_ev = 20.0;
      const LevelDiagram diagram = variant_diagram(test.comparison, choice);
      CAPTURE(diagram.title);
      CAPTURE(diagram.columns.size());
      const Figure figure = level_diagram_figure(diagram);
      CHECK(first_text_collision(figure) == "");
      CHECK(crossed_text(figure) == "");
      CHECK(doubtful_link(figure, diagram) == "");
      const DrawnBars bars = drawn_bars(figure);
      CHECK(bars.collision == "");
      CHECK(bars.twice.empty());
      CHECK(bars.count == expected_bars(diagram));
    }
  }
}

TEST_CASE("links join levels of neighbours that match, and every match in the window is drawn") {
  for (const int reference : {0, 3, 7}) {
    const Comparison comparison = comparison_of({"trans_to_hydride.yaml"}, reference);
    const LevelDiagram diagram = variant_diagram(comparison);
    const auto is_in_window = [&](std::size_t variant, int level) {
      const Levels& levels = comparison.variants[variant].levels.levels;
      const double energy = levels.levels[static_cast<std::size_t>(level)].energy_ev;
      return energy >= diagram.from_ev && energy <= diagram.to_ev;
    };
    std::multiset<LinkEnds> expected;
    for (std::size_t i = 0; i + 1 < comparison.variants.size(); ++i) {
      const VariantResult& left = comparison.variants[i];
      const VariantResult& right = comparison.variants[i + 1];
      // The comparison's reference stays the reference of the matching.
      const bool turned = static_cast<int>(i) + 1 == reference;
      for (const LevelMatch& match :
           (turned ? matching(right, left) : matching(left, right)).matches) {
        const int a = turned ? match.variant : match.reference;
        const int b = turned ? match.reference : match.variant;
        if (match.overlap < least_drawn_overlap || !is_in_window(i, a) || !is_in_window(i + 1, b)) {
          continue;
        }
        expected.insert({left.name, name_of_level(left, a), right.name, name_of_level(right, b)});
      }
    }
    CAPTURE(reference);
    CHECK(expected.size() > 20);
    CHECK(drawn_links(level_diagram_figure(diagram)) == expected);
  }
}

TEST_CASE("HOMO and LUMO are marked in every column, and the d block bears its parent labels") {
  const Comparison comparison = comparison_of({"trans_to_hydride.yaml"});
  const LevelDiagram diagram = variant_diagram(comparison);
  for (std::size_t i = 0; i < diagram.columns.size(); ++i) {
    const std::vector<DiagramLevel>& levels = diagram.columns[i].levels;
    const Frontier& frontier = comparison.variants[i].levels.levels.frontier;
    CHECK(levels[static_cast<std::size_t>(*frontier.homo)].frontier == FrontierMark::Homo);
    CHECK(levels[static_cast<std::size_t>(*frontier.lumo)].frontier == FrontierMark::Lumo);
    // The square plane has the d labels a1g, b1g, b2g and eg, the last split in two here (D4h).
    std::multiset<std::string> parents;
    for (const DiagramLevel& level : levels) {
      if (!level.parent.empty()) parents.insert(level.parent);
      if (!level.parent.empty() || level.frontier != FrontierMark::None) CHECK(level.labelled);
    }
    CHECK(parents == std::multiset<std::string>{"a1g", "b1g", "b2g", "eg", "eg"});
  }
}

TEST_CASE("a parent label that says no more than the label itself is left out") {
  const Comparison comparison = comparison_of({"ligand_series.yaml"});
  const LevelDiagram diagram = variant_diagram(comparison);
  // Six halides have the symmetry Oh of their polyhedron, six ammonia with their hydrogens have
  // not.
  for (const DiagramLevel& level : diagram.columns[1].levels) CHECK(level.parent.empty());
  CHECK(std::count_if(diagram.columns[4].levels.begin(), diagram.columns[4].levels.end(),
                      [](const DiagramLevel& level) { return !level.parent.empty(); }) == 2);
}

TEST_CASE("marked links follow the HOMO and the LUMO of the reference as the comparison does") {
  const Comparison comparison = comparison_of({"trans_to_hydride.yaml"}, 2);
  const LevelDiagram diagram = variant_diagram(comparison);
  int marked = 0;
  for (const DiagramLink& link : diagram.links) {
    if (link.weight != LinkWeight::Homo && link.weight != LinkWeight::Lumo) continue;
    ++marked;
    const FrontierSide side =
        link.weight == LinkWeight::Homo ? FrontierSide::Homo : FrontierSide::Lumo;
    for (const auto& [variant, level] :
         {std::pair{link.column, link.left_level}, std::pair{link.column + 1, link.right_level}}) {
      const std::optional<FrontierFate> fate = frontier_fate(comparison, variant, side);
      REQUIRE(fate);
      REQUIRE(fate->parts.size() == 1);  // not degenerate here: one match each
      CHECK(fate->parts[0].match.variant == level);
    }
  }
  CHECK(marked >= 8);
}

TEST_CASE("a script finds a level by its name and the name of its variant in the SVG") {
  const Comparison comparison = comparison_of({"trans_to_hydride.yaml"});
  const std::string svg = svg_document(level_diagram_figure(variant_diagram(comparison)));
  CHECK(svg.find("<g class=\"level\" data-name=\"9a1\" data-column=\"carbonyl\">") !=
        std::string::npos);
  CHECK(svg.find("<g class=\"link\" data-from-column=\"carbonyl\" data-from-level=\"9a1\" "
                 "data-to-column=\"cyanide\" data-to-level=\"9a1\">") != std::string::npos);
}

TEST_CASE("more variants than a diagram can hold are refused") {
  const Comparison comparison = comparison_of({"trans_to_hydride.yaml", "ligand_series.yaml"});
  CHECK_THROWS_WITH_AS(static_cast<void>(variant_diagram(comparison)),
                       "15 variants are too many for one diagram, which holds up to 12", Error);
}
