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

/// @returns  RFC 4648, with padding, one line
[[nodiscard]] std::string base64(std::string_view bytes);

}  // namespace irrepwise
