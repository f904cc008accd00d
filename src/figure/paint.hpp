// Paints a figure into pixels, with antialiasing.
#pragma once

#include "figure/figure.hpp"
#include "figure/raster.hpp"

namespace irrepwise {

/// @param scale  pixels of the raster for one pixel of the figure
/// @returns      on white; the same for the same figure, on every machine with the same rounding
[[nodiscard]] Raster painted(const Figure& figure, double scale = 2.0);

}  // namespace irrepwise
