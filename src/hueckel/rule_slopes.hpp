// How the off-diagonal rules change with what they are given.
#pragma once

#include "hueckel/rules.hpp"

namespace irrepwise {

/// Derivatives of `OffDiagonalRule::factor`.
struct FactorSlopes {
  double by_first = 0.0;   // with respect to the first H_ii, no unit
  double by_second = 0.0;  // with respect to the second
  double by_k_ev = 0.0;    // with respect to K; zero for `cusachs`
};

/// @source  derived by us from the formulas of rules.hpp
[[nodiscard]] FactorSlopes factor_slopes(const OffDiagonalRule& rule, double h_i_ev, double h_j_ev);

/// Derivative of `OffDiagonalRule::map` at one overlap of the diatomic frame.
[[nodiscard]] double map_slope(const OffDiagonalRule& rule, double overlap);

}  // namespace irrepwise
