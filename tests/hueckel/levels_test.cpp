#include "hueckel/levels.hpp"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>
#include <Eigen/Eigenvalues>

#include "harmonics/real_harmonics.hpp"
#include "hueckel/dense.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

// Energies one per orbital, ascending: each level as often as its degeneracy.
Eigen::VectorXd repeated_energies(const Levels& levels) {
  std::vector<double> energies;
  for (const Level& level : levels.levels) {
    energies.insert(energies.end(), static_cast<std::size_t>(level.degeneracy), level.energy_ev);
  }
  std::sort(energies.begin(), energies.end());
  return Eigen::Map<Eigen::VectorXd>(energies.data(), static_cast<Eigen::Index>(energies.size()));
}

// By another road: all orbitals at once, Eigen's generalised solver, no symmetry.
Eigen::VectorXd dense_energies(const Molecule& molecule, const Basis& basis, Rule rule) {
  const DenseMatrices dense = dense_matrices(molecule, basis, rule);
  return Eigen::GeneralizedSelfAdjointEigenSolver<Eigen::MatrixXd>(
             dense.hamiltonian_ev, dense.overlap, Eigen::EigenvaluesOnly)
      .eigenvalues();
}

Eigen::MatrixXd all_orbitals(const Run& r, Eigen::VectorXd& energies) {
  Eigen::MatrixXd orbitals(r.basis.n_orbitals, r.basis.n_orbitals);
  energies.resize(r.basis.n_orbitals);
  Eigen::Index next = 0;
  for (std::size_t k = 0; k < r.levels.levels.size(); ++k) {
    const Level& level = r.levels.levels[k];
    orbitals.middleCols(next, level.degeneracy) =
        level_orbitals(r.symmetry, r.basis, r.levels, static_cast<int>(k));
    energies.segment(next, level.degeneracy).setConstant(level.energy_ev);
    next += level.degeneracy;
  }
  return orbitals;
}

// What an operation makes of orbitals over atomic orbitals.
Eigen::MatrixXd transformed(const Run& r, int g, const Eigen::MatrixXd& orbitals) {
  Eigen::MatrixXd result(orbitals.rows(), orbitals.cols());
  for (int atom = 0; atom < r.symmetry.molecule.size(); ++atom) {
    const int image = r.symmetry.images[g][atom];
    for (int i = 0; i < r.basis.first_shell[atom + 1] - r.basis.first_shell[atom]; ++i) {
      const Shell& from = r.basis.shells[r.basis.first_shell[atom] + i];
      const Shell& to = r.basis.shells[r.basis.first_shell[image] + i];
      result.middleRows(to.first_orbital, to.size()) =
          harmonic_rotation(from.l, r.symmetry.group.operations()[g]) *
          orbitals.middleRows(from.first_orbital, from.size());
    }
  }
  return result;
}

}  // namespace

TEST_CASE(
    "levels of every molecule of the corpus are those of the dense problem without symmetry") {
  double worst = 0.0;
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const Run r = run(test.molecule);
    const Eigen::VectorXd found = repeated_energies(r.levels);
    const Eigen::VectorXd expected = dense_energies(test.molecule, r.basis, Rule::Weighted);
    REQUIRE(found.size() == expected.size());
    const double error = (found - expected).cwiseAbs().maxCoeff();
    CHECK(error < 1e-9);
    worst = std::max(worst, error);
  }
  MESSAGE("largest difference from the dense problem: " << worst << " eV");
}

TEST_CASE("every rule gives the levels of its dense problem") {
  for (const TestMolecule& test : test_molecules()) {
    if (test.molecule.size() > 15) continue;
    const std::string name = test.name;
    CAPTURE(name);
    for (Rule rule : {Rule::WolfsbergHelmholz, Rule::GeometricMean, Rule::Cusachs}) {
      HueckelOptions options;
      options.rule = rule;
      const Run r = run(test.molecule, options);
      const Eigen::VectorXd expected = dense_energies(test.molecule, r.basis, rule);
      CHECK((repeated_energies(r.levels) - expected).cwiseAbs().maxCoeff() < 1e-9);
    }
  }
}

