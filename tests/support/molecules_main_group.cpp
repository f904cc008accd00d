// Atoms, linear molecules, and molecules of the main-group elements without carbon skeletons.
#include <cmath>
#include <numbers>

#include "support/molecules_parts.hpp"
#include "support/shapes.hpp"

namespace {

using Eigen::Vector3d;
using shapes::bond_end;

const Vector3d origin = Vector3d::Zero();
const Vector3d x = Vector3d::UnitX();
const Vector3d y = Vector3d::UnitY();
const Vector3d z = Vector3d::UnitZ();
const Vector3d diagonal = Vector3d::Ones().normalized();

std::vector<TestMolecule> atoms_and_linear() {
  return {
      by_atoms("helium atom", "Kh", 0, {{"He", {1, 2, 3}}}),
      by_atoms("carbon atom", "Kh", 0, {{"C", origin}}),  // open shell
      by_atoms("iron(II) ion", "Kh", 2, {{"Fe", origin}}),
      by_atoms("uranium(IV) ion", "Kh", 4, {{"U", origin}}),  // two electrons
      by_atoms("hydrogen fluoride", "Cinfv", 0, {{"H", origin}, {"F", 0.917 * x}}),
      by_atoms("carbon monoxide", "Cinfv", 0, {{"C", origin}, {"O", 1.128 * y}}),
      by_atoms("nitric oxide", "Cinfv", 0,
               {{"N", origin}, {"O", 1.151 * z}}),  // one electron in pi
      by_atoms("hydrogen cyanide", "Cinfv", 0,
               {{"H", -1.066 * z}, {"C", origin}, {"N", 1.156 * z}}),
      by_atoms("carbonyl sulfide", "Cinfv", 0,
               {{"O", -1.160 * diagonal}, {"C", origin}, {"S", 1.560 * diagonal}}),
      by_atoms(
          "cyanoacetylene", "Cinfv", 0,
          {{"H", origin}, {"C", 1.06 * z}, {"C", 2.265 * z}, {"C", 3.643 * z}, {"N", 4.802 * z}}),
      by_atoms("dihydrogen", "Dinfh", 0, {{"H", origin}, {"H", 0.741 * z}}),
      by_atoms("dinitrogen", "Dinfh", 0, {{"N", origin}, {"N", 1.098 * x}}),
      by_atoms("dioxygen", "Dinfh", 0, {{"O", origin}, {"O", 1.208 * z}}),  // two electrons in pi g
      by_atoms("carbon dioxide", "Dinfh", 0, {{"C", origin}, {"O", 1.162 * z}, {"O", -1.162 * z}}),
      by_atoms("acetylene", "Dinfh", 0,
               {{"C", 0.6015 * y}, {"C", -0.6015 * y}, {"H", 1.6645 * y}, {"H", -1.6645 * y}}),
      by_atoms("beryllium hydride", "Dinfh", 0,
               {{"Be", origin}, {"H", 1.334 * z}, {"H", -1.334 * z}}),
      by_atoms("mercury(II) chloride", "Dinfh", 0,
               {{"Hg", origin}, {"Cl", 2.29 * diagonal}, {"Cl", -2.29 * diagonal}}),
  };
}

// XOOX and the like: two centres at +-x, the ends at +-half the dihedral angle from z.
TestMolecule skew_chain(const std::string& name, std::string_view inner, double inner_length,
                        std::string_view outer, double outer_length, double angle,
                        double dihedral) {
  const Vector3d centre = inner_length / 2 * x;
  const Vector3d end = bond_end(centre, -x, outer_length, angle, z, dihedral / 2);
  return by_orbits(name, "C2", 0, {{inner, centre}, {outer, end}});
}

std::vector<TestMolecule> small_molecules() {
  const Vector3d boric_oxygen = 1.361 * x;
  const Vector3d borate_oxygen(1.20, 0, 0.85);
  const Vector3d chloramine_side = bond_end(origin, x, 1.017, 103.7, z, 53.0);
  return {
      by_atoms("fluorine hydroperoxide", "C1", 0,
               {{"H", bond_end(origin, x, 0.97, 101.0, y)},
                {"O", origin},
                {"O", 1.36 * x},
                {"F", bond_end(1.36 * x, -x, 1.45, 105.0, y, 84.0)}}),
      by_orbits("hypochlorous acid", "Cs", 0,
                {{"O", origin}, {"H", 0.96 * x}, {"Cl", bond_end(origin, x, 1.69, 103.0, y)}}),
      by_orbits("chloramine", "Cs", 0, {{"N", origin}, {"Cl", 1.75 * x}, {"H", chloramine_side}}),
      by_orbits("hydrazoic acid", "Cs", 0,
                {{"N", origin},
                 {"N", 1.24 * x},
                 {"N", 2.37 * x + 0.15 * y},
                 {"H", bond_end(origin, x, 1.02, 109.0, y)}}),
      skew_chain("hydrogen peroxide", "O", 1.475, "H", 0.95, 94.8, 112.0),
      skew_chain("disulfur dichloride", "S", 1.93, "Cl", 2.06, 108.2, 84.0),
      by_orbits("trans-diazene", "C2h", 0,
                {{"N", 0.626 * x}, {"H", bond_end(0.626 * x, -x, 1.028, 106.8, y)}}),
      by_orbits("water", "C2v", 0, {{"O", origin}, {"H", bond_end(origin, z, 0.958, 52.25, x)}}),
      by_orbits("sulfur dioxide", "C2v", 0,
                {{"S", origin}, {"O", bond_end(origin, z, 1.432, 59.65, x)}}),
      by_orbits("nitrogen dioxide", "C2v", 0,  // odd number of electrons
                {{"N", origin}, {"O", bond_end(origin, z, 1.193, 67.05, y)}}),
      by_orbits("chlorine trifluoride", "C2v", 0,
                {{"Cl", origin}, {"F", 1.598 * z}, {"F", bond_end(origin, z, 1.698, 87.5, x)}}),
      by_orbits("ammonia", "C3v", 0, {{"N", origin}, {"H", bond_end(origin, -z, 1.012, 67.9, x)}}),
      by_orbits("phosphorus trifluoride", "C3v", 0,
                {{"P", origin}, {"F", bond_end(origin, -z, 1.570, 59.2, x)}}),
      by_orbits("bromine pentafluoride", "C4v", 0,
                {{"Br", origin}, {"F", 1.69 * z}, {"F", bond_end(origin, z, 1.77, 84.8, x)}}),
      by_orbits(
          "boric acid", "C3h", 0,
          {{"B", origin}, {"O", boric_oxygen}, {"H", bond_end(boric_oxygen, -x, 0.967, 112.6, y)}}),
      by_orbits("tetrahydroxoborate", "S4", -1,
                {{"B", origin},
                 {"O", borate_oxygen},
                 {"H", bond_end(borate_oxygen, borate_oxygen, 0.96, 68.0, z, 35.0)}}),
      by_orbits("diborane", "D2h", 0,
                {{"B", 0.885 * x}, {"H", 0.975 * z}, {"H", {1.455, 1.037, 0}}}),
      by_orbits("dinitrogen tetroxide", "D2h", 0, {{"N", 0.88 * x}, {"O", {1.345, 1.10, 0}}}),
      by_orbits("boron trifluoride", "D3h", 0, {{"B", origin}, {"F", 1.313 * x}}),
      by_orbits("phosphorus pentafluoride", "D3h", 0,
                {{"P", origin}, {"F", 1.534 * x}, {"F", 1.577 * z}}),
      by_orbits("borazine", "D3h", 0,
                {{"B", 1.43 * x}, {"H", 2.63 * x}, {"N", -1.43 * x}, {"H", -2.45 * x}}),
      by_orbits("iodine heptafluoride", "D5h", 0,
                {{"I", origin}, {"F", 1.858 * x}, {"F", 1.786 * z}}),
      by_orbits("cyclo-octasulfur", "D4d", 0, {{"S", {2.343, 0, 0.495}}}),
      by_orbits("white phosphorus", "Td", 0,
                {{"P", 2.21 / std::numbers::sqrt2 * 0.5 * Vector3d::Ones()}}),
      by_orbits("ammonium", "Td", 1, {{"N", origin}, {"H", 1.03 * diagonal}}),
      by_orbits("silicon tetrafluoride", "Td", 0, {{"Si", origin}, {"F", 1.554 * diagonal}}),
      by_orbits("sulfur hexafluoride", "Oh", 0, {{"S", origin}, {"F", 1.561 * z}}),
  };
}

}  // namespace

std::vector<TestMolecule> main_group_molecules() {
  std::vector<TestMolecule> all = atoms_and_linear();
  for (TestMolecule& entry : small_molecules()) all.push_back(entry);
  return all;
}
