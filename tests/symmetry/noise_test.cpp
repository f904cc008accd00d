// Structures as experiments give them: symmetric but for noise.
#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "support/molecules.hpp"
#include "support/moved.hpp"
#include "symmetry/molecular_symmetry.hpp"

using namespace irrepwise;

namespace {

// An operation brings an atom to within two shifts of the one it should meet, as both have moved.
// The centre moves by the mean of the shifts, at most one, and so twice that again at worst; the
// operations are fitted, which takes most of it back. 4 is the bound, 3 is what random shifts need.
constexpr double tolerance_per_noise = 3.0;

// Molecules that have no higher symmetry even at 0.3 Å, twice the largest tolerance used below, so
// that there is one right answer; the names are of one molecule or more for most families.
std::vector<TestMolecule> sturdy_molecules() {
  std::vector<TestMolecule> chosen;
  std::vector<std::string> groups;
  for (const TestMolecule& test : test_molecules()) {
    if (test.molecule.size() == 1 || test.molecule.size() > 60) continue;
    // At most two of a group, so that the thirty are spread over the families.
    if (std::count(groups.begin(), groups.end(), test.point_group) >= 1) continue;
    SymmetryOptions options;
    options.tolerance_angstrom = 0.3;
    if (find_symmetry(test.molecule, options).group.symbol().name() != test.point_group) continue;
    groups.push_back(test.point_group);
    chosen.push_back(test);
  }
  return chosen;
}

// Largest distance of an image from its atom; images that are no permutations, or do not compose
// as the group's table says, count as infinitely far.
double closure_error(const MolecularSymmetry& symmetry) {
  const PointGroup& group = symmetry.group;
  const Eigen::Matrix3Xd positions = symmetry.molecule.positions();
  const int n = symmetry.molecule.size();
  double worst = 0.0;
  for (int g = 0; g < group.order(); ++g) {
    std::vector<bool> hit(static_cast<std::size_t>(n), false);
    for (int i = 0; i < n; ++i) {
      const int image = symmetry.images[g][i];
      if (hit[image]) return HUGE_VAL;
      hit[image] = true;
      const Eigen::Vector3d at = group.operations()[g] * positions.col(i);
      worst = std::max(worst, (at - positions.col(image)).norm());
    }
    for (int h = 0; h < group.order(); ++h) {
      for (int i = 0; i < n; ++i) {
        if (symmetry.images[group.product(g, h)][i] != symmetry.images[g][symmetry.images[h][i]]) {
          return HUGE_VAL;
        }
      }
    }
  }
  return worst;
}

}  // namespace

TEST_CASE("the right group is found in noise, and the group in force always closes") {
  const std::vector<TestMolecule> molecules = sturdy_molecules();
  REQUIRE(molecules.size() >= 30);
  for (const TestMolecule& test : molecules) {
    CAPTURE(test.name);
    for (double noise : {0.001, 0.01, 0.05}) {
      CAPTURE(noise);
      for (unsigned seed = 1; seed <= 20; ++seed) {
        CAPTURE(seed);
        const Molecule noisy = with_noise(test.molecule, noise, seed);
        SymmetryOptions options;
        options.tolerance_angstrom = tolerance_per_noise * noise;
        const MolecularSymmetry symmetry = find_symmetry(noisy, options);
        CHECK(symmetry.group.symbol().name() == test.point_group);
        CHECK(closure_error(symmetry) < 1e-10);
        // The exact structure is nearer to the noisy one than any other symmetric one, on the
        // root of the mean square, so not farther than the one that the noise was put on.
        CHECK(symmetry.rms_shift_angstrom < noise * (1 + 1e-9));

        const MolecularSymmetry strict = find_symmetry(noisy);  // 0.01 Å, in the midst of the noise
        CHECK(closure_error(strict) < 1e-10);
        CHECK(strict.largest_shift_angstrom < 2.0 * strict.tolerance_angstrom);
      }
    }
  }
}
