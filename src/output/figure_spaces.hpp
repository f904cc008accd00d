// Filling up numbers with spaces as wide as their digits, for writers in proportional letters.
#pragma once

#include <string>

namespace irrepwise {

/// @param after  the point and the digits behind it, or nothing
/// @param width  characters that the longest of the column has there, its point included
/// @returns      the same with a punctuation space for a missing point and a figure space for every
///               missing digit
[[nodiscard]] std::string filled_with_figure_spaces(const std::string& after, int width);

}  // namespace irrepwise
