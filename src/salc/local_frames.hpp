// A frame for each atom around a centre: z towards the centre, x fixed by the site symmetry.
#pragma once

#include <optional>
#include <vector>

#include <Eigen/Core>

#include "salc/equivalent_atoms.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

struct Centre {
  Eigen::Vector3d position = Eigen::Vector3d::Zero();  // Å, standard frame
  std::optional<int> atom;                             // the atom there, if any
};

/// The atom at the one point that every operation keeps, or that point, if the group has just one;
/// otherwise, of the atoms that every operation keeps in place, the one with most neighbours, two
/// at least (of equal ones the heaviest, which must be one alone).
[[nodiscard]] std::optional<Centre> find_centre(const MolecularSymmetry& symmetry);

struct LocalFrames {
  std::vector<Eigen::Matrix3d> frames;  // by atom of the set; right-handed, columns x, y, z
  // x lies in σh, or in the plane of a planar molecule, and y across it, on every atom.
  bool in_plane = false;
};

/// x of the representative lies in a mirror plane that contains the line to the centre: σh or the
/// plane of the molecule before others, then the one with most atoms. Without such a plane y is
/// the direction nearest to the standard z (or y). The group carries the frame to the other atoms;
/// of the ways in which it does, the one whose y points most upwards along z (then y, x) is taken.
///
/// @returns  nothing for the atom at the centre, and for atoms that are not bonded to a central
///           atom
[[nodiscard]] std::optional<LocalFrames> local_frames(const MolecularSymmetry& symmetry,
                                                      const EquivalentAtoms& set,
                                                      const Centre& centre);

}  // namespace irrepwise
