// Characters at the points of a group over which reductions are summed, for finite and infinite
// groups alike.
#pragma once

#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "symmetry/point_group.hpp"
#include "symmetry/reduction.hpp"

namespace irrepwise {

struct TableIrrep {
  std::string label;
  int dimension = 1;
  bool complex_pair = false;
  std::vector<double> characters;  // by node
};

/// Finite groups: a node is a conjugacy class, its weight the share of the operations in it. Linear
/// molecules: equidistant turns about the axis and one mirror; single atoms: turns with the weight
/// 1 - cos φ of the rotation group; both times {1, i} where there is an inversion. The means over
/// the nodes equal those over the group exactly as long as no |m| or l exceeds the largest asked
/// for.
///
/// @source  measure on SO(3): Wigner, Group Theory (from memory); the rest derived by us
class CharacterTable {
 public:
  /// @param largest_m  infinite groups only: irreps up to this |m| or l are listed
  explicit CharacterTable(const PointGroup& group, int largest_m = 3);

  [[nodiscard]] int size() const noexcept { return static_cast<int>(weights_.size()); }
  [[nodiscard]] const std::vector<double>& weights() const noexcept { return weights_; }
  [[nodiscard]] const std::vector<TableIrrep>& irreps() const noexcept { return irreps_; }
  [[nodiscard]] int power(int node, int exponent) const;  // node of g^exponent, exponent >= 0

  /// @param label  as it stands in the table
  [[nodiscard]] const TableIrrep& irrep(std::string_view label) const;

  /// How often each irrep occurs; whole numbers of complex pairs.
  /// @param characters  by node, of a representation over the real numbers
  /// @throws Error      where the characters are those of no representation (a count is off a whole
  ///                    number by more than 1e-6)
  [[nodiscard]] Reduction reduce(std::span<const double> characters) const;

 private:
  void add_finite(const PointGroup& group);
  void add_linear(int largest_m, bool inversion);
  void add_spherical(int largest_l);
  void double_by_inversion();

  Schoenflies symbol_;
  std::vector<double> weights_;
  std::vector<std::vector<int>> cycles_;  // [node]: nodes of g^0, g^1 ... up to its order
  std::vector<TableIrrep> irreps_;
};

/// The label as it stands in the table, for what a user writes ("a1g", "e''", "πu", "sigmag").
/// @throws Error  for an unknown irrep, with the nearest or the expected ones
[[nodiscard]] std::string table_label(const PointGroup& group, std::string_view text);

/// @param label  as from `table_label`
/// @returns      |m| or l of an irrep of an infinite group; 0 for finite groups
[[nodiscard]] int angular_number(const PointGroup& group, std::string_view label);

/// Characters of the symmetric or antisymmetric part of the powers of a representation, by node,
/// for exponents 0 to `last`: Newton's identities on the characters of g, g^2, g^3 ...
///
/// @returns  [exponent][node]
[[nodiscard]] std::vector<std::vector<double>> symmetric_powers(const CharacterTable& table,
                                                                std::span<const double> characters,
                                                                int last);
[[nodiscard]] std::vector<std::vector<double>> antisymmetric_powers(
    const CharacterTable& table, std::span<const double> characters, int last);

}  // namespace irrepwise
