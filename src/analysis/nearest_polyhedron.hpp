// Which ideal polyhedron a few directions are nearest to, and how it lies.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include <Eigen/Core>

namespace irrepwise {

/// A polyhedron laid over directions as well as it goes.
struct PolyhedronFit {
  std::string symbol;              // "OC-6"
  std::string name;                // "octahedron"
  std::string group;               // of the ideal shape: "Oh"
  double deviation_degrees = 0.0;  // root mean square angle between directions and vertices
  Eigen::Matrix3d turn;            // proper: direction ≈ turn · vertex
  std::vector<int> vertices;       // per direction, the number of its vertex, from 1
};

/// Best fit of one polyhedron: the turn and the pairing with the least sum of squared distances
/// between unit vectors, found from every pairing of two directions with two vertices.
///
/// @param directions  unit vectors, as many as the polyhedron has vertices
/// @param symbol      IUPAC's
/// @source  best turn for a pairing: Kabsch, Acta Cryst. A 32, 922 (1976) (from memory)
[[nodiscard]] PolyhedronFit fit_polyhedron(const std::vector<Eigen::Vector3d>& directions,
                                           const std::string& symbol);

/// Of all polyhedra with that many vertices, the one of the smallest deviation; of those that
/// agree to 1e-6 degrees, the first in the order of `polyhedron_kinds`.
/// @returns  nothing for fewer than 2 or more than 9 directions
[[nodiscard]] std::optional<PolyhedronFit> nearest_polyhedron(
    const std::vector<Eigen::Vector3d>& directions);

/// The turn Q, proper, that brings Q b_i nearest to a_i (least squares), columns paired.
[[nodiscard]] Eigen::Matrix3d best_turn(const Eigen::Matrix3Xd& a, const Eigen::Matrix3Xd& b);

}  // namespace irrepwise
