// Coefficients of two-centre overlaps: what remains of the integrand when its exponentials and the
// scale of length are taken out. They depend on n and l alone.
#pragma once

#include <vector>

#include "basis/slater_radial.hpp"

namespace irrepwise {

/// One more than shells have, for derivatives with respect to exponents.
inline constexpr int largest_overlap_n = SlaterRadial::max_n + 1;

/// In prolate spheroidal coordinates xi = (r_a + r_b)/R, eta = (r_a - r_b)/R, the overlap of two
/// Slater functions is, with N = n_a + n_b, alpha = R (zeta_a + zeta_b)/2, beta = R (zeta_a -
/// zeta_b)/2 and t_i = 2 zeta_i / (zeta_a + zeta_b),
///   S_m = t_a^(n_a+1/2) t_b^(n_b+1/2) alpha^(N+1) / sqrt((2n_a)! (2n_b)!)
///         * integral over xi >= 1, |eta| <= 1 of W_m(xi, eta) e^(-alpha xi - beta eta),
/// where the polynomial W_m has degree N in either variable. In powers of xi - 1 the integral over
/// xi is i! / alpha^(i+1) for each, and what is left is
///   S_m = t_a^(n_a+1/2) t_b^(n_b+1/2) e^-alpha sum_jk C_mjk alpha^k eta_j(beta)
/// with the integrals eta_j of one of two bases. Both keep the sum free of cancellation where they
/// are used, which powers of xi and eta do not.
enum class EtaBasis {
  Legendre,   // P_j(eta), for small beta: eta_j = (-1)^j i_j(beta), modified spherical Bessel
  FromFirst,  // (1+eta)^j, for large beta > 0: eta_j = integral of (1+eta)^j e^(-beta eta)
};

struct OverlapTable {
  int degree = 0;                    // N: j and k run from 0 to N
  int stride = 0;                    // N + 1 rounded up to an even number; what is between is zero
  int n_m = 0;                       // smaller l + 1
  std::vector<double> coefficients;  // C_mjk at (m * (degree + 1) + j) * stride + k
};

/// Made when first asked for, then kept: the tables are constants, and too many to make them all.
/// Safe to call from any number of threads.
///
/// @param n_a, l_a, n_b, l_b  0 <= l < n <= 8, l <= 3, n_a + n_b <= 15
/// @accuracy                  each coefficient to 1 eps
/// @source                    form of the integrand: Mulliken, Rieke, Orloff and Orloff, J. Chem.
///                            Phys. 17, 1248 (1949); these expansions are our own derivation
[[nodiscard]] const OverlapTable& overlap_table(EtaBasis basis, int n_a, int l_a, int n_b, int l_b);

}  // namespace irrepwise
