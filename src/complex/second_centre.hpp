// Where the second metal of a bridged complex is, and how its polyhedron is turned.
#pragma once

#include <vector>

#include <Eigen/Core>

namespace irrepwise {

/// p = position + turn * v for a vertex v of its polyhedron; `turn` is improper.
struct SecondCentre {
  Eigen::Vector3d position;
  Eigen::Matrix3d turn;
};

/// One bridge: at the bridging atom the metals make the angle, and the second centre is turned by
/// the torsion about its bond to that atom.
/// @param donor       bridging atom, Å, the first metal at the origin
/// @param vertex      unit vector of the second polyhedron that points at the donor
/// @param distance    donor to second metal, Å
/// @param angle       radians
/// @param torsion     radians
[[nodiscard]] SecondCentre beyond_one_bridge(const Eigen::Vector3d& donor,
                                             const Eigen::Vector3d& vertex, double distance,
                                             double angle, double torsion);

/// Two or three bridges: all distances are kept; the angles at the second metal give way.
/// @throws Error  where no point has these distances, or more than three bridges
[[nodiscard]] SecondCentre beyond_bridges(const std::vector<Eigen::Vector3d>& donors,
                                          const std::vector<Eigen::Vector3d>& vertices,
                                          const std::vector<double>& distances);

}  // namespace irrepwise
