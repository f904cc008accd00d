// Frames of atoms that bind a metal side-on: a ring over a metal, an alkene, an allyl.
#pragma once

#include <optional>
#include <vector>

#include <Eigen/Core>

#include "molecule/molecule.hpp"

namespace irrepwise {

/// A ring or π bond binds side-on where several atoms bonded to each other are bonded to the same
/// one metal, and the normal of the ligand's plane at each of them rises from that plane towards
/// the metal (within 60°; a chelate has the metal in its plane).
struct SideOn {
  int metal = 0;
  Eigen::Vector3d z;  // unit vector: the normal at the atom, on the metal's side
  // Unit vector across z: towards the neighbours in the ring or π bond; zero where they lie all
  // around.
  Eigen::Vector3d x;
};

/// The normal stands across the bonds to neighbours that bind side-on too or, of an atom with one
/// such neighbour, across that bond and as far as may be across the others; of an alkyne it lies in
/// the plane of metal and bond.
///
/// @param metals  ascending
/// @returns       nothing for a hydrogen, a metal, an atom of several metals, one that binds alone
[[nodiscard]] std::optional<SideOn> side_on(const Molecule& molecule,
                                            const std::vector<int>& metals, int atom);

}  // namespace irrepwise
