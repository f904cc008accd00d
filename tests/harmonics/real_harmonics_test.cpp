#include "harmonics/real_harmonics.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <numbers>
#include <random>
#include <vector>

#include <Eigen/Geometry>

#include <boost/math/quadrature/gauss.hpp>

#include <doctest/doctest.h>

using irrepwise::HarmonicMatrix, irrepwise::HarmonicVector, irrepwise::harmonic_rotation,
    irrepwise::real_harmonics;

namespace {

// Turns and improper turns spread over O(3), the same in every run.
std::vector<Eigen::Matrix3d> random_operations(int count) {
  std::mt19937 random(20250);
  std::normal_distribution<double> gauss;
  std::vector<Eigen::Matrix3d> operations;
  for (int i = 0; i < count; ++i) {
    const Eigen::Quaterniond q(gauss(random), gauss(random), gauss(random), gauss(random));
    const Eigen::Matrix3d turn = q.normalized().toRotationMatrix();
    operations.push_back(i % 2 == 0 ? turn : Eigen::Matrix3d(-turn));
  }
  return operations;
}

double largest(const Eigen::MatrixXd& m) { return m.cwiseAbs().maxCoeff(); }

}  // namespace

TEST_CASE("an operation is represented by what it does to the values of the functions") {
  // By definition Y_i(g^-1 r) = sum_j Y_j(r) D_ji(g): two separate pieces of code, one identity.
  const Eigen::Vector3d r = Eigen::Vector3d(0.3, -1.1, 0.7).normalized();
  for (int l = 0; l <= 3; ++l) {
    for (const Eigen::Matrix3d& g : random_operations(50)) {
      const Eigen::VectorXd turned = real_harmonics(l, g.transpose() * r);
      const Eigen::VectorXd expected = harmonic_rotation(l, g).transpose() * real_harmonics(l, r);
      CAPTURE(l);
      CHECK(largest(turned - expected) <= 1e-14);
    }
  }
}

TEST_CASE("the matrices multiply as the operations do, and are orthogonal") {
  const std::vector<Eigen::Matrix3d> operations = random_operations(201);
  double worst = 0.0;
  for (int l = 0; l <= 3; ++l) {
    for (std::size_t i = 0; i + 1 < operations.size(); ++i) {
      const Eigen::Matrix3d product = operations[i] * operations[i + 1];
      const Eigen::MatrixXd left = harmonic_rotation(l, operations[i]);
      const Eigen::MatrixXd right = harmonic_rotation(l, operations[i + 1]);
      const int size = 2 * l + 1;
      worst = std::max(worst, largest(harmonic_rotation(l, product) - left * right));
      worst =
          std::max(worst, largest(left * left.transpose() - Eigen::MatrixXd::Identity(size, size)));
    }
  }
  CHECK(worst <= 1e-14);  // measured 6.3e-15 in 100 000 turns, 2.2e-15 of it the turns themselves
}

TEST_CASE("the trace is the character of the full rotation group") {
  // chi(phi) = sin((2l+1) phi/2) / sin(phi/2); Cotton, Chemical Applications of Group Theory.
  for (int l = 0; l <= 3; ++l) {
    for (const double angle : {0.3, 1.0, 2.0, 3.0}) {
      const Eigen::Vector3d axis = Eigen::Vector3d(1, 2, -3).normalized();
      const Eigen::Matrix3d turn = Eigen::AngleAxisd(angle, axis).toRotationMatrix();
      const double character = std::sin((2 * l + 1) * angle / 2) / std::sin(angle / 2);
      CAPTURE(l);
      CAPTURE(angle);
      CHECK(std::abs(harmonic_rotation(l, turn).trace() - character) <= 1e-14);
    }
  }
}

TEST_CASE("inversion changes the sign of p and f and leaves s and d, exactly") {
  for (int l = 0; l <= 3; ++l) {
    const int size = 2 * l + 1;
    const Eigen::MatrixXd expected =
        (l % 2 == 0 ? 1.0 : -1.0) * Eigen::MatrixXd::Identity(size, size);
    CHECK(Eigen::MatrixXd(harmonic_rotation(l, -Eigen::Matrix3d::Identity())) == expected);
  }
}

