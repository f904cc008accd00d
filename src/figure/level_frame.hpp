// What level diagrams of one column and of several share: heading, axis, notes, bars and arrows.
#pragma once

#include <vector>

#include "figure/font.hpp"
#include "figure/level_diagram.hpp"

namespace irrepwise::level_frame {

// Lengths in px.
inline constexpr double margin = 24.0;
inline constexpr double small_size = 11.5;
inline constexpr double title_size = 17.0;
inline constexpr double line_height = 16.0;
inline constexpr double axis_width = 66.0;
inline constexpr double least_width = 420.0;  // room for the title

[[nodiscard]] Colour level_colour(const DiagramLevel& level);

/// @returns  "2e1g: -11.304 eV, 4 of 4 electrons", for a pointer over the level
[[nodiscard]] std::string level_title(const DiagramLevel& level);

[[nodiscard]] Path line(double x0, double y0, double x1, double y1, Colour colour, double width,
                        std::vector<double> dashes = {});

struct Bars {
  double left = 0.0;    // of the first
  double length = 0.0;  // of each
  double gap = 0.0;
  double y = 0.0;
};

/// A bar for each partner.
void add_bars(Group& group, const DiagramLevel& level, const Bars& bars, double thickness);

/// Arrows on the bars by Hund's rule; none where an orbital holds a part of an electron.
/// @param height  of an arrow, px
void add_electrons(Group& group, const DiagramLevel& level, const Bars& bars, double height);

/// The scale with its ticks at the left of x.
/// @param top  px, where the highest energy of the window stands
[[nodiscard]] Group axis(const LevelDiagram& diagram, double x, double top, double per_ev);

/// Pale lines at the ticks, from one side to the other.
[[nodiscard]] Group grid(const LevelDiagram& diagram, double left, double right, double top,
                         double per_ev);

/// @returns  px, the base line of its last line
double add_heading(Figure& figure, const LevelDiagram& diagram, const Font& font, double width);

/// What the window leaves out, which level holds a part of an electron, and the diagram's own
/// notes.
/// @param y  px, the base line of what stands above
/// @returns  px, the base line of the last note
double add_notes(Figure& figure, const LevelDiagram& diagram, const Font& font, double width,
                 double y);

}  // namespace irrepwise::level_frame
