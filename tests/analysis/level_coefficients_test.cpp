#include "analysis/level_coefficients.hpp"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "harmonics/real_harmonics.hpp"
#include "hueckel/dense.hpp"
#include "salc/orbital_reductions.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

constexpr int most_atoms = 14;  // larger molecules take long and show nothing new

struct Framed {
  Run run;
  std::vector<EquivalentAtoms> sets;
  std::vector<std::optional<LocalFrames>> standard, local;
};

Framed framed(const Molecule& molecule) {
  Run r = run(molecule);
  std::vector<EquivalentAtoms> sets = equivalent_atoms(r.symmetry);
  auto local = frames_of_sets(r.symmetry, sets);
  std::vector<std::optional<LocalFrames>> standard(sets.size());
  return {std::move(r), std::move(sets), std::move(standard), std::move(local)};
}

LevelCoefficients of_level(const Framed& all, int level) {
  return level_coefficients(all.run.symmetry, all.run.basis, all.run.levels, level);
}

int level_named(const Run& r, const std::string& name) {
  for (std::size_t i = 0; i < r.levels.levels.size(); ++i) {
    if (level_name(r.symmetry.group, r.levels.levels[i]) == name) return static_cast<int>(i);
  }
  return -1;
}

double largest(const Eigen::MatrixXd& matrix) { return matrix.cwiseAbs().maxCoeff(); }

// Of each kind of orbital of the ligands (component 0 πx, 1 πy, 2 σ of p), the largest coefficient.
Eigen::Vector3d largest_of_kind(const Framed& all, int set, const std::string& name) {
  const int level = level_named(all.run, name);
  REQUIRE(level >= 0);
  const LevelCoefficients local =
      in_local_frames(of_level(all, level), all.run.basis, all.sets, all.local);
  Eigen::Vector3d found = Eigen::Vector3d::Zero();
  for (const Shell& shell : all.run.basis.shells) {
    const std::vector<int>& atoms = all.sets[static_cast<std::size_t>(set)].atoms;
    if (shell.l != 1 || std::find(atoms.begin(), atoms.end(), shell.atom) == atoms.end()) continue;
    for (int m = 0; m < 3; ++m) {
      found[m] = std::max(found[m], largest(local.coefficients.row(shell.first_orbital + m)));
    }
  }
  return found;
}

}  // namespace

TEST_CASE("coefficients are normalised with S, and shares add up to one") {
  // The second way: S over atomic orbitals, made without symmetry.
  for (const TestMolecule& test : test_molecules()) {
    if (test.molecule.size() > most_atoms) continue;
    CAPTURE(test.name);
    const Framed all = framed(test.molecule);
    const Eigen::MatrixXd s = dense_overlap(all.run.symmetry.molecule, all.run.basis);
    double worst = 0.0;
    for (int k = 0; k < static_cast<int>(all.run.levels.levels.size()); ++k) {
      const LevelCoefficients c = of_level(all, k);
      worst = std::max(worst, largest(c.times_overlap - s * c.coefficients));
      const Eigen::MatrixXd norms = c.coefficients.transpose() * s * c.coefficients;
      worst =
          std::max(worst, largest(norms - Eigen::MatrixXd::Identity(norms.rows(), norms.cols())));
      worst = std::max(worst, (c.shares().colwise().sum().array() - 1.0).abs().maxCoeff());
    }
    CHECK(worst < 1e-9);
  }
}

