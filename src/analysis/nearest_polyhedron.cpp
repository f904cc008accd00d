#include "analysis/nearest_polyhedron.hpp"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <limits>
#include <numbers>

#include <Eigen/Geometry>
#include <Eigen/SVD>

#include "molecule/polyhedra.hpp"

namespace irrepwise {
namespace {

constexpr double tie_degrees = 1e-6;

Eigen::Matrix3Xd as_columns(const std::vector<Eigen::Vector3d>& directions) {
  Eigen::Matrix3Xd columns(3, static_cast<Eigen::Index>(directions.size()));
  for (std::size_t i = 0; i < directions.size(); ++i) {
    columns.col(static_cast<Eigen::Index>(i)) = directions[i];
  }
  return columns;
}

// Frame with its first axis along a and the second in the plane of a and b.
Eigen::Matrix3d pair_frame(const Eigen::Vector3d& a, const Eigen::Vector3d& b) {
  Eigen::Matrix3d frame;
  frame.col(0) = a;
  Eigen::Vector3d across = a.cross(b);
  if (across.norm() < 1e-6) across = a.unitOrthogonal();
  frame.col(2) = across.normalized();
  frame.col(1) = frame.col(2).cross(a);
  return frame;
}

// Pairs the nearest first; every direction gets one vertex.
std::vector<int> paired(const Eigen::Matrix3Xd& directions, const Eigen::Matrix3Xd& vertices,
                        const Eigen::Matrix3d& turn) {
  Eigen::MatrixXd nearness = directions.transpose() * turn * vertices;
  std::vector<int> partner(static_cast<std::size_t>(directions.cols()), -1);
  constexpr double taken = -2.0;
  for (Eigen::Index step = 0; step < directions.cols(); ++step) {
    Eigen::Index i = 0, j = 0;
    nearness.maxCoeff(&i, &j);
    partner[static_cast<std::size_t>(i)] = static_cast<int>(j);
    nearness.row(i).setConstant(taken);
    nearness.col(j).setConstant(taken);
  }
  return partner;
}

Eigen::Matrix3Xd picked(const Eigen::Matrix3Xd& vertices, const std::vector<int>& partner) {
  Eigen::Matrix3Xd columns(3, vertices.cols());
  for (std::size_t i = 0; i < partner.size(); ++i) {
    columns.col(static_cast<Eigen::Index>(i)) = vertices.col(partner[i]);
  }
  return columns;
}

struct Fit {
  double squared = std::numeric_limits<double>::infinity();
  Eigen::Matrix3d turn = Eigen::Matrix3d::Identity();
  std::vector<int> partner;
};

// From a first turn, pairing and turning alternate until the pairing stays.
Fit refined(const Eigen::Matrix3Xd& directions, const Eigen::Matrix3Xd& vertices,
            const Eigen::Matrix3d& start) {
  constexpr int most_rounds = 10;
  Fit fit;
  fit.partner = paired(directions, vertices, start);
  for (int round = 0; round < most_rounds; ++round) {
    fit.turn = best_turn(directions, picked(vertices, fit.partner));
    std::vector<int> next = paired(directions, vertices, fit.turn);
    if (next == fit.partner) break;
    fit.partner = std::move(next);
  }
  fit.squared = (directions - fit.turn * picked(vertices, fit.partner)).squaredNorm();
  return fit;
}

// How near to being at right angles two directions are: such a pair fixes a frame best.
double slant(const Eigen::Vector3d& a, const Eigen::Vector3d& b) { return std::abs(a.dot(b)); }

}  // namespace

Eigen::Matrix3d best_turn(const Eigen::Matrix3Xd& a, const Eigen::Matrix3Xd& b) {
  const Eigen::Matrix3d product = a * b.transpose();
  const Eigen::JacobiSVD<Eigen::Matrix3d> svd(product, Eigen::ComputeFullU | Eigen::ComputeFullV);
  Eigen::Vector3d signs = Eigen::Vector3d::Ones();
  if ((svd.matrixU() * svd.matrixV().transpose()).determinant() < 0.0) signs[2] = -1.0;
  return svd.matrixU() * signs.asDiagonal() * svd.matrixV().transpose();
}

PolyhedronFit fit_polyhedron(const std::vector<Eigen::Vector3d>& directions,
                             const std::string& symbol) {
  const Polyhedron polyhedron(symbol);
  const int n = polyhedron.size();
  assert(static_cast<int>(directions.size()) == n && n >= 2);
  Eigen::Matrix3Xd vertices(3, n);
  for (int i = 0; i < n; ++i) vertices.col(i) = polyhedron.vertex(i + 1);
  const Eigen::Matrix3Xd columns = as_columns(directions);
  int first = 0, second = 1;
  for (int i = 0; i < n; ++i) {
    for (int j = i + 1; j < n; ++j) {
      if (slant(columns.col(i), columns.col(j)) <
          slant(columns.col(first), columns.col(second)) - 1e-6) {
        first = i;
        second = j;
      }
    }
  }
  Fit best;
  const Eigen::Matrix3d ours = pair_frame(columns.col(first), columns.col(second));
  for (int i = 0; i < n; ++i) {
    for (int j = 0; j < n; ++j) {
      if (i == j) continue;
      const Eigen::Matrix3d theirs = pair_frame(vertices.col(i), vertices.col(j));
      Fit fit = refined(columns, vertices, ours * theirs.transpose());
      if (fit.squared < best.squared - 1e-12) best = std::move(fit);
    }
  }
  PolyhedronFit result;
  result.symbol = polyhedron.kind().symbol;
  result.name = polyhedron.kind().name;
  result.group = polyhedron.kind().group;
  result.turn = best.turn;
  for (const int vertex : best.partner) result.vertices.push_back(vertex + 1);
  double sum = 0.0;
  const Eigen::Matrix3Xd ideal = best.turn * picked(vertices, best.partner);
  for (int i = 0; i < n; ++i) {
    // Twice the arc sine of half the chord keeps its digits for small angles.
    const double angle =
        2.0 * std::asin(std::min(1.0, 0.5 * (columns.col(i) - ideal.col(i)).norm()));
    sum += angle * angle;
  }
  result.deviation_degrees = std::sqrt(sum / n) * 180.0 / std::numbers::pi;
  return result;
}

std::optional<PolyhedronFit> nearest_polyhedron(const std::vector<Eigen::Vector3d>& directions) {
  std::optional<PolyhedronFit> best;
  for (const PolyhedronKind& kind : polyhedron_kinds()) {
    if (Polyhedron(kind.symbol).size() != static_cast<int>(directions.size())) continue;
    PolyhedronFit fit = fit_polyhedron(directions, std::string(kind.symbol));
    if (!best || fit.deviation_degrees < best->deviation_degrees - tie_degrees) {
      best = std::move(fit);
    }
  }
  return best;
}

}  // namespace irrepwise
