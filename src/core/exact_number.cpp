#include "core/exact_number.hpp"

#include <cmath>
#include <string>

#include <fmt/format.h>

namespace irrepwise {
namespace {

constexpr double tolerance = 1e-12;
constexpr int largest_denominator = 240;
constexpr int largest_golden_denominator = 40;
const double root_five = std::sqrt(5.0);

struct Fraction {
  long numerator;
  long denominator;
};

std::optional<Fraction> as_fraction(double value, double within, int largest) {
  for (int q = 1; q <= largest; ++q) {
    const double p = std::round(value * q);
    if (std::abs(value - p / q) <= within) return Fraction{static_cast<long>(p), q};
  }
  return std::nullopt;
}

long whole_root(long n) {
  const long root = std::lround(std::sqrt(static_cast<double>(n)));
  return root * root == n ? root : 0;
}

std::string over(const std::string& top, const std::string& bottom) {
  return bottom == "1" ? top : top + "/" + bottom;
}

// √(p/q), p and q without common factor: "1/2", "√3/2", "1/√6", "√(2/3)".
std::string root_of(const Fraction& f) {
  const long top = whole_root(f.numerator), bottom = whole_root(f.denominator);
  if (top > 0 && bottom > 0) return over(std::to_string(top), std::to_string(bottom));
  if (bottom > 0) return over(fmt::format("√{}", f.numerator), std::to_string(bottom));
  if (top > 0) return fmt::format("{}/√{}", top, f.denominator);
  return fmt::format("√({}/{})", f.numerator, f.denominator);
}

// (a ± b √5) / q with small whole numbers.
std::optional<std::string> golden(double value, double within) {
  for (int q = 1; q <= largest_golden_denominator; ++q) {
    for (int b = -6; b <= 6; ++b) {
      if (b == 0) continue;
      const double a = std::round(value * q - b * root_five);
      if (std::abs(a) > 15 || std::abs(value - (a + b * root_five) / q) > within) continue;
      const std::string root = std::abs(b) == 1 ? "√5" : fmt::format("{}√5", std::abs(b));
      const std::string first = a == 0 ? "" : fmt::format("{}", static_cast<int>(a));
      const std::string sign = b < 0 ? "-" : a == 0 ? "" : "+";
      const std::string top = first + sign + root;
      if (q == 1) return top;
      return a == 0 ? fmt::format("{}/{}", top, q) : fmt::format("({})/{}", top, q);
    }
  }
  return std::nullopt;
}

}  // namespace

std::optional<std::string> exact_form(double value) {
  if (!std::isfinite(value) || std::abs(value) > 12.0) return std::nullopt;
  const double size = std::abs(value);
  if (size <= tolerance) return "0";
  const std::string sign = value < 0.0 ? "-" : "";
  const double square = size * size;
  const double within = 2.0 * size * tolerance;  // an error of the value, carried to its square
  if (const auto f = as_fraction(square, within, largest_denominator); f && f->numerator > 0) {
    return sign + root_of(*f);
  }
  if (const auto form = golden(size, tolerance)) {
    // A minus before a sum would need brackets of its own: turn the signs inside instead.
    return value < 0.0 ? golden(value, tolerance) : form;
  }
  if (const auto form = golden(square, within)) {
    return sign + "√(" + *form + ")";
  }
  return std::nullopt;
}

}  // namespace irrepwise
