// Irreps of the cubic and icosahedral groups and of a single atom.

#include <cmath>
#include <functional>
#include <numbers>
#include <utility>

#include "harmonics/real_harmonics.hpp"
#include "symmetry/irreps.hpp"
#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

using Matrices = std::vector<Eigen::MatrixXd>;
using MatrixOf = std::function<Eigen::MatrixXd(const Eigen::Matrix3d&)>;

Irrep make_irrep(std::string label, Matrices matrices, bool complex_pair = false) {
  Irrep irrep;
  irrep.label = std::move(label);
  irrep.dimension = static_cast<int>(matrices.front().rows());
  irrep.complex_pair = complex_pair;
  for (const Eigen::MatrixXd& matrix : matrices) irrep.characters.push_back(matrix.trace());
  irrep.matrices = std::move(matrices);
  return irrep;
}

Eigen::Matrix3d proper_part(const Eigen::Matrix3d& g) { return determinant_sign(g) * g; }

Eigen::MatrixXd number(double value) { return Eigen::MatrixXd::Constant(1, 1, value); }

// Rows and columns of the d rotation matrix: dz2 dx2-y2 dxy dxz dyz.
Eigen::MatrixXd e_matrix(const Eigen::Matrix3d& rotation) {
  return harmonic_rotation(2, rotation).topLeftCorner(2, 2);
}
Eigen::MatrixXd t2_matrix(const Eigen::Matrix3d& rotation) {
  const Eigen::MatrixXd d = harmonic_rotation(2, rotation);
  constexpr int order[3] = {4, 3, 2};  // yz, xz, xy
  Eigen::Matrix3d matrix;
  for (int i = 0; i < 3; ++i) {
    for (int j = 0; j < 3; ++j) matrix(i, j) = d(order[i], order[j]);
  }
  return matrix;
}
double xyz_sign(const Eigen::Matrix3d& rotation) {  // fxyz is index 4
  return harmonic_rotation(3, rotation)(4, 4) > 0 ? 1.0 : -1.0;
}

// T2 and G of the icosahedral groups live in the seven f functions. D2 keeps fxyz apart and mixes
// the others in pairs; T2 takes one combination of each pair, G the other and fxyz.
struct IcosahedralParts {
  Eigen::Matrix<double, 7, 3> t2;
  Eigen::Matrix<double, 7, 4> g;
};

IcosahedralParts icosahedral_parts(const std::vector<Eigen::Matrix3d>& rotations) {
  // Projector on T2 by its character, which is that of T1 with φ -> 1 - φ: -(l=1) + ... for l = 3,
  // χ_f = χ_T2 + χ_G and χ_T2 = 3, 0 (C3), -1 (C2), and 1 - χ_T1 for the two kinds of C5.
  Eigen::Matrix<double, 7, 7> projector = Eigen::Matrix<double, 7, 7>::Zero();
  for (const Eigen::Matrix3d& rotation : rotations) {
    const double t1 = rotation.trace();  // 3, 0, -1, φ, 1 - φ
    const bool fivefold = std::abs(t1 - std::round(t1)) > 0.1;
    projector += (fivefold ? 1.0 - t1 : t1) * harmonic_rotation(3, rotation);
  }
  projector *= 3.0 / static_cast<double>(rotations.size());

  // f order: z3 xz2 yz2 z(x2-y2) xyz x(x2-3y2) y(3x2-y2); pairs like x, y, z.
  constexpr int pairs[3][2] = {{1, 5}, {2, 6}, {0, 3}};
  IcosahedralParts parts;
  parts.t2.setZero();
  parts.g.setZero();
  parts.g(4, 0) = 1.0;
  for (int axis = 0; axis < 3; ++axis) {
    const int a = pairs[axis][0], b = pairs[axis][1];
    const Eigen::Vector2d direction =
        Eigen::Vector2d(projector(a, a), projector(b, a)).normalized();
    parts.t2(a, axis) = direction[0];
    parts.t2(b, axis) = direction[1];
    parts.g(a, axis + 1) = -direction[1];
    parts.g(b, axis + 1) = direction[0];
  }
  return parts;
}

// Each irrep of the rotation group once, or with g and u where the group holds the inversion.
void add(std::vector<Irrep>& irreps, const std::vector<Eigen::Matrix3d>& operations,
         const std::vector<std::pair<std::string, MatrixOf>>& of_rotation, bool inversion,
         std::string_view complex_label = {}) {
  for (int odd = 0; odd <= (inversion ? 1 : 0); ++odd) {
    for (const auto& [label, matrix_of] : of_rotation) {
      Matrices matrices;
      for (const Eigen::Matrix3d& g : operations) {
        const double sign = odd && determinant_sign(g) < 0 ? -1.0 : 1.0;
        matrices.push_back(sign * matrix_of(proper_part(g)));
      }
      const std::string parity = !inversion ? "" : odd ? "u" : "g";
      irreps.push_back(make_irrep(label + parity, std::move(matrices), label == complex_label));
    }
  }
}