TEST_CASE(
    "orbitals are orthonormal, solve the eigenproblem, and partners turn as their irrep says") {
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const Run r = run(test.molecule);
    Eigen::VectorXd energies;
    const Eigen::MatrixXd c = all_orbitals(r, energies);
    const DenseMatrices dense = dense_matrices(r.symmetry.molecule, r.basis, Rule::Weighted);
    const Eigen::MatrixXd identity = c.transpose() * dense.overlap * c;
    CHECK((identity - Eigen::MatrixXd::Identity(c.cols(), c.cols())).cwiseAbs().maxCoeff() < 1e-10);
    const Eigen::MatrixXd residual =
        dense.hamiltonian_ev * c - dense.overlap * c * energies.asDiagonal();
    CHECK(residual.cwiseAbs().maxCoeff() < 1e-8);

    double worst = 0.0;
    for (std::size_t k = 0; k < r.levels.levels.size(); ++k) {
      const Irrep& irrep = r.symmetry.group.irreps()[r.levels.levels[k].irrep];
      const Eigen::MatrixXd partners =
          level_orbitals(r.symmetry, r.basis, r.levels, static_cast<int>(k));
      for (int g = 0; g < r.symmetry.group.order(); ++g) {
        const Eigen::MatrixXd error = transformed(r, g, partners) - partners * irrep.matrices[g];
        worst = std::max(worst, error.cwiseAbs().maxCoeff());
      }
    }
    CHECK(worst < 1e-9);
  }
}

TEST_CASE("SALCs of different irreps or partners never meet in S or H") {
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const Run r = run(test.molecule);
    // All SALCs over atomic orbitals, with a number that tells irrep and partner. The two partners
    // of a complex pair meet in S where the phase is free, so they share a number.
    Eigen::MatrixXd salcs(r.basis.n_orbitals, r.basis.n_orbitals);
    std::vector<int> kind;
    Eigen::Index next = 0;
    for (std::size_t i = 0; i < r.levels.salcs.by_irrep.size(); ++i) {
      const auto& list = r.levels.salcs.by_irrep[i];
      const Irrep& irrep = r.symmetry.group.irreps()[i];
      for (std::size_t s = 0; s < list.size(); ++s) {
        const Salc& salc = list[s];
        const EquivalentAtoms& set = r.levels.salcs.sets[salc.set];
        Eigen::MatrixXd columns = Eigen::MatrixXd::Zero(r.basis.n_orbitals, irrep.dimension);
        for (int position = 0; position < set.size(); ++position) {
          const int in_atom = salc.shell - r.basis.first_shell[set.representative()];
          const Shell& shell = r.basis.shells[r.basis.first_shell[set.atoms[position]] + in_atom];
          columns.middleRows(shell.first_orbital, shell.size()) =
              salc_on_atom(r.symmetry, r.levels.salcs, static_cast<int>(i), salc.representative,
                           salc.set, position, shell.l)
                  .transpose();
        }
        for (int p = 0; p < irrep.dimension; ++p) {
          salcs.col(next++) = columns.col(p);
          kind.push_back(static_cast<int>(i) * 8 + (irrep.complex_pair ? 0 : p));
        }
      }
    }
    REQUIRE(next == r.basis.n_orbitals);
    const Eigen::MatrixXd plain = salcs.transpose() * salcs;  // orthonormal as vectors
    CHECK((plain - Eigen::MatrixXd::Identity(next, next)).cwiseAbs().maxCoeff() < 1e-12);
    const DenseMatrices dense = dense_matrices(r.symmetry.molecule, r.basis, Rule::Weighted);
    const Eigen::MatrixXd s = salcs.transpose() * dense.overlap * salcs;
    const Eigen::MatrixXd h = salcs.transpose() * dense.hamiltonian_ev * salcs;
    double worst_s = 0.0, worst_h = 0.0;
    for (Eigen::Index i = 0; i < next; ++i) {
      for (Eigen::Index j = 0; j < next; ++j) {
        if (kind[static_cast<std::size_t>(i)] == kind[static_cast<std::size_t>(j)]) continue;
        worst_s = std::max(worst_s, std::abs(s(i, j)));
        worst_h = std::max(worst_h, std::abs(h(i, j)));
      }
    }
    CHECK(worst_s < 1e-12);
    CHECK(worst_h < 1e-12 * 40);  // eV, and H_ii reaches 40 eV
  }
}

