// Small helpers to set text in figures.
#pragma once

#include <vector>

#include "figure/font.hpp"

namespace irrepwise {

[[nodiscard]] Text text_at(Point2 at, RichText runs, double size, Colour colour);

/// Breaks text at its spaces into lines no wider than asked; a longer word stays whole. A no-break
/// space (U+00A0) holds words together.
/// @param size, width  px
[[nodiscard]] std::vector<RichText> wrapped(const Font& font, const RichText& text, double size,
                                            double width);

}  // namespace irrepwise
