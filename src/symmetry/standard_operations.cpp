#include "symmetry/standard_operations.hpp"

#include <array>
#include <cmath>
#include <numbers>

#include <boost/math/special_functions/cos_pi.hpp>
#include <boost/math/special_functions/sin_pi.hpp>

namespace irrepwise {
namespace {

using Operations = std::vector<Eigen::Matrix3d>;

// Rounding to the nearest half where the value is one keeps group products exact.
double tidy(double value) {
  const double half = std::round(2.0 * value) / 2.0;
  return std::abs(value - half) < 1e-14 ? half : value;
}

double cosine(int k, int n) { return tidy(boost::math::cos_pi(2.0 * k / n)); }
double sine(int k, int n) { return tidy(boost::math::sin_pi(2.0 * k / n)); }

// Turn by k/n of a circle about z, with z kept (+1) or turned over (-1).
Eigen::Matrix3d turn(int k, int n, int z_sign) {
  Eigen::Matrix3d matrix = Eigen::Matrix3d::Zero();
  matrix(0, 0) = matrix(1, 1) = cosine(k, n);
  matrix(1, 0) = sine(k, n);
  matrix(0, 1) = -matrix(1, 0);
  matrix(2, 2) = z_sign;
  return matrix;
}

// Reflection of the xy plane in the line at k/n of a circle from x; with z kept it is a vertical
// mirror, with z turned over a C2 axis.
Eigen::Matrix3d flip(int k, int n, int z_sign) {
  Eigen::Matrix3d matrix = Eigen::Matrix3d::Zero();
  matrix(0, 0) = cosine(2 * k, n);
  matrix(1, 1) = -matrix(0, 0);
  matrix(0, 1) = matrix(1, 0) = sine(2 * k, n);
  matrix(2, 2) = z_sign;
  return matrix;
}

void add_turns(Operations& operations, int n, int z_sign) {
  for (int k = 0; k < n; ++k) operations.push_back(turn(k, n, z_sign));
}

// Lines at multiples of half the angle of the axis, offset by a quarter of it where asked.
void add_flips(Operations& operations, int n, int z_sign, bool between = false) {
  for (int k = 0; k < n; ++k) operations.push_back(flip(2 * k + (between ? 1 : 0), 4 * n, z_sign));
}

void add_odd_rotoreflections(Operations& operations, int n) {
  for (int k = 1; k < 2 * n; k += 2) operations.push_back(turn(k, 2 * n, -1));
}

Operations axial(const Schoenflies& symbol) {
  const int n = symbol.n;
  Operations operations;
  add_turns(operations, n, 1);
  switch (symbol.family) {
    case Family::Cnv:
      add_flips(operations, n, 1);
      break;
    case Family::Cs:
    case Family::Cnh:
      add_turns(operations, n, -1);
      break;
    case Family::Dn:
      add_flips(operations, n, -1);
      break;
    case Family::Dnh:
      add_flips(operations, n, -1);
      add_turns(operations, n, -1);
      add_flips(operations, n, 1);
      break;
    case Family::Dnd:
      add_flips(operations, n, -1);
      add_odd_rotoreflections(operations, n);
      add_flips(operations, n, 1, true);
      break;
    case Family::Ci:
    case Family::S2n:
      add_odd_rotoreflections(operations, n);
      break;
    default:
      break;  // C1 and Cn have only the turns; other families do not come here
  }
  return operations;
}

// Signed permutation matrices selected by the parity of the permutation and of the signs.
template <typename Keep>
Operations signed_permutations(Keep keep) {
  constexpr std::array<std::array<int, 3>, 6> permutations = {
      {{0, 1, 2}, {1, 2, 0}, {2, 0, 1}, {1, 0, 2}, {0, 2, 1}, {2, 1, 0}}};  // even ones first
  Operations operations;
  for (std::size_t p = 0; p < permutations.size(); ++p) {
    for (int bits = 0; bits < 8; ++bits) {
      Eigen::Matrix3d matrix = Eigen::Matrix3d::Zero();
      int sign_product = 1;
      for (int column = 0; column < 3; ++column) {
        const int sign = (bits >> column) & 1 ? -1 : 1;
        sign_product *= sign;
        matrix(permutations[p][column], column) = sign;
      }
      if (keep(p<3, sign_product> 0)) operations.push_back(matrix);
    }
  }
  return operations;
}

// Entries of the icosahedral matrices in this frame are 0, ±1, ±1/2, ±φ/2, ±1/(2φ).
double tidy_icosahedral(double value) {
  constexpr double phi = std::numbers::phi;
  for (double exact : {0.0, 1.0, 0.5, phi / 2.0, 0.5 / phi}) {
    if (std::abs(std::abs(value) - exact) < 1e-9)
      return std::copysign(exact, exact == 0 ? 1 : value);
  }
  return value;
}

Operations icosahedral_rotations() {
  const Operations generators = [] {
    Operations found = signed_permutations([](bool even, bool plus) { return even && plus; });
    const Eigen::Vector3d axis = Eigen::Vector3d(0, 1, std::numbers::phi).normalized();
    const double c = std::cos(2.0 * std::numbers::pi / 5.0),
                 s = std::sin(2.0 * std::numbers::pi / 5.0);
    Eigen::Matrix3d cross;
    cross << 0, -axis[2], axis[1], axis[2], 0, -axis[0], -axis[1], axis[0], 0;
    found.push_back(c * Eigen::Matrix3d::Identity() + s * cross +
                    (1 - c) * axis * axis.transpose());
    return found;
  }();
  Operations operations = {Eigen::Matrix3d::Identity()};
  for (std::size_t done = 0; done < operations.size(); ++done) {
    for (const Eigen::Matrix3d& generator : generators) {
      const Eigen::Matrix3d product = (generator * operations[done]).unaryExpr(&tidy_icosahedral);
      bool known = false;
      for (const Eigen::Matrix3d& operation : operations) {
        if ((operation - product).cwiseAbs().maxCoeff() < 1e-6) {
          known = true;
          break;
        }
      }
      if (!known) operations.push_back(product);
    }
  }
  return operations;
}

Operations with_inversion(Operations operations) {
  const std::size_t proper = operations.size();
  for (std::size_t g = 0; g < proper; ++g) operations.push_back(-operations[g]);
  return operations;
}

}  // namespace

std::vector<Eigen::Matrix3d> standard_operations(const Schoenflies& symbol) {
  switch (symbol.family) {
    case Family::T:
      return signed_permutations([](bool even, bool plus) { return even && plus; });
    case Family::Td:
      return signed_permutations([](bool, bool plus) { return plus; });
    case Family::Th:
      return signed_permutations([](bool even, bool) { return even; });
    case Family::O:
      return signed_permutations([](bool even, bool plus) { return even == plus; });
    case Family::Oh:
      return signed_permutations([](bool, bool) { return true; });
    case Family::I:
      return icosahedral_rotations();
    case Family::Ih:
      return with_inversion(icosahedral_rotations());
    case Family::Cinfv:
      return axial({Family::Cnv, linear_quadrature_angles});
    case Family::Dinfh:
      return axial({Family::Dnh, linear_quadrature_angles});
    case Family::Kh:
      return {Eigen::Matrix3d::Identity(), -Eigen::Matrix3d::Identity()};
    default:
      return axial(symbol);
  }
}

}  // namespace irrepwise
