#include "analysis/populations.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <utility>

#include <doctest/doctest.h>

#include "hueckel/dense.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

int atom_of(const Basis& basis, int orbital) {
  int atom = 0;
  for (const Shell& shell : basis.shells) {
    if (shell.first_orbital <= orbital) atom = shell.atom;
  }
  return atom;
}

// [a, b] -> value, both ways round.
std::map<std::pair<int, int>, double> by_pair(const Populations& populations) {
  std::map<std::pair<int, int>, double> values;
  for (const OverlapPopulation& pair : populations.overlap_populations) {
    values[{pair.atom_a, pair.atom_b}] = values[{pair.atom_b, pair.atom_a}] = pair.value;
  }
  return values;
}

}  // namespace

TEST_CASE("populations add up to the electrons, charges to the charge, shares to one") {
  for (const TestMolecule& test : test_molecules()) {
    CAPTURE(test.name);
    const Run r = run(test.molecule);
    const Populations p = mulliken_populations(r.symmetry, r.basis, r.levels);
    CHECK(std::abs(p.gross_by_orbital.sum() - r.levels.electrons) < 1e-9);
    CHECK(std::abs(p.gross_by_atom.sum() - r.levels.electrons) < 1e-9);
    CHECK(std::abs(p.charge.sum() - test.molecule.charge()) < 1e-9);
    CHECK((p.shares.colwise().sum().array() - 1.0).abs().maxCoeff() < 1e-10);
    CHECK(static_cast<int>(p.overlap_populations.size()) ==
          test.molecule.size() * (test.molecule.size() - 1) / 2);
  }
}

TEST_CASE("populations are those of P = C n C^T and S over atomic orbitals") {
  // The second way: all orbitals written out, and the dense S made without symmetry.
  for (const TestMolecule& test : test_molecules()) {
    CAPTURE(test.name);
    const Run r = run(test.molecule);
    const Populations found = mulliken_populations(r.symmetry, r.basis, r.levels);
    const Eigen::MatrixXd s = dense_overlap(r.symmetry.molecule, r.basis);
    const int n = r.basis.n_orbitals;
    Eigen::MatrixXd p = Eigen::MatrixXd::Zero(n, n);
    double worst_share = 0.0;
    for (std::size_t k = 0; k < r.levels.levels.size(); ++k) {
      const Level& level = r.levels.levels[k];
      const Eigen::MatrixXd c = level_orbitals(r.symmetry, r.basis, r.levels, static_cast<int>(k));
      p += level.occupation / level.degeneracy * (c * c.transpose());
      const Eigen::VectorXd shares = c.cwiseProduct(s * c).rowwise().sum() / level.degeneracy;
      const Eigen::VectorXd difference = found.shares.col(static_cast<Eigen::Index>(k)) - shares;
      worst_share = std::max(worst_share, difference.cwiseAbs().maxCoeff());
    }
    CHECK(worst_share < 1e-9);
    const Eigen::MatrixXd ps = p.cwiseProduct(s);
    CHECK((found.gross_by_orbital - ps.rowwise().sum()).cwiseAbs().maxCoeff() < 1e-9);

    const int n_atoms = test.molecule.size();
    Eigen::MatrixXd by_atoms = Eigen::MatrixXd::Zero(n_atoms, n_atoms);
    std::vector<int> atom(static_cast<std::size_t>(n));
    for (int i = 0; i < n; ++i) atom[i] = atom_of(r.basis, i);
    for (int i = 0; i < n; ++i) {
      for (int j = 0; j < n; ++j) by_atoms(atom[i], atom[j]) += ps(i, j);
    }
    double worst_pair = 0.0, off_site = 0.0;
    for (const OverlapPopulation& pair : found.overlap_populations) {
      const double expected = 2.0 * by_atoms(pair.atom_a, pair.atom_b);
      worst_pair = std::max(worst_pair, std::abs(pair.value - expected));
      off_site += pair.value;
      const double distance = (test.molecule.atoms()[pair.atom_a].position -
                               test.molecule.atoms()[pair.atom_b].position)
                                  .norm();
      CHECK(std::abs(pair.distance_angstrom - distance) < 1e-9);
    }
    CHECK(worst_pair < 1e-9);
    // On-site populations and the pairs' together are all electrons.
    CHECK(std::abs(off_site + by_atoms.trace() - r.levels.electrons) < 1e-9);
  }
}

TEST_CASE(
    "a molecule turned, shifted and renumbered has the same charges and overlap populations") {
  for (const TestMolecule& test : test_molecules()) {
    CAPTURE(test.name);
    const Run here = run(test.molecule);
    const Populations p = mulliken_populations(here.symmetry, here.basis, here.levels);
    const MovedMolecule other = moved(test.molecule, 21);
    const Run there = run(other.molecule);
    const Populations q = mulliken_populations(there.symmetry, there.basis, there.levels);
    const auto values = by_pair(p);
    double worst_charge = 0.0, worst_pair = 0.0;
    for (int i = 0; i < test.molecule.size(); ++i) {
      worst_charge = std::max(worst_charge, std::abs(q.charge[i] - p.charge[other.permutation[i]]));
    }
    for (const OverlapPopulation& pair : q.overlap_populations) {
      const double expected =
          values.at({other.permutation[pair.atom_a], other.permutation[pair.atom_b]});
      worst_pair = std::max(worst_pair, std::abs(pair.value - expected));
    }
    CHECK(worst_charge < 1e-9);
    CHECK(worst_pair < 1e-9);
  }
}

TEST_CASE("equivalent atoms have equal charges, and bonds are told from contacts") {
  const Run r = run(test_molecule("phosphorus pentafluoride").molecule);
  const Populations p = mulliken_populations(r.symmetry, r.basis, r.levels);
  for (const EquivalentAtoms& set : r.levels.salcs.sets) {
    for (int atom : set.atoms) {
      CHECK(std::abs(p.charge[atom] - p.charge[set.representative()]) < 1e-10);
    }
  }
  const auto bonds = std::count_if(p.overlap_populations.begin(), p.overlap_populations.end(),
                                   [](const OverlapPopulation& pair) { return pair.bonded; });
  CHECK(bonds == 5);
}

TEST_CASE("H2 keeps half an electron pair on each atom and shares S/(1+S) of it twice over") {
  // c² = 1/(2(1+S)) on each atom; overlap population 2·2·c²·S = 2S/(1+S), S = <1s|1s>.
  const Run r = run(test_molecule("dihydrogen").molecule);
  const Populations p = mulliken_populations(r.symmetry, r.basis, r.levels);
  const double s = dense_overlap(r.symmetry.molecule, r.basis)(0, 1);
  CHECK(p.gross_by_atom[0] == doctest::Approx(1.0).epsilon(1e-13));
  CHECK(std::abs(p.charge[0]) < 1e-13);
  CHECK(p.overlap_populations.front().value == doctest::Approx(2 * s / (1 + s)).epsilon(1e-13));
}
