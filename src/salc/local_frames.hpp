// A frame for each atom around a centre: z towards the centre, y fixed by the site symmetry.
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

/// The centre is an atom that every operation keeps in place: a metal, or an atom that holds the
/// molecule together, so that each of its neighbours is in a piece of its own when it is taken away
/// (of a spiro atom at the one point that the group keeps, the rings are). A member of a ring is
/// none. Metals of the complex come first, then the atom with most neighbours (two at least, but
/// for the atom at the one point that the group keeps), then the heaviest, which must be one alone.
/// Without such an atom the centre is the one point that every operation keeps, if there is one.
[[nodiscard]] std::optional<Centre> find_centre(const MolecularSymmetry& symmetry);

struct LocalFrames {
  std::vector<Eigen::Matrix3d> frames;  // by atom of the set; right-handed, columns x, y, z
  // x lies in σh, or in the plane of a planar molecule, and y across it, on every atom.
  bool in_plane = false;
  // z goes along a bond to the next atom on the way to the centre, not straight to the centre.
  bool beyond_donors = false;
  // z goes along the bond to the metal, or to the midpoint of several, in a complex without a
  // central atom.
  bool to_own_metal = false;
  // z is the normal of a ring or π bond that binds side-on, x points to the neighbours in it.
  bool side_on = false;
};

/// y of a set's representative: across a mirror plane that contains z: σh or the plane of the
/// molecule before others, then the one with most atoms. Without such a plane, across the plane in
/// which the atom's bonds lie; without that too, the direction nearest to the standard z (or y).
/// @param z  unit vector, standard frame, which the site group must keep
/// @returns  unit vector across z
[[nodiscard]] Eigen::Vector3d first_y(const MolecularSymmetry& symmetry, const EquivalentAtoms& set,
                                      const Eigen::Vector3d& z);

/// The group carries the frame of the representative to the other atoms; of the ways in which it
/// does, the one whose x and y come nearest to those of the frame that the atom wishes for is
/// taken, then the one whose y points most upwards along z (then y, x). The sign of the
/// representative's x and y is chosen likewise.
///
/// @param y, z    of the representative: unit vectors across each other, z kept by the site group
/// @param wishes  frames by atom of the set; zero where there is none
[[nodiscard]] LocalFrames carried_frames(const MolecularSymmetry& symmetry,
                                         const EquivalentAtoms& set, const Eigen::Vector3d& y,
                                         const Eigen::Vector3d& z,
                                         const std::vector<Eigen::Matrix3d>& wishes);

/// z points to the centre, y is `first_y`, and the group carries the frame.
///
/// @returns  nothing for the atom at the centre, and for atoms that are not bonded to a central
///           atom
[[nodiscard]] std::optional<LocalFrames> local_frames(const MolecularSymmetry& symmetry,
                                                      const EquivalentAtoms& set,
                                                      const Centre& centre);

}  // namespace irrepwise
