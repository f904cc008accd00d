// A molecule as balls and sticks.
#pragma once

#include <vector>

#include "figure/mesh.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

inline constexpr double stick_radius_angstrom = 0.07;
inline constexpr Colour stick_colour{0x9a, 0xa3, 0xac};

/// Grows with the covalent radius.
[[nodiscard]] double ball_radius_angstrom(int atomic_number);

/// @returns  one body per element (its symbol as name), and "bonds" where there are any
[[nodiscard]] std::vector<SceneBody> ball_and_stick(const Molecule& molecule);

/// Dark for carbon, light for hydrogen, nitrogen blue, oxygen red and so on (common practice),
/// toned down beside the orbital; one silver for every metal.
[[nodiscard]] Colour element_colour(int atomic_number);

}  // namespace irrepwise
