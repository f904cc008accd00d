#include "symmetry/ladder.hpp"

#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"
#include "symmetry/molecular_symmetry.hpp"

using namespace irrepwise;

namespace {

std::string found_at(const Molecule& molecule, double tolerance) {
  SymmetryOptions options;
  options.tolerance_angstrom = tolerance;
  return find_symmetry(molecule, options).group.symbol().name();
}

SymmetryOptions in_group(const std::string& group) {
  SymmetryOptions options;
  options.group = group;
  return options;
}

// SF6 with the bonds along z longer by `stretch`.
Molecule stretched_octahedron(double stretch) {
  std::vector<Atom> atoms = {{16, {0, 0, 0}}};
  for (const double sign : {1.0, -1.0}) {
    atoms.push_back({9, {sign * 1.56, 0, 0}});
    atoms.push_back({9, {0, sign * 1.56, 0}});
    atoms.push_back({9, {0, 0, sign * (1.56 + stretch)}});
  }
  return {atoms, 0};
}

const std::vector<std::string> some_molecules = {"water",
                                                 "ammonia",
                                                 "boron trifluoride",
                                                 "tetrachloroplatinate(II)",
                                                 "ethylene",
                                                 "allene",
                                                 "pentacarbonyliron",
                                                 "carbon dioxide",
                                                 "hydrogen cyanide",
                                                 "trans-diazene",
                                                 "sulfur hexafluoride"};

}  // namespace

TEST_CASE("the ladder of an exact structure starts at its group") {
  for (const std::string& name : some_molecules) {
    CAPTURE(name);
    const TestMolecule& test = test_molecule(name);
    const std::vector<Rung> ladder = symmetry_ladder(test.molecule);
    CHECK(ladder.front().group.name() == test.point_group);
    CHECK(ladder.front().tolerance_angstrom == 0.0);
  }
}

TEST_CASE("every rung is what the search finds from its tolerance on, up to the next") {
  for (const std::string& name : some_molecules) {
    for (const double noise : {0.0, 0.003, 0.03}) {
      for (const unsigned seed : {1u, 2u}) {
        CAPTURE(name);
        CAPTURE(noise);
        CAPTURE(seed);
        const Molecule molecule = with_noise(test_molecule(name).molecule, noise, seed);
        const std::vector<Rung> ladder = symmetry_ladder(molecule);
        for (std::size_t i = 0; i < ladder.size(); ++i) {
          const double from = std::max(ladder[i].tolerance_angstrom, 2e-6);
          const double to = i + 1 < ladder.size() ? ladder[i + 1].tolerance_angstrom : 0.5;
          const std::string group = ladder[i].group.name();
          CHECK(found_at(molecule, from) == group);
          CHECK(found_at(molecule, to * (1.0 - 1e-6)) == group);
        }
      }
    }
  }
}

TEST_CASE("noise puts the right group on the ladder, at a tolerance of that size") {
  // Every atom is off by a, so an operation misses by at most 2a where it is not fitted; fitting
  // to the sum of squares may make the worst atom a little worse.
  for (const std::string& name : some_molecules) {
    for (const double noise : {0.001, 0.01, 0.05}) {
      CAPTURE(name);
      CAPTURE(noise);
      const TestMolecule& test = test_molecule(name);
      const std::vector<Rung> ladder = symmetry_ladder(with_noise(test.molecule, noise, 7));
      bool found = false;
      for (const Rung& rung : ladder) {
        found = found ||
                (rung.group.name() == test.point_group && rung.tolerance_angstrom <= 2.5 * noise);
      }
      CHECK(found);
    }
  }
}

TEST_CASE("a stretched octahedron climbs from D4h to Oh where its operations miss least") {
  // The threefold turn takes z onto x: with the centre fixed the atom on z misses by the stretch.
  const std::vector<Rung> ladder = symmetry_ladder(stretched_octahedron(0.12));
  REQUIRE(ladder.size() == 2);
  CHECK(ladder[0].group.name() == "D4h");
  CHECK(ladder[0].tolerance_angstrom == 0.0);
  CHECK(ladder[1].group.name() == "Oh");
  CHECK(ladder[1].tolerance_angstrom == doctest::Approx(0.12).epsilon(1e-8).scale(0));
  CHECK(ladder_words(ladder) == "D4h → Oh at 0.1201 Å");
}

