// Several columns of levels side by side: where bars, labels and links stand. All bars of a column
// fill one strip, so that links meet them at its edges; labels stand in a strip of their own, to
// the right. Where levels crowd, a link runs from the label of one to a tag, the label of the other
// again, to the left of its bars.
#pragma once

#include <cstddef>
#include <vector>

#include "figure/font.hpp"
#include "figure/level_diagram.hpp"

namespace irrepwise {

struct ColumnLevel {
  const DiagramLevel* level = nullptr;
  int index = 0;  // in its column
  double y = 0.0;
  double left = 0.0;         // of the first bar
  double bar = 0.0;          // length of each bar
  double right = 0.0;        // of the last bar
  double label_y = 0.0;      // middle of the label, moved away from others
  double label_width = 0.0;  // 0 without a label
  double tag_y = 0.0;        // middle of the tag
  double tag_width = 0.0;    // 0 without a tag
  bool crowded = false;      // others are so near that a line could mean any of them
};

struct LevelColumn {
  std::vector<ColumnLevel> levels;  // those in the window, ascending energy
  double tags_right = 0.0;          // tags end here, and links from the left arrive before them
  double left = 0.0;                // where bars begin, and links from the left to them arrive
  double bars_right = 0.0;
  double labels_left = 0.0;
  double right = 0.0;  // where labels end and links to the right begin
};

// Lengths in px.
inline constexpr double column_bar_gap = 3.0;  // between partners
inline constexpr double column_bar_thickness = 2.2;
inline constexpr double column_arrow_height = 12.0;
inline constexpr double column_label_size = 11.0;
inline constexpr double column_label_height = 14.2;
inline constexpr double column_tag_size = 10.0;
inline constexpr double column_tag_height = 13.4;
inline constexpr double column_link_room = 38.0;  // between one column and the next

/// The label, its parent in parentheses and the word HOMO or LUMO.
[[nodiscard]] RichText column_label(const DiagramLevel& level);

/// Whether arrows are drawn: some electrons, but fewer than there is room for.
[[nodiscard]] bool is_partly_filled(const DiagramLevel& level);

/// @returns  px for one eV: more where levels are dense
[[nodiscard]] double column_scale(const LevelDiagram& diagram);

/// Levels too close to stand one above the other share the width, each bar above 7 px, and rise to
/// the right where they are few.
/// @param column  its index in the diagram
/// @param left    px, where it begins: its tags, or its bars
/// @param top     px, where the highest energy of the window stands
/// @param per_ev  px
[[nodiscard]] LevelColumn place_level_column(const LevelDiagram& diagram, std::size_t column,
                                             const Font& font, double left, double top,
                                             double per_ev);

/// The whole drawing. @see level_diagram_figure
[[nodiscard]] Figure several_columns_figure(const LevelDiagram& diagram);

}  // namespace irrepwise
