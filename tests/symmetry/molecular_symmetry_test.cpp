#include "symmetry/molecular_symmetry.hpp"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>
#include <Eigen/LU>

#include "core/error.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"

using namespace irrepwise;

namespace {

// Largest distance between what an operation makes of an atom and the atom it should land on.
double worst_image_error(const MolecularSymmetry& symmetry) {
  double worst = 0.0;
  const Eigen::Matrix3Xd positions = symmetry.molecule.positions();
  for (int g = 0; g < symmetry.group.order(); ++g) {
    for (int i = 0; i < symmetry.molecule.size(); ++i) {
      const Eigen::Vector3d image = symmetry.group.operations()[g] * positions.col(i);
      worst = std::max(worst, (image - positions.col(symmetry.images[g][i])).norm());
    }
  }
  return worst;
}

}  // namespace

TEST_CASE(
    "the group of every molecule of the corpus is found, as given and turned, shifted, "
    "renumbered") {
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const MolecularSymmetry symmetry = find_symmetry(test.molecule);
    CHECK(symmetry.group.symbol().name() == test.point_group);
    CHECK(worst_image_error(symmetry) < 1e-10);
    CHECK(symmetry.largest_shift_angstrom < 1e-9);
    CHECK((symmetry.rotation * symmetry.rotation.transpose()).isIdentity(1e-12));
    CHECK(symmetry.rotation.determinant() == doctest::Approx(1.0).epsilon(1e-12).scale(0));

    // The frame as reported takes the input to the molecule.
    const Eigen::Matrix3Xd mapped =
        symmetry.rotation * (test.molecule.positions().colwise() - symmetry.origin);
    CHECK((mapped - symmetry.molecule.positions()).cwiseAbs().maxCoeff() < 1e-9);

    for (unsigned seed : {1u, 2u, 3u}) {
      const MolecularSymmetry turned = find_symmetry(moved(test.molecule, seed).molecule);
      CHECK(turned.group.symbol().name() == test.point_group);
      CHECK(worst_image_error(turned) < 1e-10);
    }
  }
}

TEST_CASE("a molecule found once stays where it is when it is found again") {
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const MolecularSymmetry once = find_symmetry(test.molecule);
    const MolecularSymmetry twice = find_symmetry(once.molecule);
    CHECK((twice.rotation - Eigen::Matrix3d::Identity()).cwiseAbs().maxCoeff() < 1e-9);
    CHECK(twice.origin.norm() < 1e-9);
    CHECK(twice.largest_shift_angstrom < 1e-12);
  }
}
