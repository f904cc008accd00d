// A molecule as balls and sticks.
#pragma once

#include <vector>

#include "figure/mesh.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

/// @returns  one body per element (its symbol as name), and "bonds" where there are any
[[nodiscard]] std::vector<SceneBody> ball_and_stick(const Molecule& molecule);

/// Dark for carbon, light for hydrogen, nitrogen blue, oxygen red and so on (common practice),
/// toned down beside the orbital; one silver for every metal.
[[nodiscard]] Colour element_colour(int atomic_number);

}  // namespace irrepwise
