#include "salc/side_on.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include <doctest/doctest.h>
#include <Eigen/Geometry>

#include "basis/parameter_set.hpp"
#include "molecule/bonded_atoms.hpp"
#include "molecule/metals.hpp"
#include "salc/bond_plane.hpp"
#include "salc/orbital_reductions.hpp"
#include "salc/salc_table.hpp"
#include "support/frames.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"

using namespace irrepwise;

namespace {

Eigen::Vector3d position(const Molecule& molecule, int atom) {
  return molecule.atoms()[static_cast<std::size_t>(atom)].position;
}

int element(const Molecule& molecule, int atom) {
  return molecule.atoms()[static_cast<std::size_t>(atom)].atomic_number;
}

std::vector<int> carbons_bonded_to(const Molecule& molecule, int atom) {
  std::vector<int> carbons;
  for (const int other : bonded_atoms(molecule, atom)) {
    if (element(molecule, other) == 6) carbons.push_back(other);
  }
  return carbons;
}

// An allyl above a palladium chloride, flat: C-C 1.40, C-H 1.08 Å, 120° (common practice).
Molecule allyl() {
  const double half = 1.40 * std::sqrt(3.0) / 2.0;
  const double h = 1.08 * std::sqrt(3.0) / 2.0;
  return Molecule({{46, {0, 0, 0}},
                   {6, {0, 0.35, 1.95}},
                   {6, {half, -0.35, 1.95}},
                   {6, {-half, -0.35, 1.95}},
                   {1, {0, 1.43, 1.95}},
                   {1, {half + h, 0.19, 1.95}},
                   {1, {half, -1.43, 1.95}},
                   {1, {-half - h, 0.19, 1.95}},
                   {1, {-half, -1.43, 1.95}},
                   {17, {0, -0.8, -2.2}}},
                  0, "allyl");
}

}  // namespace

TEST_CASE("z of a ring over a metal is the normal of the ring, on the metal's side") {
  // The second way: the ring's normal from its centroid and any two of its carbons.
  int seen = 0;
  for (const char* name :
       {"ferrocene, twisted", "dibenzenechromium, eclipsed", "uranocene, staggered",
        "bis(cycloheptatrienyl)uranium anion, twisted", "cyclopentadienylnitrosylnickel",
        "cyclopentadienylthallium", "benzenetricarbonylchromium", "dichlorotitanocene",
        "tricarbonylcyclopentadienylmanganese"}) {
    CAPTURE(name);
    const Framed all = framed(moved(test_molecule(name).molecule, 4).molecule);
    const Molecule& molecule = all.symmetry.molecule;
    const int metal = metals_of_complex(molecule).front();
    for (std::size_t s = 0; s < all.sets.size(); ++s) {
      const int atom = all.sets[s].representative();
      if (element(molecule, atom) != 6 || carbons_bonded_to(molecule, atom).size() != 2) continue;
      REQUIRE(all.frames[s]);
      CHECK(all.frames[s]->side_on);
      for (int i = 0; i < all.sets[s].size(); ++i) {
        const int carbon = all.sets[s].atoms[static_cast<std::size_t>(i)];
        std::vector<int> ring = {carbon};
        for (std::size_t at = 0; at < ring.size(); ++at) {
          for (const int next : carbons_bonded_to(molecule, ring[at])) {
            if (std::find(ring.begin(), ring.end(), next) == ring.end()) ring.push_back(next);
          }
        }
        Eigen::Vector3d middle = Eigen::Vector3d::Zero();
        for (const int member : ring) middle += position(molecule, member) / double(ring.size());
        const Eigen::Vector3d out = position(molecule, carbon) - middle;
        const Eigen::Vector3d normal = out.cross(position(molecule, ring[1]) - middle).normalized();
        const Eigen::Matrix3d& frame = all.frames[s]->frames[static_cast<std::size_t>(i)];
        CHECK(std::abs(frame.col(2).dot(normal)) > 1.0 - 1e-6);
        CHECK(frame.col(2).dot(position(molecule, metal) - position(molecule, carbon)) > 0.0);
        // r looks into the ring.
        CHECK(frame.col(0).dot(out.normalized()) < -1.0 + 1e-6);
        ++seen;
      }
    }
  }
  CHECK(seen == 10 + 12 + 16 + 14 + 5 + 5 + 6 + 10 + 5);
}

