#include "overlap/overlap_table.hpp"

#include <algorithm>
#include <array>
#include <atomic>
#include <cassert>
#include <cmath>
#include <memory>

#include <boost/math/special_functions/factorials.hpp>

#include "basis/shell.hpp"

namespace irrepwise {
namespace {

constexpr int max_n = largest_overlap_n;
constexpr int max_degree = SlaterRadial::max_n + largest_overlap_n;
constexpr int size = max_degree + 1;

double factorial(int k) { return boost::math::factorial<double>(static_cast<unsigned>(k)); }

// A polynomial in t = xi - 1 and e, which is eta or 1 + eta; coefficient of t^i e^j at (i, j). All
// of them are whole numbers far below 2^53, so sums and products are exact.
class Polynomial {
 public:
  explicit Polynomial(double constant) { at(0, 0) = constant; }

  struct Term {
    int i, j;
    double coefficient;
  };
  Polynomial(std::initializer_list<Term> terms) {
    for (const Term& term : terms) {
      at(term.i, term.j) = term.coefficient;
      degree_t_ = std::max(degree_t_, term.i);
      degree_e_ = std::max(degree_e_, term.j);
    }
  }

  double& at(int i, int j) { return c_[static_cast<std::size_t>(i * size + j)]; }
  [[nodiscard]] double at(int i, int j) const { return c_[static_cast<std::size_t>(i * size + j)]; }

  [[nodiscard]] Polynomial operator*(const Polynomial& other) const {
    Polynomial product(0.0);
    product.degree_t_ = degree_t_ + other.degree_t_;
    product.degree_e_ = degree_e_ + other.degree_e_;
    assert(product.degree_t_ <= max_degree && product.degree_e_ <= max_degree);
    for (int p = 0; p <= other.degree_t_; ++p) {
      for (int q = 0; q <= other.degree_e_; ++q) {
        const double factor = other.at(p, q);
        if (factor == 0.0) continue;
        for (int i = 0; i <= degree_t_; ++i) {
          for (int j = 0; j <= degree_e_; ++j) product.at(i + p, j + q) += factor * at(i, j);
        }
      }
    }
    return product;
  }

  [[nodiscard]] Polynomial power(int k) const {
    Polynomial result(1.0);
    for (int step = 0; step < k; ++step) result = result * *this;
    return result;
  }

  [[nodiscard]] Polynomial plus(double factor, const Polynomial& other) const {
    Polynomial sum = *this;
    sum.degree_t_ = std::max(degree_t_, other.degree_t_);
    sum.degree_e_ = std::max(degree_e_, other.degree_e_);
    for (std::size_t i = 0; i < c_.size(); ++i) sum.c_[i] += factor * other.c_[i];
    return sum;
  }

