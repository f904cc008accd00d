// Contour lines of an orbital in a plane.
#pragma once

#include <span>
#include <vector>

#include "figure/figure.hpp"
#include "figure/orbital_field.hpp"
#include "figure/plane.hpp"

namespace irrepwise {

/// Places in the plane are in Å along its `right` and `up`.
struct Contour {
  double level = 0.0;                      // bohr^(-3/2)
  std::vector<std::vector<Point2>> lines;  // closed polygons
};

struct ContourMap {
  std::vector<Contour> contours;  // of the positive levels ascending, then the negative descending
  Box extent;                     // Å, of the lines; `top` is the larger end
};

/// By marching squares, then moving each vertex along its edge until the orbital itself has the
/// level there.
///
/// @param levels  positive, ascending, bohr^(-3/2); the negative ones are drawn too
/// @accuracy      |psi - level| below 1e-6 of the level at every vertex
[[nodiscard]] ContourMap contour_map(const OrbitalField& field, int orbital, const Plane& plane,
                                     std::span<const double> levels);

/// 0.0125, 0.025, 0.05 … bohr^(-3/2), each twice the one before: the steps of contour drawings.
[[nodiscard]] std::span<const double> contour_levels();

}  // namespace irrepwise