TEST_CASE("local frames turn each shell and change no norm and no share of a shell") {
  for (const TestMolecule& test : test_molecules()) {
    if (test.molecule.size() > most_atoms) continue;
    CAPTURE(test.name);
    const Framed all = framed(test.molecule);
    double worst = 0.0;
    for (int k = 0; k < static_cast<int>(all.run.levels.levels.size()); ++k) {
      const LevelCoefficients standard = of_level(all, k);
      const LevelCoefficients local = in_local_frames(standard, all.run.basis, all.sets, all.local);
      for (const Shell& shell : all.run.basis.shells) {
        const auto part = [&](const Eigen::MatrixXd& m) {
          return m.middleRows(shell.first_orbital, shell.size());
        };
        const Eigen::MatrixXd before = part(standard.coefficients).colwise().squaredNorm();
        const Eigen::MatrixXd after = part(local.coefficients).colwise().squaredNorm();
        worst = std::max(worst, largest(after - before));
        worst = std::max(worst, largest(part(local.shares()).colwise().sum() -
                                        part(standard.shares()).colwise().sum()));
      }
    }
    CHECK(worst < 1e-12);
  }
}

TEST_CASE("in a square the ligands take part by σ or by one π as symmetry says") {
  // D4h, by the characters of σ, in-plane and out-of-plane π of four ligands (any textbook of
  // ligand field theory): a1g + b1g + eu, a2g + b2g + eu, eg + a2u + b2u.
  std::vector<Atom> atoms = {{78, Eigen::Vector3d::Zero()}};
  for (const Eigen::Vector3d& along : {Eigen::Vector3d(1, 0, 0), Eigen::Vector3d(0, 1, 0),
                                       Eigen::Vector3d(-1, 0, 0), Eigen::Vector3d(0, -1, 0)}) {
    atoms.push_back({17, 2.32 * along});
  }
  const Framed all = framed(moved(Molecule(atoms, -2, "square"), 5).molecule);
  const int ligands = all.sets[0].size() == 4 ? 0 : 1;
  enum { in_plane, out_of_plane, sigma };
  for (const auto& [name, kind] :
       {std::pair{"2b1g", sigma}, std::pair{"2a1g", sigma}, std::pair{"1a2g", in_plane},
        std::pair{"1b2g", in_plane}, std::pair{"1eg", out_of_plane},
        std::pair{"1b2u", out_of_plane}}) {
    CAPTURE(name);
    const Eigen::Vector3d found = largest_of_kind(all, ligands, name);
    for (int m = 0; m < 3; ++m) {
      CAPTURE(m);
      if (m == kind) {
        CHECK(found[m] > 0.05);
      } else {
        CHECK(found[m] < 1e-10);
      }
    }
  }
}

TEST_CASE("in a hexacarbonyl a1g is σ on carbon and oxygen alike, t2g and t1g are π on both") {
  // Oh: σ of six ligands on the axes span a1g + eg + t1u, π span t1g + t2g + t1u + t2u (any
  // textbook of ligand field theory), so a1g and eg have no π and t1g, t2g, t2u no σ.
  const Framed all = framed(moved(test_molecule("hexacarbonylchromium").molecule, 9).molecule);
  int levels = 0;
  for (const Level& level : all.run.levels.levels) {
    const std::string name = level_name(all.run.symmetry.group, level);
    const std::string irrep = name.substr(name.find_first_not_of("0123456789"));
    const bool no_pi = irrep == "a1g" || irrep == "eg";
    const bool no_sigma = irrep == "t1g" || irrep == "t2g" || irrep == "t2u";
    if (!no_pi && !no_sigma) continue;
    CAPTURE(name);
    ++levels;
    for (std::size_t set = 0; set < all.sets.size(); ++set) {
      if (all.sets[set].size() != 6) continue;
      const Eigen::Vector3d found = largest_of_kind(all, static_cast<int>(set), name);
      if (no_pi) CHECK(std::max(found[0], found[1]) < 1e-10);
      if (no_sigma) CHECK(found[2] < 1e-10);
      CHECK(found.maxCoeff() > 0.01);
    }
  }
  CHECK(levels > 10);
}