TEST_CASE("made exact in a group that holds only roughly, all atoms lie at the mean") {
  const Molecule molecule = stretched_octahedron(0.12);
  const MolecularSymmetry symmetry = find_symmetry(molecule, in_group("Oh"));
  CHECK(symmetry.group.symbol().name() == "Oh");
  // Least squares: the mean of four bonds of 1.56 and two of 1.68 Å.
  for (int atom = 1; atom < 7; ++atom) {
    CHECK(symmetry.molecule.atoms()[atom].position.norm() ==
          doctest::Approx(1.60).epsilon(1e-10).scale(0));
  }
  CHECK(symmetry.largest_shift_angstrom == doctest::Approx(0.08).epsilon(1e-8).scale(0));
  CHECK(symmetry.rms_shift_angstrom ==
        doctest::Approx(std::sqrt((4 * 0.04 * 0.04 + 2 * 0.08 * 0.08) / 7)).epsilon(1e-8).scale(0));
}

TEST_CASE("a structure made exact has the group at any tolerance, and its atoms in their places") {
  for (const std::string& name : some_molecules) {
    CAPTURE(name);
    const TestMolecule& test = test_molecule(name);
    const Molecule noisy = with_noise(moved(test.molecule, 3).molecule, 0.04, 5);
    const MolecularSymmetry symmetry = find_symmetry(noisy, in_group(test.point_group));
    CHECK(symmetry.group.symbol().name() == test.point_group);
    CHECK(found_at(symmetry.molecule, 1e-5) == test.point_group);
    // As near as the average: at most the noise and what turning and shifting take.
    CHECK(symmetry.largest_shift_angstrom < 0.1);
    const Eigen::Matrix3Xd back =
        (symmetry.rotation.transpose() * symmetry.molecule.positions()).colwise() + symmetry.origin;
    CHECK((back - noisy.positions()).colwise().norm().maxCoeff() < 0.1);
    CHECK(find_symmetry(symmetry.molecule, in_group(test.point_group)).largest_shift_angstrom <
          1e-10);
  }
}

TEST_CASE("a group smaller than the structure's own is laid as the conventions lay it") {
  const Molecule square = test_molecule("tetrachloroplatinate(II)").molecule;
  SymmetryOptions subgroup;
  subgroup.subgroup = "C2v";
  const MolecularSymmetry a = find_symmetry(square, in_group("C2v"));
  const MolecularSymmetry b = find_symmetry(square, subgroup);
  CHECK(a.group.symbol().name() == "C2v");
  CHECK(a.full_group == "D4h");
  CHECK(a.axes == b.axes);
}

TEST_CASE("linear molecules and atoms take finite groups as subgroups, and bent ones Dinfh") {
  CHECK(find_symmetry(test_molecule("carbon dioxide").molecule, in_group("D2h"))
            .group.symbol()
            .name() == "D2h");
  CHECK(find_symmetry(test_molecule("carbon dioxide").molecule, in_group("Cinfv"))
            .group.symbol()
            .name() == "Cinfv");
  CHECK(
      find_symmetry(test_molecule("helium atom").molecule, in_group("Oh")).group.symbol().name() ==
      "Oh");
  const Molecule bent({{8, {0.0, 0.1, 1.16}}, {6, {0.0, 0.0, 0.0}}, {8, {0.0, 0.1, -1.16}}}, 0);
  CHECK(find_symmetry(bent).group.symbol().name() == "C2v");
  CHECK(find_symmetry(bent, in_group("Dinfh")).group.symbol().name() == "Dinfh");
}

TEST_CASE("a group that the structure is nowhere near is refused, with what it approaches") {
  CHECK_THROWS_WITH_AS(
      static_cast<void>(find_symmetry(stretched_octahedron(0.12), in_group("Ih"))),
      "the structure is nowhere near Ih: no set of operations of that group comes within 0.5 Å; it "
      "approaches D4h → Oh at 0.1201 Å",
      Error);
  SymmetryOptions options = in_group("Oh");
  options.limit_angstrom = 0.1;
  CHECK_THROWS_WITH_AS(
      static_cast<void>(find_symmetry(stretched_octahedron(0.12), options)),
      "the structure is nowhere near Oh: no set of operations of that group comes within 0.1 Å; it "
      "approaches D4h",
      Error);
  CHECK_THROWS_AS(static_cast<void>(find_symmetry(stretched_octahedron(0.12), in_group("Kh"))),
                  Error);
}
