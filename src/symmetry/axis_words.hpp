// Where the axes of the standard frame run, in words with the names of atoms.
#pragma once

#include <string>
#include <vector>

#include "molecule/molecule.hpp"
#include "symmetry/point_group.hpp"

namespace irrepwise {

/// @param molecule  exactly symmetric, in the standard frame
/// @returns         a phrase for each axis that the group fixes: "z = C4 through Pt1",
///                  "x = C2' through Cl2 and Cl4", "yz = mirror plane through O1, H2 and H3"; of an
///                  axis through no atom "x = C2', towards Cl3 and Cl7 seen along z", "midway
///                  between …"
[[nodiscard]] std::vector<std::string> axis_words(const PointGroup& group,
                                                  const Molecule& molecule);

}  // namespace irrepwise
