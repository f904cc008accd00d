// Whole levels of large symmetric molecules, and LAPACK's dense solver alone on the same problem.
//
//   build/tests/bench/levels_bench
//
// "levels" is everything from coordinates to occupied levels: finding the symmetry, the basis, the
// SALCs, S and H, the eigenproblems. "dsygvd" is given S and H and only solves the eigenproblem.
#include <cmath>
#include <numbers>
#include <stdexcept>
#include <string>
#include <vector>

#include <benchmark/benchmark.h>
#include <Eigen/Eigenvalues>

#include "analysis/populations.hpp"
#include "hueckel/dense.hpp"
#include "hueckel/levels.hpp"
#include "symmetry/molecular_symmetry.hpp"
#include "symmetry/standard_operations.hpp"

#ifdef IRREPWISE_HAVE_LAPACKE
#include <lapacke.h>
#endif

namespace {

using namespace irrepwise;

Molecule from_points(const std::vector<Eigen::Vector3d>& points) {
  std::vector<Atom> atoms;
  for (const Eigen::Vector3d& point : points) atoms.push_back({6, point});
  return Molecule(std::move(atoms), 0);
}

void add_orbit(std::vector<Eigen::Vector3d>& points, const Eigen::Vector3d& seed) {
  const std::size_t first = points.size();
  for (const Eigen::Matrix3d& g : standard_operations({Family::Ih, 1})) {
    const Eigen::Vector3d image = g * seed;
    bool known = false;
    for (std::size_t i = first; i < points.size() && !known; ++i) {
      known = (points[i] - image).norm() < 1e-6;
    }
    if (!known) points.push_back(image);
  }
}

// The truncated icosahedron with edges of 1.43 Å: corners at (0, ±1, ±3φ) and so on, edge 2.
Molecule c60() {
  std::vector<Eigen::Vector3d> points;
  add_orbit(points, Eigen::Vector3d(0, 1, 3 * std::numbers::phi) * 0.715);
  return from_points(points);
}

// 960 atoms: eight orbits of 120 points each, on one sphere of the density of graphene, spread by
// the golden angle over one asymmetric part of it, which has its corners on the axes of order 2,
// 3, 5.
Molecule icosahedral_cage() {
  const double phi = std::numbers::phi, radius = 14.2;
  const Eigen::Vector3d two(0, 0, 1);
  const Eigen::Vector3d three = Eigen::Vector3d(1 / phi, 0, phi).normalized();
  const Eigen::Vector3d five = Eigen::Vector3d(0, 1, phi).normalized();
  std::vector<Eigen::Vector3d> points;
  // Inner points of a triangle in barycentric coordinates, in three rows.
  const double rows[][2] = {{0.15, 0.15}, {0.15, 0.38}, {0.15, 0.62}, {0.38, 0.15},
                            {0.38, 0.38}, {0.60, 0.15}, {0.15, 0.80}, {0.78, 0.12}};
  for (const auto& [a, b] : rows) {
    add_orbit(points, radius * (a * two + b * three + (1 - a - b) * five).normalized());
  }
  return from_points(points);
}

Levels whole_levels(const Molecule& molecule) {
  const MolecularSymmetry symmetry = find_symmetry(molecule);
  const Basis basis = make_basis(symmetry.molecule, published_parameters());
  return solve_levels(symmetry, basis);
}

void levels(benchmark::State& state, const Molecule& molecule) {
  for ([[maybe_unused]] auto _ : state) benchmark::DoNotOptimize(whole_levels(molecule));
}

void symmetry_only(benchmark::State& state, const Molecule& molecule) {
  for ([[maybe_unused]] auto _ : state) benchmark::DoNotOptimize(find_symmetry(molecule));
}

void salcs_only(benchmark::State& state, const Molecule& molecule) {
  const MolecularSymmetry symmetry = find_symmetry(molecule);
  const Basis basis = make_basis(symmetry.molecule, published_parameters());
  for ([[maybe_unused]] auto _ : state) benchmark::DoNotOptimize(make_salcs(symmetry, basis));
}

void solve_only(benchmark::State& state, const Molecule& molecule) {
  const MolecularSymmetry symmetry = find_symmetry(molecule);
  const Basis basis = make_basis(symmetry.molecule, published_parameters());
  for ([[maybe_unused]] auto _ : state) benchmark::DoNotOptimize(solve_levels(symmetry, basis));
}

void populations_only(benchmark::State& state, const Molecule& molecule) {
  const MolecularSymmetry symmetry = find_symmetry(molecule);
  const Basis basis = make_basis(symmetry.molecule, published_parameters());
  const Levels solved = solve_levels(symmetry, basis);
  for ([[maybe_unused]] auto _ : state) {
    benchmark::DoNotOptimize(mulliken_populations(symmetry, basis, solved));
  }
}

#ifdef IRREPWISE_HAVE_LAPACKE
void dsygvd(benchmark::State& state, const Molecule& molecule) {
  const Basis basis = make_basis(molecule, published_parameters());
  const DenseMatrices dense = dense_matrices(molecule, basis, Rule::Weighted);
  const auto n = static_cast<lapack_int>(basis.n_orbitals);
  Eigen::VectorXd energies(n);
  for ([[maybe_unused]] auto _ : state) {
    state.PauseTiming();
    Eigen::MatrixXd h = dense.hamiltonian_ev, s = dense.overlap;
    state.ResumeTiming();
    if (LAPACKE_dsygvd(LAPACK_COL_MAJOR, 1, 'V', 'L', n, h.data(), n, s.data(), n,
                       energies.data()) != 0) {
      throw std::runtime_error("dsygvd failed");
    }
    benchmark::DoNotOptimize(energies.data());
  }
}

// A matrix like those of a molecule without symmetry, for the choice between two solvers.
Eigen::MatrixXd some_symmetric(Eigen::Index n) {
  Eigen::MatrixXd m(n, n);
  for (Eigen::Index i = 0; i < n; ++i) {
    for (Eigen::Index j = 0; j < n; ++j) {
      const double apart = static_cast<double>(i > j ? i - j : j - i);
      m(i, j) = std::cos(static_cast<double>(i * j % 17 + i + j)) * std::exp(-apart / 20) * 10;
    }
  }
  return m + m.transpose();
}

void eigen_standard(benchmark::State& state) {
  const Eigen::MatrixXd m = some_symmetric(state.range(0));
  for ([[maybe_unused]] auto _ : state) {
    const Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd> solver(m);
    benchmark::DoNotOptimize(solver.eigenvectors().data());
  }
}

void lapack_standard(benchmark::State& state) {
  const Eigen::MatrixXd m = some_symmetric(state.range(0));
  const auto n = static_cast<lapack_int>(m.rows());
  Eigen::VectorXd energies(n);
  for ([[maybe_unused]] auto _ : state) {
    Eigen::MatrixXd vectors = m;
    if (LAPACKE_dsyevd(LAPACK_COL_MAJOR, 'V', 'L', n, vectors.data(), n, energies.data()) != 0) {
      throw std::runtime_error("dsyevd failed");
    }
    benchmark::DoNotOptimize(vectors.data());
  }
}
#endif

void register_all(const std::string& name, const Molecule& molecule) {
  const auto add = [&](const char* part, void (*function)(benchmark::State&, const Molecule&)) {
    benchmark::RegisterBenchmark((name + "/" + part).c_str(), function, molecule)
        ->Unit(benchmark::kMillisecond);
  };
  add("levels", levels);
  add("of this: symmetry", symmetry_only);
  add("of this: SALCs", salcs_only);
  add("of this: SALCs, blocks and solving", solve_only);
  add("populations", populations_only);
}

}  // namespace

int main(int argc, char** argv) {
  benchmark::Initialize(&argc, argv);
  if (benchmark::ReportUnrecognizedArguments(argc, argv)) return 2;
  register_all("C60", c60());
#ifdef IRREPWISE_HAVE_LAPACKE
  benchmark::RegisterBenchmark("C60/dsygvd alone, 240 x 240", dsygvd, c60())
      ->Unit(benchmark::kMillisecond);
#endif
  register_all("icosahedral cage of 960", icosahedral_cage());
#ifdef IRREPWISE_HAVE_LAPACKE
  benchmark::RegisterBenchmark("eigenproblem/Eigen", eigen_standard)
      ->Arg(20)
      ->Arg(50)
      ->Arg(100)
      ->Arg(200)
      ->Arg(400)
      ->Arg(1000)
      ->Unit(benchmark::kMillisecond);
  benchmark::RegisterBenchmark("eigenproblem/LAPACK dsyevd", lapack_standard)
      ->Arg(20)
      ->Arg(50)
      ->Arg(100)
      ->Arg(200)
      ->Arg(400)
      ->Arg(1000)
      ->Unit(benchmark::kMillisecond);
#endif
  benchmark::RunSpecifiedBenchmarks();
  benchmark::Shutdown();
}
