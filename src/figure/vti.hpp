// Writes orbitals on a grid as VTK ImageData in XML (Kitware's open format, version 1.0).
#pragma once

#include <string>
#include <vector>

#include "figure/orbital_grid.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

/// Values as 32-bit floats in base64, an array per orbital; origin and spacing in Å. The field data
/// hold the atoms ("atomic_numbers", "positions_angstrom") and the integrals of the densities
/// ("density_integrals").
///
/// @param names  of the arrays, one per orbital of the grid
[[nodiscard]] std::string vti_document(const OrbitalGrid& grid,
                                       const std::vector<std::string>& names,
                                       const Molecule& molecule);

}  // namespace irrepwise
