#include "complex/second_centre.hpp"

#include <cmath>
#include <cstddef>

#include <Eigen/Dense>

#include <fmt/format.h>

#include "complex/body.hpp"
#include "core/error.hpp"
#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

Error no_fit() {
  return Error(
      "the bridges lie too far apart for the second metal to reach them all; give longer "
      "distances, or vertices that lie nearer to each other");
}

// The point beyond the donors, seen from the origin, with the given distances to them: on the line
// or plane of the donors as the distances say, then outwards.
Eigen::Vector3d beyond(const std::vector<Eigen::Vector3d>& donors, const std::vector<double>& d) {
  const auto n = static_cast<Eigen::Index>(donors.size()) - 1;
  Eigen::MatrixX3d edges(n, 3);
  Eigen::VectorXd right(n);
  for (Eigen::Index i = 0; i < n; ++i) {
    const auto k = static_cast<std::size_t>(i) + 1;
    edges.row(i) = donors[k] - donors[0];
    right[i] = 0.5 * (d[0] * d[0] - d[k] * d[k] + edges.row(i).squaredNorm());
  }
  // Least norm: the part of the answer within the span of the edges, seen from the first donor.
  const Eigen::Vector3d inside = edges.completeOrthogonalDecomposition().solve(right);
  const double square = d[0] * d[0] - inside.squaredNorm();
  if (!(square > 0.01)) throw no_fit();
  Eigen::Vector3d middle = Eigen::Vector3d::Zero();
  for (const Eigen::Vector3d& donor : donors) middle += donor / static_cast<double>(donors.size());
  const Eigen::Vector3d across =
      middle - edges.completeOrthogonalDecomposition().solve(edges * middle);
  if (across.norm() < 0.1) {
    throw Error("the first metal lies between its bridges; give them neighbouring vertices");
  }
  return donors[0] + inside + std::sqrt(square) * across.normalized();
}

// The improper matrix that takes the vertices best to the directions of the donors.
Eigen::Matrix3d improper_fit(const std::vector<Eigen::Vector3d>& vertices,
                             const std::vector<Eigen::Vector3d>& directions) {
  Eigen::Matrix3d sum = Eigen::Matrix3d::Zero();
  for (std::size_t i = 0; i < vertices.size(); ++i) {
    sum += directions[i] * vertices[i].transpose();
  }
  const Eigen::JacobiSVD<Eigen::Matrix3d> svd(sum, Eigen::ComputeFullU | Eigen::ComputeFullV);
  Eigen::Matrix3d signs = Eigen::Matrix3d::Identity();
  // Kabsch, Acta Cryst. A 32, 922 (1976), with the other sign.
  if ((svd.matrixU() * svd.matrixV().transpose()).determinant() > 0.0) signs(2, 2) = -1.0;
  return svd.matrixU() * signs * svd.matrixV().transpose();
}

}  // namespace

SecondCentre beyond_one_bridge(const Eigen::Vector3d& donor, const Eigen::Vector3d& vertex,
                               double distance, double angle, double torsion) {
  const Eigen::Vector3d along = donor.normalized();
  const Eigen::Vector3d side = reference_direction(along);
  const double bend = std::acos(-1.0) - angle;
  const Eigen::Vector3d onwards = std::cos(bend) * along + std::sin(bend) * side;
  Eigen::Matrix3d target;
  target << std::cos(bend) * side - std::sin(bend) * along, along.cross(side), -onwards;
  const Eigen::Vector3d own_side = reference_direction(vertex);
  Eigen::Matrix3d own;
  own << own_side, vertex.cross(own_side), vertex;
  return {donor + distance * onwards, rotation_about(onwards, torsion) * target * own.transpose()};
}

SecondCentre beyond_bridges(const std::vector<Eigen::Vector3d>& donors,
                            const std::vector<Eigen::Vector3d>& vertices,
                            const std::vector<double>& distances) {
  if (donors.size() > 3) throw Error("found more than three bridges, expected one to three");
  const Eigen::Vector3d position = beyond(donors, distances);
  std::vector<Eigen::Vector3d> directions;
  for (const Eigen::Vector3d& donor : donors) {
    directions.push_back((donor - position).normalized());
  }
  constexpr double worst_misfit = 0.35;  // about 20°
  const Eigen::Matrix3d turn = improper_fit(vertices, directions);
  for (std::size_t i = 0; i < vertices.size(); ++i) {
    if ((turn * vertices[i] - directions[i]).norm() > worst_misfit) {
      throw Error(
          "the bridges do not fit the vertices of the second centre, whose polyhedron is the "
          "mirror image of the first; name its vertices in the order of a mirror image");
    }
  }
  return {position, turn};
}

}  // namespace irrepwise
