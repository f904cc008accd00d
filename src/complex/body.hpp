// A ligand as one rigid body seen from its metal, and the pose that puts it into the complex.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "complex/spec.hpp"

namespace irrepwise {

/// The metal is at the origin and the ligand along +z: the donor, the centroid of donors side by
/// side, or the middle of the angle between two teeth. x is the ligand's own x made perpendicular
/// to z; of two donors side by side, and of a chelate, it points from the second to the first.
struct LigandBody {
  std::vector<Atom> atoms;                 // in the order of the library
  std::vector<Eigen::Vector3d> teeth;      // donors or centroids, one for each tooth
  std::vector<double> distances_angstrom;  // from the metal to the donors, one for each tooth
  double bite_degrees = 0.0;               // of a chelate
  bool turns = false;                      // whether a twist about z changes anything
  bool has_hand = false;  // whether its mirror image in xz differs by more than a turn
};

/// Distances to the metal: as requested, or the sum of covalent radii less the ligand's shortening;
/// with a bite, what the bite makes them.
/// @throws Error  a distance that the ring of donors or the bite does not allow, an angle for a
///                ligand that has none, an element without a radius
[[nodiscard]] LigandBody make_body(const SeatedLigand& ligand, int metal);

/// Between two metals: the metals lie symmetrically below the donor, in the yz plane; here the
/// donor is at the origin and the ligand along +z, bent towards +x.
/// @throws Error  for a ligand that the library gives no electrons for between two metals, or that
///                has an angle there and not one atom behind the donor
[[nodiscard]] std::vector<Atom> make_bridge_body(const Ligand& ligand);

/// How a body stands: right-handed unit axes in columns, then the centre added.
struct Pose {
  Eigen::Matrix3d axes = Eigen::Matrix3d::Identity();
  bool mirrored = false;  // y of the body is reversed first
};

/// @param centre  position of the metal, Å
[[nodiscard]] std::vector<Eigen::Vector3d> posed(const std::vector<Atom>& atoms, const Pose& pose,
                                                 const Eigen::Vector3d& centre);

/// Where the twist of a ligand along a unit direction is counted from: the part of the polyhedron's
/// z axis perpendicular to it; for a ligand on that axis, the part of x.
[[nodiscard]] Eigen::Vector3d reference_direction(const Eigen::Vector3d& along);

/// @returns  z along the unit direction, x at the twist (radians, right-handed about z) from the
///           reference direction
[[nodiscard]] Eigen::Matrix3d axes_along(const Eigen::Vector3d& along, double twist);

/// @returns  sum of covalent radii less the ligand's shortening, Å
/// @throws Error  an element without a covalent radius
[[nodiscard]] double usual_distance_angstrom(const Ligand& ligand, int donor_atom, int metal);

/// @returns  the order of the highest proper axis along z that the body has, up to 8; 0 where every
///           atom lies on z
[[nodiscard]] int axial_order(const LigandBody& body);

/// @returns  whether both sets hold the same elements at the same places, within 1e-4 Å beyond the
///           rounding of the library's coordinates
[[nodiscard]] bool same_atoms(const std::vector<Atom>& atoms, const std::vector<Eigen::Vector3d>& a,
                              const std::vector<Eigen::Vector3d>& b);

}  // namespace irrepwise
