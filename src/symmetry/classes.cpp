#include "symmetry/classes.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <tuple>

#include <fmt/format.h>

#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

bool is_cubic(Family family) {
  return family == Family::T || family == Family::Td || family == Family::Th ||
         family == Family::O || family == Family::Oh || family == Family::I || family == Family::Ih;
}

bool along_z(const Eigen::Vector3d& axis) { return std::abs(axis[2]) > 0.99; }

// In axial groups C2' and σv belong to the lines through x, C2'' and σd to those between. In Dnd
// the mirrors lie between the axes and are σd.
std::string axial_mark(const SymmetryOperation& op, const Schoenflies& symbol) {
  if (op.kind == OperationKind::Reflection && symbol.family == Family::Cs) return "h";
  if (op.kind == OperationKind::Rotation && op.n == 2 && !along_z(op.axis)) {
    if (symbol.n == 2 && symbol.family != Family::Dnd)
      return std::abs(op.axis[0]) > 0.99 ? "(x)" : "(y)";
    const double steps = std::atan2(op.axis[1], op.axis[0]) / (M_PI / (2.0 * symbol.n));
    const bool between = symbol.family != Family::Dnd && symbol.n % 2 == 0 &&
                         std::lround(steps) % 4 != 0 && std::lround(steps) % 2 == 0;
    return between ? "''" : "'";
  }
  if (op.kind == OperationKind::Rotation && op.n == 2 && symbol.n == 2 &&
      (symbol.family == Family::Dn || symbol.family == Family::Dnh)) {
    return "(z)";
  }
  if (op.kind != OperationKind::Reflection) return "";
  if (along_z(op.axis)) {
    return symbol.n == 2 && symbol.family == Family::Dnh ? "(xy)" : "h";
  }
  if (symbol.family == Family::Dnd) return "d";
  if (symbol.n == 2) return std::abs(op.axis[1]) > 0.99 ? "(xz)" : "(yz)";
  // The mirror's line in the xy plane is a quarter turn from its normal.
  const double steps = (std::atan2(op.axis[1], op.axis[0]) + M_PI / 2) / (M_PI / (2.0 * symbol.n));
  const bool between = symbol.n % 2 == 0 && std::lround(steps) % 4 != 0;
  return between ? "d" : "v";
}

std::string cubic_mark(const SymmetryOperation& op, Family family) {
  const bool along_axis = op.axis.cwiseAbs().maxCoeff() > 0.99;
  if (op.kind == OperationKind::Rotation && op.n == 2) {
    return (family == Family::O || family == Family::Oh) && !along_axis ? "'" : "";
  }
  if (op.kind != OperationKind::Reflection) return "";
  if (family == Family::Td) return "d";
  if (family == Family::Ih) return "";
  return along_axis ? "h" : "d";
}

std::tuple<int, int, int, std::string> sort_key(const SymmetryOperation& op,
                                                const std::string& mark) {
  static constexpr int order_of_kind[] = {0, 1, 2, 4, 3};  // as OperationKind: mirrors last
  const int kind = order_of_kind[static_cast<int>(op.kind)];
  const bool mirror = op.kind == OperationKind::Reflection;
  // Mirrors in the order h, v, d; other marks (primes, axes in brackets) sort as they are.
  return {kind, mirror ? 0 : -op.n, op.k, mirror && mark == "d" ? "w" : mark};
}

