#include "figure/level_columns.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <set>

#include "figure/level_lanes.hpp"
#include "figure/level_placing.hpp"
#include "figure/rich_text.hpp"
#include "hueckel/occupation.hpp"

namespace irrepwise {
namespace {

constexpr double least_bars_width = 54.0;
constexpr double least_bar = 7.0;
constexpr double lane_gap = 8.0;   // between levels that share the width
constexpr double clearance = 2.6;  // px of white between bars one above the other
constexpr double leader = 14.0;    // room between bars and labels
constexpr double tag_leader = 10.0;
constexpr double crowd = 11.0;  // px: closer than this, two lines cannot be told apart
constexpr int most_stairs = 6;  // bars that rise side by side

// What a level needs above and below its line.
double half_extent(const DiagramLevel& level) {
  const double half = is_partly_filled(level) ? column_arrow_height : column_bar_thickness;
  return 0.5 * (half + clearance);
}

// Levels that touch, directly or through others, by indices into the column; each with its lane.
struct Cluster {
  std::vector<std::size_t> members;
  std::vector<std::size_t> lanes;      // per member
  std::vector<int> lane_degeneracies;  // per lane, the largest
};

std::vector<Cluster> clusters_of(const std::vector<ColumnLevel>& levels) {
  std::vector<Cluster> clusters;
  double reach = 0.0;  // the highest point, y downwards, that the cluster touches
  for (std::size_t i = 0; i < levels.size(); ++i) {
    const double half = half_extent(*levels[i].level);
    if (clusters.empty() || levels[i].y + half <= reach) {
      clusters.push_back({});
      reach = levels[i].y - half;
    }
    clusters.back().members.push_back(i);
    reach = std::min(reach, levels[i].y - half);
  }
  for (Cluster& cluster : clusters) {
    int bars = 0;
    for (const std::size_t i : cluster.members) bars += levels[i].level->degeneracy;
    const bool stairs = bars <= most_stairs;
    for (const std::size_t i : cluster.members) {
      std::vector<bool> taken(cluster.members.size() + 1, false);
      for (std::size_t k = 0; k < cluster.lanes.size(); ++k) {
        const ColumnLevel& other = levels[cluster.members[k]];
        const double needed = half_extent(*levels[i].level) + half_extent(*other.level);
        if (stairs || std::abs(levels[i].y - other.y) < needed) taken[cluster.lanes[k]] = true;
      }
      std::size_t lane = 0;
      while (taken[lane]) ++lane;
      cluster.lanes.push_back(lane);
      if (cluster.lane_degeneracies.size() <= lane) cluster.lane_degeneracies.push_back(0);
      int& widest = cluster.lane_degeneracies[lane];
      widest = std::max(widest, levels[i].level->degeneracy);
    }
  }
  return clusters;
}

// Of a cluster: what is no bar, and how many bars stand side by side.
double gaps_width(const Cluster& cluster) {
  double width = lane_gap * static_cast<double>(cluster.lane_degeneracies.size() - 1);
  for (const int d : cluster.lane_degeneracies) width += column_bar_gap * (d - 1);
  return width;
}

int bars_across(const Cluster& cluster) {
  int bars = 0;
  for (const int d : cluster.lane_degeneracies) bars += d;
  return bars;
}

std::vector<ColumnLevel> shown_levels(const LevelDiagram& diagram, const DiagramColumn& column,
                                      double top, double per_ev) {
  std::vector<ColumnLevel> levels;
  for (std::size_t i = 0; i < column.levels.size(); ++i) {
    const DiagramLevel& level = column.levels[i];
    if (!is_shown(diagram, level)) continue;
    ColumnLevel drawn;
    drawn.level = &level;
    drawn.index = static_cast<int>(i);
    drawn.y = top + (diagram.to_ev - level.energy_ev) * per_ev;
    levels.push_back(drawn);
  }
  return levels;
}

// Tags for levels that links from the left end at, moved apart like the labels; one that stands
// alone needs none, unless it was moved.
double place_tags(std::vector<ColumnLevel>& levels, const std::set<int>& linked, const Font& font) {
  std::vector<std::size_t> meant;
  std::vector<double> places;
  for (std::size_t i = levels.size(); i-- > 0;) {
    if (!levels[i].level->labelled || linked.count(levels[i].index) == 0) continue;
    meant.push_back(i);
    places.push_back(levels[i].y);
  }
  const std::vector<double> middles = spread_apart(places, column_tag_height);
  double widest = 0.0;
  for (std::size_t k = 0; k < meant.size(); ++k) {
    ColumnLevel& level = levels[meant[k]];
    if (!level.crowded && std::abs(middles[k] - level.y) < 0.5) continue;
    level.tag_y = middles[k];
    level.tag_width = font.width(label_text(level.level->label), column_tag_size);
    widest = std::max(widest, level.tag_width);
  }
  return widest;
}

void mark_crowded(std::vector<ColumnLevel>& levels) {  // ascending energy
  for (std::size_t i = 1; i < levels.size(); ++i) {
    if (levels[i - 1].y - levels[i].y >= crowd) continue;
    levels[i - 1].crowded = true;
    levels[i].crowded = true;
  }
}

// Labels are moved apart; y runs downwards, levels upwards.
double place_labels(std::vector<ColumnLevel>& levels, const Font& font) {
  std::vector<std::size_t> labelled;
  std::vector<double> places;
  for (std::size_t i = levels.size(); i-- > 0;) {
    if (!levels[i].level->labelled) continue;
    labelled.push_back(i);
    places.push_back(levels[i].y);
  }
  const std::vector<double> middles = spread_apart(places, column_label_height);
  double widest = 0.0;
  for (std::size_t k = 0; k < labelled.size(); ++k) {
    ColumnLevel& level = levels[labelled[k]];
    level.label_y = middles[k];
    level.label_width = font.width(column_label(*level.level), column_label_size);
    widest = std::max(widest, level.label_width);
  }
  return widest;
}

}  // namespace

bool is_partly_filled(const DiagramLevel& level) {
  return is_partly_filled(level.occupation, level.degeneracy);
}

RichText column_label(const DiagramLevel& level) {
  RichText words = label_text(level.label);
  if (!level.parent.empty()) {
    words = words + plain_text("\u00A0(") + label_text(level.parent) + plain_text(")");
  }
  if (level.frontier == FrontierMark::Homo) return words + plain_text("\u00A0HOMO");
  if (level.frontier == FrontierMark::Lumo) return words + plain_text("\u00A0LUMO");
  return words;
}

double column_scale(const LevelDiagram& diagram) {
  constexpr double least_height = 560.0;
  constexpr double most_height = 900.0;
  constexpr int wanted_across = 4;
  const double range = diagram.to_ev - diagram.from_ev;
  const auto is_dense = [&](double height) {
    for (const DiagramColumn& column : diagram.columns) {
      for (const Cluster& cluster :
           clusters_of(shown_levels(diagram, column, 0.0, height / range))) {
        if (bars_across(cluster) > wanted_across && cluster.lane_degeneracies.size() > 1) {
          return true;
        }
      }
    }
    return false;
  };
  double height = least_height;
  while (height < most_height && is_dense(height)) height += 60.0;
  return height / range;
}

LevelColumn place_level_column(const LevelDiagram& diagram, std::size_t column, const Font& font,
                               double left, double top, double per_ev) {
  LevelColumn out;
  out.levels = shown_levels(diagram, diagram.columns[column], top, per_ev);
  mark_crowded(out.levels);
  std::set<int> linked;
  for (const DiagramLink& link : diagram.links) {
    if (link.column + 1 == static_cast<int>(column)) linked.insert(link.right_level);
  }
  const double tags = place_tags(out.levels, linked, font);
  out.tags_right = left + tags;
  if (tags > 0.0) left += tags + tag_leader;
  out.left = left;
  const std::vector<Cluster> clusters = clusters_of(out.levels);
  double width = least_bars_width;
  for (const Cluster& cluster : clusters) {
    width = std::max(width, gaps_width(cluster) + least_bar * bars_across(cluster));
  }
  for (const Cluster& cluster : clusters) {
    const double bar = (width - gaps_width(cluster)) / bars_across(cluster);
    std::vector<double> lane_left = {left};
    for (const int d : cluster.lane_degeneracies) {
      lane_left.push_back(lane_left.back() + d * bar + (d - 1) * column_bar_gap + lane_gap);
    }
    for (std::size_t k = 0; k < cluster.members.size(); ++k) {
      ColumnLevel& level = out.levels[cluster.members[k]];
      const std::size_t lane = cluster.lanes[k];
      const int d = level.level->degeneracy;
      // A level that is narrower than its lane fills it all the same.
      const double room = lane_left[lane + 1] - lane_gap - lane_left[lane];
      level.left = lane_left[lane];
      level.bar = (room - (d - 1) * column_bar_gap) / d;
      level.right = level.left + room;
    }
  }
  out.bars_right = left + width;
  out.labels_left = out.bars_right + leader;
  const double widest = place_labels(out.levels, font);
  out.right = widest > 0.0 ? out.labels_left + widest + 4.0 : out.bars_right + 4.0;
  return out;
}

}  // namespace irrepwise
