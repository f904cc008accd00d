#include "hueckel/rule_slopes.hpp"

#include <cmath>

#include <doctest/doctest.h>

using namespace irrepwise;

TEST_CASE("slopes of every rule are the differences of its factor") {
  // A second way to compute: central differences; the factors are smooth on the scale of 1 eV.
  constexpr double step = 1e-4;
  for (const Rule rule :
       {Rule::Weighted, Rule::WolfsbergHelmholz, Rule::GeometricMean, Rule::Cusachs}) {
    const OffDiagonalRule at{rule, 1.9};
    for (const double h_i : {-5.2, -12.6, -26.3}) {
      for (const double h_j : {-9.1, -12.6}) {
        const FactorSlopes slopes = factor_slopes(at, h_i, h_j);
        CAPTURE(static_cast<int>(rule));
        CHECK(std::abs(slopes.by_first - (at.factor(h_i + step, h_j) - at.factor(h_i - step, h_j)) /
                                             (2 * step)) < 1e-7);
        CHECK(std::abs(slopes.by_second -
                       (at.factor(h_i, h_j + step) - at.factor(h_i, h_j - step)) / (2 * step)) <
              1e-7);
        const double by_k = (OffDiagonalRule{rule, 1.9 + step}.factor(h_i, h_j) -
                             OffDiagonalRule{rule, 1.9 - step}.factor(h_i, h_j)) /
                            (2 * step);
        CHECK(std::abs(slopes.by_k_ev - by_k) < 1e-7);
      }
    }
    const OverlapMap map = at.map();
    for (const double overlap : {-0.4, 0.2, 0.7}) {
      const auto mapped = [&](double s) { return map ? map(s) : s; };
      CHECK(std::abs(map_slope(at, overlap) -
                     (mapped(overlap + step) - mapped(overlap - step)) / (2 * step)) < 1e-7);
    }
  }
}
