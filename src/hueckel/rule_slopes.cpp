#include "hueckel/rule_slopes.hpp"

#include <cmath>

namespace irrepwise {

FactorSlopes factor_slopes(const OffDiagonalRule& rule, double h_i_ev, double h_j_ev) {
  const double mean = 0.5 * (h_i_ev + h_j_ev), k = rule.k;
  switch (rule.rule) {
    case Rule::Weighted: {
      const double sum = h_i_ev + h_j_ev;
      const double delta = (h_i_ev - h_j_ev) / sum;
      const double square = delta * delta;
      const double half = 0.5 * (k + square + (1.0 - k) * square * square);
      const double turn = mean * (2.0 * delta + 4.0 * (1.0 - k) * square * delta);
      return {half + turn * 2.0 * h_j_ev / (sum * sum), half - turn * 2.0 * h_i_ev / (sum * sum),
              (1.0 - square * square) * mean};
    }
    case Rule::WolfsbergHelmholz:
      return {0.5 * k, 0.5 * k, mean};
    case Rule::GeometricMean: {
      const double root = std::sqrt(h_i_ev * h_j_ev);
      return {-0.5 * k * h_j_ev / root, -0.5 * k * h_i_ev / root, -root};
    }
    case Rule::Cusachs:
      break;
  }
  return {0.5, 0.5, 0.0};
}

double map_slope(const OffDiagonalRule& rule, double overlap) {
  return rule.rule == Rule::Cusachs ? 2.0 * (1.0 - std::abs(overlap)) : 1.0;
}

}  // namespace irrepwise
