#include "figure/level_diagram.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include <fmt/format.h>

#include "core/error.hpp"
#include "figure/font.hpp"
#include "figure/level_lanes.hpp"
#include "figure/palette.hpp"
#include "figure/rich_text.hpp"

namespace irrepwise {
namespace {

// Lengths in px.
constexpr double margin = 24.0;
constexpr double bar_length = 30.0;
constexpr double bar_gap = 6.0;
constexpr double label_gap = 7.0;
constexpr double label_size = 14.0;
constexpr double small_size = 11.5;
constexpr double arrow_height = 17.0;
constexpr double least_apart = arrow_height + 5.0;  // of two levels in one lane
constexpr double lane_gap = 18.0;
constexpr double column_gap = 70.0;
constexpr double axis_width = 62.0;
constexpr double least_height = 460.0;  // of the energy range
constexpr double most_height = 1200.0;
constexpr int wanted_lanes = 3;  // the range grows until so many are enough
constexpr double picture_size = 118.0;
constexpr double picture_gap = 8.0;

struct Drawn {
  const DiagramLevel* level = nullptr;
  int index = 0;  // in its column
  int lane = 0;
  double y = 0.0;
  double left = 0.0;  // of the first bar
  double bars_right = 0.0;
};

struct DrawnColumn {
  std::vector<Drawn> levels;  // ascending energy
  double left = 0.0;
  double right = 0.0;
};

double bars_width(const DiagramLevel& level) {
  return level.degeneracy * bar_length + (level.degeneracy - 1) * bar_gap;
}

RichText level_words(const DiagramLevel& level) {
  RichText words = label_text(level.label);
  if (level.frontier == FrontierMark::Homo) return words + plain_text("  HOMO");
  if (level.frontier == FrontierMark::Lumo) return words + plain_text("  LUMO");
  return words;
}

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

bool inside(const LevelDiagram& diagram, const DiagramLevel& level) {
  return level.energy_ev >= diagram.from_ev && level.energy_ev <= diagram.to_ev;
}

// Places the levels of a column from its left side on; the lanes are as wide as what they hold.
DrawnColumn place_column(const LevelDiagram& diagram, const DiagramColumn& column, const Font& font,
                         double left, double top, double per_ev) {
  DrawnColumn out;
  out.left = left;
  std::vector<double> heights;
  for (std::size_t i = 0; i < column.levels.size(); ++i) {
    const DiagramLevel& level = column.levels[i];
    if (!inside(diagram, level)) continue;
    Drawn drawn;
    drawn.level = &level;
    drawn.index = static_cast<int>(i);
    drawn.y = top + (diagram.to_ev - level.energy_ev) * per_ev;
    out.levels.push_back(drawn);
    heights.push_back(drawn.y);
  }
  const std::vector<int> lanes = level_lanes(heights, least_apart);
  std::vector<double> bars;
  std::vector<double> labels;
  for (std::size_t i = 0; i < out.levels.size(); ++i) {
    const auto lane = static_cast<std::size_t>(lanes[i]);
    out.levels[i].lane = lanes[i];
    if (bars.size() <= lane) {
      bars.resize(lane + 1, 0.0);
      labels.resize(lane + 1, 0.0);
    }
    bars[lane] = std::max(bars[lane], bars_width(*out.levels[i].level));
    labels[lane] =
        std::max(labels[lane], font.width(level_words(*out.levels[i].level), label_size));
  }
  std::vector<double> centres;
  double x = left;
  for (std::size_t lane = 0; lane < bars.size(); ++lane) {
    if (lane > 0) x += lane_gap;
    centres.push_back(x + 0.5 * bars[lane]);
    x += bars[lane] + label_gap + labels[lane];
  }
  out.right = x;
  for (Drawn& drawn : out.levels) {
    const double width = bars_width(*drawn.level);
    drawn.left = centres[static_cast<std::size_t>(drawn.lane)] - 0.5 * width;
    drawn.bars_right = drawn.left + width;
  }
  return out;
}

int lanes_needed(const LevelDiagram& diagram, double per_ev) {
  int most = 0;
  for (const DiagramColumn& column : diagram.columns) {
    std::vector<double> heights;
    for (const DiagramLevel& level : column.levels) {
      if (inside(diagram, level)) heights.push_back(-level.energy_ev * per_ev);
    }
    for (const int lane : level_lanes(heights, least_apart)) most = std::max(most, lane + 1);
  }
  return most;
}

double px_per_ev(const LevelDiagram& diagram) {
  const double range = diagram.to_ev - diagram.from_ev;
  double height = least_height;
  while (height < most_height && lanes_needed(diagram, height / range) > wanted_lanes) {
    height += 60.0;
  }
  return height / range;
}

Path line(double x0, double y0, double x1, double y1, Colour colour, double width,
          std::vector<double> dashes = {}) {
  Path path;
  path.lines = {{{x0, y0}, {x1, y1}}};
  path.stroke = Stroke{colour, width, std::move(dashes)};
  return path;
}

Path arrow(double x, double y, bool up, Colour colour) {
  const double half = 0.5 * arrow_height;
  const double tip = up ? y - half : y + half;
  const double tail = up ? y + half : y - half;
  const double back = up ? tip + 4.6 : tip - 4.6;
  Path path;
  path.lines = {{{x, tail}, {x, tip}}, {{x - 2.7, back}, {x, tip}, {x + 2.7, back}}};
  path.stroke = Stroke{colour, 1.3, {}};
  return path;
}

// Electrons by Hund's rule, a hollow disc with a number where an orbital holds a part of one.
void add_electrons(Group& group, const Drawn& drawn, Colour colour) {
  const DiagramLevel& level = *drawn.level;
  const double whole = std::round(level.occupation);
  if (std::abs(level.occupation - whole) > 1e-9) return;  // the label says how many
  const int electrons = static_cast<int>(whole);
  for (int partner = 0; partner < level.degeneracy; ++partner) {
    const double x = drawn.left + partner * (bar_length + bar_gap) + 0.5 * bar_length;
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

Group level_group(const Drawn& drawn) {
  const DiagramLevel& level = *drawn.level;
  const Colour colour = level_colour(level);
  Group group;
  group.kind = "level";
  group.name = level.label;
  group.title = fmt::format("{}: {}, {:g} of {} electrons", level.label,
                            energy_words(level.energy_ev), level.occupation, 2 * level.degeneracy);
  for (int partner = 0; partner < level.degeneracy; ++partner) {
    const double x = drawn.left + partner * (bar_length + bar_gap);
    group.elements.emplace_back(line(x, drawn.y, x + bar_length, drawn.y, colour, 2.4));
  }
  add_electrons(group, drawn, colour);
  Text text;
  text.at = {drawn.bars_right + label_gap, drawn.y + 0.33 * label_size};
  text.runs = level_words(level);
  text.size = label_size;
  text.colour = level.frontier == FrontierMark::None ? palette::ink : colour;
  group.elements.emplace_back(std::move(text));
  return group;
}

double tick_step(double per_ev) {
  for (const double step : {0.1, 0.2, 0.5, 1.0, 2.0, 5.0, 10.0, 20.0, 50.0}) {
    if (step * per_ev >= 36.0) return step;
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
  title.at = {x - 42.0, 0.5 * (top + bottom)};
  title.runs = plain_text("orbital energy / eV");
  title.size = small_size;
  title.colour = palette::muted;
  title.anchor = Anchor::Middle;
  title.upwards = true;
  group.elements.emplace_back(std::move(title));
  return group;
}

Group links_group(const LevelDiagram& diagram, const std::vector<DrawnColumn>& columns) {
  Group group;
  group.kind = "links";
  for (const DiagramLink& link : diagram.links) {
    const auto find = [&](int column, int level) -> const Drawn* {
      for (const Drawn& drawn : columns[static_cast<std::size_t>(column)].levels) {
        if (drawn.index == level) return &drawn;
      }
      return nullptr;
    };
    const Drawn* a = find(link.column_a, link.level_a);
    const Drawn* b = find(link.column_b, link.level_b);
    if (a == nullptr || b == nullptr) continue;
    if (a->left > b->left) std::swap(a, b);
    const DrawnColumn& column =
        columns[static_cast<std::size_t>(std::min(link.column_a, link.column_b))];
    const double edge = column.right + 6.0;
    group.elements.emplace_back(line(edge, a->y, b->left - 5.0, b->y, palette::faint, 1.1, {4, 3}));
  }
  return group;
}

std::string count_words(int n, const char* where) {
  return fmt::format("{} {} {}", n, n == 1 ? "level" : "levels", where);
}

// What the window leaves out, so that nobody takes the picture for the whole.
std::string left_out(const LevelDiagram& diagram) {
  int below = 0;
  int above = 0;
  for (const DiagramColumn& column : diagram.columns) {
    for (const DiagramLevel& level : column.levels) {
      below += level.energy_ev < diagram.from_ev ? 1 : 0;
      above += level.energy_ev > diagram.to_ev ? 1 : 0;
    }
  }
  std::string words;
  if (below > 0) words = count_words(below, "below");
  if (above > 0) words += (words.empty() ? "" : ", ") + count_words(above, "above");
  return words.empty() ? words : words + " the range shown";
}

std::string fractions_note(const LevelDiagram& diagram) {
  for (const DiagramColumn& column : diagram.columns) {
    for (const DiagramLevel& level : column.levels) {
      if (inside(diagram, level) &&
          std::abs(level.occupation - std::round(level.occupation)) > 1e-9) {
        return fmt::format("{} holds {:g} electrons, spread evenly", level.label, level.occupation);
      }
    }
  }
  return {};
}

Text words(Point2 at, const std::string& text, double size, Colour colour) {
  Text out;
  out.at = at;
  out.runs = plain_text(text);
  out.size = size;
  out.colour = colour;
  return out;
}

// The gap as a measure between the two frontier levels, to the right of a single column.
Group gap_group(const DrawnColumn& column, double x) {
  Group group;
  group.kind = "gap";
  const Drawn* homo = nullptr;
  const Drawn* lumo = nullptr;
  for (const Drawn& drawn : column.levels) {
    if (drawn.level->frontier == FrontierMark::Homo) homo = &drawn;
    if (drawn.level->frontier == FrontierMark::Lumo) lumo = &drawn;
  }
  if (homo == nullptr || lumo == nullptr || homo->y <= lumo->y) return group;
  group.elements.emplace_back(line(x - 4, homo->y, x + 4, homo->y, palette::muted, 1.0));
  group.elements.emplace_back(line(x - 4, lumo->y, x + 4, lumo->y, palette::muted, 1.0));
  group.elements.emplace_back(line(x, homo->y, x, lumo->y, palette::muted, 1.0));
  const double gap = lumo->level->energy_ev - homo->level->energy_ev;
  group.elements.emplace_back(words({x + 9.0, 0.5 * (homo->y + lumo->y) + 0.35 * small_size},
                                    "gap " + energy_words(gap, 2), small_size, palette::muted));
  return group;
}

struct Pictures {
  std::vector<Group> groups;
  double right = 0.0;
  double top = std::numeric_limits<double>::infinity();
  double bottom = 0.0;
};

// Orbital pictures in a row for each level that has them, beside the column, led to their level.
Pictures picture_groups(const DrawnColumn& column, double x) {
  Pictures out;
  std::vector<const Drawn*> shown;
  std::vector<double> places;
  for (auto drawn = column.levels.rbegin(); drawn != column.levels.rend(); ++drawn) {
    if (drawn->level->pictures.empty()) continue;
    shown.push_back(&*drawn);
    places.push_back(drawn->y);
  }
  const std::vector<double> centres = spread_apart(places, picture_size + picture_gap + 18.0);
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
    text.runs = label_text(level.label) + plain_text("   " + energy_words(level.energy_ev, 2));
    group.elements.emplace_back(std::move(text));
    out.right = std::max(out.right, left);
    out.top = std::min(out.top, centres[i] - 0.5 * picture_size);
    out.bottom = std::max(out.bottom, centres[i] + 0.5 * picture_size + 18.0);
    out.groups.push_back(std::move(group));
  }
  return out;
}

std::string description(const LevelDiagram& diagram) {
  std::string text = fmt::format("Orbital energies from {} to {}. ",
                                 energy_words(diagram.from_ev, 1), energy_words(diagram.to_ev, 1));
  for (const DiagramColumn& column : diagram.columns) {
    if (!column.title.empty()) text += column.title + ": ";
    for (auto level = column.levels.rbegin(); level != column.levels.rend(); ++level) {
      if (!inside(diagram, *level)) continue;
      text += fmt::format("{} at {}, {:g} electrons{}; ", level->label,
                          energy_words(level->energy_ev, 2), level->occupation,
                          level->frontier == FrontierMark::Homo   ? " (HOMO)"
                          : level->frontier == FrontierMark::Lumo ? " (LUMO)"
                                                                  : "");
    }
  }
  if (text.ends_with("; ")) text.replace(text.size() - 2, 2, ".");
  return text;
}

void check_window(const LevelDiagram& diagram) {
  if (!(diagram.to_ev > diagram.from_ev)) {
    throw Error(
        fmt::format("the range of energies runs from {} to {} eV; its end must lie above "
                    "its start",
                    diagram.from_ev, diagram.to_ev));
  }
  double lowest = std::numeric_limits<double>::infinity();
  double highest = -lowest;
  for (const DiagramColumn& column : diagram.columns) {
    for (const DiagramLevel& level : column.levels) {
      if (inside(diagram, level)) return;
      lowest = std::min(lowest, level.energy_ev);
      highest = std::max(highest, level.energy_ev);
    }
  }
  throw Error(fmt::format("no level lies between {} and {} eV; they run from {:.3f} to {:.3f} eV",
                          diagram.from_ev, diagram.to_ev, lowest, highest));
}

}  // namespace

Figure level_diagram_figure(const LevelDiagram& diagram) {
  check_window(diagram);
  const Font font;
  const double per_ev = px_per_ev(diagram);
  double top = margin + 62.0;
  std::vector<DrawnColumn> columns;
  double x = margin + axis_width + 30.0;
  for (const DiagramColumn& column : diagram.columns) {
    columns.push_back(place_column(diagram, column, font, x, top, per_ev));
    const double title = font.width(plain_text(column.title), label_size);
    columns.back().right = std::max(columns.back().right, x + title);
    x = columns.back().right + column_gap;
  }
  double right = columns.back().right;
  const bool single = columns.size() == 1;
  Group gap;
  if (single) gap = gap_group(columns.front(), right + 22.0);
  if (!gap.elements.empty()) right += 22.0 + 80.0;
  Pictures pictures = picture_groups(columns.back(), right + 20.0);
  if (!pictures.groups.empty()) right = pictures.right;

  const double range_bottom = top + (diagram.to_ev - diagram.from_ev) * per_ev;
  double bottom = std::max(range_bottom, pictures.bottom) + 14.0;
  Figure figure;
  figure.title = diagram.title;
  figure.description = description(diagram);
  Group heading;
  heading.kind = "heading";
  heading.elements.emplace_back(words({margin, margin + 14.0}, diagram.title, 17.0, palette::ink));
  heading.elements.emplace_back(
      words({margin, margin + 34.0}, diagram.method, small_size, palette::muted));
  const double heading_width = std::max(font.width(plain_text(diagram.title), 17.0),
                                        font.width(plain_text(diagram.method), small_size));
  figure.groups.push_back(std::move(heading));
  figure.groups.push_back(axis(diagram, margin + axis_width, top, per_ev));
  Group names;
  names.kind = "column-titles";
  for (std::size_t i = 0; i < columns.size(); ++i) {
    if (diagram.columns[i].title.empty()) continue;
    names.elements.emplace_back(words({columns[i].left, bottom + 10.0}, diagram.columns[i].title,
                                      label_size, palette::ink));
  }
  if (!names.elements.empty()) bottom += 20.0;
  if (!diagram.links.empty()) figure.groups.push_back(links_group(diagram, columns));
  for (const DrawnColumn& column : columns) {
    for (const Drawn& drawn : column.levels) figure.groups.push_back(level_group(drawn));
  }
  if (!gap.elements.empty()) figure.groups.push_back(std::move(gap));
  for (Group& group : pictures.groups) figure.groups.push_back(std::move(group));
  if (!names.elements.empty()) figure.groups.push_back(std::move(names));
  Group notes;
  notes.kind = "notes";
  double notes_width = 0.0;
  for (const std::string& note : {left_out(diagram), fractions_note(diagram)}) {
    if (note.empty()) continue;
    bottom += 16.0;
    notes.elements.emplace_back(words({margin, bottom}, note, small_size, palette::muted));
    notes_width = std::max(notes_width, font.width(plain_text(note), small_size));
  }
  if (!notes.elements.empty()) figure.groups.push_back(std::move(notes));
  figure.width =
      std::ceil(std::max({right, margin + heading_width, margin + notes_width}) + margin);
  figure.height = std::ceil(bottom + margin);
  return figure;
}

}  // namespace irrepwise
