#include "analysis/common_symmetry.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <numeric>
#include <optional>

#include "symmetry/descent.hpp"
#include "symmetry/identify.hpp"

namespace irrepwise {
namespace {

constexpr double same_element = 0.1;

// The operation of a finite group that a matrix is; the nearest one within the tolerance.
std::optional<int> find_operation(const std::vector<Eigen::Matrix3d>& operations,
                                  const Eigen::Matrix3d& matrix) {
  std::optional<int> found;
  double nearest = same_element;
  for (std::size_t g = 0; g < operations.size(); ++g) {
    const double distance = (operations[g] - matrix).cwiseAbs().maxCoeff();
    if (distance < nearest) {
      nearest = distance;
      found = static_cast<int>(g);
    }
  }
  return found;
}

bool holds(const PointGroup& group, const Eigen::Matrix3d& matrix) {
  switch (group.symbol().family) {
    case Family::Kh:
      return true;
    case Family::Cinfv:
      return std::abs(matrix(2, 2) - 1.0) < same_element;
    case Family::Dinfh:
      return std::abs(std::abs(matrix(2, 2)) - 1.0) < same_element;
    default:
      return find_operation(group.operations(), matrix).has_value();
  }
}

double character(const PointGroup& group, std::size_t irrep, const Eigen::Matrix3d& matrix) {
  if (!group.symbol().is_finite()) return continuous_character(group, irrep, matrix);
  const std::optional<int> operation = find_operation(group.operations(), matrix);
  return group.irreps()[irrep].characters[static_cast<std::size_t>(operation.value_or(0))];
}

// @param turn  from the frame of the common group to that of the whole one
std::vector<std::vector<int>> contents(const PointGroup& whole, const PointGroup& common,
                                       const Eigen::Matrix3d& turn) {
  std::vector<Eigen::Matrix3d> operations;
  for (const Eigen::Matrix3d& h : common.operations()) {
    operations.emplace_back(turn * h * turn.transpose());
  }
  std::vector<std::vector<int>> counts(whole.irreps().size(),
                                       std::vector<int>(common.irreps().size(), 0));
  for (std::size_t i = 0; i < counts.size(); ++i) {
    for (std::size_t j = 0; j < counts[i].size(); ++j) {
      const Irrep& irrep = common.irreps()[j];
      double sum = 0.0;
      for (std::size_t h = 0; h < operations.size(); ++h) {
        sum += character(whole, i, operations[h]) * irrep.characters[h];
      }
      counts[i][j] =
          static_cast<int>(std::lround(sum / common.order() / (irrep.complex_pair ? 2.0 : 1.0)));
    }
  }
  return counts;
}

struct Placed {
  PointGroup group;
  Eigen::Matrix3d from_first;  // turn from the frame of the first group to the common one's
};

Placed no_symmetry() { return {PointGroup({Family::C1, 1}), Eigen::Matrix3d::Identity()}; }

// The operations of `listed`, in the first group's frame, that the other has too.
Placed of_operations(const std::vector<Eigen::Matrix3d>& shared) {
  PartialTable table;
  table.size = static_cast<int>(shared.size());
  for (const Eigen::Matrix3d& g : shared) {
    for (const Eigen::Matrix3d& h : shared) {
      table.products.push_back(find_operation(shared, g * h).value_or(-1));
    }
  }
  if (!table.is_closed()) return no_symmetry();
  Subset all(shared.size());
  std::iota(all.begin(), all.end(), 0);
  const Schoenflies symbol = identify_group(table, shared, all);
  return {PointGroup(symbol), some_standard_frame(symbol, table, shared, all)};
}

bool is_linear(const PointGroup& group) {
  const Family family = group.symbol().family;
  return family == Family::Cinfv || family == Family::Dinfh;
}

Placed common_group(const PointGroup& first, const PointGroup& second,
                    const Eigen::Matrix3d& turn) {
  if (second.symbol().family == Family::Kh) return {first, Eigen::Matrix3d::Identity()};
  if (first.symbol().family == Family::Kh) return {second, turn.transpose()};
  if (is_linear(first) && is_linear(second)) {
    if (std::abs(std::abs(turn(2, 2)) - 1.0) > same_element) return no_symmetry();
    const bool reversible =
        first.symbol() == second.symbol() && first.symbol().family == Family::Dinfh;
    return {PointGroup({reversible ? Family::Dinfh : Family::Cinfv, 1}),
            Eigen::Matrix3d::Identity()};
  }
  std::vector<Eigen::Matrix3d> shared;
  if (first.symbol().is_finite()) {
    for (const Eigen::Matrix3d& g : first.operations()) {
      if (holds(second, turn.transpose() * g * turn)) shared.push_back(g);
    }
    if (static_cast<int>(shared.size()) == first.order()) {
      return {first, Eigen::Matrix3d::Identity()};
    }
  } else {
    for (const Eigen::Matrix3d& g : second.operations()) {
      const Eigen::Matrix3d turned = turn * g * turn.transpose();
      if (holds(first, turned)) shared.push_back(turned);
    }
  }
  if (second.symbol().is_finite() && static_cast<int>(shared.size()) == second.order()) {
    return {second, turn.transpose()};
  }
  return of_operations(shared);
}

}  // namespace

CommonSymmetry common_symmetry(const PointGroup& first, const PointGroup& second,
                               const Eigen::Matrix3d& turn) {
  Placed common = common_group(first, second, turn);
  const Eigen::Matrix3d to_first = common.from_first.transpose();
  std::vector<std::vector<int>> of_first = contents(first, common.group, to_first);
  std::vector<std::vector<int>> of_second =
      contents(second, common.group, turn.transpose() * to_first);
  return {std::move(common.group), std::move(of_first), std::move(of_second)};
}

}  // namespace irrepwise
