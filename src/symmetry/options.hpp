// What a user may say about symmetry: tolerance, axes, the group to work in.
#pragma once

#include <optional>
#include <string>
#include <variant>
#include <vector>

#include <Eigen/Core>

namespace irrepwise {

/// A direction in the input frame: a vector, or given by atoms (indices from 0): from the origin to
/// one atom, from the first to the second of two, or the normal of the plane of three.
using AxisDirection = std::variant<Eigen::Vector3d, std::vector<int>>;

struct SymmetryOptions {
  double tolerance_angstrom = 0.01;  // points closer than this count as images of each other
  std::optional<AxisDirection> z;    // must lie along a possible principal axis of the group
  std::optional<AxisDirection> x;
  // Schoenflies symbol of a group to make the structure exact in, though it holds only at a larger
  // tolerance, up to the limit.
  std::optional<std::string> group;
  double limit_angstrom = 0.5;
  std::optional<std::string> subgroup;  // to work in: symbol, or one way to it, "C2v(C2')"
  // Per atom: atoms of different kinds are never images of each other, though of one element (they
  // have other parameters, say). Empty: the element alone decides.
  std::vector<int> kinds;
};

}  // namespace irrepwise