TEST_CASE("a molecule turned, shifted and renumbered has the same labels and energies") {
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const Run here = run(test.molecule);
    for (unsigned seed : {11u, 12u}) {
      const Run there = run(moved(test.molecule, seed).molecule);
      REQUIRE(here.levels.levels.size() == there.levels.levels.size());
      for (std::size_t k = 0; k < here.levels.levels.size(); ++k) {
        const Level &a = here.levels.levels[k], &b = there.levels.levels[k];
        const std::string label = level_name(here.symmetry.group, a);
        CAPTURE(label);
        CHECK(label == level_name(there.symmetry.group, b));
        CHECK(std::abs(a.energy_ev - b.energy_ev) < 1e-9);
        CHECK(a.occupation == b.occupation);
      }
    }
  }
}

TEST_CASE("methane as worked in a textbook: overlap, energies and labels") {
  // Source: Lowe and Peterson, Quantum Chemistry, ch. 10 (from memory): C-H 1.1 Å, H exponent 1.2,
  // C 2s -0.7144, C 2p -0.3921, H 1s -0.5 hartree, K = 1.75, plain rule. Digits as printed there.
  const double hartree = 27.211386245981;
  const auto shell = [&](int n, int l, double h, double zeta) {
    return ShellParameters{n, l, h * hartree, ContractedRadial({{SlaterRadial(n, zeta), 1.0}}), ""};
  };
  const ParameterSet parameters(
      "textbook", {{1, {1, {shell(1, 0, -0.5, 1.2)}}},
                   {6, {4, {shell(2, 0, -0.7144, 1.625), shell(2, 1, -0.3921, 1.625)}}}});
  HueckelOptions options;
  options.rule = Rule::WolfsbergHelmholz;
  const Run r = run(methane(1.1), options, {}, parameters);
  struct Row {
    const char* label;
    double hartree;
  };
  const Row rows[] = {{"1a1", -0.852}, {"1t2", -0.549}, {"2t2", 0.207}, {"2a1", 1.190}};
  REQUIRE(r.levels.levels.size() == 4);
  for (std::size_t k = 0; k < 4; ++k) {
    CHECK(level_name(r.symmetry.group, r.levels.levels[k]) == rows[k].label);
    CHECK(std::abs(r.levels.levels[k].energy_ev / hartree - rows[k].hartree) < 1e-3);
  }
}

TEST_CASE("ethane prefers the staggered form by 4.0 kcal/mol in the first paper's setting") {
  // Source: Hoffmann, J. Chem. Phys. 39, 1397 (1963) (from memory): H exponent 1.0, C-C 1.54,
  // C-H 1.10 Å, tetrahedral angles, plain rule; the value is printed with one decimal.
  const auto parameters = [] {
    const auto shell = [](int n, int l, double h, double zeta) {
      return ShellParameters{n, l, h, ContractedRadial({{SlaterRadial(n, zeta), 1.0}}), ""};
    };
    return ParameterSet("first paper",
                        {{1, {1, {shell(1, 0, -13.6, 1.0)}}},
                         {6, {4, {shell(2, 0, -21.4, 1.625), shell(2, 1, -11.4, 1.625)}}}});
  }();
  HueckelOptions options;
  options.rule = Rule::WolfsbergHelmholz;
  const Run staggered = run(ethane(1.54, 1.10, EthaneForm::Staggered), options, {}, parameters);
  const Run eclipsed = run(ethane(1.54, 1.10, EthaneForm::Eclipsed), options, {}, parameters);
  constexpr double kcal_per_mol_in_ev = 23.0605;  // CODATA 2022, F / 4184
  const double barrier =
      (eclipsed.levels.sum_of_occupied_ev - staggered.levels.sum_of_occupied_ev) *
      kcal_per_mol_in_ev;
  CHECK(barrier == doctest::Approx(4.0).epsilon(0.05 / 4.0).scale(0));
}
