// Overlap blocks that are singular or nearly so: a warning or an error that names what is behind.
#include "hueckel/near_singular.hpp"

#include <string>
#include <vector>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "core/constants.hpp"
#include "core/error.hpp"
#include "molecule/element.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

// Hydrogen with one 1s function of any exponent.
ParameterSet hydrogen(double zeta) {
  return ParameterSet(
      "diffuse hydrogen",
      {{1, {1, {{1, 0, -13.6, ContractedRadial({{SlaterRadial(1, zeta), 1.0}}), ""}}}}});
}

Molecule chain(int atoms, double spacing_angstrom) {
  std::vector<Atom> list;
  for (int i = 0; i < atoms; ++i) list.push_back({1, {0, 0, i * spacing_angstrom}});
  return Molecule(std::move(list), 0);
}

}  // namespace

TEST_CASE(
    "a nearly singular overlap is a warning that names the smallest eigenvalue and the shells") {
  // 1 - S for two 1s functions, S = e^(-p)(1 + p + p²/3) = 1 - p²/6 + p⁴/24 + O(p⁵), p = ζR.
  const double p = 1e-3 * 0.74 / bohr_in_angstrom;
  const Run r = run(chain(2, 0.74), {}, {}, hydrogen(1e-3));
  REQUIRE(r.levels.warnings.size() == 1);
  CHECK(
      r.levels.warnings.front() ==
      fmt::format("the overlap of sigmau+ is nearly singular (smallest eigenvalue {:.1e}), through "
                  "1s of H1 and H2; its highest levels cannot be trusted",
                  p * p / 6.0));
  // With p ten times as large the eigenvalue is 3e-5, and nothing is said.
  CHECK(run(chain(2, 0.74), {}, {}, hydrogen(1e-2)).levels.warnings.empty());
}

TEST_CASE("an overlap that is singular to working precision is an error that names the shells") {
  // Smooth functions that differ by a shift: each atom more brings another factor p² in the
  // smallest eigenvalue, which for five is 1e-17 or less.
  std::string message;
  try {
    (void)run(chain(5, 0.74), {}, {}, hydrogen(1e-3));
  } catch (const Error& error) {
    message = error.what();
  }
  CHECK(
      message.starts_with("the overlap of sigmag+ is not positive definite (smallest eigenvalue "));
  CHECK(message.find("1s of H") != std::string::npos);
  CHECK(message.ends_with("; atoms stand too close, or exponents are too small"));
}
