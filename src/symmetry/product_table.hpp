// Finding which operation of a list a matrix is, and the products of all pairs.
#pragma once

#include <utility>
#include <vector>

#include <Eigen/Core>

namespace irrepwise {

/// Looks matrices up in a list of operations by one number each, a fixed generic linear form, in
/// logarithmic time.
class OperationIndex {
 public:
  explicit OperationIndex(const std::vector<Eigen::Matrix3d>& operations);

  /// @returns  index of the operation within 1e-6 of the matrix, or -1
  [[nodiscard]] int find(const Eigen::Matrix3d& matrix) const;

 private:
  const std::vector<Eigen::Matrix3d>* operations_;
  std::vector<std::pair<double, int>> keys_;  // ascending
};

/// @returns  [g * order + h]: index of g after h; the list must be closed
///           (asserted) and begin with the identity
[[nodiscard]] std::vector<int> product_table(const std::vector<Eigen::Matrix3d>& operations);

}  // namespace irrepwise
