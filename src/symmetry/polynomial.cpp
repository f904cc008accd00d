#include "symmetry/polynomial.hpp"

#include <cassert>
#include <cctype>
#include <cmath>
#include <numbers>

namespace irrepwise {
namespace {

using Exponents = std::array<int, 3>;

Polynomial product(const Polynomial& a, const Polynomial& b) {
  Polynomial result;
  for (const auto& [ea, ca] : a) {
    for (const auto& [eb, cb] : b) {
      result[{ea[0] + eb[0], ea[1] + eb[1], ea[2] + eb[2]}] += ca * cb;
    }
  }
  return result;
}

Polynomial constant(double value) { return {{{0, 0, 0}, value}}; }

// sum = term (('+' | '-') term)*; term = factor*, '*' between them if one likes, '/' before a
// constant; factor = digits | 'phi' digits? | variable digits? | '(' sum ')'.
class Reader {
 public:
  explicit Reader(std::string_view text) : text_(text) {}

  Polynomial sum() {
    Polynomial result;
    double sign = 1.0;
    while (true) {
      for (const auto& [exponents, coefficient] : term()) result[exponents] += sign * coefficient;
      if (text_.empty() || text_[0] == ')') break;
      assert(text_[0] == '+' || text_[0] == '-');
      sign = text_[0] == '+' ? 1.0 : -1.0;
      text_.remove_prefix(1);
    }
    std::erase_if(result, [](const auto& entry) { return entry.second == 0.0; });
    return result;
  }

 private:
  int digits(int otherwise) {
    if (text_.empty() || std::isdigit(static_cast<unsigned char>(text_[0])) == 0) return otherwise;
    const int digit = text_[0] - '0';
    text_.remove_prefix(1);
    return digit;
  }

  Polynomial term() {
    Polynomial result = constant(1.0);
    bool divides = false;
    while (!text_.empty() && text_[0] != '+' && text_[0] != '-' && text_[0] != ')') {
      if (text_[0] == '*' || text_[0] == '/') {
        divides = text_[0] == '/';
        text_.remove_prefix(1);
        continue;
      }
      Polynomial next = factor();
      if (divides) next = constant(1.0 / next.at({0, 0, 0}));
      divides = false;
      result = product(result, next);
    }
    return result;
  }

  Polynomial factor() {
    if (text_[0] == '(') {
      text_.remove_prefix(1);
      Polynomial inner = sum();
      assert(!text_.empty() && text_[0] == ')');
      text_.remove_prefix(1);
      return inner;
    }
    if (text_.starts_with("phi")) {
      text_.remove_prefix(3);
      return constant(std::pow(std::numbers::phi, digits(1)));
    }
    if (std::isdigit(static_cast<unsigned char>(text_[0])) != 0) return constant(digits(1));
    const int variable = text_[0] - 'x';
    assert(variable >= 0 && variable < 3);
    text_.remove_prefix(1);
    Exponents exponents = {0, 0, 0};
    exponents[static_cast<std::size_t>(variable)] = digits(1);
    return {{exponents, 1.0}};
  }

  std::string_view text_;
};

}  // namespace

Polynomial parse_polynomial(std::string_view name) { return Reader(name).sum(); }

Polynomial transformed(const Polynomial& polynomial, const Eigen::Matrix3d& operation) {
  // g^-1 r = g^T r: the variable i becomes the linear form of column i of g.
  std::array<Polynomial, 3> images;
  for (int i = 0; i < 3; ++i) {
    images[static_cast<std::size_t>(i)] = {
        {{1, 0, 0}, operation(0, i)}, {{0, 1, 0}, operation(1, i)}, {{0, 0, 1}, operation(2, i)}};
  }
  Polynomial result;
  for (const auto& [exponents, coefficient] : polynomial) {
    Polynomial image = constant(coefficient);
    for (std::size_t i = 0; i < 3; ++i) {
      for (int power = 0; power < exponents[i]; ++power) image = product(image, images[i]);
    }
    for (const auto& [e, c] : image) result[e] += c;
  }
  return result;
}

Eigen::VectorXd coefficients(const Polynomial& polynomial, int degree) {
  Eigen::VectorXd values((degree + 1) * (degree + 2) / 2);
  Eigen::Index at = 0;
  for (int a = 0; a <= degree; ++a) {
    for (int b = 0; a + b <= degree; ++b) {
      const auto found = polynomial.find({a, b, degree - a - b});
      values[at++] = found == polynomial.end() ? 0.0 : found->second;
    }
  }
  return values;
}

}  // namespace irrepwise
