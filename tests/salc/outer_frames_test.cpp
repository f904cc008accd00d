#include "salc/outer_frames.hpp"

#include <algorithm>
#include <cmath>
#include <optional>
#include <vector>

#include <doctest/doctest.h>
#include <Eigen/Geometry>

#include "molecule/bonded_atoms.hpp"
#include "salc/bond_plane.hpp"
#include "salc/orbital_reductions.hpp"
#include "support/frames.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"

using namespace irrepwise;

namespace {

// Chromium with three straight carbonyls at no special angles: C1. The carbonyl given by atoms 1
// and 2 bends at carbon by the angle.
Molecule carbonyls(double bend_degrees) {
  std::vector<Atom> atoms = {{24, {0, 0, 0}}};
  const std::vector<Eigen::Vector3d> directions = {
      {1, 0.1, 0.2}, {-0.2, 1, 0.3}, {0.1, -0.3, 1}, {-1, -0.9, 0.2}};
  double length = 1.80;
  for (const Eigen::Vector3d& direction : directions) {
    const Eigen::Vector3d along = direction.normalized();
    const Eigen::Vector3d carbon = length * along;
    Eigen::Vector3d on = along;
    if (atoms.size() == 1) {
      const Eigen::Vector3d axis = along.cross(Eigen::Vector3d::UnitZ()).normalized();
      on = Eigen::AngleAxisd(bend_degrees / 180.0 * std::acos(-1.0), axis) * along;
    }
    atoms.push_back({6, carbon});
    atoms.push_back({8, carbon + 1.15 * on});
    length += 0.03;
  }
  return Molecule(atoms, 0, "carbonyls");
}

// Two square metals that share an edge of two chlorines, with two carbonyls each: D2h where the
// chlorines lie in the plane, C2v where they are lifted out of it.
Molecule bridged(double lifted_angstrom) {
  std::vector<Atom> atoms;
  for (const double x : {1.0, -1.0}) {
    const Eigen::Vector3d metal(1.65 * x, 0, 0);
    atoms.push_back({45, metal});
    for (const double y : {1.0, -1.0}) {
      const Eigen::Vector3d out = Eigen::Vector3d(x, y, 0).normalized();
      atoms.push_back({6, metal + 1.84 * out});
      atoms.push_back({8, metal + 2.99 * out});
    }
  }
  for (const double y : {1.0, -1.0}) atoms.push_back({17, {0, 1.65 * y, lifted_angstrom}});
  return Molecule(atoms, 0, "bridged");
}

}  // namespace

TEST_CASE("with several metals each donor looks at its own, a bridge at their midpoint") {
  for (const double lifted : {0.0, 0.5}) {
    CAPTURE(lifted);
    const Framed all = framed(moved(bridged(lifted), 6).molecule);
    const Molecule& molecule = all.symmetry.molecule;
    int terminal = 0;
    int bridges = 0;
    for (int atom = 0; atom < molecule.size(); ++atom) {
      const int element = molecule.atoms()[atom].atomic_number;
      if (element == 45) continue;
      REQUIRE(all.of_atom(atom));
      Eigen::Vector3d goal = Eigen::Vector3d::Zero();
      std::vector<int> before = bonded_atoms(molecule, atom);
      std::erase_if(before, [&](int other) {
        return molecule.atoms()[other].atomic_number != (element == 8 ? 6 : 45);
      });
      REQUIRE(before.size() == (element == 17 ? 2 : 1));
      for (const int other : before) goal += all.position(other) / double(before.size());
      const Eigen::Vector3d along = (goal - all.position(atom)).normalized();
      CHECK((all.of_atom(atom)->col(2) - along).norm() < 1e-9);
      if (element == 8) {
        ++terminal;
        CHECK((*all.of_atom(atom) - *all.of_atom(before.front())).norm() < 1e-6);
      }
      bridges += element == 17 ? 1 : 0;
    }
    CHECK(terminal == 4);
    CHECK(bridges == 2);
  }
}

TEST_CASE("frames of equivalent atoms are images of each other, at any distance from the centre") {
  int beyond = 0;
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const Framed all = framed(moved(test.molecule, 5).molecule);
    for (std::size_t s = 0; s < all.sets.size(); ++s) {
      if (!all.frames[s]) continue;
      beyond += all.frames[s]->beyond_donors ? 1 : 0;
      const EquivalentAtoms& set = all.sets[s];
      const Eigen::Matrix3d& first = all.frames[s]->frames.front();
      for (int i = 0; i < set.size(); ++i) {
        const Eigen::Matrix3d& frame = all.frames[s]->frames[static_cast<std::size_t>(i)];
        CHECK((frame.transpose() * frame).isIdentity(1e-9));
        CHECK(frame.determinant() > 0.0);
        bool is_image = false;
        for (int g = 0; g < all.symmetry.group.order(); ++g) {
          if (all.symmetry.images[g][set.representative()] != set.atoms[i]) continue;
          // Of an image by a reflection y has the other sign, so that the frame is right-handed.
          const Eigen::Matrix3d image = all.symmetry.group.operations()[g] * first;
          is_image = is_image || ((frame.col(0) - image.col(0)).norm() < 1e-6 &&
                                  (frame.col(2) - image.col(2)).norm() < 1e-6);
        }
        CHECK(is_image);
      }
    }
  }
  CHECK(beyond > 20);
}