std::vector<Irrep> tetrahedral_td(const std::vector<Eigen::Matrix3d>& operations) {
  // Td is O with the C4 and C2' replaced by their products with the inversion: T2 is x, y, z, and
  // the determinant tells A2.
  Matrices a1, a2, e, t1, t2;
  for (const Eigen::Matrix3d& g : operations) {
    const double sign = determinant_sign(g);
    a1.push_back(number(1.0));
    a2.push_back(number(sign));
    e.push_back(e_matrix(g));
    t1.push_back(sign * g);
    t2.push_back(g);
  }
  std::vector<Irrep> irreps;
  irreps.push_back(make_irrep("A1", std::move(a1)));
  irreps.push_back(make_irrep("A2", std::move(a2)));
  irreps.push_back(make_irrep("E", std::move(e)));
  irreps.push_back(make_irrep("T1", std::move(t1)));
  irreps.push_back(make_irrep("T2", std::move(t2)));
  return irreps;
}

std::vector<Irrep> spherical(const std::vector<Eigen::Matrix3d>& operations) {
  static constexpr const char* labels[] = {"Sg", "Pu", "Dg", "Fu"};
  std::vector<Irrep> irreps;
  for (int l = 0; l <= 3; ++l) {
    Matrices matrices;
    for (const Eigen::Matrix3d& g : operations) matrices.push_back(harmonic_rotation(l, g));
    irreps.push_back(make_irrep(labels[l], std::move(matrices)));
  }
  return irreps;
}

std::vector<std::pair<std::string, MatrixOf>> icosahedral(
    const std::vector<Eigen::Matrix3d>& operations) {
  std::vector<Eigen::Matrix3d> rotations;
  for (const Eigen::Matrix3d& g : operations) {
    if (determinant_sign(g) > 0) rotations.push_back(g);
  }
  const IcosahedralParts parts = icosahedral_parts(rotations);
  const auto f_part = [](const auto& columns, const Eigen::Matrix3d& r) -> Eigen::MatrixXd {
    return columns.transpose() * harmonic_rotation(3, r) * columns;
  };
  return {{"A", [](const Eigen::Matrix3d&) { return number(1.0); }},
          {"T1", [](const Eigen::Matrix3d& r) { return Eigen::MatrixXd(r); }},
          {"T2", [=](const Eigen::Matrix3d& r) { return f_part(parts.t2, r); }},
          {"G", [=](const Eigen::Matrix3d& r) { return f_part(parts.g, r); }},
          {"H", [](const Eigen::Matrix3d& r) { return harmonic_rotation(2, r); }}};
}

}  // namespace

std::vector<Irrep> polyhedral_irreps(const Schoenflies& symbol,
                                     const std::vector<Eigen::Matrix3d>& operations) {
  const std::pair<std::string, MatrixOf> a = {"A",
                                              [](const Eigen::Matrix3d&) { return number(1.0); }};
  const std::pair<std::string, MatrixOf> a1 = {"A1", a.second};
  const std::pair<std::string, MatrixOf> a2 = {
      "A2", [](const Eigen::Matrix3d& r) { return number(xyz_sign(r)); }};
  const std::pair<std::string, MatrixOf> e = {"E", e_matrix};
  const MatrixOf vector = [](const Eigen::Matrix3d& r) { return Eigen::MatrixXd(r); };

  std::vector<Irrep> irreps;
  switch (symbol.family) {
    case Family::T:
      add(irreps, operations, {a, e, {"T", vector}}, false, "E");
      break;
    case Family::Th:
      add(irreps, operations, {a, e, {"T", vector}}, true, "E");
      break;
    case Family::O:
      add(irreps, operations, {a1, a2, e, {"T1", vector}, {"T2", t2_matrix}}, false);
      break;
    case Family::Oh:
      add(irreps, operations, {a1, a2, e, {"T1", vector}, {"T2", t2_matrix}}, true);
      break;
    case Family::Td:
      return tetrahedral_td(operations);
    case Family::I:
      add(irreps, operations, icosahedral(operations), false);
      break;
    case Family::Ih:
      add(irreps, operations, icosahedral(operations), true);
      break;
    default:
      return spherical(operations);
  }
  return irreps;
}

}  // namespace irrepwise
