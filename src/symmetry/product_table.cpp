#include "symmetry/product_table.hpp"

#include <algorithm>
#include <cassert>

namespace irrepwise {
namespace {

// Components without rational relations, so that different operations have different keys.
double key_of(const Eigen::Matrix3d& m) {
  static const Eigen::Matrix3d weights = (Eigen::Matrix3d() << 1.0, 0.7320508, 0.4142136, 0.2360680,
                                          1.6457513, 0.3166248, 0.6055513, 0.1231056, 1.3588989)
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
  // Matrices are multiplied for a few generators only: the row of s g is that of g, each product
  // multiplied by s from the left.
  const OperationIndex index(operations);
  const std::size_t order = operations.size();
  std::vector<int> products(order * order, -1);
  std::vector<std::size_t> reached = {0};
  for (std::size_t h = 0; h < order; ++h) products[h] = static_cast<int>(h);
  std::vector<std::vector<int>> times;  // [generator][h]: index of the generator after h
  for (std::size_t candidate = 1; candidate < order; ++candidate) {
    if (products[candidate * order] >= 0) continue;
    times.emplace_back();
    for (std::size_t h = 0; h < order; ++h) {
      times.back().push_back(index.find(operations[candidate] * operations[h]));
      assert(times.back().back() >= 0);
    }
    for (std::size_t done = 0; done < reached.size(); ++done) {
      for (const std::vector<int>& left : times) {
        const auto image = static_cast<std::size_t>(left[reached[done]]);
        if (products[image * order] >= 0) continue;
        reached.push_back(image);
        for (std::size_t h = 0; h < order; ++h) {
          products[image * order + h] = left[products[reached[done] * order + h]];
        }
      }
    }
  }
  return products;
}

}  // namespace irrepwise