 private:
  std::array<double, size * size> c_{};
  int degree_t_ = 0;
  int degree_e_ = 0;
};

// What the integrand is made of, lengths in units of half the distance.
struct Spheroidal {
  Polynomial r_a, r_b;  // distances from the centres
  Polynomial z_a, z_b;  // along the line from a to b, from a and from b
  Polynomial rho2;      // square of the distance from that line
};

Spheroidal spheroidal(EtaBasis basis) {
  switch (basis) {
    case EtaBasis::Legendre:  // e = eta
      return {{{0, 0, 1}, {1, 0, 1}, {0, 1, 1}},
              {{0, 0, 1}, {1, 0, 1}, {0, 1, -1}},
              {{0, 0, 1}, {0, 1, 1}, {1, 1, 1}},
              {{0, 0, -1}, {0, 1, 1}, {1, 1, 1}},
              {{1, 0, 2}, {2, 0, 1}, {1, 2, -2}, {2, 2, -1}}};
    case EtaBasis::FromFirst:  // e = 1 + eta
      break;
  }
  return {{{1, 0, 1}, {0, 1, 1}},
          {{0, 0, 2}, {1, 0, 1}, {0, 1, -1}},
          {{0, 1, 1}, {1, 0, -1}, {1, 1, 1}},
          {{0, 0, -2}, {0, 1, 1}, {1, 0, -1}, {1, 1, 1}},
          {{1, 1, 4}, {2, 1, 2}, {1, 2, -2}, {2, 2, -1}}};
}

// The square of the norm of sin^m(theta) P_lm(cos theta) is 1 / polar_square, P_lm having the whole
// coefficients below and being positive at theta = 0.
double polar_square(int l, int m) {
  constexpr std::array<std::array<double, 4>, 4> squares = {
      {{1.0 / 2},
       {3.0 / 2, 3.0 / 4},
       {5.0 / 8, 15.0 / 4, 15.0 / 16},
       {7.0 / 8, 21.0 / 32, 105.0 / 16, 35.0 / 32}}};
  return squares[static_cast<std::size_t>(l)][static_cast<std::size_t>(m)];
}

// r^(l-m) P_lm(z/r).
Polynomial polar(int l, int m, const Polynomial& z, const Polynomial& r) {
  switch (l - m) {
    case 0:
      return Polynomial(1.0);
    case 1:
      return z;
    case 2:  // 3z^2 - r^2 for l = 2, 5z^2 - r^2 for l = 3
      return (Polynomial(l == 2 ? 3.0 : 5.0) * z * z).plus(-1.0, r * r);
    default:  // 5z^3 - 3zr^2
      return (Polynomial(5.0) * z * z * z).plus(-3.0, z * r * r);
  }
}

using LegendreCoefficients = std::array<std::array<long double, size>, size>;

// eta^j = sum_l c_jl P_l(eta), from (2l+1) eta P_l = (l+1) P_(l+1) + l P_(l-1).
LegendreCoefficients powers_in_legendre() {
  LegendreCoefficients c{};
  c[0][0] = 1.0L;
  for (std::size_t j = 1; j < size; ++j) {
    for (std::size_t l = 0; l < j; ++l) {
      const long double share = c[j - 1][l] / static_cast<long double>(2 * l + 1);
      c[j][l + 1] += share * static_cast<long double>(l + 1);
      if (l > 0) c[j][l - 1] += share * static_cast<long double>(l);
    }
  }
  return c;
}

// The factors of t^i, as functions of eta in the basis asked for: one row per i.
std::array<double, size> in_basis(EtaBasis basis, const Polynomial& w, int i) {
  std::array<double, size> row{};
  if (basis == EtaBasis::FromFirst) {
    for (int j = 0; j < size; ++j) row[static_cast<std::size_t>(j)] = w.at(i, j);
    return row;
  }
  static const LegendreCoefficients c = powers_in_legendre();
  for (std::size_t l = 0; l < size; ++l) {
    long double sum = 0.0L;  // terms of both signs: the longer format keeps all digits of the sum
    for (std::size_t j = l; j < size; j += 2) sum += w.at(i, static_cast<int>(j)) * c[j][l];
    row[l] = static_cast<double>(2.0L * sum);  // the integral of P_l e^(-beta eta) is 2 (-1)^l i_l
  }
  return row;
}

OverlapTable make_table(EtaBasis basis, int n_a, int l_a, int n_b, int l_b) {
  const Spheroidal s = spheroidal(basis);
  const Polynomial radial = s.r_a.power(n_a - l_a) * s.r_b.power(n_b - l_b);
  OverlapTable table;
  table.degree = n_a + n_b;
  table.stride = (table.degree + 2) / 2 * 2;
  table.n_m = std::min(l_a, l_b) + 1;
  const int n_columns = table.degree + 1;
  table.coefficients.assign(static_cast<std::size_t>(table.n_m * n_columns * table.stride), 0.0);
  for (int m = 0; m < table.n_m; ++m) {
    const Polynomial w =
        radial * polar(l_a, m, s.z_a, s.r_a) * polar(l_b, m, s.z_b, s.r_b) * s.rho2.power(m);
    const double norm = std::sqrt(polar_square(l_a, m) * polar_square(l_b, m) /
                                  (factorial(2 * n_a) * factorial(2 * n_b)));
    for (int k = 0; k <= table.degree; ++k) {
      const int i = table.degree - k;
      const std::array<double, size> row = in_basis(basis, w, i);
      for (int j = 0; j < n_columns; ++j) {
        table.coefficients[static_cast<std::size_t>((m * n_columns + j) * table.stride + k)] =
            norm * factorial(i) * row[static_cast<std::size_t>(j)];
      }
    }
  }
  return table;
}

// One slot for each kind of table. A slot goes from empty to filled once and never changes again.
class TableStore {
 public:
  TableStore() = default;
  TableStore(const TableStore&) = delete;
  TableStore& operator=(const TableStore&) = delete;
  ~TableStore() {
    for (std::atomic<const OverlapTable*>& slot : slots_) {
      const std::unique_ptr<const OverlapTable> owner(slot.load(std::memory_order_acquire));
    }
  }

  const OverlapTable& get(EtaBasis basis, int n_a, int l_a, int n_b, int l_b) {
    std::atomic<const OverlapTable*>& slot = slots_[static_cast<std::size_t>(
        (static_cast<int>(basis) * kinds + kind(n_a, l_a)) * kinds + kind(n_b, l_b))];
    const OverlapTable* table = slot.load(std::memory_order_acquire);
    if (table != nullptr) return *table;
    // Two threads may both make it; they make the same, and the second one's is dropped.
    auto made = std::make_unique<const OverlapTable>(make_table(basis, n_a, l_a, n_b, l_b));
    if (slot.compare_exchange_strong(table, made.get(), std::memory_order_acq_rel)) {
      return *made.release();
    }
    return *table;
  }

 private:
  static constexpr int kinds = max_n * (max_l + 1);
  static int kind(int n, int l) { return (n - 1) * (max_l + 1) + l; }

  std::array<std::atomic<const OverlapTable*>, 2 * kinds * kinds> slots_{};
};

}  // namespace

const OverlapTable& overlap_table(EtaBasis basis, int n_a, int l_a, int n_b, int l_b) {
  assert(l_a >= 0 && l_a <= max_l && l_a < n_a && n_a <= max_n);
  assert(l_b >= 0 && l_b <= max_l && l_b < n_b && n_b <= max_n);
  assert(n_a + n_b <= max_degree);
  static TableStore store;
  return store.get(basis, n_a, l_a, n_b, l_b);
}

}  // namespace irrepwise
