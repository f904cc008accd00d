// Clusters that no chemist has made, for the groups that few molecules have.
//
// Atoms of one or two elements stand at general positions of the group, in reach of one another, so
// that the overlap matrix is well conditioned. Chains of reasons why no higher symmetry is left: in
// Cn, Cnh and S2n the second ring is turned against the first by an angle that is no half step, so
// no vertical mirror or twofold axis is common to both; in Dn the upper ring is turned against the
// lower in the same way; the cubic and icosahedral orbits have no two coordinates alike.
#include <string>

#include <fmt/format.h>

#include "support/molecules_parts.hpp"
#include "support/shapes.hpp"

namespace {

using Eigen::Vector3d;
using shapes::polygon_radius, shapes::ring, shapes::Seed;

TestMolecule cluster(const std::string& group, int charge, const std::vector<Seed>& seeds) {
  return by_orbits("cluster " + group, group, charge, seeds);
}

TestMolecule cyclic(int n) {
  const double radius = polygon_radius(n, 1.6);
  const double step = 360.0 / n;
  return cluster(fmt::format("C{}", n), n % 2,
                 {{"C", ring(radius, 0, 0)}, {"H", ring(radius + 0.55, 0.15 * step, 0.9)}});
}

TestMolecule cyclic_with_mirror(int n) {
  const double radius = polygon_radius(n, 1.6);
  const double step = 360.0 / n;
  return cluster(fmt::format("C{}h", n), 0,
                 {{"C", ring(radius, 0, 0.8)}, {"H", ring(radius + 0.9, 0.2 * step, 1.2)}});
}

TestMolecule dihedral(int n) {
  const double radius = polygon_radius(n, 1.6);
  const double step = 360.0 / n;
  return cluster(
      fmt::format("D{}", n), 0,
      {{"C", ring(radius, 0.1 * step, 0.75)}, {"H", ring(radius + 0.5, 0.22 * step, 1.7)}});
}

TestMolecule rotation_reflection(int order) {
  const double radius = polygon_radius(order, 1.3);
  const double step = 360.0 / order;
  return cluster(fmt::format("S{}", order), 0,
                 {{"B", ring(radius, 0, 0.45)}, {"H", ring(radius + 0.6, 0.2 * step, 1.35)}});
}

// Regular orbits, as many atoms as the group has operations, and all irreps in each.
std::vector<TestMolecule> regular_orbits() {
  return {
      cluster("T", 0,
              {{"Ti", Vector3d::Zero()}, {"B", {0.55, 1.15, 2.05}}, {"H", {0.75, 1.95, 2.75}}}),
      cluster("Th", 0, {{"C", {0.95, 1.30, 2.10}}}),
      cluster("Td", 0, {{"C", {0.72, 1.62, 2.42}}}),
      cluster("O", 0, {{"Mo", Vector3d::Zero()}, {"H", {0.55, 1.05, 2.10}}}),
      cluster("Oh", 0, {{"B", {0.85, 2.15, 3.40}}}),
      cluster("I", 0, {{"H", {0.85, 1.75, 3.05}}}),
      cluster("Ih", 0, {{"H", {1.55, 2.05, 5.30}}}),
      cluster("D6h", 0, {{"B", ring(2.6, 17.0, 0.85)}}),
      cluster("D3d", 0, {{"C", ring(1.6, 33.0, 0.9)}}),
      cluster("C6v", 0, {{"Ni", {0, 0, 0.5}}, {"H", ring(2.6, 19.0, 0)}}),
  };
}

}  // namespace

std::vector<TestMolecule> synthetic_clusters() {
  std::vector<TestMolecule> all;
  for (const int n : {2, 3, 4, 5, 6, 8, 12}) all.push_back(cyclic(n));
  for (const int n : {2, 3, 4, 5, 6, 8, 12}) all.push_back(cyclic_with_mirror(n));
  for (const int n : {2, 3, 4, 5, 6, 8, 12}) all.push_back(dihedral(n));
  for (const int order : {4, 6, 8, 10, 12, 24}) all.push_back(rotation_reflection(order));
  all.push_back(cluster("D12d", 0, {{"C", ring(polygon_radius(24, 1.3), 0, 0.45)}}));
  all.push_back(cluster("D9h", 0, {{"C", ring(polygon_radius(9, 1.6), 0, 0.8)}}));
  for (TestMolecule& entry : regular_orbits()) all.push_back(entry);
  return all;
}
