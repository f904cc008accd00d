// What an orthogonal matrix does: identity, rotation, reflection, inversion or rotoreflection.
#pragma once

#include <string>

#include <Eigen/Core>

namespace irrepwise {

enum class OperationKind { Identity, Rotation, Inversion, Reflection, Rotoreflection };

/// C_n^k is a turn by k/n of a full circle about `axis`; S_n^k the same followed by reflection in
/// the plane across it. 1 <= k < n without common factor; `axis` is the mirror's normal for a
/// reflection, and zero for identity and inversion.
struct SymmetryOperation {
  OperationKind kind = OperationKind::Identity;
  int n = 1;
  int k = 1;
  Eigen::Vector3d axis = Eigen::Vector3d::Zero();
};

/// The axis is chosen so that the turn is counter-clockwise by at most half a circle; for half a
/// circle and for mirrors, so that its first non-zero component from z to x is positive.
///
/// @param matrix  orthogonal; its angle is matched to the nearest k/n with n <= max_order
[[nodiscard]] SymmetryOperation classify_operation(const Eigen::Matrix3d& matrix,
                                                   int max_order = 480);

/// @returns  "C4", "C5^2", "S6", "i", "E", "σ" as "sigma"
[[nodiscard]] std::string operation_symbol(const SymmetryOperation& operation);

/// @returns  the right-handed turn by `angle` (radians) about a unit vector
[[nodiscard]] Eigen::Matrix3d rotation_about(const Eigen::Vector3d& axis, double angle);

/// @returns  unit axis of a proper operation or of minus an improper one (the normal of a mirror);
///           zero for identity and inversion. Signs as in `classify_operation`.
[[nodiscard]] Eigen::Vector3d operation_axis(const Eigen::Matrix3d& matrix);

/// @returns  +1 for a proper operation, -1 for an improper one
[[nodiscard]] int determinant_sign(const Eigen::Matrix3d& matrix);

}  // namespace irrepwise
