// Direct products of irreps, and the symmetric and antisymmetric parts of powers.
#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "symmetry/point_group.hpp"
#include "symmetry/reduction.hpp"

namespace irrepwise {

/// An irrep, or its power where the exponent is more than 1.
struct Factor {
  std::string label;  // as in the group's character table
  int exponent = 1;

  friend bool operator==(const Factor&, const Factor&) = default;
};

/// @param text    "e1g x t2u", "e1g,t2u", "t2g^2 eg", "πu²": factors joined by x, ×, *, commas or
///                blanks; labels in any case
/// @throws Error  for an unknown irrep (nearest label), no factor, or an exponent outside 1 to 20
[[nodiscard]] std::vector<Factor> parse_factors(const PointGroup& group, std::string_view text);

/// @returns  "E1g x T2u^2"
[[nodiscard]] std::string factors_text(const std::vector<Factor>& factors);

/// @throws Error  for an unknown irrep, or a product of more than a million dimensions
[[nodiscard]] Reduction direct_product(const PointGroup& group, const std::vector<Factor>& factors);
[[nodiscard]] Reduction direct_product(const PointGroup& group, const std::string& a,
                                       const std::string& b);

/// Parts of the n-th power of one irrep. The antisymmetric one is empty for n above the dimension.
[[nodiscard]] Reduction symmetric_power(const PointGroup& group, const std::string& label, int n);
[[nodiscard]] Reduction antisymmetric_power(const PointGroup& group, const std::string& label,
                                            int n);

/// One question, answered as far as it goes.
struct ProductAnswer {
  std::vector<Factor> factors;
  Reduction product;
  // For one irrep to a power, or one irrep twice: the parts. For squares they add up to the
  // product.
  bool has_parts = false;
  Reduction symmetric;
  Reduction antisymmetric;
};

/// @throws Error  as `parse_factors` and `direct_product`
[[nodiscard]] ProductAnswer answer_product(const PointGroup& group, std::string_view question);

}  // namespace irrepwise
