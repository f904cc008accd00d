#include "hueckel/options.hpp"

#include <doctest/doctest.h>

#include "core/error.hpp"

using namespace irrepwise;

TEST_CASE("every rule is read by the name it is printed with") {
  for (const Rule rule :
       {Rule::Weighted, Rule::WolfsbergHelmholz, Rule::GeometricMean, Rule::Cusachs}) {
    CHECK(parse_rule(rule_name(rule)) == rule);
  }
}

TEST_CASE("K is 1.75, 2 for the geometric mean, and absent from Cusachs' rule") {
  // Common practice; Wolfsberg and Helmholz (1952), Ballhausen and Gray (1962), Cusachs (1965).
  CHECK(default_k(Rule::Weighted) == 1.75);
  CHECK(default_k(Rule::WolfsbergHelmholz) == 1.75);
  CHECK(default_k(Rule::GeometricMean) == 2.0);
  CHECK_FALSE(default_k(Rule::Cusachs).has_value());
}

TEST_CASE("an unknown rule is refused with the nearest one and all of them") {
  CHECK_THROWS_WITH_AS((void)parse_rule("wolfsberg-helmholtz"),
                       "unknown rule 'wolfsberg-helmholtz'; did you mean 'wolfsberg-helmholz'? the "
                       "rules are weighted, wolfsberg-helmholz, geometric-mean and cusachs",
                       Error);
  CHECK_THROWS_WITH_AS((void)parse_rule("x"),
                       "unknown rule 'x'; the rules are weighted, wolfsberg-helmholz, "
                       "geometric-mean and cusachs",
                       Error);
}
