#include "figure/level_placing.hpp"

#include <algorithm>

#include "figure/level_lanes.hpp"
#include "figure/rich_text.hpp"

namespace irrepwise {
namespace {

constexpr double least_apart = level_arrow_height + 5.0;  // of two levels in one lane
constexpr double lane_gap = 18.0;
constexpr double strip = 36.0;          // after the main lane, for the measure of the gap
constexpr double least_height = 460.0;  // of the energy range
constexpr double most_height = 900.0;
constexpr int wanted_lanes = 4;  // the range grows until so many are enough

double bars_width(const DiagramLevel& level) {
  return level.degeneracy * level_bar_length + (level.degeneracy - 1) * level_bar_gap;
}

int lanes_needed(const LevelDiagram& diagram, double per_ev) {
  int most = 0;
  for (const DiagramColumn& column : diagram.columns) {
    std::vector<double> heights;
    for (const DiagramLevel& level : column.levels) {
      if (is_shown(diagram, level)) heights.push_back(-level.energy_ev * per_ev);
    }
    for (const int lane : level_lanes(heights, least_apart)) most = std::max(most, lane + 1);
  }
  return most;
}

}  // namespace

RichText level_words(const DiagramLevel& level) {
  RichText words = label_text(level.label);
  if (level.frontier == FrontierMark::Homo) return words + plain_text("\u00A0\u00A0HOMO");
  if (level.frontier == FrontierMark::Lumo) return words + plain_text("\u00A0\u00A0LUMO");
  return words;
}

bool is_shown(const LevelDiagram& diagram, const DiagramLevel& level) {
  return level.energy_ev >= diagram.from_ev && level.energy_ev <= diagram.to_ev;
}

PlacedColumn place_column(const LevelDiagram& diagram, const DiagramColumn& column,
                          const Font& font, double left, double top, double per_ev) {
  PlacedColumn out;
  out.left = left;
  std::vector<double> heights;
  for (std::size_t i = 0; i < column.levels.size(); ++i) {
    const DiagramLevel& level = column.levels[i];
    if (!is_shown(diagram, level)) continue;
    PlacedLevel drawn;
    drawn.level = &level;
    drawn.index = static_cast<int>(i);
    drawn.y = top + (diagram.to_ev - level.energy_ev) * per_ev;
    out.levels.push_back(drawn);
    heights.push_back(drawn.y);
  }
  // The frontier stands in the main lane.
  std::vector<std::size_t> first;
  for (std::size_t i = 0; i < out.levels.size(); ++i) {
    if (out.levels[i].level->frontier != FrontierMark::None) first.push_back(i);
  }
  const std::vector<int> lanes = level_lanes(heights, least_apart, first);
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
        std::max(labels[lane], font.width(level_words(*out.levels[i].level), level_label_size));
  }
  std::vector<double> centres;
  double x = left;
  for (std::size_t lane = 0; lane < bars.size(); ++lane) {
    if (lane > 0) x += lane == 1 ? strip : lane_gap;
    centres.push_back(x + 0.5 * bars[lane]);
    x += bars[lane] + level_label_gap + labels[lane];
    if (lane == 0) out.main_right = x;
  }
  out.right = x;
  for (PlacedLevel& drawn : out.levels) {
    const double width = bars_width(*drawn.level);
    drawn.left = centres[static_cast<std::size_t>(drawn.lane)] - 0.5 * width;
    drawn.bars_right = drawn.left + width;
  }
  return out;
}

double level_scale(const LevelDiagram& diagram) {
  const double range = diagram.to_ev - diagram.from_ev;
  double height = least_height;
  while (height < most_height && lanes_needed(diagram, height / range) > wanted_lanes) {
    height += 60.0;
  }
  return height / range;
}

}  // namespace irrepwise
