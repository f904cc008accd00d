#include <algorithm>
#include <cmath>
#include <utility>

#include <fmt/format.h>

#include "figure/level_columns.hpp"
#include "figure/level_diagram_words.hpp"
#include "figure/level_frame.hpp"
#include "figure/palette.hpp"
#include "figure/rich_text.hpp"
#include "figure/text_layout.hpp"

namespace irrepwise {
namespace {

using namespace level_frame;

constexpr double column_title_size = 13.0;
constexpr double label_shift = 0.35 * column_label_size;  // from the middle to the base line

Group level_group(const ColumnLevel& drawn, const LevelColumn& column, const std::string& title) {
  const DiagramLevel& level = *drawn.level;
  Group group;
  group.kind = "level";
  group.name = level.label;
  group.facts = {{"column", title}};
  group.title = level_title(level);
  const Bars bars{drawn.left, drawn.bar, column_bar_gap, drawn.y};
  add_bars(group, level, bars, column_bar_thickness);
  if (is_partly_filled(level)) add_electrons(group, level, bars, column_arrow_height);
  if (drawn.tag_width > 0.0) {
    group.elements.emplace_back(
        line(column.tags_right + 2.0, drawn.tag_y, drawn.left - 1.5, drawn.y, palette::faint, 0.8));
    group.elements.emplace_back(
        text_at({column.tags_right - drawn.tag_width, drawn.tag_y + 0.35 * column_tag_size},
                label_text(level.label), column_tag_size,
                level.frontier == FrontierMark::None ? palette::muted : level_colour(level)));
  }
  if (!level.labelled) return group;
  if (std::abs(drawn.label_y - drawn.y) > 2.0) {
    group.elements.emplace_back(line(drawn.right + 1.5, drawn.y, column.labels_left - 2.0,
                                     drawn.label_y, palette::faint, 0.8));
  }
  const Colour colour = level_colour(level);
  group.elements.emplace_back(
      text_at({column.labels_left, drawn.label_y + label_shift}, column_label(level),
              column_label_size, level.frontier == FrontierMark::None ? palette::ink : colour));
  return group;
}

Stroke link_stroke(const DiagramLink& link) {
  Stroke stroke{palette::faint, 1.0, {}};
  switch (link.weight) {
    case LinkWeight::Plain:
      break;
    case LinkWeight::Strong:
      stroke = {palette::muted, 1.2, {}};
      break;
    case LinkWeight::Homo:
      stroke = {palette::homo, 1.7, {}};
      break;
    case LinkWeight::Lumo:
      stroke = {palette::lumo, 1.7, {}};
      break;
  }
  if (link.overlap < dashed_below) stroke.dashes = {4.0, 3.0};
  return stroke;
}

// Where a link may run level through the strip of labels, or of tags: not across any of them.
constexpr double clear_of_words = 1.0;  // px between a link and the words above or below it

bool is_free_of_labels(const LevelColumn& column, double y) {
  return std::none_of(column.levels.begin(), column.levels.end(), [&](const ColumnLevel& level) {
    return level.label_width > 0.0 &&
           std::abs(level.label_y - y) < 0.5 * column_label_height + clear_of_words;
  });
}

bool is_free_of_tags(const LevelColumn& column, double y) {
  return std::none_of(column.levels.begin(), column.levels.end(), [&](const ColumnLevel& level) {
    return level.tag_width > 0.0 &&
           std::abs(level.tag_y - y) < 0.5 * column_tag_height + clear_of_words;
  });
}

double widest_tag(const LevelColumn& column) {
  double widest = 0.0;
  for (const ColumnLevel& level : column.levels) widest = std::max(widest, level.tag_width);
  return widest;
}

const ColumnLevel* find(const LevelColumn& column, int index) {
  for (const ColumnLevel& level : column.levels) {
    if (level.index == index) return &level;
  }
  return nullptr;
}

Path link_path(const DiagramLink& link, const LevelColumn& left, const ColumnLevel& from,
               const LevelColumn& right, const ColumnLevel& to) {
  Path path;
  path.stroke = link_stroke(link);
  // From height to height of the levels, so that it rises where the energy does; where labels had
  // to be moved apart, from name to name, so that each line has ends of its own.
  std::vector<Point2> points;
  const bool from_label = from.label_width > 0.0;
  const double from_y = from_label ? from.label_y : from.y;
  if (from_label) {
    points.push_back({left.labels_left + from.label_width + 4.0, from_y});
  } else if (is_free_of_labels(left, from_y)) {
    points.push_back({left.bars_right + 3.0, from_y});
  }
  points.push_back({left.right, from_y});
  const double arrival = right.tags_right - widest_tag(right) - 3.0;
  if (to.tag_width > 0.0) {
    points.push_back({arrival, to.tag_y});
    points.push_back({right.tags_right - to.tag_width - 3.0, to.tag_y});
  } else {
    points.push_back({arrival, to.y});
    if (is_free_of_tags(right, to.y)) points.push_back({right.left - 3.0, to.y});
  }
  path.lines = {std::move(points)};
  return path;
}

// Strong ones last, above the others.
std::vector<Group> link_groups(const LevelDiagram& diagram,
                               const std::vector<LevelColumn>& columns) {
  std::vector<DiagramLink> links = diagram.links;
  std::stable_sort(links.begin(), links.end(), [](const DiagramLink& a, const DiagramLink& b) {
    return static_cast<int>(a.weight) < static_cast<int>(b.weight);
  });
  std::vector<Group> groups;
  for (const DiagramLink& link : links) {
    const auto at = static_cast<std::size_t>(link.column);
    const ColumnLevel* from = find(columns[at], link.left_level);
    const ColumnLevel* to = find(columns[at + 1], link.right_level);
    if (from == nullptr || to == nullptr) continue;  // outside the window
    Group group;
    group.kind = "link";
    group.title = fmt::format("{} to {}: {:.0f} % in common", from->level->label, to->level->label,
                              100.0 * link.overlap);
    group.facts = {{"from-column", diagram.columns[at].title},
                   {"from-level", from->level->label},
                   {"to-column", diagram.columns[at + 1].title},
                   {"to-level", to->level->label}};
    group.elements = {link_path(link, columns[at], *from, columns[at + 1], *to)};
    groups.push_back(std::move(group));
  }
  return groups;
}

// Title and notes below each column, broken to the width from it to the next.
double add_column_words(Figure& figure, const LevelDiagram& diagram,
                        const std::vector<LevelColumn>& columns, const Font& font, double y) {
  Group group;
  group.kind = "column-titles";
  double lowest = y;
  for (std::size_t i = 0; i < columns.size(); ++i) {
    const DiagramColumn& column = diagram.columns[i];
    const double room = columns[i].right - columns[i].left + column_link_room - 10.0;
    double line_y = y + 4.0;
    for (const RichText& row : wrapped(font, plain_text(column.title), column_title_size, room)) {
      line_y += line_height;
      group.elements.emplace_back(
          text_at({columns[i].left, line_y}, row, column_title_size, palette::ink));
    }
    for (const RichText& note : column.notes) {
      for (const RichText& row : wrapped(font, note, small_size, room)) {
        line_y += line_height;
        group.elements.emplace_back(
            text_at({columns[i].left, line_y}, row, small_size, palette::muted));
      }
    }
    lowest = std::max(lowest, line_y);
  }
  figure.groups.push_back(std::move(group));
  return lowest;
}

std::vector<LevelColumn> placed_columns(const LevelDiagram& diagram, const Font& font, double top,
                                        double per_ev) {
  std::vector<LevelColumn> columns;
  double x = margin + axis_width + 24.0;
  for (const DiagramColumn& column : diagram.columns) {
    columns.push_back(place_level_column(diagram, columns.size(), font, x, top, per_ev));
    // No word of a title is broken, however long.
    double widest = 0.0;
    for (const RichText& row : wrapped(font, plain_text(column.title), column_title_size, 0.0)) {
      widest = std::max(widest, font.width(row, column_title_size));
    }
    LevelColumn& placed = columns.back();
    placed.right = std::max(placed.right, placed.left + widest - column_link_room + 10.0);
    x = placed.right + column_link_room;
  }
  return columns;
}

// How far labels, moved apart, reach beyond the window.
std::pair<double, double> label_range(const std::vector<LevelColumn>& columns) {
  double highest = 0.0;
  double lowest = -1e9;
  for (const LevelColumn& column : columns) {
    for (const ColumnLevel& level : column.levels) {
      if (level.label_width == 0.0) continue;
      highest = std::min(highest, level.label_y - 0.5 * column_label_height);
      lowest = std::max(lowest, level.label_y + 0.5 * column_label_height);
    }
  }
  return {highest, lowest};
}

}  // namespace

Figure several_columns_figure(const LevelDiagram& diagram) {
  const Font font;
  const double per_ev = column_scale(diagram);
  const double height = (diagram.to_ev - diagram.from_ev) * per_ev;
  // Neither width nor the reach of labels depend on the height at which things start.
  const std::vector<LevelColumn> measured = placed_columns(diagram, font, 0.0, per_ev);
  const auto [highest, lowest] = label_range(measured);
  const double width = std::max(least_width, measured.back().right + 10.0 - margin);
  Figure figure;
  figure.title = diagram.title;
  figure.description = spoken_levels(diagram);
  const double top = add_heading(figure, diagram, font, width) + 26.0 - highest;
  const std::vector<LevelColumn> columns = placed_columns(diagram, font, top, per_ev);
  figure.groups.push_back(grid(diagram, margin + axis_width, columns.back().right, top, per_ev));
  figure.groups.push_back(axis(diagram, margin + axis_width, top, per_ev));
  for (Group& group : link_groups(diagram, columns)) figure.groups.push_back(std::move(group));
  for (std::size_t i = 0; i < columns.size(); ++i) {
    for (const ColumnLevel& level : columns[i].levels) {
      figure.groups.push_back(level_group(level, columns[i], diagram.columns[i].title));
    }
  }
  double bottom = top + std::max(height, lowest) + 6.0;
  bottom = add_column_words(figure, diagram, columns, font, bottom) + 12.0;
  bottom = add_notes(figure, diagram, font, width, bottom);
  figure.width = std::ceil(width + 2.0 * margin);
  figure.height = std::ceil(bottom + margin);
  return figure;
}

}  // namespace irrepwise
