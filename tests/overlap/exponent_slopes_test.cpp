#include "overlap/exponent_slopes.hpp"

#include <cmath>
#include <vector>

#include <doctest/doctest.h>

#include "overlap/two_centre.hpp"

using namespace irrepwise;

namespace {

struct Pair {
  ContractedRadial a;
  int l_a;
  ContractedRadial b;
  int l_b;
};

ContractedRadial single(int n, double zeta) {
  return ContractedRadial({{SlaterRadial(n, zeta), 1.0}});
}

// The same contraction, ratio of coefficients kept, one exponent moved.
ContractedRadial moved(const ContractedRadial& radial, std::size_t term, double change) {
  std::vector<ContractedRadial::Term> terms(radial.terms().begin(), radial.terms().end());
  terms[term].function = SlaterRadial(radial.n(), terms[term].function.zeta() + change);
  return ContractedRadial(terms);
}

}  // namespace

TEST_CASE("slopes by the exponent are the differences of the overlaps") {
  // A second way to compute: central differences of fourth order, error below 1e-9 with this step.
  // The pair of n = 7 is the one that leads to n = 8.
  const ContractedRadial d({{SlaterRadial(5, 6.013), 0.6334}, {SlaterRadial(5, 2.696), 0.5513}});
  const Pair pairs[] = {{single(1, 1.3), 0, single(2, 1.625), 1},
                        {single(2, 1.625), 1, single(2, 1.625), 1},
                        {d, 2, single(3, 2.033), 1},
                        {single(3, 2.033), 1, d, 2},
                        {d, 2, d, 2},
                        {single(7, 1.8), 1, single(7, 2.2), 0},
                        {single(7, 2.2), 0, single(2, 2.425), 1},
                        {single(4, 5.0), 3, single(2, 2.0), 1}};
  for (const double distance : {1.5, 3.8, 7.0}) {
    for (const Pair& pair : pairs) {
      const auto slopes = exponent_slopes(pair.a, pair.l_a, pair.b, pair.l_b, distance);
      REQUIRE(slopes.size() == pair.a.terms().size());
      for (std::size_t term = 0; term < slopes.size(); ++term) {
        constexpr double step = 2e-3;
        const auto at = [&](double change) {
          return diatomic_overlaps(moved(pair.a, term, change), pair.l_a, pair.b, pair.l_b,
                                   distance);
        };
        const auto p1 = at(step), m1 = at(-step), p2 = at(2 * step), m2 = at(-2 * step);
        for (std::size_t m = 0; m < p1.size(); ++m) {
          const double difference = (8.0 * (p1[m] - m1[m]) - (p2[m] - m2[m])) / (12.0 * step);
          CAPTURE(distance);
          CAPTURE(m);
          CHECK(std::abs(slopes[term][m] - difference) < 1e-9);
        }
      }
    }
  }
}

TEST_CASE("growing both exponents as the distance shrinks changes no overlap") {
  // Identity: S depends on the products of exponents and distance only.
  const ContractedRadial a = single(7, 1.9), b = single(6, 2.5);
  const double distance = 4.2, step = 1e-4;
  const auto by_a = exponent_slopes(a, 1, b, 1, distance);
  const auto by_b = exponent_slopes(b, 1, a, 1, distance);
  const auto far = diatomic_overlaps(a, 1, b, 1, distance + step);
  const auto near = diatomic_overlaps(a, 1, b, 1, distance - step);
  for (std::size_t m = 0; m < 2; ++m) {
    const double by_distance = (far[m] - near[m]) / (2.0 * step);
    CHECK(std::abs(1.9 * by_a[0][m] + 2.5 * by_b[0][m] - distance * by_distance) < 1e-7);
  }
}
