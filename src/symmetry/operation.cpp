#include "symmetry/operation.hpp"

#include <cmath>
#include <numbers>
#include <numeric>

#include <fmt/format.h>
#include <Eigen/Geometry>

namespace irrepwise {
namespace {

struct Turn {
  int k;
  int n;
};

// The fraction of a circle with the smallest denominator that is as near as rounding and small
// distortions allow.
Turn nearest_turn(double fraction, int max_order) {
  Turn best{0, 1};
  double best_error = 2.0;
  for (int n = 1; n <= max_order; ++n) {
    const double k = std::round(fraction * n);
    const double error = std::abs(fraction - k / n);
    if (error < best_error - 1e-7) {
      best = {static_cast<int>(k), n};
      best_error = error;
      if (error < 1e-7) break;
    }
  }
  return best;
}

Eigen::Vector3d upward(const Eigen::Vector3d& axis) {
  for (int i : {2, 1, 0}) {
    if (std::abs(axis[i]) > 1e-6) return axis[i] > 0 ? axis : Eigen::Vector3d(-axis);
  }
  return axis;
}

// Axis of a proper rotation. Near half a turn the skew part vanishes and the symmetric part,
// which is then 2 u u^T - 1, gives the axis.
Eigen::Vector3d rotation_axis(const Eigen::Matrix3d& rotation) {
  const Eigen::Vector3d skew(rotation(2, 1) - rotation(1, 2), rotation(0, 2) - rotation(2, 0),
                             rotation(1, 0) - rotation(0, 1));
  if (skew.norm() > 1e-3) return skew.normalized();
  const Eigen::Matrix3d outer =
      0.5 * (rotation + rotation.transpose()) + Eigen::Matrix3d::Identity();
  Eigen::Index column = 0;
  outer.colwise().norm().maxCoeff(&column);
  return upward(outer.col(column).normalized());
}

}  // namespace

int determinant_sign(const Eigen::Matrix3d& matrix) { return matrix.determinant() > 0 ? 1 : -1; }

Eigen::Matrix3d rotation_about(const Eigen::Vector3d& axis, double angle) {
  return Eigen::AngleAxisd(angle, axis).toRotationMatrix();
}

Eigen::Vector3d operation_axis(const Eigen::Matrix3d& matrix) {
  const Eigen::Matrix3d proper = determinant_sign(matrix) * matrix;
  if (proper.trace() > 2.999) return Eigen::Vector3d::Zero();
  return rotation_axis(proper);
}

SymmetryOperation classify_operation(const Eigen::Matrix3d& matrix, int max_order) {
  const bool proper = determinant_sign(matrix) > 0;
  // An improper operation is a mirror times a turn about its normal: angle of the turn from the
  // trace, 2 cos(angle) - 1, and axis from minus the matrix, which turns by angle + pi.
  const double cosine = 0.5 * (matrix.trace() + (proper ? -1.0 : 1.0));
  const Eigen::Vector3d skew(matrix(2, 1) - matrix(1, 2), matrix(0, 2) - matrix(2, 0),
                             matrix(1, 0) - matrix(0, 1));
  const double angle = std::atan2(0.5 * skew.norm(), cosine);
  const Turn turn = nearest_turn(angle / (2.0 * std::numbers::pi), max_order);

  SymmetryOperation operation;
  operation.n = turn.n;
  operation.k = turn.n == 1 ? 1 : turn.k;
  if (proper) {
    operation.kind = turn.n == 1 ? OperationKind::Identity : OperationKind::Rotation;
    if (turn.n > 1) operation.axis = rotation_axis(matrix);
    return operation;
  }
  if (turn.n == 1) {
    operation.kind = OperationKind::Reflection;
    operation.axis = upward(rotation_axis(-matrix));
  } else if (turn.n == 2) {
    operation.kind = OperationKind::Inversion;
  } else {
    operation.kind = OperationKind::Rotoreflection;
    operation.axis = skew.normalized();
    if (turn.n % 2 == 1) {
      // S_n^k with n odd: k and k + n turn alike, the odd one of the two reflects.
      if (turn.k % 2 == 0) operation.k = turn.k + turn.n;
    }
  }
  return operation;
}

std::string operation_symbol(const SymmetryOperation& operation) {
  const auto powered = [&](char letter) {
    return operation.k == 1 ? fmt::format("{}{}", letter, operation.n)
                            : fmt::format("{}{}^{}", letter, operation.n, operation.k);
  };
  switch (operation.kind) {
    case OperationKind::Identity:
      return "E";
    case OperationKind::Inversion:
      return "i";
    case OperationKind::Reflection:
      return "sigma";
    case OperationKind::Rotation:
      return powered('C');
    case OperationKind::Rotoreflection:
      return powered('S');
  }
  return {};
}

}  // namespace irrepwise
