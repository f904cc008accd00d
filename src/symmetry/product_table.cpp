#include "symmetry/product_table.hpp"

#include <algorithm>
#include <cassert>

namespace irrepwise {
namespace {

// Components without rational relations, so that different operations have different keys.
double key_of(const Eigen::Matrix3d& m) {
  static const Eigen::Matrix3d weights =
      (Eigen::Matrix3d() << 1.0, 0.7320508, 0.4142136, 0.2360680, 1.6457513, 0.3166248, 0.6055513,
       0.1231056, 1.3588989)
          .finished();
  return m.cwiseProduct(weights).sum();
}

constexpr double same_matrix = 1e-6;

}  // namespace

OperationIndex::OperationIndex(const std::vector<Eigen::Matrix3d>& operations)
    : operations_(&operations) {
  for (std::size_t g = 0; g < operations.size(); ++g) {
    keys_.emplace_back(key_of(operations[g]), static_cast<int>(g));
  }
  std::sort(keys_.begin(), keys_.end());
}

int OperationIndex::find(const Eigen::Matrix3d& matrix) const {
  const double key = key_of(matrix);
  const double reach = 9.0 * 1.7 * same_matrix;
  for (auto at = std::lower_bound(keys_.begin(), keys_.end(), std::pair(key - reach, -1));
       at != keys_.end() && at->first <= key + reach; ++at) {
    if (((*operations_)[at->second] - matrix).cwiseAbs().maxCoeff() < same_matrix) {
      return at->second;
    }
  }
  return -1;
}

std::vector<int> product_table(const std::vector<Eigen::Matrix3d>& operations) {
  const OperationIndex index(operations);
  const std::size_t order = operations.size();
  std::vector<int> products(order * order);
  for (std::size_t g = 0; g < order; ++g) {
    for (std::size_t h = 0; h < order; ++h) {
      products[g * order + h] = index.find(operations[g] * operations[h]);
      assert(products[g * order + h] >= 0);
    }
  }
  return products;
}

}  // namespace irrepwise
