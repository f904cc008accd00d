// Carbon compounds.
#include <fmt/format.h>

#include "support/molecules_parts.hpp"
#include "support/shapes.hpp"

namespace {

using Eigen::Vector3d;
using shapes::bond_end, shapes::polygon_radius, shapes::ring;

constexpr double tetrahedral_degrees = 109.47122063449069;  // arccos(-1/3)
constexpr double supplement_degrees = 180.0 - tetrahedral_degrees;
const Vector3d origin = Vector3d::Zero();
const Vector3d x = Vector3d::UnitX();
const Vector3d y = Vector3d::UnitY();
const Vector3d z = Vector3d::UnitZ();

// Bond k of a tetrahedral centre whose axis (bond 0) points along z; k from 0 to 3.
Vector3d tetrahedral_bond(double length, int k) {
  return k == 0 ? Vector3d(length * z)
                : bond_end(origin, z, length, tetrahedral_degrees, x, 120.0 * (k - 1));
}

std::vector<TestMolecule> open_chain() {
  const Vector3d half_cc = 0.77 * z;
  const auto meso_bond = [&](double length, double azimuth) {
    return bond_end(half_cc, z, length, supplement_degrees, x, azimuth);
  };
  const Vector3d methyl(0, 0, 1.46);
  const Vector3d formic_oxygen = bond_end(origin, x, 1.343, 124.9, y);
  return {
      {"methane", methane(1.09), "Td"},
      {"ethane, staggered", ethane(1.54, 1.10, EthaneForm::Staggered), "D3d"},
      {"ethane, eclipsed", ethane(1.54, 1.10, EthaneForm::Eclipsed), "D3h"},
      by_orbits("ethane, twisted by 20 degrees", "D3", 0,
                {{"C", half_cc}, {"H", bond_end(half_cc, z, 1.10, supplement_degrees, x, 10.0)}}),
      by_atoms("bromochlorofluoromethane", "C1", 0,
               {{"C", origin},
                {"H", tetrahedral_bond(1.09, 0)},
                {"F", tetrahedral_bond(1.36, 1)},
                {"Cl", tetrahedral_bond(1.76, 2)},
                {"Br", tetrahedral_bond(1.93, 3)}}),
      by_orbits("meso-1,2-dichloro-1,2-difluoroethane", "Ci", 0,
                {{"C", half_cc},
                 {"H", meso_bond(1.09, 0)},
                 {"F", meso_bond(1.37, 120)},
                 {"Cl", meso_bond(1.77, 240)}}),
      by_orbits("formic acid", "Cs", 0,
                {{"C", origin},
                 {"O", 1.202 * x},
                 {"O", formic_oxygen},
                 {"H", bond_end(origin, x, 1.097, 124.1, -y)},
                 {"H", bond_end(formic_oxygen, -formic_oxygen, 0.972, 106.3, x)}}),
      by_orbits("dichloromethane", "C2v", 0,
                {{"C", origin},
                 {"Cl", bond_end(origin, z, 1.77, 56.0, x)},
                 {"H", bond_end(origin, -z, 1.09, 55.5, y)}}),
      by_orbits("formaldehyde", "C2v", 0,
                {{"C", origin}, {"O", 1.205 * z}, {"H", bond_end(origin, -z, 1.111, 58.05, x)}}),
      by_orbits("chloromethane", "C3v", 0,
                {{"C", origin}, {"Cl", 1.78 * z}, {"H", bond_end(origin, -z, 1.09, 71.5, x)}}),
      by_orbits("propyne", "C3v", 0,
                {{"C", origin},
                 {"C", -1.206 * z},
                 {"H", -2.262 * z},
                 {"C", methyl},
                 {"H", bond_end(methyl, z, 1.09, 69.5, x)}}),
      by_orbits("trans-glyoxal", "C2h", 0,
                {{"C", 0.763 * x},
                 {"O", bond_end(0.763 * x, x, 1.207, 58.8, y)},
                 {"H", bond_end(0.763 * x, x, 1.116, 64.5, -y)}}),
      by_orbits("methyl cation", "D3h", 1, {{"C", origin}, {"H", 1.09 * x}}),
      by_orbits("methyl radical", "D3h", 0, {{"C", origin}, {"H", 1.079 * x}}),  // odd electron
      by_orbits("ethylene", "D2h", 0,
                {{"C", 0.669 * x}, {"H", bond_end(0.669 * x, x, 1.086, 58.8, y)}}),
      by_orbits("ethylene, twisted by 20 degrees", "D2", 0,
                {{"C", 0.669 * x}, {"H", bond_end(0.669 * x, x, 1.086, 58.8, y, 10.0)}}),
      by_orbits("allene", "D2d", 0,
                {{"C", origin}, {"C", 1.308 * z}, {"H", bond_end(1.308 * z, z, 1.087, 59.1, x)}}),
  };
}

// A planar ring (CH)n.
TestMolecule annulene(const std::string& name, int n, int charge, double cc, double ch) {
  const double radius = polygon_radius(n, cc);
  return by_orbits(name, fmt::format("D{}h", n), charge,
                   {{"C", radius * x}, {"H", (radius + ch) * x}});
}

TestMolecule biphenyl() {
  const Vector3d side = ring(1.0, 20.0, 0.0);  // half the angle between the rings, about x below
  const Vector3d in_plane(0, side.x(), side.y());
  const double start = 0.745;  // half of the C-C bond between the rings
  const Vector3d ortho = (start + 0.70) * x + 1.2124 * in_plane;
  const Vector3d meta = (start + 2.10) * x + 1.2124 * in_plane;
  const Vector3d ortho_outward = -0.5 * x + 0.8660 * in_plane;
  const Vector3d meta_outward = 0.5 * x + 0.8660 * in_plane;
  return by_orbits("biphenyl, twisted by 40 degrees", "D2", 0,
                   {{"C", start * x},
                    {"C", ortho},
                    {"C", meta},
                    {"C", (start + 2.80) * x},
                    {"H", ortho + 1.085 * ortho_outward},
                    {"H", meta + 1.085 * meta_outward},
                    {"H", (start + 2.80 + 1.085) * x}});
}

std::vector<TestMolecule> rings() {
  const double cyclopropane_radius = polygon_radius(3, 1.51);
  const Vector3d cyclobutane_carbon(1.09, 0, 0.13);
  const auto [cyclobutane_h1, cyclobutane_h2] =
      shapes::two_bond_ends(cyclobutane_carbon, {0, 1.09, -0.13}, {0, -1.09, -0.13}, 1.09, 109.0);
  const auto [cyclopropane_h, other] =
      shapes::two_bond_ends(cyclopropane_radius * x, ring(cyclopropane_radius, 120, 0),
                            ring(cyclopropane_radius, -120, 0), 1.08, 115.0);
  const Vector3d chair(1.4425, 0, 0.255);
  return {
      annulene("cyclobutadiene, square", 4, 0, 1.44, 1.08),  // two electrons in eg
      annulene("cyclopentadienide", 5, -1, 1.41, 1.08),
      annulene("benzene", 6, 0, 1.397, 1.084),
      annulene("tropylium", 7, 1, 1.39, 1.085),
      annulene("cyclo-octatetraene dianion, planar", 8, -2, 1.40, 1.085),
      annulene("[12]annulene dication, round", 12, 2, 1.40, 1.085),
      by_orbits("naphthalene", "D2h", 0,
                {{"C", 0.70 * y},
                 {"C", {1.2124, 1.40, 0}},
                 {"C", {2.4249, 0.70, 0}},
                 {"H", {1.2124, 2.485, 0}},
                 {"H", {3.3645, 1.2425, 0}}}),
      biphenyl(),
      by_orbits("cyclopropane", "D3h", 0, {{"C", cyclopropane_radius * x}, {"H", cyclopropane_h}}),
      by_orbits("cyclobutane, puckered", "D2d", 0,
                {{"C", cyclobutane_carbon}, {"H", cyclobutane_h1}, {"H", cyclobutane_h2}}),
      by_orbits("cyclohexane, chair", "D3d", 0,
                {{"C", chair},
                 {"H", chair + 1.09 * z},
                 {"H", bond_end(chair, z, 1.09, tetrahedral_degrees, x)}}),
  };
}

}  // namespace

std::vector<TestMolecule> organic_molecules() {
  std::vector<TestMolecule> all = open_chain();
  for (TestMolecule& entry : rings()) all.push_back(entry);
  return all;
}
