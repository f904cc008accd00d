// How wide a text is on a terminal, and breaking it into lines.
#pragma once

#include <string>
#include <string_view>
#include <vector>

namespace irrepwise {

/// @param text  UTF-8
/// @returns     the columns it fills on a terminal: combining marks none, East Asian wide
///              characters two, all others one; a broken byte counts as one
[[nodiscard]] int display_width(std::string_view text);

/// @returns  the text with spaces behind (or before) it up to the width; longer text stays whole
[[nodiscard]] std::string padded_right(std::string_view text, int width);
[[nodiscard]] std::string padded_left(std::string_view text, int width);

/// Breaks at spaces, but not at no-break ones, which become plain; a word wider than the line
/// stands alone and stays whole. At least one line.
[[nodiscard]] std::vector<std::string> wrapped(std::string_view text, int width);

}  // namespace irrepwise
