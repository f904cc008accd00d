// Writes a figure as SVG 1.1 (W3C), text as text.
#pragma once

#include <string>
#include <string_view>

#include "figure/figure.hpp"

namespace irrepwise {

/// A whole document with title and description for screen readers. Each group is a <g> with its
/// kind as class, its name as data-name and its facts as further data attributes; pictures are
/// carried inside as PNG.
[[nodiscard]] std::string svg_document(const Figure& figure);

/// The same without a background and without the prologue of a document, to stand in a page.
/// @param id  what the ids inside begin with: each figure of a page needs its own
[[nodiscard]] std::string svg_element(const Figure& figure, std::string_view id);

/// @returns  "#2b6cb8"
[[nodiscard]] std::string colour_code(const Colour& colour);

/// @returns  RFC 4648, with padding, one line
[[nodiscard]] std::string base64(std::string_view bytes);

}  // namespace irrepwise
