// Errors in units of the machine epsilon, for checks against tables of many digits.
#pragma once

#include <cmath>
#include <limits>

/// @returns  |found - expected| / (eps |expected|); for expected = 0, |found| / eps
inline double error_in_eps(double found, double expected) {
  constexpr double eps = std::numeric_limits<double>::epsilon();
  const double scale = expected == 0.0 ? 1.0 : std::abs(expected);
  return std::abs(found - expected) / (eps * scale);
}
