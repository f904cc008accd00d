#include "salc/orbital_reductions.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <string>

#include <doctest/doctest.h>
#include <Eigen/Geometry>
#include <Eigen/LU>

#include "basis/parameter_set.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"

using namespace irrepwise;

namespace {

struct Reduced {
  MolecularSymmetry symmetry;
  Basis basis;
  std::vector<EquivalentAtoms> sets;
  std::vector<std::optional<LocalFrames>> frames;
  std::vector<OrbitalReduction> reductions;
};

Reduced reduced(const Molecule& molecule) {
  MolecularSymmetry symmetry = find_symmetry(molecule);
  Basis basis = make_basis(molecule, published_parameters());
  std::vector<EquivalentAtoms> sets = equivalent_atoms(symmetry);
  auto frames = frames_of_sets(symmetry, sets);
  auto list = orbital_reductions(symmetry, basis, sets, frames);
  return {std::move(symmetry), std::move(basis), std::move(sets), std::move(frames),
          std::move(list)};
}

// "a1g + eg + 2t1u" of one part of the set that holds the atom.
std::string spans(const std::string& name, int atom, Part part) {
  const Reduced all = reduced(test_molecule(name).molecule);
  for (const OrbitalReduction& reduction : all.reductions) {
    const auto& atoms = all.sets[reduction.set].atoms;
    if (reduction.part != part || std::find(atoms.begin(), atoms.end(), atom) == atoms.end())
      continue;
    std::string words;
    for (std::size_t i = 0; i < reduction.times.size(); ++i) {
      if (reduction.times[i] == 0) continue;
      words += (words.empty() ? "" : " + ") +
               (reduction.times[i] > 1 ? std::to_string(reduction.times[i]) : "") +
               level_label(all.symmetry.group.irreps()[i].label);
    }
    return words;
  }
  return "no such part";
}

}  // namespace

TEST_CASE("ligand orbitals of the common polyhedra span what the handbooks say") {
  // Cotton, Chemical Applications of Group Theory, chapter on ligand orbitals (from memory); the
  // square also common practice.
  CHECK(spans("sulfur hexafluoride", 1, Part::Sigma) == "a1g + eg + t1u");
  CHECK(spans("sulfur hexafluoride", 1, Part::Pi) == "t1g + t2g + t1u + t2u");
  CHECK(spans("titanium tetrachloride", 1, Part::Sigma) == "a1 + t2");
  CHECK(spans("titanium tetrachloride", 1, Part::Pi) == "e + t1 + t2");
  CHECK(spans("tetrachloroplatinate(II)", 1, Part::Sigma) == "a1g + b1g + eu");
  CHECK(spans("tetrachloroplatinate(II)", 1, Part::PiInPlane) == "a2g + b2g + eu");
  CHECK(spans("tetrachloroplatinate(II)", 1, Part::PiOutOfPlane) == "eg + a2u + b2u");
  CHECK(spans("boron trifluoride", 1, Part::Sigma) == "a1' + e'");
  CHECK(spans("boron trifluoride", 1, Part::PiInPlane) == "a2' + e'");
  CHECK(spans("boron trifluoride", 1, Part::PiOutOfPlane) == "a2\" + e\"");
  CHECK(spans("carbon dioxide", 1, Part::Sigma) == "sigmag+ + sigmau+");
  CHECK(spans("carbon dioxide", 1, Part::Pi) == "pig + piu");
}

TEST_CASE("benzene's out-of-plane orbitals span a2u + b2g + e1g + e2u") {
  // Hückel's π system; Cotton (from memory), with C2' through atoms.
  CHECK(spans("benzene", 0, Part::PiOutOfPlane) == "b2g + e1g + a2u + e2u");
}

TEST_CASE("a central atom's d shell splits as in the handbooks") {
  // Bethe's splittings; common practice.
  const Reduced all = reduced(test_molecule("permanganate").molecule);
  std::map<int, std::string> by_l;
  for (const OrbitalReduction& reduction : all.reductions) {
    if (reduction.set != 0 || reduction.part != Part::Shell) continue;
    std::string words;
    for (std::size_t i = 0; i < reduction.times.size(); ++i) {
      if (reduction.times[i] > 0) words += level_label(all.symmetry.group.irreps()[i].label) + " ";
    }
    by_l[all.basis.shells[reduction.shells.front()].l] = words;
  }
  CHECK(by_l[0] == "a1 ");
  CHECK(by_l[1] == "t2 ");
  CHECK(by_l[2] == "e t2 ");
}

TEST_CASE("parts add up to their shells, and shells to the basis, in every test molecule") {
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const Reduced all = reduced(test.molecule);
    int total = 0;
    for (std::size_t s = 0; s < all.sets.size(); ++s) {
      std::vector<int> shells(all.symmetry.group.irreps().size(), 0), parts = shells;
      for (const OrbitalReduction& reduction : all.reductions) {
        if (reduction.set != static_cast<int>(s)) continue;
        const bool shell = reduction.part == Part::Shell;
        total += shell ? reduction.orbitals : 0;
        for (std::size_t i = 0; i < shells.size(); ++i) {
          (shell ? shells : parts)[i] +=
              reduction.times[i] * (shell ? 1 : static_cast<int>(reduction.shells.size()));
        }
      }
      if (all.frames[s]) CHECK(shells == parts);
    }
    CHECK(total == all.basis.n_orbitals);
  }
}