TEST_CASE("a quarter turn about z gives exact zeros and ones") {
  Eigen::Matrix3d c4;  // x to y, y to -x
  c4 << 0, -1, 0, 1, 0, 0, 0, 0, 1;
  Eigen::MatrixXd d = Eigen::MatrixXd::Zero(5, 5);
  d(0, 0) = 1;   // dz2
  d(1, 1) = -1;  // dx2-y2
  d(2, 2) = -1;  // dxy
  d(4, 3) = 1;   // dxz to dyz
  d(3, 4) = -1;
  CHECK(Eigen::MatrixXd(harmonic_rotation(2, c4)) == d);
  Eigen::MatrixXd f = Eigen::MatrixXd::Zero(7, 7);
  f(0, 0) = 1;  // fz3
  f(2, 1) = 1;  // fxz2 to fyz2
  f(1, 2) = -1;
  f(3, 3) = -1;  // fz(x2-y2)
  f(4, 4) = -1;  // fxyz
  f(6, 5) = -1;  // x(x2-3y2) to y(y2-3x2)
  f(5, 6) = 1;
  CHECK(Eigen::MatrixXd(harmonic_rotation(3, c4)) == f);
}

TEST_CASE("no operation that permutes the axes leaves rounding where a zero belongs") {
  // The 48 operations of the cube: their d and f matrices hold only these values, known exactly
  // from sqrt(3)/2 and sqrt(15)/4, sqrt(3/8), sqrt(5/8), 1/4, 1/2.
  std::array<int, 3> permutation = {0, 1, 2};
  do {
    for (int signs = 0; signs < 8; ++signs) {
      Eigen::Matrix3d g = Eigen::Matrix3d::Zero();
      for (int axis = 0; axis < 3; ++axis) {
        g(permutation[static_cast<std::size_t>(axis)], axis) = (signs >> axis) & 1 ? -1 : 1;
      }
      for (int l = 1; l <= 3; ++l) {
        const HarmonicMatrix d = harmonic_rotation(l, g);
        const int size = 2 * l + 1;
        CHECK((d.array() == 0.0 || d.array().abs() > 0.2).all());
        CHECK(largest(d * d.transpose() - Eigen::MatrixXd::Identity(size, size)) <= 1e-15);
      }
    }
  } while (std::next_permutation(permutation.begin(), permutation.end()));
}

TEST_CASE("the functions are orthonormal over the sphere") {
  // Gauss-Legendre in cos(theta) by equal steps in phi is exact for the degree 6 that occurs.
  using Rule = boost::math::quadrature::gauss<double, 15>;
  constexpr int steps = 16;
  for (int l = 0; l <= 3; ++l) {
    Eigen::MatrixXd overlap = Eigen::MatrixXd::Zero(2 * l + 1, 2 * l + 1);
    for (int k = 0; k < steps; ++k) {
      const double phi = 2 * std::numbers::pi * k / steps;
      for (std::size_t i = 0; i < Rule::abscissa().size(); ++i) {
        for (const double sign : {1.0, -1.0}) {
          if (i == 0 && sign < 0) continue;  // the middle node is zero and counts once
          const double c = sign * Rule::abscissa()[i], s = std::sqrt(1 - c * c);
          const Eigen::VectorXd y =
              real_harmonics(l, Eigen::Vector3d(s * std::cos(phi), s * std::sin(phi), c));
          overlap += Rule::weights()[i] * 2 * std::numbers::pi / steps * y * y.transpose();
        }
      }
    }
    CAPTURE(l);
    CHECK(largest(overlap - Eigen::MatrixXd::Identity(2 * l + 1, 2 * l + 1)) <= 1e-14);
  }
}

TEST_CASE("functions are positive where their name says, and in the order of the conventions") {
  // Each name is a polynomial; at this point in the positive octant the terms after a minus sign
  // are the smaller ones for the function tested, so every function is positive at its own point.
  const auto at = [](double x, double y, double z) {
    return Eigen::Vector3d(x, y, z).normalized();
  };
  CHECK(real_harmonics(0, at(1, 0, 0))(0) > 0);
  const std::vector<std::vector<Eigen::Vector3d>> lobes = {
      {at(1, 0, 0), at(0, 1, 0), at(0, 0, 1)},
      {at(0, 0, 1), at(1, 0, 0), at(1, 1, 0), at(1, 0, 1), at(0, 1, 1)},
      {at(0, 0, 1), at(1, 0, 2), at(0, 1, 2), at(1, 0, 1), at(1, 1, 1), at(1, 0, 0),
       at(1, 0.5, 0)}};
  for (int l = 1; l <= 3; ++l) {
    for (int i = 0; i < 2 * l + 1; ++i) {
      const Eigen::VectorXd values =
          real_harmonics(l, lobes[static_cast<std::size_t>(l - 1)][static_cast<std::size_t>(i)]);
      CAPTURE(l);
      CAPTURE(i);
      CHECK(values(i) > 0.2);
    }
  }
  // On the z axis only the m = 0 function lives, and it stands first for d and f, last for p.
  for (int l = 2; l <= 3; ++l) CHECK(real_harmonics(l, at(0, 0, 1)).tail(2 * l).isZero(0.0));
  CHECK(real_harmonics(1, at(0, 0, 1)).head(2).isZero(0.0));
}
