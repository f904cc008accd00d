// Axes on the command line: "0,0,1", "Pt1", "C1,C2", "C1,C2,C3".
#pragma once

#include <string>

#include "molecule/molecule.hpp"
#include "symmetry/options.hpp"

namespace irrepwise::cli {

/// @param text    three numbers: a vector; one to three atoms by symbol and number: towards an
///                atom, from one to another, or the normal of three
/// @throws Error  for anything else, an atom that is not there, or one named twice
[[nodiscard]] AxisDirection parse_axis(const std::string& text, const Molecule& molecule);

}  // namespace irrepwise::cli
