#include "hueckel/eigenproblem.hpp"

#include <Eigen/Cholesky>
#include <Eigen/Eigenvalues>

#ifdef IRREPWISE_LAPACKE
#include <vector>

#include <lapacke.h>
#endif

namespace irrepwise {
namespace {

#ifdef IRREPWISE_LAPACKE
// Below this size Eigen's own solver is as fast and needs no second library.
constexpr Eigen::Index lapack_from = 96;

int divide_and_conquer(Eigen::MatrixXd& matrix, Eigen::VectorXd& values) {
  const auto n = static_cast<lapack_int>(matrix.rows());
  return LAPACKE_dsyevd(LAPACK_COL_MAJOR, 'V', 'L', n, matrix.data(), n, values.data());
}
int divide_and_conquer(Eigen::MatrixXcd& matrix, Eigen::VectorXd& values) {
  const auto n = static_cast<lapack_int>(matrix.rows());
  return LAPACKE_zheevd(LAPACK_COL_MAJOR, 'V', 'L', n,
                        reinterpret_cast<lapack_complex_double*>(matrix.data()), n, values.data());
}
#endif

template <typename Scalar>
Eigenpairs<Scalar> solve(const typename Eigenpairs<Scalar>::Matrix& hamiltonian,
                         const typename Eigenpairs<Scalar>::Matrix& overlap) {
  using Matrix = typename Eigenpairs<Scalar>::Matrix;
  Eigenpairs<Scalar> pairs;
  if (overlap.rows() == 0) return pairs;
  const Eigen::LLT<Matrix> cholesky(overlap);
  pairs.positive = cholesky.info() == Eigen::Success;
  if (!pairs.positive) return pairs;
  // Eigen estimates the norm of the inverse and divides by that of S: take the latter out again.
  const Matrix full = overlap.template selfadjointView<Eigen::Lower>();
  pairs.smallest_overlap = cholesky.rcond() * full.cwiseAbs().colwise().sum().maxCoeff();

  // L^-1 H L^-H, whose eigenvectors y give c = L^-H y.
  Matrix standard = hamiltonian.template selfadjointView<Eigen::Lower>();
  cholesky.matrixL().solveInPlace(standard);
  standard.adjointInPlace();
  cholesky.matrixL().solveInPlace(standard);
#ifdef IRREPWISE_LAPACKE
  if (standard.rows() >= lapack_from) {
    pairs.energies.resize(standard.rows());
    if (divide_and_conquer(standard, pairs.energies) == 0) {
      pairs.vectors = std::move(standard);
      cholesky.matrixU().solveInPlace(pairs.vectors);
      return pairs;
    }
    standard = hamiltonian.template selfadjointView<Eigen::Lower>();
    cholesky.matrixL().solveInPlace(standard);
    standard.adjointInPlace();
    cholesky.matrixL().solveInPlace(standard);
  }
#endif
  const Eigen::SelfAdjointEigenSolver<Matrix> solver(standard);
  pairs.energies = solver.eigenvalues();
  pairs.vectors = solver.eigenvectors();
  cholesky.matrixU().solveInPlace(pairs.vectors);
  return pairs;
}

}  // namespace

Eigenpairs<double> solve_generalised(const Eigen::MatrixXd& hamiltonian,
                                     const Eigen::MatrixXd& overlap) {
  return solve<double>(hamiltonian, overlap);
}

Eigenpairs<std::complex<double>> solve_generalised(const Eigen::MatrixXcd& hamiltonian,
                                                   const Eigen::MatrixXcd& overlap) {
  return solve<std::complex<double>>(hamiltonian, overlap);
}

}  // namespace irrepwise
