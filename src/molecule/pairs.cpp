#include "molecule/pairs.hpp"

#include <algorithm>
#include <cstddef>
#include <numeric>
#include <tuple>

namespace irrepwise {

std::vector<NearPair> near_pairs(const std::vector<Atom>& atoms, double cutoff_angstrom) {
  // Sorted along the longest extent, only a short stretch after each atom can hold partners.
  Eigen::Vector3d low = atoms.front().position;
  Eigen::Vector3d high = low;
  for (const Atom& atom : atoms) {
    low = low.cwiseMin(atom.position);
    high = high.cwiseMax(atom.position);
  }
  Eigen::Index axis = 0;
  (high - low).maxCoeff(&axis);
  std::vector<int> order(atoms.size());
  std::iota(order.begin(), order.end(), 0);
  const auto along = [&](int atom) { return atoms[static_cast<std::size_t>(atom)].position[axis]; };
  std::sort(order.begin(), order.end(), [&](int a, int b) { return along(a) < along(b); });

  std::vector<NearPair> pairs;
  for (std::size_t i = 0; i < order.size(); ++i) {
    for (std::size_t j = i + 1; j < order.size(); ++j) {
      if (along(order[j]) - along(order[i]) > cutoff_angstrom) break;
      const auto [a, b] = std::minmax(order[i], order[j]);
      const double distance = (atoms[static_cast<std::size_t>(a)].position -
                               atoms[static_cast<std::size_t>(b)].position)
                                  .norm();
      if (distance <= cutoff_angstrom) pairs.push_back({a, b, distance});
    }
  }
  std::sort(pairs.begin(), pairs.end(), [](const NearPair& p, const NearPair& q) {
    return std::tie(p.a, p.b) < std::tie(q.a, q.b);
  });
  return pairs;
}

}  // namespace irrepwise