TEST_CASE("in a linear molecule σ levels have no π part and π levels no σ part") {
  const Molecule carbon_dioxide({{6, {0, 0, 0}}, {8, {0, 1.16, 0}}, {8, {0, -1.16, 0}}}, 0, "CO2");
  const Framed all = framed(carbon_dioxide);
  const Eigen::Vector3d in_sigma = largest_of_kind(all, 1, "2sigmag+");
  CHECK(in_sigma[2] > 0.05);
  CHECK(std::max(in_sigma[0], in_sigma[1]) < 1e-10);
  const Eigen::Vector3d in_pi = largest_of_kind(all, 1, "1pig");
  CHECK(in_pi[2] < 1e-10);
  CHECK(std::min(in_pi[0], in_pi[1]) > 0.05);
}

TEST_CASE("coefficients over SALCs expand to those over atomic orbitals, one for all partners") {
  for (const TestMolecule& test : test_molecules()) {
    if (test.molecule.size() > most_atoms) continue;
    CAPTURE(test.name);
    const Framed all = framed(test.molecule);
    const PointGroup& group = all.run.symmetry.group;
    for (const auto* frames : {&all.standard, &all.local}) {
      const std::vector<SalcFunction> salcs =
          salc_table(all.run.symmetry, all.run.basis, all.sets, *frames);
      double worst = 0.0;
      for (int k = 0; k < static_cast<int>(all.run.levels.levels.size()); ++k) {
        const Level& level = all.run.levels.levels[static_cast<std::size_t>(k)];
        const Irrep& irrep = group.irreps()[static_cast<std::size_t>(level.irrep)];
        const LevelCoefficients orbitals =
            in_local_frames(of_level(all, k), all.run.basis, all.sets, *frames);
        const LevelCoefficients found = over_salcs(orbitals, all.run.basis, all.sets, salcs);
        Eigen::MatrixXd expanded =
            Eigen::MatrixXd::Zero(orbitals.coefficients.rows(), orbitals.coefficients.cols());
        for (std::size_t i = 0; i < salcs.size(); ++i) {
          const auto row = static_cast<Eigen::Index>(i);
          expanded += salc_vector(salcs[i], all.run.basis, all.sets) * found.coefficients.row(row);
          // SALCs of other irreps, and of other partners, have no part in it.
          const bool other_irrep = salcs[i].irrep != level.irrep;
          for (int r = 0; r < level.degeneracy; ++r) {
            const bool other_partner = !irrep.complex_pair && salcs[i].partner != r + 1;
            if (other_irrep || other_partner) {
              worst = std::max(worst, std::abs(found.coefficients(row, r)));
            }
          }
          if (!irrep.complex_pair && !other_irrep && salcs[i].partner == 1) {
            for (int r = 1; r < level.degeneracy; ++r) {  // partners stand behind each other
              worst = std::max(
                  worst, std::abs(found.coefficients(row + r, r) - found.coefficients(row, 0)));
            }
          }
        }
        worst = std::max(worst, largest(expanded - orbitals.coefficients));
        const Eigen::VectorXd totals = found.shares().colwise().sum();
        worst = std::max(worst, (totals.array() - 1.0).abs().maxCoeff());
      }
      CHECK(worst < 1e-9);
    }
  }
}

TEST_CASE("σ and π shares of a level do not depend on how the molecule lies and is numbered") {
  for (const char* name :
       {"sulfur hexafluoride", "phosphorus pentafluoride", "hexacarbonylchromium"}) {
    CAPTURE(name);
    const Molecule& molecule = test_molecule(name).molecule;
    const Framed first = framed(molecule);
    const Framed second = framed(moved(molecule, 11).molecule);
    // Of each level: shares summed over all atoms by element, shell and σ or not.
    const auto sums = [](const Framed& all, int level) {
      const Eigen::MatrixXd shares =
          in_local_frames(of_level(all, level), all.run.basis, all.sets, all.local).shares();
      std::vector<double> values(4 * 120, 0.0);
      for (const Shell& shell : all.run.basis.shells) {
        const int z =
            all.run.symmetry.molecule.atoms()[static_cast<std::size_t>(shell.atom)].atomic_number;
        for (int m = 0; m < shell.size(); ++m) {
          const bool along = shell.l == 1 && m == 2;
          values[static_cast<std::size_t>(4 * z + (along ? 3 : shell.l))] +=
              shares.row(shell.first_orbital + m).sum();
        }
      }
      return values;
    };
    double worst = 0.0;
    for (int k = 0; k < static_cast<int>(first.run.levels.levels.size()); ++k) {
      const std::string label = level_name(first.run.symmetry.group,
                                           first.run.levels.levels[static_cast<std::size_t>(k)]);
      const int same = level_named(second.run, label);
      REQUIRE(same >= 0);
      const std::vector<double> a = sums(first, k);
      const std::vector<double> b = sums(second, same);
      for (std::size_t i = 0; i < a.size(); ++i) worst = std::max(worst, std::abs(a[i] - b[i]));
    }
    CHECK(worst < 1e-9);
  }
}

