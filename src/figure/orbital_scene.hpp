// One orbital with its molecule as a scene: two phases at the isovalue that encloses a share of
// the density, balls and sticks.
#pragma once

#include "figure/isosurface.hpp"
#include "figure/mesh.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

struct OrbitalScene {
  Scene scene;            // "positive phase" and "negative phase" first, then the molecule
  double isovalue = 0.0;  // bohr^(-3/2)
  double share = 0.0;     // of the density inside the surface
  double integral = 0.0;  // of the density over the grid
};

/// @throws Error  as enclosing_isovalue
[[nodiscard]] OrbitalScene orbital_scene(const Molecule& molecule, const OrbitalField& field,
                                         const OrbitalGrid& grid, int orbital, double share);

}  // namespace irrepwise
