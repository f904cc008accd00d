#include "basis/shell.hpp"

#include <cmath>
#include <string>

#include <boost/math/quadrature/exp_sinh.hpp>

#include <doctest/doctest.h>

#include "core/error.hpp"

using irrepwise::ContractedRadial, irrepwise::Error, irrepwise::SlaterRadial;

namespace {

double radial_value(const ContractedRadial& radial, double r) {
  double sum = 0.0;
  for (const ContractedRadial::Term& term : radial.terms()) {
    const int n = term.function.n();
    const double zeta = term.function.zeta();
    const double norm = std::pow(2 * zeta, n + 0.5) / std::sqrt(std::tgamma(2 * n + 1));
    sum += term.coefficient * norm * std::pow(r, n - 1) * std::exp(-zeta * r);
  }
  return sum;
}

}  // namespace

TEST_CASE("a contraction is normalised on reading, as quadrature over the radius finds") {
  // Coefficients rounded to two figures, so that there is something to mend (norm 1.0037).
  const ContractedRadial radial({{{3, 5.0}, 0.57}, {{3, 2.0}, 0.59}});
  boost::math::quadrature::exp_sinh<double> quadrature;
  const double norm =
      quadrature.integrate([&](double r) { return std::pow(r * radial_value(radial, r), 2); });
  CHECK(std::abs(norm - 1.0) <= 1e-12);  // the quadrature's own accuracy
  CHECK(radial.terms()[0].coefficient != 0.57);
  const double ratio = radial.terms()[0].coefficient / radial.terms()[1].coefficient;
  CHECK(ratio == doctest::Approx(0.57 / 0.59).epsilon(1e-14).scale(0));
  CHECK(radial.n() == 3);
}

TEST_CASE("a single function with coefficient one stays exactly as it is") {
  const ContractedRadial radial({{{2, 1.625}, 1.0}});
  CHECK(radial.terms().size() == 1);
  CHECK(radial.terms()[0].coefficient == 1.0);
}

TEST_CASE("a contraction that cannot be right is refused with what was found and expected") {
  CHECK_THROWS_WITH_AS(ContractedRadial({}), "contraction: 0 Slater functions, expected one or two",
                       Error);
  CHECK_THROWS_WITH_AS(ContractedRadial({{{3, 1.0}, 0.5}, {{3, 2.0}, 0.5}, {{3, 3.0}, 0.5}}),
                       "contraction: 3 Slater functions, expected one or two", Error);
  CHECK_THROWS_WITH_AS(ContractedRadial({{{3, 1.0}, 0.5}, {{4, 2.0}, 0.5}}),
                       "contraction: n = 3 and n = 4, expected the same n in both functions",
                       Error);
  CHECK_THROWS_WITH_AS(ContractedRadial({{{1, 1.0}, std::nan("")}}),
                       "contraction: coefficient nan, expected a number", Error);
  // <R(3,1)|R(3,1)> = 1, so one coefficient 0.9 has the norm 0.81.
  CHECK_THROWS_WITH_AS(ContractedRadial({{{3, 1.0}, 0.9}}),
                       "contraction: norm 0.8100, expected 1 within 0.01; check coefficients and "
                       "exponents for a misprint",
                       Error);
  CHECK_NOTHROW(ContractedRadial({{{3, 1.0}, 0.9951}}));           // norm 0.9902
  CHECK_THROWS_AS(ContractedRadial({{{3, 1.0}, 0.9949}}), Error);  // norm 0.9898
}

TEST_CASE("orbitals bear the names and the order of the conventions") {
  const auto names = [](int l) {
    std::string all;
    for (int i = 0; i <= 2 * l; ++i) all += std::string(irrepwise::orbital_name(l, i)) + " ";
    return all;
  };
  CHECK(names(0) == "s ");
  CHECK(names(1) == "px py pz ");
  CHECK(names(2) == "dz2 dx2-y2 dxy dxz dyz ");
  CHECK(names(3) == "fz3 fxz2 fyz2 fz(x2-y2) fxyz fx(x2-3y2) fy(3x2-y2) ");
  CHECK(irrepwise::shell_letter(0) == 's');
  CHECK(irrepwise::shell_letter(1) == 'p');
  CHECK(irrepwise::shell_letter(2) == 'd');
  CHECK(irrepwise::shell_letter(3) == 'f');
}
