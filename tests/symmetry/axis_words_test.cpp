#include "symmetry/axis_words.hpp"

#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "support/molecules.hpp"
#include "support/moved.hpp"
#include "symmetry/molecular_symmetry.hpp"

using namespace irrepwise;

namespace {

// A quadruple bond's skeleton; one half turned against the other by an angle.
Molecule dimer(double turn_degrees) {
  std::vector<Atom> atoms = {{75, {0, 0, 1.12}}, {75, {0, 0, -1.12}}};
  for (int i = 0; i < 8; ++i) {
    const double turn = (i < 4 ? 0.0 : turn_degrees) / 180.0 * std::acos(-1.0);
    const double angle = turn + i * std::acos(-1.0) / 2.0;
    atoms.push_back({17, {2.26 * std::cos(angle), 2.26 * std::sin(angle), i < 4 ? 1.67 : -1.67}});
  }
  return Molecule(atoms, -2, "dimer");
}

std::string words_for_x(const Molecule& molecule) {
  for (const std::string& words : find_symmetry(molecule).axes) {
    if (words.starts_with("x")) return words;
  }
  return {};
}

}  // namespace

TEST_CASE("an axis through no atom is told by the atoms that it points to as seen along z") {
  // Atoms 3 and 7 lie one above the other, in the plane of x and z.
  CHECK(words_for_x(dimer(0.0)) == "x = C2', towards Cl3 and Cl7 seen along z");
  // Staggered, x lies between a chlorine of one half and one of the other.
  const Molecule staggered = moved(dimer(45.0), 3).molecule;
  const MolecularSymmetry symmetry = find_symmetry(staggered);
  const std::string words = words_for_x(staggered);
  REQUIRE(words.starts_with("x = C2', midway between Cl"));
  Eigen::Vector3d sum = Eigen::Vector3d::Zero();
  for (int atom = 0; atom < staggered.size(); ++atom) {
    const std::string name = atom_name(staggered, atom);
    const bool named = words.find(" " + name + " ") != std::string::npos;
    if (named) sum += symmetry.molecule.atoms()[static_cast<std::size_t>(atom)].position;
  }
  CHECK(sum.x() > 1.0);
  CHECK(std::abs(sum.y()) < 1e-6);
  CHECK(std::abs(sum.z()) < 1e-6);
}

TEST_CASE("an axis across a flat molecule is told so, and one through atoms by their names") {
  const auto axes = find_symmetry(test_molecule("ethylene").molecule).axes;
  REQUIRE(axes.size() == 3);
  CHECK(axes[2] == "x = C2, across the plane of all atoms");
  CHECK(words_for_x(test_molecule("tetrachloroplatinate(II)").molecule)
            .starts_with("x = C2' through Pt1, Cl"));
}
