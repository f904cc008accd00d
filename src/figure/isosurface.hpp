// Surfaces of one value of an orbital, as meshes whose vertices lie on that value.
#pragma once

#include "figure/mesh.hpp"
#include "figure/orbital_grid.hpp"

namespace irrepwise {

/// Lobes of so few triangles are made again on a grid so many times as fine.
struct SmallLobes {
  std::size_t few_triangles = 160;
  int finer = 4;
};

/// By marching tetrahedra, six to each cube of the grid (Kuhn's division, which fits between
/// neighbours, so that the surface is closed); each vertex is then moved along its edge until the
/// orbital itself has the value there. Small lobes get finer points.
///
/// @param isovalue  bohr^(-3/2); its sign chooses the phase
/// @returns         closed where the surface does not reach the end of the grid; empty where the
///                  orbital nowhere has the value
/// @accuracy        |psi - isovalue| below 1e-6 of |isovalue| at the vertices in double, 1e-5 after
///                  rounding to float
/// @source          the division: Kuhn, IBM J. Res. Dev. 4, 518 (1960) (from memory)
[[nodiscard]] Mesh isosurface(const OrbitalField& field, const OrbitalGrid& grid, int orbital,
                              double isovalue, const SmallLobes& lobes = {});

}  // namespace irrepwise
