// The generalised symmetric eigenproblem H c = ε S c of one block.
#pragma once

#include <complex>

#include <Eigen/Core>

namespace irrepwise {

template <typename Scalar>
struct Eigenpairs {
  using Matrix = Eigen::Matrix<Scalar, Eigen::Dynamic, Eigen::Dynamic>;

  bool positive = true;           // whether S is positive definite; if not, the rest is empty
  double smallest_overlap = 1.0;  // smallest eigenvalue of S, to within a small factor
  Eigen::VectorXd energies;       // ascending
  Matrix vectors;                 // columns, C^H S C = 1
};

/// By Cholesky's factor of S. Large blocks go to LAPACK's divide and conquer where it was found
/// when the library was built, small ones to Eigen.
///
/// @param hamiltonian, overlap  Hermitian, the lower triangles are read
[[nodiscard]] Eigenpairs<double> solve_generalised(const Eigen::MatrixXd& hamiltonian,
                                                   const Eigen::MatrixXd& overlap);
[[nodiscard]] Eigenpairs<std::complex<double>> solve_generalised(
    const Eigen::MatrixXcd& hamiltonian, const Eigen::MatrixXcd& overlap);

}  // namespace irrepwise
