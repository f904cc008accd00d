// A molecular point group in its standard frame: operations, classes, product table, irreps.
#pragma once

#include <string>
#include <vector>

#include <Eigen/Core>

#include "symmetry/schoenflies.hpp"

namespace irrepwise {

/// One irreducible representation over the real numbers. A pair of complex conjugate irreps is one
/// real irrep of dimension 2 with `complex_pair` set: its matrices are then rotations by the phase
/// of the character, D(g) = [cos a, -sin a; sin a, cos a].
struct Irrep {
  std::string label;  // "A1g", "E1\"", "T2", "Sigmag+": ASCII, capital
  int dimension = 1;
  bool complex_pair = false;
  std::vector<Eigen::MatrixXd> matrices;  // by operation, real orthogonal, `dimension x dimension`
  std::vector<double> characters;         // by operation: traces of the matrices
};

struct ConjugacyClass {
  std::string symbol;           // "2C4", "3C2'", "σh" as "sigmah": ASCII; the size is part of it
  std::vector<int> operations;  // indices, ascending
};

/// Always valid: the operations are closed and in the standard frame of the conventions, the first
/// is the identity, and the irreps obey the orthogonality theorem.
///
/// For the infinite groups the operations are nodes of an exact quadrature over the group: for
/// functions with |m| up to 3, the mean over 8 equidistant angles equals the integral over the
/// angle (every product of two such functions has |m| up to 6 < 8). For Kh there is only the
/// identity and the inversion; code that projects asks `Family::Kh` first.
class PointGroup {
 public:
  explicit PointGroup(const Schoenflies& symbol);

  [[nodiscard]] const Schoenflies& symbol() const noexcept { return symbol_; }
  [[nodiscard]] const std::vector<Eigen::Matrix3d>& operations() const noexcept;
  [[nodiscard]] int order() const noexcept { return static_cast<int>(operations_.size()); }
  [[nodiscard]] int product(int g, int h) const { return products_[g * order() + h]; }  // g after h
  [[nodiscard]] int inverse(int g) const { return inverses_[g]; }
  [[nodiscard]] const std::vector<ConjugacyClass>& classes() const noexcept { return classes_; }
  [[nodiscard]] const std::vector<Irrep>& irreps() const noexcept { return irreps_; }

  /// @param label   any case, "a1g", "E1\"", "sigmag+"
  /// @throws Error  with the nearest label
  [[nodiscard]] int irrep_index(const std::string& label) const;

 private:
  Schoenflies symbol_;
  std::vector<Eigen::Matrix3d> operations_;
  std::vector<int> products_;
  std::vector<int> inverses_;
  std::vector<ConjugacyClass> classes_;
  std::vector<Irrep> irreps_;
};

/// "A1g" -> "a1g": the label of a level of that irrep, ASCII as in JSON ("e1\"", "sigmag+").
[[nodiscard]] std::string level_label(const std::string& irrep_label);

/// ASCII label, capital or level, for people: "sigmag+" -> "σg+", "E1\"" stays.
[[nodiscard]] std::string readable_label(const std::string& ascii_label);

}  // namespace irrepwise
