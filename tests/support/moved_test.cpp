#include "support/moved.hpp"

#include <cmath>
#include <set>
#include <vector>

#include <Eigen/LU>

#include <doctest/doctest.h>

#include "support/molecules.hpp"

using irrepwise::Atom, irrepwise::Molecule;

TEST_CASE("a moved molecule is the same one, turned, shifted and renumbered as it says") {
  for (const TestMolecule& entry : test_molecules()) {
    CAPTURE(entry.name);
    const MovedMolecule there = moved(entry.molecule, 7);
    REQUIRE(there.molecule.size() == entry.molecule.size());
    CHECK(there.molecule.charge() == entry.molecule.charge());
    CHECK(std::abs(there.rotation.determinant() - 1.0) < 1e-14);
    CHECK((there.rotation.transpose() * there.rotation - Eigen::Matrix3d::Identity()).norm() <
          1e-14);
    const std::set<int> originals(there.permutation.begin(), there.permutation.end());
    CHECK(static_cast<int>(originals.size()) == entry.molecule.size());
    CHECK(*originals.begin() == 0);
    CHECK(*originals.rbegin() == entry.molecule.size() - 1);
    for (int i = 0; i < there.molecule.size(); ++i) {
      const Atom& here = there.molecule.atoms()[i];
      const Atom& original = entry.molecule.atoms()[there.permutation[i]];
      CHECK(here.atomic_number == original.atomic_number);
      CHECK(
          (there.rotation.transpose() * (here.position - there.shift) - original.position).norm() <
          1e-13);
    }
  }
}

TEST_CASE("moves depend on the seed alone") {
  const Molecule& molecule = test_molecule("adamantane").molecule;
  CHECK(moved(molecule, 1).permutation == moved(molecule, 1).permutation);
  CHECK(moved(molecule, 1).rotation == moved(molecule, 1).rotation);
  CHECK(moved(molecule, 1).permutation != moved(molecule, 2).permutation);
  CHECK((moved(molecule, 1).rotation - moved(molecule, 2).rotation).norm() > 0.1);
  CHECK(with_noise(molecule, 0.01, 1).positions() == with_noise(molecule, 0.01, 1).positions());
}

TEST_CASE("noise shifts each atom by its amplitude, in all directions") {
  const Molecule& molecule = test_molecule("buckminsterfullerene").molecule;
  const Eigen::Matrix3Xd shifts = with_noise(molecule, 0.01, 3).positions() - molecule.positions();
  for (const auto& shift : shifts.colwise()) CHECK(std::abs(shift.norm() - 0.01) < 1e-14);
  // The mean of 60 random unit vectors is about 1/sqrt(60) long: 0.13; all along one would give 1.
  CHECK(shifts.rowwise().mean().norm() < 0.004);
}
