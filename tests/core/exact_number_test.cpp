#include "core/exact_number.hpp"

#include <cmath>
#include <limits>
#include <numbers>
#include <string>

#include <doctest/doctest.h>

using irrepwise::exact_form;

TEST_CASE("coefficients of SALCs get their exact form") {
  CHECK(exact_form(0.0) == "0");
  CHECK(exact_form(1.0) == "1");
  CHECK(exact_form(-1.0) == "-1");
  CHECK(exact_form(0.5) == "1/2");
  CHECK(exact_form(-std::sqrt(0.5)) == "-1/√2");
  CHECK(exact_form(1.0 / std::sqrt(6.0)) == "1/√6");
  CHECK(exact_form(-1.0 / std::sqrt(12.0)) == "-1/√12");
  CHECK(exact_form(std::sqrt(3.0) / 2.0) == "√3/2");
  CHECK(exact_form(2.0 / std::sqrt(12.0)) == "1/√3");
  CHECK(exact_form(std::sqrt(2.0 / 3.0)) == "√(2/3)");
  CHECK(exact_form(2.0 / std::sqrt(5.0)) == "2/√5");
}

TEST_CASE("numbers with the square root of five get theirs") {
  using std::numbers::phi;
  CHECK(exact_form(phi / 2.0) == "(1+√5)/4");
  CHECK(exact_form(-1.0 / phi) == "(1-√5)/2");
  // sin 72° and sin 36°, from the regular pentagon: √((5 ± √5)/8).
  CHECK(exact_form(std::sin(72.0 / 180.0 * std::numbers::pi)) == "√((5+√5)/8)");
  CHECK(exact_form(-std::sin(36.0 / 180.0 * std::numbers::pi)) == "-√((5-√5)/8)");
}

TEST_CASE("a value a little off, or without a short form, stays a number") {
  CHECK_FALSE(exact_form(0.5 + 1e-10));
  CHECK_FALSE(exact_form(0.3717482));
  CHECK_FALSE(exact_form(std::cos(std::numbers::pi / 7.0)));  // of degree three
  CHECK_FALSE(exact_form(std::numeric_limits<double>::quiet_NaN()));
  CHECK_FALSE(exact_form(1e300));
}
