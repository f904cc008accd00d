// Cages of high symmetry.
#include <numbers>

#include "support/molecules_parts.hpp"
#include "support/shapes.hpp"

namespace {

using Eigen::Vector3d;

const Vector3d x = Vector3d::UnitX();
const Vector3d z = Vector3d::UnitZ();
const Vector3d diagonal = Vector3d::Ones().normalized();

TestMolecule buckminsterfullerene() {
  // A corner lies on an edge of an icosahedron, at the length of a pentagon's side from its end;
  // what remains of the edge in the middle is the bond shared by two hexagons.
  const double pentagon_side = 1.455;
  const double hexagon_bond = 1.391;
  const double edge = 2 * pentagon_side + hexagon_bond;
  const Vector3d end = edge / 2 * Vector3d(0, 1, std::numbers::phi);
  const Vector3d other_end = edge / 2 * Vector3d(0, -1, std::numbers::phi);
  return by_orbits("buckminsterfullerene", "Ih", 0,
                   {{"C", end + pentagon_side / edge * (other_end - end)}});
}

}  // namespace

std::vector<TestMolecule> cages() {
  const Vector3d boron = 1.78 / 2 * Vector3d(0, 1, std::numbers::phi);
  const double adamantane_step = 1.54 / std::numbers::sqrt3;  // carbons on sites of the diamond net
  const Vector3d bridge(0, 0, 2 * adamantane_step);
  const Vector3d methyl = 1.54 * diagonal;
  return {
      by_orbits("cubane", "Oh", 0,
                {{"C", 1.57 / 2 * Vector3d::Ones()},
                 {"H", 1.57 / 2 * Vector3d::Ones() + 1.09 * diagonal}}),
      by_orbits("hexahydrohexaborate", "Oh", -2, {{"B", 1.22 * z}, {"H", (1.22 + 1.20) * z}}),
      by_orbits("adamantane", "Td", 0,
                {{"C", adamantane_step * Vector3d::Ones()},
                 {"H", (adamantane_step * std::numbers::sqrt3 + 1.10) * diagonal},
                 {"C", bridge},
                 {"H", shapes::bond_end(bridge, z, 1.10, 54.0, Vector3d(1, -1, 0))}}),
      by_orbits("neopentane", "Td", 0,
                {{"C", Vector3d::Zero()},
                 {"C", methyl},
                 {"H", shapes::bond_end(methyl, methyl, 1.09, 70.5, -z)}}),
      by_orbits("neopentane, methyls turned by 15 degrees", "T", 0,
                {{"C", Vector3d::Zero()},
                 {"C", methyl},
                 {"H", shapes::bond_end(methyl, methyl, 1.09, 70.5, -z, 15.0)}}),
      by_orbits("dodecahedrane", "Ih", 0,
                {{"C", 1.54 * std::numbers::phi / 2 * Vector3d::Ones()},
                 {"H", (1.54 * std::numbers::phi / 2 * std::numbers::sqrt3 + 1.09) * diagonal}}),
      by_orbits("dodecahydrododecaborate", "Ih", -2,
                {{"B", boron}, {"H", boron + 1.20 * boron.normalized()}}),
      buckminsterfullerene(),
  };
}
