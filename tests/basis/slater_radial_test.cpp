#include "basis/slater_radial.hpp"

#include <cmath>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "support/eps.hpp"

using irrepwise::Error, irrepwise::SlaterRadial;

TEST_CASE("one-centre overlap is within 16 eps of quadrature, and the same in both orders") {
  // Source: quadrature of R_a R_b r^2 at 60 digits (mpmath), not the closed form.
  // Regenerate: python3 tests/reference/one_centre_overlap.py. Each zeta is exact in binary.
  struct Row {
    SlaterRadial a, b;
    double overlap;
  };
  const Row rows[] = {{{1, 1}, {1, 1.25}, 0.9815387555554632412221338},
                      {{2, 1.625}, {2, 1.25}, 0.9580080954256381599252484},
                      {{2, 0.5}, {1, 5.75}, 0.02213386836892277174274258},
                      {{7, 0.5}, {1, 9.5}, 7.99708571627064363679506e-9}};
  for (const Row& row : rows) {
    const double found = one_centre_overlap(row.a, row.b);
    CAPTURE(row.overlap);
    CHECK(error_in_eps(found, row.overlap) <= 16.0);
    CHECK(found == one_centre_overlap(row.b, row.a));
  }
}

TEST_CASE("a function overlaps itself with exactly one") {
  const SlaterRadial f(3, 1.0 / 3.0);
  CHECK(one_centre_overlap(f, f) == 1.0);
}

TEST_CASE("a value out of range is refused, and the message gives value, unit and range") {
  CHECK_THROWS_WITH_AS(SlaterRadial(1, -0.5),
                       "Slater function: zeta = -0.5 bohr^-1, expected 0.001 to 1000", Error);
  CHECK_THROWS_WITH_AS(SlaterRadial(8, 1.0), "Slater function: n = 8, expected 1 to 7", Error);
  CHECK_THROWS_WITH_AS(SlaterRadial(0, 1.0), "Slater function: n = 0, expected 1 to 7", Error);
  CHECK_THROWS_AS(SlaterRadial(1, std::nan("")), Error);
}