TEST_CASE("local frames are right-handed, look at the centre, and lie in the plane where one is") {
  int with_plane = 0;
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const MolecularSymmetry symmetry = find_symmetry(moved(test.molecule, 11).molecule);
    const auto centre = find_centre(symmetry);
    for (const EquivalentAtoms& set : equivalent_atoms(symmetry)) {
      const auto local = centre ? local_frames(symmetry, set, *centre) : std::nullopt;
      if (!local) continue;
      for (int i = 0; i < set.size(); ++i) {
        const Eigen::Matrix3d& frame = local->frames[i];
        const Eigen::Vector3d to_centre =
            centre->position - symmetry.molecule.atoms()[set.atoms[i]].position;
        CHECK((frame.transpose() * frame).isIdentity(1e-12));
        CHECK(frame.determinant() > 0.0);
        CHECK((frame.col(2) - to_centre.normalized()).norm() < 1e-12);
        if (local->in_plane) {
          ++with_plane;
          CHECK((frame.col(1).cross(local->frames[0].col(1))).norm() < 1e-9);
        }
      }
    }
  }
  CHECK(with_plane > 20);
}

TEST_CASE("the centre is a metal, otherwise the atom with most neighbours, among those that stay") {
  const auto centre_of = [](const char* name) {
    return find_centre(find_symmetry(test_molecule(name).molecule));
  };
  CHECK(centre_of("tetrachlorooxovanadate(IV)")->atom == 0);  // V, though O lies on the axis too
  // Phosphorus has four neighbours, gold two (C3v; distances common practice).
  const Molecule linear({{15, {0, 0, 0}},
                         {79, {0, 0, 2.25}},
                         {17, {0, 0, 4.55}},
                         {1, {1.2, 0, -0.7}},
                         {1, {-0.6, 1.2 * std::sqrt(0.75), -0.7}},
                         {1, {-0.6, -1.2 * std::sqrt(0.75), -0.7}}},
                        0, "chlorido(phosphane)gold(I)");
  CHECK(find_symmetry(linear).group.symbol().name() == "C3v");
  CHECK(find_centre(find_symmetry(linear))->atom == 1);
  CHECK(centre_of("benzene")->atom == std::nullopt);
  CHECK(centre_of("benzene")->position.norm() == 0.0);
  CHECK_FALSE(centre_of("disulfur dichloride"));  // C2: a line of points stays
}

TEST_CASE("a member of a ring is no centre, a spiro atom and a metal are") {
  const auto centre_of = [](const std::vector<Atom>& atoms) {
    return find_centre(find_symmetry(Molecule(atoms, 0)));
  };
  // Pyridine's skeleton and furan's: C2v, nitrogen or oxygen and a carbon stay in place.
  std::vector<Atom> pyridine, furan;
  for (int i = 0; i < 6; ++i) {
    const double angle = i * std::acos(-1.0) / 3.0;
    const Eigen::Vector3d out(std::cos(angle), std::sin(angle), 0.0);
    pyridine.push_back({i == 0 ? 7 : 6, 1.4 * out});
    if (i > 0) pyridine.push_back({1, 2.48 * out});
  }
  for (int i = 0; i < 5; ++i) {
    const double angle = i * std::acos(-1.0) * 0.4;
    const Eigen::Vector3d out(std::cos(angle), std::sin(angle), 0.0);
    furan.push_back({i == 0 ? 8 : 6, 1.2 * out});
    if (i > 0) furan.push_back({1, 2.28 * out});
  }
  CHECK_FALSE(centre_of(pyridine));
  CHECK_FALSE(centre_of(furan));

  // Two three-membered rings that share an atom, D2d: the only atom that the group keeps.
  const std::vector<Atom> spiro = {{6, {0, 0, 0}},
                                   {6, {0.76, 0, 1.27}},
                                   {6, {-0.76, 0, 1.27}},
                                   {6, {0, 0.76, -1.27}},
                                   {6, {0, -0.76, -1.27}}};
  REQUIRE(centre_of(spiro));
  CHECK(centre_of(spiro)->atom == 0);

  // Gold between chlorine and phosphine: phosphorus has four neighbours, gold is the metal.
  const std::vector<Atom> gold = {{79, {0, 0, 0}},
                                  {17, {0, 0, -2.28}},
                                  {15, {0, 0, 2.24}},
                                  {1, {1.27, 0, 2.85}},
                                  {1, {-0.635, 1.0998523, 2.85}},
                                  {1, {-0.635, -1.0998523, 2.85}}};
  REQUIRE(centre_of(gold));
  CHECK(centre_of(gold)->atom == 0);

  for (const char* name : {"methane", "water", "sulfur hexafluoride"}) {
    CAPTURE(name);
    const MolecularSymmetry symmetry = find_symmetry(test_molecule(name).molecule);
    REQUIRE(find_centre(symmetry));
    REQUIRE(find_centre(symmetry)->atom);
    CHECK(symmetry.molecule.atoms()[*find_centre(symmetry)->atom].atomic_number > 1);
  }
}
