#include "hueckel/eigenproblem.hpp"

#include <cmath>
#include <random>

#include <doctest/doctest.h>
#include <Eigen/Eigenvalues>

using namespace irrepwise;

namespace {

// Uniform in (-1, 1), the same everywhere: the engine's own integers, no distribution.
template <typename Matrix>
Matrix random_matrix(Eigen::Index n, unsigned seed) {
  std::mt19937 engine(seed);
  const auto next = [&] { return static_cast<double>(engine()) / 2147483648.0 - 1.0; };
  Matrix m(n, n);
  for (Eigen::Index j = 0; j < n; ++j) {
    for (Eigen::Index i = 0; i < n; ++i) {
      if constexpr (Eigen::NumTraits<typename Matrix::Scalar>::IsComplex) {
        const double real = next();
        m(i, j) = {real, next()};
      } else {
        m(i, j) = next();
      }
    }
  }
  return m;
}

// Energies as in a molecule, of some eV, and an overlap with eigenvalues between 0.5 and about 2.
template <typename Matrix>
void check_size(Eigen::Index n) {
  CAPTURE(n);
  const Matrix a = random_matrix<Matrix>(n, 1), b = random_matrix<Matrix>(n, 2);
  const Matrix h = 5.0 * (a + a.adjoint());
  const Matrix s = Matrix::Identity(n, n) * 0.5 + b * b.adjoint() / static_cast<double>(n);
  const auto pairs = solve_generalised(h, s);
  REQUIRE(pairs.positive);
  REQUIRE(pairs.energies.size() == n);
  const Matrix energies = pairs.energies.template cast<typename Matrix::Scalar>().asDiagonal();
  CHECK((h * pairs.vectors - s * pairs.vectors * energies).cwiseAbs().maxCoeff() < 1e-10);
  CHECK(
      (pairs.vectors.adjoint() * s * pairs.vectors - Matrix::Identity(n, n)).cwiseAbs().maxCoeff() <
      1e-12);
  for (Eigen::Index k = 1; k < n; ++k) CHECK(pairs.energies[k - 1] <= pairs.energies[k]);
  // By another road: Eigen's solver after the inverse root of S in place of Cholesky's factor.
  const Matrix root = Eigen::SelfAdjointEigenSolver<Matrix>(s).operatorInverseSqrt();
  const Eigen::VectorXd expected =
      Eigen::SelfAdjointEigenSolver<Matrix>(Matrix(root * h * root), Eigen::EigenvaluesOnly)
          .eigenvalues();
  CHECK((pairs.energies - expected).cwiseAbs().maxCoeff() < 1e-10);
}

}  // namespace

TEST_CASE("the generalised eigenproblem is solved at every size, on either side of any threshold") {
  for (Eigen::Index n : {1, 2, 7, 40, 130}) {
    check_size<Eigen::MatrixXd>(n);
    check_size<Eigen::MatrixXcd>(n);
  }
}

TEST_CASE("only the lower triangles are read") {
  Eigen::Matrix2d h, s;
  h << -2, 99, 1, -3;
  s << 1, -77, 0.5, 1;
  const auto pairs = solve_generalised(Eigen::MatrixXd(h), Eigen::MatrixXd(s));
  REQUIRE(pairs.positive);
  // det(H - E S) = (-2-E)(-3-E) - (1-E/2)² = 3/4 E² + 6 E + 5 = 0.
  CHECK(pairs.energies[0] == doctest::Approx(-4 - std::sqrt(16 - 20.0 / 3)).epsilon(1e-14));
  CHECK(pairs.energies[1] == doctest::Approx(-4 + std::sqrt(16 - 20.0 / 3)).epsilon(1e-14));
}

TEST_CASE("an overlap that is not positive definite is told, and nothing is solved") {
  Eigen::Matrix2d s;
  s << 1, 1.5, 1.5, 1;
  const auto pairs =
      solve_generalised(Eigen::MatrixXd(Eigen::Matrix2d::Identity()), Eigen::MatrixXd(s));
  CHECK_FALSE(pairs.positive);
  CHECK(pairs.energies.size() == 0);
}

TEST_CASE("the smallest eigenvalue of the overlap is estimated, whatever the size of the others") {
  // The warning of a nearly singular overlap hangs on it, also for a block of one function.
  for (double smallest : {1e-9, 1e-4, 0.5}) {
    const Eigen::MatrixXd one = Eigen::MatrixXd::Constant(1, 1, smallest);
    CHECK(solve_generalised(one, one).smallest_overlap == doctest::Approx(smallest));
    Eigen::MatrixXd s = Eigen::MatrixXd::Identity(3, 3);
    s(1, 0) = s(0, 1) = 1.0 - smallest;  // eigenvalues of the corner: smallest, 2 - smallest
    const double found = solve_generalised(s, s).smallest_overlap;
    CHECK(found > smallest / 4.0);
    CHECK(found < smallest * 4.0);
  }
}

TEST_CASE("no orbitals give no levels") {
  CHECK(solve_generalised(Eigen::MatrixXd(0, 0), Eigen::MatrixXd(0, 0)).energies.size() == 0);
}
