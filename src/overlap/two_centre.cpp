#include "overlap/two_centre.hpp"

#include <algorithm>
#include <array>
#include <cassert>
#include <cmath>
#include <cstddef>
#include <utility>

#include "overlap/overlap_table.hpp"

namespace irrepwise {
namespace {

constexpr int max_degree = SlaterRadial::max_n + largest_overlap_n;

using Moments = std::array<double, max_degree + 2>;

double power(double base, int exponent) {
  double result = 1.0;
  for (; exponent > 0; exponent >>= 1, base *= base) {
    if (exponent & 1) result *= base;
  }
  return result;
}

// i_l(beta) / beta^l = sum_k (beta^2/2)^k / (k! (2l+2k+1)!!), for l and l - 1 side by side.
// @source  DLMF 10.53.3
std::pair<double, double> scaled_bessel(int l, double half_square) {
  static const std::array<double, max_degree + 1> first = [] {
    std::array<double, max_degree + 1> inverse{};  // 1 / (2l+1)!!
    double odd = 1.0;
    for (std::size_t i = 0; i < inverse.size(); ++i) {
      odd *= static_cast<double>(2 * i + 1);
      inverse[i] = 1.0 / odd;
    }
    return inverse;
  }();
  constexpr double negligible = 1e-17;
  double sum = 1.0, sum_below = 1.0, term = 1.0, term_below = 1.0;
  for (int k = 1; term_below > negligible * sum_below; ++k) {
    term *= half_square / (k * (2 * l + 2 * k + 1));
    term_below *= half_square / (k * (2 * l + 2 * k - 1));
    sum += term;
    sum_below += term_below;
  }
  return {sum * first[static_cast<std::size_t>(l)],
          sum_below * first[static_cast<std::size_t>(l - 1)]};
}

// (-1)^l i_l(beta) for l = 0 to degree, downwards from a series for the last two: every term is
// positive, so nothing cancels.
Moments legendre_moments(int degree, double beta) {
  Moments moments;
  const double square = beta * beta;
  const auto [last, last_but_one] = scaled_bessel(degree, square / 2);
  double above = last, here = last_but_one;
  moments[static_cast<std::size_t>(degree)] = last;
  moments[static_cast<std::size_t>(degree - 1)] = last_but_one;
  for (int l = degree - 1; l > 0; --l) {
    const double below = square * above + (2 * l + 1) * here;
    above = here;
    here = below;
    moments[static_cast<std::size_t>(l - 1)] = below;
  }
  double factor = 1.0;
  for (int l = 1; l <= degree; ++l) {
    factor *= -beta;
    moments[static_cast<std::size_t>(l)] *= factor;
  }
  return moments;
}

// Integrals of s^j e^(-beta s) over 0 <= s <= 2, upwards; stable where 2 beta exceeds the degree.
Moments near_moments(int degree, double beta) {
  Moments moments;
  const double inverse = 1.0 / beta;
  double end = std::exp(-2.0 * beta);
  moments[0] = (1.0 - end) * inverse;
  for (int j = 1; j <= degree; ++j) {
    end *= 2.0;
    moments[static_cast<std::size_t>(j)] =
        (j * moments[static_cast<std::size_t>(j - 1)] - end) * inverse;
  }
  return moments;
}

// sum_jk C_mjk eta_j alpha^k for every m.
template <int stride>
void contract(const OverlapTable& table, const Moments& eta, const double* powers,
              DiatomicOverlaps& sums) {
  const double* c = table.coefficients.data();
  for (int m = 0; m < table.n_m; ++m) {
    double rows[stride] = {};
    for (int j = 0; j <= table.degree; ++j, c += stride) {
      const double moment = eta[static_cast<std::size_t>(j)];
      for (int k = 0; k < stride; ++k) rows[k] += moment * c[k];
    }
    double even = 0.0, odd = 0.0;
    for (int k = 0; k < stride; k += 2) {
      even += rows[k] * powers[k];
      odd += rows[k + 1] * powers[k + 1];
    }
    sums[static_cast<std::size_t>(m)] = even + odd;
  }
}

void contract(const OverlapTable& table, const Moments& eta, double alpha, DiatomicOverlaps& sums) {
  std::array<double, max_degree + 2> powers;
  powers[0] = 1.0;
  powers[1] = alpha;
  const double square = alpha * alpha;
  for (int k = 2; k < table.stride; ++k) {
    powers[static_cast<std::size_t>(k)] = square * powers[static_cast<std::size_t>(k - 2)];
  }
  switch (table.stride) {
    case 4:
      return contract<4>(table, eta, powers.data(), sums);
    case 6:
      return contract<6>(table, eta, powers.data(), sums);
    case 8:
      return contract<8>(table, eta, powers.data(), sums);
    case 10:
      return contract<10>(table, eta, powers.data(), sums);
    case 12:
      return contract<12>(table, eta, powers.data(), sums);
    case 14:
      return contract<14>(table, eta, powers.data(), sums);
    default:
      return contract<16>(table, eta, powers.data(), sums);
  }
}

// Beyond this S is below 1e-380 for every n and every ratio of exponents: zero in a double.
constexpr double largest_exponent = 1000.0;

// From this share of the degree on, beta is large. Below it the upward moments would lose digits,
// far above it the Legendre expansion would; in between the error is flat (see tests/bench).
constexpr double large_beta_per_degree = 0.5;

// Two single functions, zeta_a >= zeta_b.
DiatomicOverlaps ordered_overlaps(const SlaterFunction& a, int l_a, const SlaterFunction& b,
                                  int l_b, double distance) {
  DiatomicOverlaps sums{};
  const double tail = distance * b.zeta;  // alpha - beta: the overlap falls as e^-tail
  if (tail > largest_exponent) return sums;
  const double alpha = distance * (a.zeta + b.zeta) / 2;
  const double beta = distance * (a.zeta - b.zeta) / 2;
  const double inverse = 2.0 / (a.zeta + b.zeta);
  const double t_a = a.zeta * inverse, t_b = b.zeta * inverse;
  double scale = power(t_a, a.n) * power(t_b, b.n) * std::sqrt(t_a * t_b);
  const int degree = a.n + b.n;
  if (beta < large_beta_per_degree * degree) {
    scale *= std::exp(-alpha);
    contract(overlap_table(EtaBasis::Legendre, a.n, l_a, b.n, l_b),
             legendre_moments(degree, beta), alpha, sums);
  } else {
    scale *= std::exp(-tail);
    contract(overlap_table(EtaBasis::FromFirst, a.n, l_a, b.n, l_b), near_moments(degree, beta),
             alpha, sums);
  }
  for (double& sum : sums) sum *= scale;
  return sums;
}

}  // namespace

DiatomicOverlaps slater_overlaps(const SlaterFunction& a, int l_a, const SlaterFunction& b, int l_b,
                                 double distance_bohr) {
  assert(distance_bohr > 0.0 && std::isfinite(distance_bohr));
  assert(a.n + b.n <= max_degree);
  if (a.zeta >= b.zeta) return ordered_overlaps(a, l_a, b, l_b, distance_bohr);
  DiatomicOverlaps overlaps = ordered_overlaps(b, l_b, a, l_a, distance_bohr);
  if ((l_a + l_b) % 2 != 0) {
    for (double& overlap : overlaps) overlap = -overlap;
  }
  return overlaps;
}

DiatomicOverlaps diatomic_overlaps(const ContractedRadial& radial_a, int l_a,
                                   const ContractedRadial& radial_b, int l_b,
                                   double distance_bohr) {
  DiatomicOverlaps total{};
  for (const ContractedRadial::Term& a : radial_a.terms()) {
    for (const ContractedRadial::Term& b : radial_b.terms()) {
      const DiatomicOverlaps part =
          slater_overlaps({a.function.n(), a.function.zeta()}, l_a,
                          {b.function.n(), b.function.zeta()}, l_b, distance_bohr);
      const double factor = a.coefficient * b.coefficient;
      for (std::size_t m = 0; m < total.size(); ++m) total[m] += factor * part[m];
    }
  }
  return total;
}

OverlapBlock overlap_block(const Shell& a, const Shell& b,
                           const Eigen::Vector3d& displacement_bohr) {
  const DiatomicFrame frame(displacement_bohr, std::max(a.l, b.l));
  return frame.block(diatomic_overlaps(a.radial, a.l, b.radial, b.l, displacement_bohr.norm()), a.l,
                     b.l);
}

}  // namespace irrepwise
