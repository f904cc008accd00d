#include "figure/level_diagram.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <map>
#include <optional>
#include <set>
#include <string>
#include <utility>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "figure/collisions.hpp"
#include "figure/font.hpp"
#include "figure/rich_text.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

LevelDiagram diagram_of(const Molecule& molecule) {
  const Run r = run(molecule);
  LevelDiagram diagram;
  diagram.title = "title";
  diagram.method = plain_text("method");
  diagram.columns = {diagram_column(r.symmetry.group, r.levels)};
  const EnergyWindow window = frontier_window(diagram.columns);
  diagram.from_ev = window.from_ev;
  diagram.to_ev = window.to_ev;
  return diagram;
}

Box box_of(const Path& path) {
  Box box{1e9, 1e9, -1e9, -1e9};
  for (const auto& line : path.lines) {
    for (const Point2& p : line) {
      box = {std::min(box.left, p.x), std::min(box.top, p.y), std::max(box.right, p.x),
             std::max(box.bottom, p.y)};
    }
  }
  return box;
}

bool is_bar(const Path& path) {
  return path.lines.size() == 1 && path.lines[0].size() == 2 &&
         path.lines[0][0].y == path.lines[0][1].y;
}

// Every text, and every bar and arrow of the levels; pairs of one level's own strokes are left out.
std::string first_collision(const Figure& figure) {
  const std::string texts_only = first_text_collision(figure);
  if (!texts_only.empty()) return texts_only;
  const std::vector<NamedBox> texts = text_boxes(figure);
  std::vector<NamedBox> strokes;
  for (const Group& group : figure.groups) {
    for (const Element& element : group.elements) {
      const auto* path = std::get_if<Path>(&element);
      const bool counts = group.kind == "level" || group.kind == "gap";
      if (path != nullptr && counts) {
        strokes.push_back({group.kind + " " + group.name, box_of(*path)});
      }
    }
  }
  for (std::size_t i = 0; i < strokes.size(); ++i) {
    for (const NamedBox& text : texts) {
      if (overlap(text.box, strokes[i].box))
        return text.name + " over a stroke of " + strokes[i].name;
    }
    for (std::size_t j = 0; j < i; ++j) {
      if (strokes[i].name != strokes[j].name && overlap(strokes[i].box, strokes[j].box)) {
        return "strokes of " + strokes[i].name + " over " + strokes[j].name;
      }
    }
  }
  return {};
}

}  // namespace

TEST_CASE(
    "nothing overlaps in the level diagram of any molecule, all stays inside the figure, and "
    "every level of the window appears once, with a bar for each partner") {
  for (const TestMolecule& test : test_molecules()) {
    LevelDiagram diagram;
    try {
      diagram = diagram_of(test.molecule);
    } catch (const Error&) {  // without electrons or parameters: no levels to draw
      continue;
    }
    CAPTURE(test.name);
    const Figure figure = level_diagram_figure(diagram);
    CHECK(first_collision(figure) == "");
    std::map<std::string, int> bars;
    std::set<std::string> twice;
    for (const Group& group : figure.groups) {
      if (group.kind != "level") continue;
      if (bars.count(group.name) != 0) twice.insert(group.name);
      for (const Element& element : group.elements) {
        const auto* path = std::get_if<Path>(&element);
        if (path != nullptr && is_bar(*path)) ++bars[group.name];
      }
    }
    CHECK(twice.empty());
    std::map<std::string, int> expected;
    for (const DiagramLevel& level : diagram.columns[0].levels) {
      if (level.energy_ev >= diagram.from_ev && level.energy_ev <= diagram.to_ev) {
        expected[level.label] = level.degeneracy;
      }
    }
    CHECK(bars == expected);
  }
}

TEST_CASE("the default window holds HOMO and LUMO of every molecule") {
  for (const TestMolecule& test : test_molecules()) {
    LevelDiagram diagram;
    try {
      diagram = diagram_of(test.molecule);
    } catch (const Error&) {
      continue;
    }
    CAPTURE(test.name);
    for (const DiagramLevel& level : diagram.columns[0].levels) {
      if (level.frontier == FrontierMark::None) continue;
      CHECK(level.energy_ev > diagram.from_ev);
      CHECK(level.energy_ev < diagram.to_ev);
    }
  }
}

