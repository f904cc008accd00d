#include "figure/level_diagram.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include <fmt/format.h>

#include "figure/font.hpp"
#include "figure/level_diagram_words.hpp"
#include "figure/level_lanes.hpp"
#include "figure/level_placing.hpp"
#include "figure/palette.hpp"
#include "figure/rich_text.hpp"
#include "figure/text_layout.hpp"

namespace irrepwise {
namespace {

// Lengths in px.
constexpr double margin = 24.0;
constexpr double small_size = 11.5;
constexpr double title_size = 17.0;
constexpr double line_height = 16.0;
constexpr double column_gap = 70.0;
constexpr double axis_width = 66.0;
constexpr double least_width = 420.0;  // room for the title
constexpr double picture_size = 118.0;
constexpr double picture_gap = 8.0;
constexpr double picture_caption = 18.0;

Colour level_colour(const DiagramLevel& level) {
  switch (level.frontier) {
    case FrontierMark::Homo:
      return palette::homo;
    case FrontierMark::Lumo:
      return palette::lumo;
    case FrontierMark::None:
      break;
  }
  return level.occupation > 0.0 ? palette::ink : palette::empty;
}

Path line(double x0, double y0, double x1, double y1, Colour colour, double width,
          std::vector<double> dashes = {}) {
  Path path;
  path.lines = {{{x0, y0}, {x1, y1}}};
  path.stroke = Stroke{colour, width, std::move(dashes)};
  return path;
}

Path arrow(double x, double y, bool up, Colour colour) {
  const double half = 0.5 * level_arrow_height;
  const double tip = up ? y - half : y + half;
  const double tail = up ? y + half : y - half;
  const double back = up ? tip + 4.6 : tip - 4.6;
  Path path;
  path.lines = {{{x, tail}, {x, tip}}, {{x - 2.7, back}, {x, tip}, {x + 2.7, back}}};
  path.stroke = Stroke{colour, 1.3, {}};
  return path;
}

// Electrons by Hund's rule, a hollow disc with a number where an orbital holds a part of one.
void add_electrons(Group& group, const PlacedLevel& drawn, Colour colour) {
  const DiagramLevel& level = *drawn.level;
  const double whole = std::round(level.occupation);
  if (std::abs(level.occupation - whole) > 1e-9) return;  // the label says how many
  const int electrons = static_cast<int>(whole);
  for (int partner = 0; partner < level.degeneracy; ++partner) {
    const double x =
        drawn.left + partner * (level_bar_length + level_bar_gap) + 0.5 * level_bar_length;
    const bool one = electrons > partner;
    const bool two = electrons > level.degeneracy + partner;
    if (two) {
      group.elements.emplace_back(arrow(x - 4.5, drawn.y, true, colour));
      group.elements.emplace_back(arrow(x + 4.5, drawn.y, false, colour));
    } else if (one) {
      group.elements.emplace_back(arrow(x, drawn.y, true, colour));
    }
  }
}

Group level_group(const PlacedLevel& drawn) {
  const DiagramLevel& level = *drawn.level;
  const Colour colour = level_colour(level);
  Group group;
  group.kind = "level";
  group.name = level.label;
  group.title = fmt::format("{}: {}, {:g} of {} electrons", level.label,
                            energy_words(level.energy_ev), level.occupation, 2 * level.degeneracy);
  for (int partner = 0; partner < level.degeneracy; ++partner) {
    const double x = drawn.left + partner * (level_bar_length + level_bar_gap);
    group.elements.emplace_back(line(x, drawn.y, x + level_bar_length, drawn.y, colour, 2.4));
  }
  add_electrons(group, drawn, colour);
  Text text;
  text.at = {drawn.bars_right + level_label_gap, drawn.y + 0.33 * level_label_size};
  text.runs = level_words(level);
  text.size = level_label_size;
  text.colour = level.frontier == FrontierMark::None ? palette::ink : colour;
  group.elements.emplace_back(std::move(text));
  return group;
}

double tick_step(double per_ev) {
  for (const double step : {0.1, 0.2, 0.5, 1.0, 2.0, 5.0, 10.0, 20.0, 50.0}) {
    if (step * per_ev >= 44.0) return step;
  }
  return 100.0;
}

Group axis(const LevelDiagram& diagram, double x, double top, double per_ev) {
  Group group;
  group.kind = "axis";
  const double bottom = top + (diagram.to_ev - diagram.from_ev) * per_ev;
  group.elements.emplace_back(line(x, top, x, bottom, palette::muted, 1.0));
  const double step = tick_step(per_ev);
  const int digits = step < 1.0 ? 1 : 0;
  const auto first = static_cast<int>(std::ceil(diagram.from_ev / step - 1e-9));
  const auto last = static_cast<int>(std::floor(diagram.to_ev / step + 1e-9));
  for (int k = first; k <= last; ++k) {
    const double energy = k * step;
    const double y = top + (diagram.to_ev - energy) * per_ev;
    group.elements.emplace_back(line(x - 5.0, y, x, y, palette::muted, 1.0));
    Text text;
    text.at = {x - 9.0, y + 0.35 * small_size};
    text.runs =
        plain_text((energy < 0.0 ? "−" : "") + fmt::format("{:.{}f}", std::abs(energy), digits));
    text.size = small_size;
    text.colour = palette::muted;
    text.anchor = Anchor::End;
    group.elements.emplace_back(std::move(text));
  }
  Text title;
  title.at = {x - 48.0, 0.5 * (top + bottom)};
  title.runs = plain_text("orbital energy / eV");
  title.size = small_size;
  title.colour = palette::muted;
  title.anchor = Anchor::Middle;
  title.upwards = true;
  group.elements.emplace_back(std::move(title));
  return group;
}

Group links_group(const LevelDiagram& diagram, const std::vector<PlacedColumn>& columns) {
  Group group;
  group.kind = "links";
  for (const DiagramLink& link : diagram.links) {
    const auto find = [&](int column, int level) -> const PlacedLevel* {
      for (const PlacedLevel& drawn : columns[static_cast<std::size_t>(column)].levels) {
        if (drawn.index == level) return &drawn;
      }
      return nullptr;
    };
    const PlacedLevel* a = find(link.column_a, link.level_a);
    const PlacedLevel* b = find(link.column_b, link.level_b);
    if (a == nullptr || b == nullptr) continue;
    if (a->left > b->left) std::swap(a, b);
    const PlacedColumn& column =
        columns[static_cast<std::size_t>(std::min(link.column_a, link.column_b))];
    const double edge = column.right + 6.0;
    group.elements.emplace_back(line(edge, a->y, b->left - 5.0, b->y, palette::faint, 1.1, {4, 3}));
  }
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

double add_heading(Figure& figure, const LevelDiagram& diagram, const Font& font, double width) {
  Group group;
  group.kind = "heading";
  double y = margin - 4.0;
  for (const RichText& line : wrapped(font, plain_text(diagram.title), title_size, width)) {
    y += title_size + 3.0;
    group.elements.emplace_back(text_at({margin, y}, line, title_size, palette::ink));
  }
  y += 4.0;
  for (const RichText& line : wrapped(font, diagram.method, small_size, width)) {
    y += line_height;
    group.elements.emplace_back(text_at({margin, y}, line, small_size, palette::muted));
  }
  figure.groups.push_back(std::move(group));
  return y;
}

// Everything between heading and notes, for one place of the upper end.
struct Body {
  std::vector<PlacedColumn> columns;
  double right = 0.0;
  Group gap;
  Pictures pictures;
};

Body placed_body(const LevelDiagram& diagram, const Font& font, double top, double per_ev) {
  Body body;
  double x = margin + axis_width + 30.0;
  for (const DiagramColumn& column : diagram.columns) {
    body.columns.push_back(place_column(diagram, column, font, x, top, per_ev));
    const double title = font.width(plain_text(column.title), level_label_size);
    body.columns.back().right = std::max(body.columns.back().right, x + title);
    x = body.columns.back().right + column_gap;
  }
  body.right = body.columns.back().right;
  if (body.columns.size() == 1) {
    Gap gap = gap_group(body.columns.front(), font);
    body.gap = std::move(gap.group);
    body.right = gap.right;
  }
  body.pictures = picture_groups(body.columns.back(), body.right + 20.0, top);
  if (!body.pictures.groups.empty()) body.right = body.pictures.right;
  return body;
}

double add_column_titles(Figure& figure, const LevelDiagram& diagram,
                         const std::vector<PlacedColumn>& columns, double y) {
  Group group;
  group.kind = "column-titles";
  for (std::size_t i = 0; i < columns.size(); ++i) {
    if (diagram.columns[i].title.empty()) continue;
    group.elements.emplace_back(words({columns[i].left, y + 10.0}, diagram.columns[i].title,
                                      level_label_size, palette::ink));
  }
  if (group.elements.empty()) return y;
  figure.groups.push_back(std::move(group));
  return y + 20.0;
}

double add_notes(Figure& figure, const LevelDiagram& diagram, const Font& font, double width,
                 double y) {
  Group group;
  group.kind = "notes";
  for (const std::string& note : {words_on_left_out(diagram), words_on_fractions(diagram)}) {
    for (const RichText& line : wrapped(font, plain_text(note), small_size, width)) {
      y += line_height;
      group.elements.emplace_back(text_at({margin, y}, line, small_size, palette::muted));
    }
  }
  if (!group.elements.empty()) figure.groups.push_back(std::move(group));
  return y;
}

}  // namespace

Figure level_diagram_figure(const LevelDiagram& diagram) {
  check_window(diagram);
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
  if (!diagram.links.empty()) figure.groups.push_back(links_group(diagram, body.columns));
  for (const PlacedColumn& column : body.columns) {
    for (const PlacedLevel& level : column.levels) figure.groups.push_back(level_group(level));
  }
  if (!body.gap.elements.empty()) figure.groups.push_back(std::move(body.gap));
  for (Group& group : body.pictures.groups) figure.groups.push_back(std::move(group));
  const double range_bottom = top + (diagram.to_ev - diagram.from_ev) * per_ev;
  double bottom = std::max(range_bottom, body.pictures.bottom) + 14.0;
  bottom = add_column_titles(figure, diagram, body.columns, bottom);
  bottom = add_notes(figure, diagram, font, width, bottom);
  figure.width = std::ceil(width + 2.0 * margin);
  figure.height = std::ceil(bottom + margin);
  return figure;
}

}  // namespace irrepwise
