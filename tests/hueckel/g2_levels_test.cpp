// Levels of the G2/97 molecules against the dense problem: geometries that nobody here made.
#include <algorithm>
#include <vector>

#include <doctest/doctest.h>
#include <Eigen/Eigenvalues>

#include "hueckel/dense.hpp"
#include "support/g2.hpp"
#include "support/run.hpp"

using namespace irrepwise;

TEST_CASE("levels of the G2 molecules are those of the dense problem, with their published spin") {
  for (const G2Molecule& entry : read_g2()) {
    CAPTURE(entry.name);
    HueckelOptions options;
    options.multiplicity = entry.unpaired_electrons + 1;
    const Run r = run(entry.molecule, options);
    std::vector<double> found;
    double electrons = 0.0;
    for (const Level& level : r.levels.levels) {
      found.insert(found.end(), static_cast<std::size_t>(level.degeneracy), level.energy_ev);
      electrons += level.occupation;
    }
    CHECK(electrons == r.levels.electrons);
    // The exact structure, as the one of the input is symmetric to six decimals only.
    const DenseMatrices dense = dense_matrices(r.symmetry.molecule, r.basis, Rule::Weighted);
    const Eigen::VectorXd expected =
        Eigen::GeneralizedSelfAdjointEigenSolver<Eigen::MatrixXd>(
            dense.hamiltonian_ev, dense.overlap, Eigen::EigenvaluesOnly)
            .eigenvalues();
    std::sort(found.begin(), found.end());
    REQUIRE(static_cast<Eigen::Index>(found.size()) == expected.size());
    const Eigen::Map<const Eigen::VectorXd> energies(found.data(), expected.size());
    CHECK((energies - expected).cwiseAbs().maxCoeff() < 1e-9);
  }
}
