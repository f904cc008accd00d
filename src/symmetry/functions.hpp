// Which functions of x, y, z belong to which irrep.
#pragma once

#include <string>
#include <vector>

#include "symmetry/point_group.hpp"

namespace irrepwise {

enum class FunctionKind { Linear, Rotation, Quadratic, Cubic };

/// Partners that one irrep transforms among themselves.
struct FunctionSet {
  FunctionKind kind = FunctionKind::Linear;
  std::vector<std::string> functions;  // "x", "Rz", "x2-y2", "z(x2-y2)": ASCII, powers as digits

  friend bool operator==(const FunctionSet&, const FunctionSet&) = default;
};

/// x, y, z, Rx, Ry, Rz, all six quadratic and all ten cubic functions, by irrep: the sets are those
/// that handbooks print, and each is assigned by how the operations transform it. Among
/// alternatives the simplest comes first, "x2, y2, z2" before "x2-y2". Kh: the rotations belong to
/// Pg, which is none of the irreps listed, and are left out.
///
/// @returns  [irrep of the group], sets in the order of FunctionKind
[[nodiscard]] std::vector<std::vector<FunctionSet>> assign_functions(const PointGroup& group);

/// @returns  "(x, y)", "x2-y2"; ASCII
[[nodiscard]] std::string function_text(const FunctionSet& set);

}  // namespace irrepwise