TEST_CASE("heights are to scale: equal steps of energy are equal lengths") {
  LevelDiagram diagram;
  diagram.columns = {{"",
                      {{"1a", -12.0, 1, 2.0, FrontierMark::None, {}},
                       {"2a", -10.0, 1, 2.0, FrontierMark::Homo, {}},
                       {"3a", -4.0, 1, 0.0, FrontierMark::Lumo, {}}}}};
  diagram.from_ev = -13.0;
  diagram.to_ev = -3.0;
  std::map<std::string, double> height;
  for (const Group& group : level_diagram_figure(diagram).groups) {
    if (group.kind != "level") continue;
    const auto& bar = std::get<Path>(group.elements.front());
    height[group.name] = bar.lines[0][0].y;
  }
  CHECK(height["1a"] > height["2a"]);  // y runs down
  CHECK(std::abs((height["2a"] - height["3a"]) / (height["1a"] - height["2a"]) - 3.0) < 1e-9);
}

TEST_CASE("electrons are drawn as arrows, in pairs only once every partner has one") {
  // Hund's rule for 3 electrons in a doubly degenerate level: two up, one down.
  LevelDiagram diagram;
  diagram.columns = {{"", {{"1e", -12.0, 2, 3.0, FrontierMark::Homo, {}}}}};
  diagram.from_ev = -13.0;
  diagram.to_ev = -11.0;
  int up = 0;
  int down = 0;
  for (const Group& group : level_diagram_figure(diagram).groups) {
    if (group.kind != "level") continue;
    for (const Element& element : group.elements) {
      const auto* path = std::get_if<Path>(&element);
      if (path == nullptr || is_bar(*path)) continue;
      (path->lines[0][1].y < path->lines[0][0].y ? up : down) += 1;
    }
  }
  CHECK(up == 2);
  CHECK(down == 1);
}

TEST_CASE("columns with links stand side by side, and links of equal levels run level") {
  LevelDiagram diagram = diagram_of(test_molecule("benzenetricarbonylchromium").molecule);
  diagram.columns.push_back(diagram.columns.front());
  diagram.columns[0].title = "first";
  diagram.columns[1].title = "second variant";
  for (DiagramColumn& column : diagram.columns) {  // labels moved apart would bend the links
    for (DiagramLevel& level : column.levels) level.labelled = false;
  }
  for (int i = 0; i < static_cast<int>(diagram.columns[0].levels.size()); ++i) {
    diagram.links.push_back({0, i, i, 1.0, LinkWeight::Plain});
  }
  const Figure figure = level_diagram_figure(diagram);
  CHECK(first_collision(figure) == "");
  std::size_t shown = 0;
  for (const DiagramLevel& level : diagram.columns[0].levels) {
    shown += level.energy_ev >= diagram.from_ev && level.energy_ev <= diagram.to_ev ? 1 : 0;
  }
  std::size_t links = 0;
  for (const Group& group : figure.groups) {
    if (group.kind != "link") continue;
    ++links;
    const auto& line = std::get<Path>(group.elements.front()).lines[0];
    CHECK(line.front().y == line.back().y);
    CHECK(line.front().x < line.back().x);
  }
  CHECK(links == shown);
}