TEST_CASE("partners go over into each other by the group's operations") {
  for (const char* name : {"sulfur hexafluoride", "benzene", "phosphorus pentafluoride"}) {
    CAPTURE(name);
    const Framed all = framed(test_molecule(name).molecule);
    const PointGroup& group = all.run.symmetry.group;
    double worst = 0.0;
    for (int k = 0; k < static_cast<int>(all.run.levels.levels.size()); ++k) {
      const Level& level = all.run.levels.levels[static_cast<std::size_t>(k)];
      if (level.degeneracy == 1) continue;
      const Eigen::MatrixXd c = of_level(all, k).coefficients;
      for (int g = 0; g < group.order(); ++g) {
        Eigen::MatrixXd turned = Eigen::MatrixXd::Zero(c.rows(), c.cols());
        for (std::size_t s = 0; s < all.run.basis.shells.size(); ++s) {
          const Shell& shell = all.run.basis.shells[s];
          const int in_atom = static_cast<int>(s) - all.run.basis.first_shell[shell.atom];
          const int image = all.run.symmetry.images[g][shell.atom];
          const Shell& to = all.run.basis.shells[all.run.basis.first_shell[image] + in_atom];
          turned.middleRows(to.first_orbital, to.size()) =
              harmonic_rotation(shell.l, group.operations()[g]) *
              c.middleRows(shell.first_orbital, shell.size());
        }
        worst = std::max(worst, largest(turned - c * group.irreps()[level.irrep].matrices[g]));
      }
    }
    CHECK(worst < 1e-9);
  }
}

TEST_CASE("the pi orbitals of a ring over a metal are one function of each atom") {
  // Lithium has s and p alone, a1 and e1 of C6v, so that the e2 and b levels are those of benzene
  // itself, each pure pi or without any: b2g and e2u of Hückel's theory are pi.
  for (const unsigned seed : {0U, 8U}) {
    const Molecule& given = test_molecule("benzene with lithium ion").molecule;
    const Framed all = framed(seed == 0U ? given : moved(given, seed).molecule);
    int pure = 0;
    double worst = 0.0;
    for (int k = 0; k < static_cast<int>(all.run.levels.levels.size()); ++k) {
      const Level& level = all.run.levels.levels[static_cast<std::size_t>(k)];
      const std::string label =
          all.run.symmetry.group.irreps()[static_cast<std::size_t>(level.irrep)].label;
      if (label != "E2" && label != "B1" && label != "B2") continue;
      const Eigen::MatrixXd shares =
          in_local_frames(of_level(all, k), all.run.basis, all.sets, all.local).shares();
      double pi = 0.0;
      for (const Shell& shell : all.run.basis.shells) {
        if (shell.l == 1) pi += shares.row(shell.first_orbital + 2).mean();
      }
      worst = std::max(worst, std::min(std::abs(pi), std::abs(pi - 1.0)));
      pure += pi > 0.5 ? 1 : 0;
    }
    CHECK(worst < 1e-9);
    CHECK(pure == 2);
  }
}