TEST_CASE("z of an alkene stands across its bond, of a flat one across its plane") {
  const Framed zeise =
      framed(moved(test_molecule("trichloro(ethylene)platinate(II)").molecule, 9).molecule);
  const Molecule& molecule = zeise.symmetry.molecule;
  int seen = 0;
  for (std::size_t s = 0; s < zeise.sets.size(); ++s) {
    const int atom = zeise.sets[s].representative();
    if (element(molecule, atom) != 6) continue;
    const int other = carbons_bonded_to(molecule, atom).front();
    const Eigen::Vector3d bond =
        (position(molecule, other) - position(molecule, atom)).normalized();
    const Eigen::Matrix3d& frame = zeise.frames[s]->frames.front();
    CHECK(zeise.frames[s]->side_on);
    CHECK((frame.col(0) - bond).norm() < 1e-9);
    // Metal and bond lie in a mirror plane of this complex, and z with them.
    const int metal = metals_of_complex(molecule).front();
    CHECK(std::abs(frame.col(1).dot(position(molecule, metal) - position(molecule, atom))) < 1e-6);
    ++seen;
  }
  CHECK(seen == 1);

  const Molecule flat = moved(allyl(), 5).molecule;
  const Framed all = framed(flat);
  const Molecule& exact = all.symmetry.molecule;
  int carbons = 0;
  for (std::size_t s = 0; s < all.sets.size(); ++s) {
    const int atom = all.sets[s].representative();
    if (element(exact, atom) != 6) continue;
    carbons += all.sets[s].size();
    REQUIRE(all.frames[s]->side_on);
    for (const int other : bonded_atoms(exact, atom)) {
      if (is_metal(element(exact, other))) continue;
      const Eigen::Vector3d bond = position(exact, other) - position(exact, atom);
      CHECK(std::abs(all.frames[s]->frames.front().col(2).dot(bond)) < 1e-6);  // flat at the atom
    }
  }
  CHECK(carbons == 3);
}

TEST_CASE("ligands that bind by single atoms, or in the plane of a chelate, do not bind side-on") {
  for (const char* name : {"hexacarbonylchromium", "tris(ethene-1,2-dithiolato)rhenium",
                           "tris(ethylenediamine)cobalt(III)", "tetrachloroplatinate(II)",
                           "nonahydridorhenate(VII)"}) {
    CAPTURE(name);
    const Molecule& molecule = test_molecule(name).molecule;
    const std::vector<int> metals = metals_of_complex(molecule);
    for (int atom = 0; atom < molecule.size(); ++atom) {
      CHECK_FALSE(side_on(molecule, metals, atom));
    }
  }
  // A carboxylate, Zr-O 2.2 Å: zirconium counts as bonded to carbon too, but lies in the plane.
  const Molecule chelate({{40, {0, 0, 0}},
                          {8, {1.1, 1.9, 0}},
                          {8, {-1.1, 1.9, 0}},
                          {6, {0, 2.5, 0}},
                          {1, {0, 3.6, 0}}},
                         3);
  REQUIRE(are_bonded(chelate, 0, 3));
  REQUIRE(are_bonded(chelate, 1, 3));
  for (int atom = 0; atom < chelate.size(); ++atom) CHECK_FALSE(side_on(chelate, {0}, atom));
}

TEST_CASE("a ring's reductions tell its pi orbitals from those in its plane") {
  // The pi orbitals of one Cp ring in C5v span a1 + e1 + e2, of two staggered ones (D5d) a1g + a2u
  // + e1g + e1u + e2g + e2u: Cotton, chapter on metal sandwich compounds (from memory).
  const auto pi_of = [](const char* name) {
    const Framed all = framed(test_molecule(name).molecule);
    const Basis basis = make_basis(all.symmetry.molecule, published_parameters());
    std::string words;
    for (const OrbitalReduction& reduction :
         orbital_reductions(all.symmetry, basis, all.sets, all.frames)) {
      if (reduction.part != Part::FacePi) continue;
      CHECK(std::string(part_name(reduction.part)) == "π");
      for (std::size_t i = 0; i < reduction.times.size(); ++i) {
        for (int n = 0; n < reduction.times[i]; ++n) {
          words += (words.empty() ? "" : " + ") + level_label(all.symmetry.group.irreps()[i].label);
        }
      }
    }
    return words;
  };
  CHECK(pi_of("cyclopentadienylnitrosylnickel") == "a1 + e1 + e2");
  CHECK(pi_of("ferrocene, staggered") == "a1g + e1g + e2g + a2u + e1u + e2u");
}

TEST_CASE("orbitals of atoms bound side-on are named by the ligand's plane") {
  const Basis basis = make_basis(Molecule({{6, {0, 0, 0}}}, 0), published_parameters());
  const Shell& p = basis.shells[1];
  REQUIRE(p.l == 1);
  CHECK(salc_orbital_name(p, 2, OrbitalFrame::SideOn) == "2pπ");
  CHECK(salc_orbital_name(p, 0, OrbitalFrame::SideOn) == "2pr");
  CHECK(salc_orbital_name(p, 1, OrbitalFrame::SideOn) == "2pt");
  CHECK(side_on_name(2, 0) == "dn2");
}