TEST_CASE(
    "where levels crowd, a link runs from the name of one to the name of the other and no other "
    "link "
    "ends there; elsewhere it runs between their heights") {
  // Six levels within 0.05 eV: labels need 14 px each, the bars stand less than 1 px apart.
  LevelDiagram diagram;
  for (int c = 0; c < 2; ++c) {
    DiagramColumn column;
    column.title = c == 0 ? "first" : "second";
    for (int i = 0; i < 6; ++i) {
      column.levels.push_back({std::to_string(i + 1) + "a",
                               -12.0 + 0.01 * i + 0.02 * c,
                               1,
                               2.0,
                               i == 5 ? FrontierMark::Homo : FrontierMark::None,
                               {}});
    }
    column.levels.push_back({"7a", -6.0, 1, 0.0, FrontierMark::Lumo, {}});
    diagram.columns.push_back(column);
  }
  diagram.columns[1].levels.insert(diagram.columns[1].levels.begin(),
                                   {"0a", -12.3, 1, 2.0, FrontierMark::None, {}});
  for (int i = 0; i < 7; ++i) diagram.links.push_back({0, i, i + 1, 1.0, LinkWeight::Plain});
  diagram.from_ev = -13.0;
  diagram.to_ev = -5.0;
  const Figure figure = level_diagram_figure(diagram);
  CHECK(first_text_collision(figure) == "");
  std::map<std::string, double> bar;              // by column and level
  std::map<std::string, std::vector<Box>> names;  // their texts, from the left
  const Font font;
  for (const Group& group : figure.groups) {
    if (group.kind != "level") continue;
    const std::string level = group.facts[0].second + group.name;
    for (const Element& element : group.elements) {
      if (const auto* text = std::get_if<Text>(&element)) names[level].push_back(font.box(*text));
    }
    bar[level] = std::get<Path>(group.elements.front()).lines[0][0].y;
  }
  std::vector<double> starts;
  std::vector<double> ends;
  for (const Group& group : figure.groups) {
    if (group.kind != "link") continue;
    const auto& way = std::get<Path>(group.elements.front()).lines[0];
    const std::string from = group.facts[0].second + group.facts[1].second;
    const std::string to = group.facts[2].second + group.facts[3].second;
    CAPTURE(group.title);
    starts.push_back(way.front().y);
    ends.push_back(way.back().y);
    const auto is_beside = [](const Box& text, double y) {
      return text.top < y && y < text.bottom;
    };
    CHECK(is_beside(names.at(from).back(), way.front().y));
    CHECK(names.at(from).back().right < way.front().x);
    if (group.facts[1].second == "7a") {  // nothing near it
      CHECK(names.at(to).size() == 1);
      CHECK(way.front().y == doctest::Approx(bar.at(from)).epsilon(1e-12));
      CHECK(way.back().y == doctest::Approx(bar.at(to)).epsilon(1e-12));
    } else {
      REQUIRE(names.at(to).size() == 2);
      CHECK(is_beside(names.at(to).front(), way.back().y));
      CHECK(way.back().x < names.at(to).front().left);
    }
  }
  REQUIRE(starts.size() == 7);
  for (std::vector<double>* places : {&starts, &ends}) {
    std::sort(places->begin(), places->end());
    for (std::size_t i = 1; i < places->size(); ++i) CHECK((*places)[i] - (*places)[i - 1] > 12.0);
  }
}

TEST_CASE("a window without levels, or upside down, is refused") {
  LevelDiagram diagram;
  diagram.columns = {{"", {{"1a", -12.0, 1, 2.0, FrontierMark::Homo, {}}}}};
  diagram.from_ev = -5.0;
  diagram.to_ev = -1.0;
  CHECK_THROWS_WITH_AS(static_cast<void>(level_diagram_figure(diagram)),
                       "no level lies between -5 and -1 eV; they run from -12.000 to -12.000 eV",
                       Error);
  diagram.to_ev = -6.0;
  CHECK_THROWS_WITH_AS(
      static_cast<void>(level_diagram_figure(diagram)),
      "the range of energies runs from -5 to -6 eV; its end must lie above its start", Error);
  const double huge = std::numeric_limits<double>::infinity();
  for (const auto& [from, to] :
       {std::pair{-1e7, 0.0}, {-huge, 0.0}, {-20.0, huge}, {-20.0, std::nan("")}}) {
    diagram.from_ev = from;
    diagram.to_ev = to;
    CHECK_THROWS_WITH_AS(static_cast<void>(level_diagram_figure(diagram)),
                         doctest::Contains("expected energies between -10000 and 10000 eV"), Error);
  }
}