TEST_CASE("a frame beyond the donors looks along the one bond that leads to the centre") {
  for (const char* name : {"hexacarbonylchromium", "hexa-aquairon(II)"}) {
    CAPTURE(name);
    const Framed all = framed(moved(test_molecule(name).molecule, 3).molecule);
    int seen = 0;
    for (std::size_t s = 0; s < all.sets.size(); ++s) {
      if (!all.frames[s] || !all.frames[s]->beyond_donors) continue;
      for (const int atom : all.sets[s].atoms) {
        const std::vector<int> bonds = bonded_atoms(all.symmetry.molecule, atom);
        REQUIRE(bonds.size() == 1);  // O and H end the ligand
        const Eigen::Vector3d along =
            (all.position(bonds.front()) - all.position(atom)).normalized();
        CHECK((all.of_atom(atom)->col(2) - along).norm() < 1e-9);
        ++seen;
      }
    }
    CHECK(seen >= 6);
  }
}

TEST_CASE("C and O of a carbonyl share all axes where it is straight, whatever the symmetry") {
  for (const Molecule& molecule :
       {test_molecule("hexacarbonylchromium").molecule, carbonyls(0.0), carbonyls(8.0)}) {
    const Framed all = framed(moved(molecule, 7).molecule);
    int pairs = 0;
    for (int oxygen = 0; oxygen < all.symmetry.molecule.size(); ++oxygen) {
      if (all.symmetry.molecule.atoms()[oxygen].atomic_number != 8) continue;
      const int carbon = bonded_atoms(all.symmetry.molecule, oxygen).front();
      REQUIRE(all.of_atom(carbon));
      REQUIRE(all.of_atom(oxygen));
      const Eigen::Matrix3d turn = all.of_atom(carbon)->transpose() * *all.of_atom(oxygen);
      const double bend = std::acos(std::min(turn(2, 2), 1.0));
      // The least turn that carries one z to the other turns no axis by more than the bend.
      CHECK(turn(0, 0) > std::cos(bend) - 1e-6);
      CHECK(turn(1, 1) > std::cos(bend) - 1e-6);
      ++pairs;
    }
    CHECK(pairs >= 4);
  }
}

TEST_CASE("where a ligand bends, x or y stands across the plane of the bend") {
  const Framed all = framed(carbonyls(40.0));  // atom 2 is O, on C 1, on Cr 0
  const Eigen::Vector3d normal =
      (all.position(1) - all.position(2)).cross(all.position(0) - all.position(2)).normalized();
  const auto nearer = [&](int atom) {
    const Eigen::Vector3d parts = all.of_atom(atom)->transpose() * normal;
    return std::abs(parts.x()) > std::abs(parts.y()) ? 0 : 1;
  };
  CHECK(nearer(2) == nearer(1));
  CHECK(std::abs(all.of_atom(2)->col(nearer(2)).dot(normal)) > 1.0 - 1e-9);
}

TEST_CASE("one of x and y stands across a flat ligand on all its atoms") {
  // Pyridine in a square, its ring upright, aslant or in the plane: bond lengths 1.4 Å, angles
  // 120°, hydrogens 1.08 Å (common practice). Only nitrogen is bonded to platinum.
  for (const double turn : {90.0, 50.0, 0.0}) {
    CAPTURE(turn);
    const Eigen::Matrix3d turned =
        Eigen::AngleAxisd(turn / 180.0 * std::acos(-1.0), Eigen::Vector3d::UnitX())
            .toRotationMatrix();
    std::vector<Atom> atoms = {{78, {3.45, 0, 0}}};
    for (int i = 0; i < 6; ++i) {
      const double angle = i * std::acos(-1.0) / 3.0;
      const Eigen::Vector3d out(std::cos(angle), std::sin(angle), 0.0);
      atoms.push_back({i == 0 ? 7 : 6, turned * (1.4 * out)});
      if (i > 0) atoms.push_back({1, turned * (2.48 * out)});
    }
    atoms.push_back({17, {5.75, 0, 0}});
    atoms.push_back({17, {3.45, 2.3, 0}});
    atoms.push_back({17, {3.45, -2.35, 0}});
    const Framed all = framed(moved(Molecule(atoms, -1, "pyridine on platinum"), 2).molecule);
    const Molecule& molecule = all.symmetry.molecule;
    Eigen::Vector3d across = Eigen::Vector3d::Zero();
    int nitrogen = 0;
    for (int atom = 0; atom < molecule.size(); ++atom) {
      const int element = molecule.atoms()[atom].atomic_number;
      if (element == 6) across = *bond_plane_normal(molecule, atom);
      if (element == 7) nitrogen = atom;
    }
    const Eigen::Vector3d on_nitrogen = all.of_atom(nitrogen)->transpose() * across;
    const int axis = std::abs(on_nitrogen.x()) > std::abs(on_nitrogen.y()) ? 0 : 1;
    int ring = 0;
    for (int atom = 0; atom < molecule.size(); ++atom) {
      const int element = molecule.atoms()[atom].atomic_number;
      if (element != 6 && element != 1) continue;
      CHECK(std::abs(all.of_atom(atom)->col(axis).dot(across)) > 1.0 - 1e-9);
      ++ring;
    }
    CHECK(ring == 10);
  }
}

TEST_CASE("a plane of bonds is found where there is one") {
  const auto normal = [](const char* name, int atom) {
    return bond_plane_normal(test_molecule(name).molecule, atom);
  };
  CHECK(normal("boron trifluoride", 0));        // flat
  CHECK_FALSE(normal("carbon dioxide", 0));     // straight
  CHECK_FALSE(normal("boron trifluoride", 1));  // one bond
  CHECK_FALSE(bond_plane_normal(methane(1.09), 0));
  CHECK(is_straight({0, 0, 1}, {0.1, 0, -1}));       // 5.7°
  CHECK_FALSE(is_straight({0, 0, 1}, {0.3, 0, 1}));  // 16.7°
}