std::vector<ConjugacyClass> linear_classes(const std::vector<Eigen::Matrix3d>& operations,
                                           bool inversion) {
  // Which class of the continuous group each node belongs to, in the order of the tables.
  const std::vector<std::string> symbols =
      inversion ? std::vector<std::string>{"E", "2Cphi", "i", "2Sphi", "∞C2", "∞sigmav", "sigmah"}
                : std::vector<std::string>{"E", "2Cphi", "∞sigmav"};
  std::vector<ConjugacyClass> classes;
  for (const std::string& symbol : symbols) classes.push_back({symbol, {}});
  const auto put = [&](std::string_view symbol, int g) {
    for (ConjugacyClass& c : classes) {
      if (c.symbol == symbol) c.operations.push_back(g);
    }
  };
  for (int g = 0; g < static_cast<int>(operations.size()); ++g) {
    const SymmetryOperation op = classify_operation(operations[g]);
    switch (op.kind) {
      case OperationKind::Identity:
        put("E", g);
        break;
      case OperationKind::Inversion:
        put("i", g);
        break;
      case OperationKind::Rotoreflection:
        put("2Sphi", g);
        break;
      case OperationKind::Rotation:
        put(along_z(op.axis) ? "2Cphi" : "∞C2", g);
        break;
      case OperationKind::Reflection:
        put(along_z(op.axis) ? "sigmah" : "∞sigmav", g);
        break;
    }
  }
  return classes;
}

}  // namespace

std::vector<ConjugacyClass> find_classes(const Schoenflies& symbol,
                                         const std::vector<Eigen::Matrix3d>& operations,
                                         const std::vector<int>& products,
                                         const std::vector<int>& inverses) {
  if (symbol.family == Family::Cinfv) return linear_classes(operations, false);
  if (symbol.family == Family::Dinfh) return linear_classes(operations, true);

  const int order = static_cast<int>(operations.size());
  struct Marked {
    std::tuple<int, int, int, std::string> key;
    ConjugacyClass members;
  };
  std::vector<Marked> found;
  std::vector<bool> seen(operations.size(), false);
  for (int g = 0; g < order; ++g) {
    if (seen[g]) continue;
    Marked marked;
    for (int h = 0; h < order; ++h) {
      const int image = products[products[h * order + g] * order + inverses[h]];
      if (!seen[image]) {
        seen[image] = true;
        marked.members.operations.push_back(image);
      }
    }
    std::sort(marked.members.operations.begin(), marked.members.operations.end());
    // The member that turns least names the class (C5 rather than C5^4).
    SymmetryOperation name_giver = classify_operation(operations[g]);
    for (int member : marked.members.operations) {
      const SymmetryOperation op = classify_operation(operations[member]);
      if (op.k < name_giver.k) name_giver = op;
    }
    // Where turns to the left and to the right are not conjugate, the one about -z has k counted
    // from the other side: C3^2 rather than C3 about -z.
    if (!is_cubic(symbol.family) && name_giver.axis[2] < -0.99 &&
        (name_giver.kind == OperationKind::Rotation ||
         name_giver.kind == OperationKind::Rotoreflection) &&
        marked.members.operations.size() == 1) {
      const bool even_period = name_giver.kind == OperationKind::Rotation || name_giver.n % 2 == 0;
      name_giver.k = (even_period ? 1 : 2) * name_giver.n - name_giver.k;
    }
    if (symbol.family == Family::T || symbol.family == Family::Th) {
      // C3 and C3^2 are different classes: tell them by the turn about (1, 1, 1).
      if (name_giver.n % 3 == 0 && name_giver.axis.prod() < 0)
        name_giver.k = name_giver.n - name_giver.k;
    }
    // S5^7 turns as S5^3 does the other way round; where both are in the class, handbooks write the
    // smaller power.
    if (name_giver.kind == OperationKind::Rotoreflection && name_giver.n % 2 == 1 &&
        name_giver.k % 2 == 0 && marked.members.operations.size() == 2) {
      name_giver.k = name_giver.n - name_giver.k;
    }
    const std::string mark = is_cubic(symbol.family) ? cubic_mark(name_giver, symbol.family)
                                                     : axial_mark(name_giver, symbol);
    const std::size_t size = marked.members.operations.size();
    marked.key = sort_key(name_giver, mark);
    marked.members.symbol =
        (size > 1 ? fmt::format("{}", size) : "") + operation_symbol(name_giver) + mark;
    found.push_back(std::move(marked));
  }
  std::stable_sort(found.begin(), found.end(),
                   [](const Marked& a, const Marked& b) { return a.key < b.key; });
  std::vector<ConjugacyClass> classes;
  for (Marked& marked : found) classes.push_back(std::move(marked.members));
  return classes;
}

}  // namespace irrepwise
