// Where the levels of a diagram stand: heights by energy, lanes for those too close to each other.
#pragma once

#include <vector>

#include "figure/font.hpp"
#include "figure/level_diagram.hpp"

namespace irrepwise {

// Lengths in px.
inline constexpr double level_bar_length = 30.0;
inline constexpr double level_bar_gap = 6.0;
inline constexpr double level_label_gap = 7.0;
inline constexpr double level_label_size = 14.0;
inline constexpr double level_arrow_height = 17.0;

struct PlacedLevel {
  const DiagramLevel* level = nullptr;
  int index = 0;  // in its column
  int lane = 0;
  double y = 0.0;
  double left = 0.0;  // of the first bar
  double bars_right = 0.0;
};

struct PlacedColumn {
  std::vector<PlacedLevel> levels;  // ascending energy
  double left = 0.0;
  double main_right = 0.0;  // where the main lane ends; a free strip of 36 px follows
  double right = 0.0;
};

/// @returns  whether the level lies in the window of the diagram
[[nodiscard]] bool is_shown(const LevelDiagram& diagram, const DiagramLevel& level);

/// The label, with the word HOMO or LUMO behind it where that is what it is.
[[nodiscard]] RichText level_words(const DiagramLevel& level);

/// @returns  px for one eV, so that few levels need to step aside and the diagram is not too high
[[nodiscard]] double level_scale(const LevelDiagram& diagram);

/// Places the levels of a column from its left side on; lanes are as wide as what they hold.
/// @param top     px, where the highest energy of the window stands
/// @param per_ev  px
[[nodiscard]] PlacedColumn place_column(const LevelDiagram& diagram, const DiagramColumn& column,
                                        const Font& font, double left, double top, double per_ev);

}  // namespace irrepwise
