#include "harmonics/real_harmonics.hpp"

#include <array>
#include <cassert>
#include <cmath>
#include <numbers>

namespace irrepwise {
namespace {

// A function of degree l is a homogeneous polynomial, and an operation sends it to the same
// polynomial of the columns u, v, w of g instead of x, y, z. Terms with a factor r^2 belong to
// lower l and drop out in the projection, so z(5z^2 - 3r^2) may be carried as 5w^3.

// Coefficients of the monomials xx yy zz xy xz yz.
using Quadratic = Eigen::Matrix<double, 6, 1>;

Quadratic product(const Eigen::Vector3d& a, const Eigen::Vector3d& b) {
  Quadratic q;
  q << a.x() * b.x(), a.y() * b.y(), a.z() * b.z(), a.x() * b.y() + a.y() * b.x(),
      a.x() * b.z() + a.z() * b.x(), a.y() * b.z() + a.z() * b.y();
  return q;
}

// Coefficients of the monomials xxx yyy zzz xxy xxz xyy yyz xzz yzz xyz.
using Cubic = Eigen::Matrix<double, 10, 1>;

Cubic cubic(const Quadratic& q, const Eigen::Vector3d& c) {
  Cubic p;
  p << q(0) * c.x(), q(1) * c.y(), q(2) * c.z(), q(0) * c.y() + q(3) * c.x(),
      q(0) * c.z() + q(4) * c.x(), q(1) * c.x() + q(3) * c.y(), q(1) * c.z() + q(5) * c.y(),
      q(2) * c.x() + q(4) * c.z(), q(2) * c.y() + q(5) * c.z(),
      q(3) * c.z() + q(4) * c.y() + q(5) * c.x();
  return p;
}

// Projections use the inner product in which a monomial x^i y^j z^k has the square i! j! k!; it
// is invariant under turns, and the squares of the harmonic polynomials are whole numbers, so that
// axis-permuting operations lose nothing.

constexpr std::array<double, 5> d_squares = {12, 4, 1, 1, 1};

Eigen::Matrix<double, 5, 1> d_projections(const Quadratic& q) {
  Eigen::Matrix<double, 5, 1> p;
  p << 4 * q(2) - 2 * q(0) - 2 * q(1), 2 * q(0) - 2 * q(1), q(3), q(4), q(5);
  return p;
}

constexpr std::array<double, 7> f_squares = {60, 40, 40, 4, 1, 24, 24};

Eigen::Matrix<double, 7, 1> f_projections(const Cubic& c) {
  Eigen::Matrix<double, 7, 1> p;
  p << 12 * c(2) - 6 * c(4) - 6 * c(6), 8 * c(7) - 6 * c(0) - 2 * c(5),
      8 * c(8) - 6 * c(1) - 2 * c(3), 2 * c(4) - 2 * c(6), c(9), 6 * c(0) - 6 * c(5),
      6 * c(3) - 6 * c(1);
  return p;
}

template <std::size_t size>
using SquareMatrix = Eigen::Matrix<double, static_cast<int>(size), static_cast<int>(size)>;

template <std::size_t size>
SquareMatrix<size> norm_products(const std::array<double, size>& squares) {
  SquareMatrix<size> norms;
  for (std::size_t i = 0; i < size; ++i) {
    for (std::size_t j = 0; j < size; ++j) {
      norms(static_cast<int>(i), static_cast<int>(j)) = std::sqrt(squares[i] * squares[j]);
    }
  }
  return norms;
}

SquareMatrix<5> d_rotation(const Eigen::Matrix3d& g) {
  const Eigen::Vector3d u = g.col(0), v = g.col(1), w = g.col(2);
  SquareMatrix<5> images;
  images << d_projections(3.0 * product(w, w)), d_projections(product(u, u) - product(v, v)),
      d_projections(product(u, v)), d_projections(product(u, w)), d_projections(product(v, w));
  static const SquareMatrix<5> norms = norm_products(d_squares);
  return images.cwiseQuotient(norms);
}

SquareMatrix<7> f_rotation(const Eigen::Matrix3d& g) {
  const Eigen::Vector3d u = g.col(0), v = g.col(1), w = g.col(2);
  const Quadratic uu = product(u, u), vv = product(v, v), ww = product(w, w), uv = product(u, v);
  SquareMatrix<7> images;
  images << f_projections(5.0 * cubic(ww, w)), f_projections(5.0 * cubic(ww, u)),
      f_projections(5.0 * cubic(ww, v)), f_projections(cubic(uu - vv, w)),
      f_projections(cubic(uv, w)), f_projections(cubic(uu - 3.0 * vv, u)),
      f_projections(cubic(3.0 * uu - vv, v));
  static const SquareMatrix<7> norms = norm_products(f_squares);
  return images.cwiseQuotient(norms);
}

}  // namespace

HarmonicMatrix harmonic_rotation(int l, const Eigen::Matrix3d& operation) {
  assert(l >= 0 && l <= 3);
  switch (l) {
    case 0:
      return HarmonicMatrix::Identity(1, 1);
    case 1:
      return operation;
    case 2:
      return d_rotation(operation);
    default:
      return f_rotation(operation);
  }
}

HarmonicVector real_harmonics(int l, const Eigen::Vector3d& direction) {
  assert(l >= 0 && l <= 3);
  const double x = direction.x(), y = direction.y(), z = direction.z();
  constexpr double sphere = 4.0 * std::numbers::pi;
  HarmonicVector values(2 * l + 1);
  switch (l) {
    case 0:
      values << std::sqrt(1 / sphere);
      break;
    case 1:
      values = std::sqrt(3 / sphere) * direction;
      break;
    case 2:
      values << std::sqrt(5 / sphere) * (z * z - (x * x + y * y) / 2),
          std::sqrt(15 / sphere) * (x - y) * (x + y) / 2, std::sqrt(15 / sphere) * x * y,
          std::sqrt(15 / sphere) * x * z, std::sqrt(15 / sphere) * y * z;
      break;
    default: {
      const double rho2 = x * x + y * y;
      values << std::sqrt(7 / sphere) * z * (z * z - 1.5 * rho2),
          std::sqrt(21 / (8 * sphere)) * x * (4 * z * z - rho2),
          std::sqrt(21 / (8 * sphere)) * y * (4 * z * z - rho2),
          std::sqrt(105 / (4 * sphere)) * z * (x - y) * (x + y),
          std::sqrt(105 / sphere) * x * y * z,
          std::sqrt(35 / (8 * sphere)) * x * (x * x - 3 * y * y),
          std::sqrt(35 / (8 * sphere)) * y * (3 * x * x - y * y);
    }
  }
  return values;
}

}  // namespace irrepwise
