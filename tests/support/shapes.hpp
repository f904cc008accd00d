// Building blocks for test molecules: generators of the point groups, orbits of points, and bonds
// by length and angle. Knows nothing of the library's symmetry code, which it serves to test.
#pragma once

#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include <Eigen/Core>

#include "molecule/molecule.hpp"

namespace shapes {

using Generators = std::vector<Eigen::Matrix3d>;

[[nodiscard]] Eigen::Matrix3d turn(const Eigen::Vector3d& axis, double degrees);
[[nodiscard]] Eigen::Matrix3d mirror(const Eigen::Vector3d& normal);

/// Matrices that generate a finite point group: principal axis z; C2' along x in Dn and Dnh, and
/// the xz plane a mirror in Cnv, Dnh and Dnd; cubic and icosahedral groups with C2 (T, I) or C4 (O)
/// axes along x, y, z, a C3 along (1, 1, 1) and, in I, a C5 along (0, 1, golden ratio).
/// @param symbol  "C1", "Cs", "Ci", "C3v", "D6h", "D4d", "S8", "T", "Td", "Th", "O", "Oh", "I",
/// "Ih"
[[nodiscard]] Generators generators(std::string_view symbol);

/// @returns  the different images of a point under the group generated, the point itself first
[[nodiscard]] std::vector<Eigen::Vector3d> orbit(const Generators& generators,
                                                 const Eigen::Vector3d& point);

/// @returns  the point at this distance from the z axis, azimuth and height
[[nodiscard]] Eigen::Vector3d ring(double radius, double degrees, double height);

/// @returns  distance of the corners of a regular polygon from its centre
[[nodiscard]] double polygon_radius(int corners, double side);

/// The end of a bond that makes an angle with another, as in a cone about it.
/// @param apex     where the bond starts
/// @param axis     direction of the other bond, away from the apex
/// @param degrees  between the bond and `axis`
/// @param side     the end lies towards this direction, or at `azimuth_degrees` about `axis` from
/// it
[[nodiscard]] Eigen::Vector3d bond_end(const Eigen::Vector3d& apex, const Eigen::Vector3d& axis,
                                       double length, double degrees, const Eigen::Vector3d& side,
                                       double azimuth_degrees = 0.0);

/// @returns  the two ends of equal bonds that complete a centre with two neighbours to a
/// tetrahedron
[[nodiscard]] std::pair<Eigen::Vector3d, Eigen::Vector3d> two_bond_ends(
    const Eigen::Vector3d& centre, const Eigen::Vector3d& neighbour_a,
    const Eigen::Vector3d& neighbour_b, double length, double degrees);

/// An element and where one atom of it stands, Å.
struct Seed {
  std::string_view element;
  Eigen::Vector3d position;
};

/// @returns  the molecule made of the orbits of the seeds
[[nodiscard]] irrepwise::Molecule from_orbits(const Generators& generators,
                                              const std::vector<Seed>& seeds, int charge,
                                              const std::string& title);

}  // namespace shapes
