// What is said in words on a level diagram and to those who cannot see it.
#pragma once

#include <string>

#include "figure/level_diagram.hpp"

namespace irrepwise {

/// What the window leaves out, so that nobody takes the picture for the whole; may be empty.
[[nodiscard]] std::string words_on_left_out(const LevelDiagram& diagram);

/// Which level holds a part of an electron, which arrows cannot show; may be empty.
[[nodiscard]] std::string words_on_fractions(const LevelDiagram& diagram);

/// Every level shown, from high to low.
[[nodiscard]] std::string spoken_levels(const LevelDiagram& diagram);

/// @throws Error  for a window without levels, or whose end is not above its start, and for too
/// many
///                columns
void check_diagram(const LevelDiagram& diagram);

}  // namespace irrepwise
