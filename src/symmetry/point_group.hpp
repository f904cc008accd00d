// A molecular point group in its standard frame: operations, classes, product table, irreps.
#pragma once

#include <string>
#include <vector>

#include <Eigen/Core>

#include "symmetry/classes.hpp"
#include "symmetry/irrep.hpp"
#include "symmetry/schoenflies.hpp"

namespace irrepwise {

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
  [[nodiscard]] const std::vector<Eigen::Matrix3d>& operations() const noexcept {
    return operations_;
  }
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

}  // namespace irrepwise
