#include "basis/slater_radial.hpp"

#include <cmath>

#include <boost/math/special_functions/factorials.hpp>

#include <fmt/format.h>

#include "core/error.hpp"

namespace irrepwise {
namespace {
// k <= 2 * max_n = 14 and 14! < 2^53, so every factorial used here is exact.
double factorial(int k) { return boost::math::factorial<double>(static_cast<unsigned>(k)); }
}  // namespace

SlaterRadial::SlaterRadial(int n, double zeta) : n_(n), zeta_(zeta) {
  if (n < 1 || n > max_n) {
    throw Error(fmt::format("Slater function: n = {}, expected 1 to {}", n, max_n));
  }
  if (!(zeta >= min_zeta && zeta <= max_zeta)) {  // in this form NaN is refused too
    throw Error(fmt::format("Slater function: zeta = {} bohr^-1, expected {} to {}", zeta, min_zeta,
                            max_zeta));
  }
}

double one_centre_overlap(const SlaterRadial& a, const SlaterRadial& b) {
  const double sum = a.zeta() + b.zeta();
  const double power_a = std::pow(2.0 * a.zeta() / sum, a.n() + 0.5);
  const double power_b = std::pow(2.0 * b.zeta() / sum, b.n() + 0.5);
  const double ratio =
      factorial(a.n() + b.n()) / std::sqrt(factorial(2 * a.n()) * factorial(2 * b.n()));
  return ratio * (power_a * power_b);  // grouped so that swapping a and b changes no bit
}

}  // namespace irrepwise
