// The point group of a molecule: found, oriented by the conventions, and made exact.
#pragma once

#include <string>
#include <vector>

#include <Eigen/Core>

#include "molecule/molecule.hpp"
#include "symmetry/options.hpp"
#include "symmetry/point_group.hpp"

namespace irrepwise {

struct MolecularSymmetry {
  PointGroup group;
  Molecule molecule;         // symmetrised, in the standard frame, atoms in input order
  Eigen::Matrix3d rotation;  // r_standard = rotation (r_input - origin)
  Eigen::Vector3d origin;    // Å, input frame
  double tolerance_angstrom = 0.0;
  double largest_shift_angstrom = 0.0;  // of an atom, from the input to the exact structure
  double rms_shift_angstrom = 0.0;
  std::vector<std::vector<int>> images;  // [operation][atom] -> atom it lands on
  std::vector<std::string> axes;         // words: "z = C4 through Pt1"
  std::string full_group;                // the molecule's whole group, where a subgroup is in force
};

/// @throws Error  where an axis or subgroup was asked for that the molecule does not have
[[nodiscard]] MolecularSymmetry find_symmetry(const Molecule& molecule,
                                              const SymmetryOptions& options = {});

}  // namespace irrepwise
