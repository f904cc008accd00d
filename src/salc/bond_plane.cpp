#include "salc/bond_plane.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <numbers>

#include <Eigen/Geometry>

#include "molecule/bonded_atoms.hpp"

namespace irrepwise {
namespace {

constexpr double radians_per_degree = std::numbers::pi / 180.0;

}  // namespace

bool is_straight(const Eigen::Vector3d& a, const Eigen::Vector3d& b) {
  return a.normalized().cross(b.normalized()).norm() <
         std::sin(straight_within_degrees * radians_per_degree);
}

std::optional<Eigen::Vector3d> common_normal(const std::vector<Eigen::Vector3d>& directions) {
  // Of all pairs the one nearest to a right angle spans the plane best. Products over all pairs,
  // turned to its side, weigh them alike, so that equivalent bonds have equal parts in it.
  Eigen::Vector3d best = Eigen::Vector3d::Zero();
  std::vector<Eigen::Vector3d> products;
  for (std::size_t i = 0; i < directions.size(); ++i) {
    for (std::size_t j = 0; j < i; ++j) {
      if (is_straight(directions[i], directions[j])) continue;
      products.emplace_back(directions[i].cross(directions[j]));
      if (products.back().norm() > best.norm()) best = products.back();
    }
  }
  if (products.empty()) return std::nullopt;
  Eigen::Vector3d normal = Eigen::Vector3d::Zero();
  for (const Eigen::Vector3d& product : products) {
    normal += product.dot(best) < 0.0 ? Eigen::Vector3d(-product) : product;
  }
  return normal.normalized();
}

std::optional<Eigen::Vector3d> bond_plane_normal(const Molecule& molecule, int atom) {
  std::vector<Eigen::Vector3d> bonds;
  for (const int other : bonded_atoms(molecule, atom)) {
    bonds.emplace_back(
        (molecule.atoms()[other].position - molecule.atoms()[atom].position).normalized());
  }
  const std::optional<Eigen::Vector3d> normal = common_normal(bonds);
  if (!normal) return std::nullopt;
  const double highest = std::sin(flat_within_degrees * radians_per_degree);
  const bool flat = std::all_of(bonds.begin(), bonds.end(), [&](const Eigen::Vector3d& bond) {
    return std::abs(bond.dot(*normal)) < highest;
  });
  return flat ? normal : std::nullopt;
}

}  // namespace irrepwise
