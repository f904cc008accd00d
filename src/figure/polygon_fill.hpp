// Filling polygons into pixels with antialiasing.
#pragma once

#include <vector>

#include "figure/figure.hpp"
#include "figure/raster.hpp"

namespace irrepwise {

enum class FillRule { NonZero, EvenOdd };

/// Blends a colour into the raster where the polygons cover it, by the covered part of each pixel:
/// exact along x, by `16` lines along y.
/// @param polygons  closed, in pixels of the raster
void fill_polygons(Raster& raster, const std::vector<std::vector<Point2>>& polygons, FillRule rule,
                   Colour colour);

/// @returns  polygons, to be filled by the non-zero rule, that cover a line with round joins
/// @param dashes  lengths on, off, on …; empty: solid
[[nodiscard]] std::vector<std::vector<Point2>> stroke_polygons(const std::vector<Point2>& line,
                                                               bool closed, double width,
                                                               const std::vector<double>& dashes);

}  // namespace irrepwise
