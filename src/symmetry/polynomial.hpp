// Homogeneous polynomials in x, y, z by the names that character tables print.
#pragma once

#include <array>
#include <map>
#include <string_view>

#include <Eigen/Core>

namespace irrepwise {

/// Exponents of x, y, z -> coefficient; no zero coefficients.
using Polynomial = std::map<std::array<int, 3>, double>;

/// @param name  "x2-y2", "z(x2-y2)", "x(x2-3phi*y2+3z2/phi)": digits before a letter are a factor,
///              behind it a power; phi is the golden ratio, phi2 its square. One of our own names
///              (asserted), not a user's text
[[nodiscard]] Polynomial parse_polynomial(std::string_view name);

/// @returns  the polynomial of the image: (g f)(r) = f(g^-1 r)
[[nodiscard]] Polynomial transformed(const Polynomial& polynomial,
                                     const Eigen::Matrix3d& operation);

/// @returns  coefficients of the (degree + 1)(degree + 2)/2 monomials, in a fixed order
[[nodiscard]] Eigen::VectorXd coefficients(const Polynomial& polynomial, int degree);

}  // namespace irrepwise
