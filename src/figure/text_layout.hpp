// Small helpers to set text in figures.
#pragma once

#include <string>
#include <vector>

#include "figure/font.hpp"

namespace irrepwise {

[[nodiscard]] Text text_at(Point2 at, RichText runs, double size, Colour colour);

/// Breaks text between words into lines no wider than asked; a longer word stays whole.
/// @param size, width  px
[[nodiscard]] std::vector<std::string> wrapped(const Font& font, const std::string& text,
                                               double size, double width);

}  // namespace irrepwise
