#include "hueckel/rules.hpp"

#include <cmath>

#include <doctest/doctest.h>

#include "basis/basis.hpp"
#include "core/error.hpp"
#include "support/molecules.hpp"

using namespace irrepwise;

// Formulas: Ammeter et al. (1978), Wolfsberg and Helmholz (1952), Ballhausen and Gray (1962),
// Cusachs (1965); the arithmetic below is by hand and exact in binary where compared with ==.

TEST_CASE("each rule gives what its formula gives by hand") {
  // H = -10 and -30 eV: mean -20, Δ = ±1/2, K' = 1.75 + 1/4 - 0.75/16 = 1.953125.
  CHECK(OffDiagonalRule{Rule::Weighted, 1.75}.factor(-10, -30) == -39.0625);
  CHECK(OffDiagonalRule{Rule::WolfsbergHelmholz, 1.75}.factor(-10, -30) == -35.0);
  CHECK(OffDiagonalRule{Rule::GeometricMean, 2.0}.factor(-10, -40) == -40.0);  // -2 √400
  CHECK(OffDiagonalRule{Rule::Cusachs, 1.0}.factor(-10, -30) == -20.0);
}

TEST_CASE("every rule treats the two orbitals alike") {
  for (Rule rule : {Rule::Weighted, Rule::WolfsbergHelmholz, Rule::GeometricMean, Rule::Cusachs}) {
    const OffDiagonalRule with_k{rule, 1.9};
    CHECK(with_k.factor(-7.25, -21.5) ==
          doctest::Approx(with_k.factor(-21.5, -7.25)).epsilon(1e-15));
  }
}

TEST_CASE("between equal orbitals the weighted, plain and geometric rules are one") {
  for (double k : {1.5, 1.75, 2.0}) {
    const double plain = OffDiagonalRule{Rule::WolfsbergHelmholz, k}.factor(-13.6, -13.6);
    CHECK(plain == doctest::Approx(-13.6 * k).epsilon(1e-15));
    CHECK(OffDiagonalRule{Rule::Weighted, k}.factor(-13.6, -13.6) == plain);
    CHECK(OffDiagonalRule{Rule::GeometricMean, k}.factor(-13.6, -13.6) ==
          doctest::Approx(plain).epsilon(1e-15));
  }
}

TEST_CASE("far apart in energy the weighted rule has K' = 2 whatever K") {
  // Δ -> ±1 gives K + 1 + (1 - K); the deeper orbital is -1 eV, so H is K' / 2 times it.
  for (double k : {1.5, 1.75, 2.5}) {
    CHECK(OffDiagonalRule{Rule::Weighted, k}.factor(-1.0, -1e-12) ==
          doctest::Approx(-1.0).epsilon(1e-9));
  }
}

TEST_CASE("only Cusachs' rule changes the overlap, and makes its H the mean at full overlap") {
  for (Rule rule : {Rule::Weighted, Rule::WolfsbergHelmholz, Rule::GeometricMean}) {
    CHECK_FALSE(OffDiagonalRule{rule, 1.75}.map());
  }
  const OverlapMap map = OffDiagonalRule{Rule::Cusachs, 1.0}.map();
  REQUIRE(map);
  CHECK(map(0.0) == 0.0);
  CHECK(map(0.5) == 0.75);
  CHECK(map(-0.5) == -0.75);
  CHECK(map(1.0) == 1.0);
}

TEST_CASE("a K or an H_ii that makes no sense is refused") {
  const Basis basis = make_basis(methane(1.09), published_parameters());
  CHECK(make_rule(Rule::Weighted, {}, basis).k == 1.75);
  CHECK(make_rule(Rule::GeometricMean, {}, basis).k == 2.0);
  CHECK(make_rule(Rule::Weighted, 1.6, basis).k == 1.6);
  CHECK_THROWS_WITH_AS((void)make_rule(Rule::Cusachs, 1.75, basis),
                       "the rule cusachs has no K; leave K out or choose another rule", Error);
  CHECK_THROWS_WITH_AS((void)make_rule(Rule::Weighted, 0.0, basis),
                       "K = 0, expected more than 0 and at most 10 (usual: 1.75)", Error);
  CHECK_THROWS_WITH_AS((void)make_rule(Rule::Weighted, std::nan(""), basis),
                       "K = nan, expected more than 0 and at most 10 (usual: 1.75)", Error);
  Basis spoilt = basis;
  spoilt.shells[1].h_ii_ev = 0.5;
  CHECK_THROWS_WITH_AS((void)make_rule(Rule::Weighted, {}, spoilt),
                       "atom 1: H_ii of shell 2p = 0.5 eV, expected a negative energy", Error);
}
