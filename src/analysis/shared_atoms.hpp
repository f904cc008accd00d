// Which atoms two molecules have in common, when one is laid over the other.
#pragma once

#include <utility>
#include <vector>

#include <Eigen/Core>

#include "basis/basis.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

/// Farther apart, atoms of one element are not the same atom. Above the change of a bond between
/// variants, below the distance between neighbours.
inline constexpr double same_atom_angstrom = 0.7;

/// Two donors of one atom on the same side of both metals that are not the same atom.
struct ReplacedDonor {
  int first = 0;
  int second = 0;
  Eigen::Vector3d direction;  // unit vector from the metal to the first, standard frame
  bool sigma_only = false;    // either has atoms behind it, to which its π functions belong
};

struct SharedAtoms {
  std::vector<std::pair<int, int>> atoms;  // atom of the first, atom of the second; by the first
  std::vector<ReplacedDonor> replaced_donors;
  Eigen::Matrix3d turn;  // proper, from the standard frame of the second to that of the first
};

/// Lays the second molecule over the first, metal on metal (without metals: centroid on centroid),
/// so that as many donors as possible meet one of their element, then as many as possible meet any,
/// then as many atoms as possible meet one of their element. The way the
/// input files have them is kept unless another is better. Donors that bind by one atom, and of
/// which neither is shared, replace each other where they lie within 20 degrees of one direction.
///
/// @source  derived by us
[[nodiscard]] SharedAtoms find_shared_atoms(const MolecularSymmetry& first,
                                            const MolecularSymmetry& second);

}  // namespace irrepwise
