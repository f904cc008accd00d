// Which labels changed places because the axes were chosen otherwise.
#pragma once

#include <string>
#include <vector>

#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

struct Relabelled {
  std::string before;  // irrep or class, as in the table
  std::string after;
};

struct AxisEffect {
  std::vector<Relabelled> irreps;   // only those that changed
  std::vector<Relabelled> classes;  // symbols without their sizes: "C2'" that was "C2''"
};

/// Compares two descriptions of one molecule, of the same group in two standard frames: an irrep is
/// the same when its characters are the same for the same operations in space.
///
/// @param before  with the axes of the conventions
/// @param after   with those of the user
/// @returns       empty for infinite groups, and where the operations are not the same ones
[[nodiscard]] AxisEffect axis_effect(const MolecularSymmetry& before,
                                     const MolecularSymmetry& after);

}  // namespace irrepwise
