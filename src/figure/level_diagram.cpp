#include "figure/level_diagram.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

#include "figure/font.hpp"
#include "figure/level_columns.hpp"
#include "figure/level_diagram_words.hpp"
#include "figure/level_frame.hpp"
#include "figure/level_lanes.hpp"
#include "figure/level_placing.hpp"
#include "figure/palette.hpp"
#include "figure/rich_text.hpp"
#include "figure/text_layout.hpp"

namespace irrepwise {
namespace {

using namespace level_frame;

// Lengths in px.
constexpr double picture_size = 118.0;
constexpr double picture_gap = 8.0;
constexpr double picture_caption = 18.0;

Group level_group(const PlacedLevel& drawn) {
  const DiagramLevel& level = *drawn.level;
  Group group;
  group.kind = "level";
  group.name = level.label;
  group.title = level_title(level);
  const Bars bars{drawn.left, level_bar_length, level_bar_gap, drawn.y};
  add_bars(group, level, bars, 2.4);
  add_electrons(group, level, bars, level_arrow_height);
  Text text;
  text.at = {drawn.bars_right + level_label_gap, drawn.y + 0.33 * level_label_size};
  text.runs = level_words(level);
  text.size = level_label_size;
  text.colour = level.frontier == FrontierMark::None ? palette::ink : level_colour(level);
  group.elements.emplace_back(std::move(text));
  return group;
}

Text words(Point2 at, const std::string& text, double size, Colour colour) {
  return text_at(at, plain_text(text), size, colour);
}

struct Gap {
  Group group;
  double right = 0.0;
};

// The gap as a measure between the two frontier levels, beside the main lane: no other level stands
// between them, so that its words have room, unless they are very close. Then it stands beside all.
Gap gap_group(const PlacedColumn& column, const Font& font) {
  constexpr double room = 52.0;  // px in height that the words need
  Gap out;
  out.group.kind = "gap";
  out.right = column.right;
  const PlacedLevel* homo = nullptr;
  const PlacedLevel* lumo = nullptr;
  for (const PlacedLevel& drawn : column.levels) {
    if (drawn.level->frontier == FrontierMark::Homo) homo = &drawn;
    if (drawn.level->frontier == FrontierMark::Lumo) lumo = &drawn;
  }
  if (homo == nullptr || lumo == nullptr || homo->y <= lumo->y) return out;
  const bool has_room = homo->y - lumo->y > room;
  const double x = (has_room ? column.main_right : column.right) + 18.0;
  std::vector<Element>& elements = out.group.elements;
  elements.emplace_back(line(x - 4, homo->y, x + 4, homo->y, palette::muted, 1.0));
  elements.emplace_back(line(x - 4, lumo->y, x + 4, lumo->y, palette::muted, 1.0));
  elements.emplace_back(line(x, homo->y, x, lumo->y, palette::muted, 1.0));
  const std::string text =
      "gap " + energy_words(lumo->level->energy_ev - homo->level->energy_ev, 2);
  elements.emplace_back(words({x + 9.0, 0.5 * (homo->y + lumo->y) + 0.35 * small_size}, text,
                              small_size, palette::muted));
  out.right = std::max(out.right, x + 9.0 + font.width(plain_text(text), small_size));
  return out;
}

struct Pictures {
  std::vector<Group> groups;
  double right = 0.0;
  double bottom = 0.0;
};

// Orbital pictures in a row for each level that has them, beside the column, led to their level.
Pictures picture_groups(const PlacedColumn& column, double x, double top) {
  Pictures out;
  std::vector<const PlacedLevel*> shown;
  std::vector<double> places;
  for (auto drawn = column.levels.rbegin(); drawn != column.levels.rend(); ++drawn) {
    if (drawn->level->pictures.empty()) continue;
    shown.push_back(&*drawn);
    places.push_back(drawn->y);
  }
  std::vector<double> centres = spread_apart(places, picture_size + picture_gap + picture_caption);
  // None may stand over the heading.
  const double lift = centres.empty() ? 0.0 : top - (centres.front() - 0.5 * picture_size);
  for (double& centre : centres) centre += std::max(0.0, lift);
  for (std::size_t i = 0; i < shown.size(); ++i) {
    const DiagramLevel& level = *shown[i]->level;
    Group group;
    group.kind = "pictures";
    group.name = level.label;
    double left = x;
    for (const std::shared_ptr<const Raster>& raster : level.pictures) {
      group.elements.emplace_back(Picture{{left, centres[i] - 0.5 * picture_size},
                                          picture_size,
                                          picture_size,
                                          raster,
                                          "orbital " + level.label});
      left += picture_size + picture_gap;
    }
    Text text = words({x, centres[i] + 0.5 * picture_size + 12.0}, "", small_size, palette::ink);
    text.runs =
        label_text(level.label) + plain_text("\u00A0\u00A0 " + energy_words(level.energy_ev, 2));
    group.elements.emplace_back(std::move(text));
    out.right = std::max(out.right, left);
    out.bottom = std::max(out.bottom, centres[i] + 0.5 * picture_size + picture_caption);
    out.groups.push_back(std::move(group));
  }
  return out;
}

// Everything between heading and notes, for one place of the upper end.
struct Body {
  PlacedColumn column;
  double right = 0.0;
  Group gap;
  Pictures pictures;
};

Body placed_body(const LevelDiagram& diagram, const Font& font, double top, double per_ev) {
  Body body;
  const double left = margin + axis_width + 30.0;
  body.column = place_column(diagram, diagram.columns.front(), font, left, top, per_ev);
  Gap gap = gap_group(body.column, font);
  body.gap = std::move(gap.group);
  body.right = gap.right;
  body.pictures = picture_groups(body.column, body.right + 20.0, top);
  if (!body.pictures.groups.empty()) body.right = body.pictures.right;
  return body;
}

Figure single_column_figure(const LevelDiagram& diagram) {
  const Font font;
  const double per_ev = level_scale(diagram);
  // The width does not depend on the height at which things start.
  const double width =
      std::max(least_width, placed_body(diagram, font, 0.0, per_ev).right - margin);
  Figure figure;
  figure.title = diagram.title;
  figure.description = spoken_levels(diagram);
  const double top = add_heading(figure, diagram, font, width) + 28.0;
  Body body = placed_body(diagram, font, top, per_ev);
  figure.groups.push_back(axis(diagram, margin + axis_width, top, per_ev));
  for (const PlacedLevel& level : body.column.levels) figure.groups.push_back(level_group(level));
  if (!body.gap.elements.empty()) figure.groups.push_back(std::move(body.gap));
  for (Group& group : body.pictures.groups) figure.groups.push_back(std::move(group));
  const double range_bottom = top + (diagram.to_ev - diagram.from_ev) * per_ev;
  const double bottom = std::max(range_bottom, body.pictures.bottom) + 14.0;
  figure.width = std::ceil(width + 2.0 * margin);
  figure.height = std::ceil(add_notes(figure, diagram, font, width, bottom) + margin);
  return figure;
}

}  // namespace

Figure level_diagram_figure(const LevelDiagram& diagram) {
  check_diagram(diagram);
  return diagram.columns.size() == 1 ? single_column_figure(diagram)
                                     : several_columns_figure(diagram);
}

}  // namespace irrepwise
