// Why two-centre overlaps are computed as they are: error and time of three ways, on the rows of
// the reference table that lie in the promised range.
//
//   build/tests/bench/overlap_methods
//
// 1. sums of A_i(alpha) B_j(beta), the classical expansion in powers of xi and eta: the integrals
//    themselves are good to rounding here, what is lost is lost in the sum;
// 2. Gauss-Laguerre in xi - 1, exact for the polynomial, by Gauss-Legendre in eta with e^(-beta
// eta)
//    left in the integrand, 24 and 64 points;
// 3. the program's.
// Times are means over the whole table, all m of a pair together, tables and nodes made beforehand;
// ways 1 and 2 are written plainly, so their times tell the order of magnitude. The whole table has
// hundreds of kinds of pair, whose coefficients leave the cache; overlap_bench has the times that
// matter in a molecule.
#include <algorithm>
#include <array>
#include <cmath>
#include <cstdio>
#include <cstdlib>
#include <ctime>
#include <fstream>
#include <functional>
#include <map>
#include <numbers>
#include <sstream>
#include <string>
#include <tuple>
#include <vector>

#include <Eigen/Eigenvalues>

#include "overlap/two_centre.hpp"

namespace {

using irrepwise::DiatomicOverlaps;

struct Pair {
  int n_a, l_a, n_b, l_b;
  double zeta_a, zeta_b, distance;
  irrepwise::ContractedRadial radial_a, radial_b;
  [[nodiscard]] double alpha() const { return distance * (zeta_a + zeta_b) / 2; }
  [[nodiscard]] double beta() const { return distance * (zeta_a - zeta_b) / 2; }
  [[nodiscard]] int n_m() const { return std::min(l_a, l_b) + 1; }
};

double power(double base, int exponent) {
  double result = 1.0;
  for (; exponent > 0; --exponent) result *= base;
  return result;
}

struct Row {
  Pair pair;
  int m;
  double overlap;
};

std::vector<Row> reference_rows() {
  std::ifstream file(IRREPWISE_TEST_DATA "/two_centre_overlaps.csv");
  std::vector<Row> rows;
  for (std::string line; std::getline(file, line);) {
    if (!line.starts_with("ordinary")) continue;
    std::istringstream cells(line.substr(line.find(',') + 1));
    char comma = 0;
    int n_a = 0, l_a = 0, n_b = 0, l_b = 0, m = 0;
    double zeta_a = 0, zeta_b = 0, distance = 0;
    cells >> n_a >> comma >> l_a >> comma >> zeta_a >> comma >> n_b >> comma >> l_b >> comma >>
        zeta_b >> comma >> distance >> comma >> m >> comma;
    std::string value;
    cells >> value;
    const double overlap = std::strtod(value.c_str(), nullptr);  // >> refuses what underflows
    rows.push_back({{n_a, l_a, n_b, l_b, zeta_a, zeta_b, distance,
                     irrepwise::ContractedRadial({{{n_a, zeta_a}, 1.0}}),
                     irrepwise::ContractedRadial({{{n_b, zeta_b}, 1.0}})},
                    m,
                    overlap});
  }
  return rows;
}

// r^l Theta_lm without rho^m: the polar functions of the conventions, normalised over theta.
double polar(int l, int m, double z, double r) {
  switch (l * 4 + m) {
    case 0:
      return std::sqrt(1.0 / 2);
    case 4:
      return std::sqrt(3.0 / 2) * z;
    case 5:
      return std::sqrt(3.0 / 4);
    case 8:
      return std::sqrt(5.0 / 8) * (3 * z * z - r * r);
    case 9:
      return std::sqrt(15.0 / 4) * z;
    case 10:
      return std::sqrt(15.0 / 16);
    case 12:
      return std::sqrt(7.0 / 8) * z * (5 * z * z - 3 * r * r);
    case 13:
      return std::sqrt(21.0 / 32) * (5 * z * z - r * r);
    case 14:
      return std::sqrt(105.0 / 16) * z;
    default:
      return std::sqrt(35.0 / 32);
  }
}

// The polynomial that multiplies e^(-alpha xi - beta eta), at one point.
double polynomial(const Pair& p, int m, double xi, double eta) {
  const double r_a = xi + eta, r_b = xi - eta;
  return power(r_a, p.n_a - p.l_a) * power(r_b, p.n_b - p.l_b) *
         polar(p.l_a, m, 1 + xi * eta, r_a) * polar(p.l_b, m, xi * eta - 1, r_b) *
         power((xi * xi - 1) * (1 - eta * eta), m);
}

double normalisation(const Pair& p) {
  return std::pow(p.zeta_a * p.distance, p.n_a + 0.5) *
         std::pow(p.zeta_b * p.distance, p.n_b + 0.5) /
         std::sqrt(std::tgamma(2 * p.n_a + 1) * std::tgamma(2 * p.n_b + 1));
}

// ---- 1. A_i B_j

// Coefficients of xi^i eta^j by interpolation on whole numbers, in long double, rounded at the end.
using Coefficients = std::vector<Eigen::MatrixXd>;  // by m, (N+1) x (N+1)

const Coefficients& coefficients(const Pair& p) {
  static std::map<std::tuple<int, int, int, int>, Coefficients> known;
  Coefficients& all = known[{p.n_a, p.l_a, p.n_b, p.l_b}];
  if (!all.empty()) return all;
  const int size = p.n_a + p.n_b + 1;
  using Matrix = Eigen::Matrix<long double, Eigen::Dynamic, Eigen::Dynamic>;
  Matrix vandermonde(size, size);
  Eigen::VectorXd nodes(size);
  for (int i = 0; i < size; ++i) {
    nodes(i) = std::cos(std::numbers::pi * (i + 0.5) / size);
    long double power = 1.0L;
    for (int k = 0; k < size; ++k, power *= nodes(i)) vandermonde(i, k) = power;
  }
  const Eigen::FullPivLU<Matrix> solver(vandermonde);
  for (int m = 0; m < p.n_m(); ++m) {
    Matrix values(size, size);
    for (int i = 0; i < size; ++i) {
      for (int j = 0; j < size; ++j) values(i, j) = polynomial(p, m, nodes(i), nodes(j));
    }
    const Matrix half = solver.solve(values);
    const Matrix whole = solver.solve(Matrix(half.transpose())).transpose();
    all.push_back(whole.cast<double>());
  }
  return all;
}

DiatomicOverlaps by_sums(const Pair& p) {
  const Coefficients& c = coefficients(p);
  const int size = p.n_a + p.n_b + 1;
  const double alpha = p.alpha(), beta = p.beta();
  // A_k e^alpha and B_k e^-|beta|, so that nothing overflows.
  Eigen::VectorXd a(size), b(size);
  a(0) = 1 / alpha;
  for (int k = 1; k < size; ++k) a(k) = a(0) + k * a(k - 1) / alpha;
  if (std::abs(beta) > size) {
    const double plus = std::exp(beta - std::abs(beta)), minus = std::exp(-beta - std::abs(beta));
    b(0) = (plus - minus) / beta;
    for (int k = 1; k < size; ++k) {
      b(k) = ((k % 2 == 0 ? plus : -plus) - minus + k * b(k - 1)) / beta;
    }
  } else {
    for (int k = 0; k < size; ++k) {
      double term = std::exp(-std::abs(beta));
      b(k) = 0.0;
      for (int j = 0; j < 80; ++j) {
        if ((k + j) % 2 == 0) b(k) += 2 * term / (k + j + 1);
        term *= -beta / (j + 1);
      }
    }
  }
  DiatomicOverlaps sums{};
  const double scale = normalisation(p) * std::exp(std::abs(beta) - alpha);
  for (std::size_t m = 0; m < c.size(); ++m) sums[m] = scale * a.dot(c[m] * b);
  return sums;
}

// ---- 2. quadrature

struct Rule {
  Eigen::VectorXd nodes, weights;
};

// Golub and Welsch, Math. Comp. 23, 221 (1969).
Rule gauss(const Eigen::VectorXd& diagonal, const Eigen::VectorXd& beside, double total) {
  Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd> solver;
  solver.computeFromTridiagonal(diagonal, beside);
  return {solver.eigenvalues(), total * solver.eigenvectors().row(0).transpose().cwiseAbs2()};
}

Rule gauss_laguerre(int n) {
  return gauss(Eigen::VectorXd::LinSpaced(n, 1, 2 * n - 1),
               Eigen::VectorXd::LinSpaced(n - 1, 1, n - 1), 1.0);
}

Rule gauss_legendre(int n) {
  Eigen::VectorXd beside(n - 1);
  for (int k = 1; k < n; ++k) beside(k - 1) = k / std::sqrt(4.0 * k * k - 1);
  return gauss(Eigen::VectorXd::Zero(n), beside, 2.0);
}

DiatomicOverlaps by_quadrature(const Pair& p, const Rule& eta_rule) {
  static std::map<int, Rule> known;
  const int points = (p.n_a + p.n_b) / 2 + 1;
  Rule& xi_rule = known[points];
  if (xi_rule.nodes.size() == 0) xi_rule = gauss_laguerre(points);
  const double alpha = p.alpha(), beta = p.beta();
  DiatomicOverlaps sums{};
  for (int j = 0; j < eta_rule.nodes.size(); ++j) {
    const double eta = eta_rule.nodes(j),
                 weight = eta_rule.weights(j) * std::exp(-alpha - beta * eta);
    for (int i = 0; i < points; ++i) {
      const double xi = 1 + xi_rule.nodes(i) / alpha;
      for (int m = 0; m < p.n_m(); ++m) {
        sums[static_cast<std::size_t>(m)] +=
            weight * xi_rule.weights(i) / alpha * polynomial(p, m, xi, eta);
      }
    }
  }
  const double scale = normalisation(p);
  for (double& sum : sums) sum *= scale;
  return sums;
}

// ---- 3. the program's

DiatomicOverlaps by_program(const Pair& p) {
  return diatomic_overlaps(p.radial_a, p.l_a, p.radial_b, p.l_b, p.distance);
}

void measure(const char* name, const std::vector<Row>& rows,
             const std::function<DiatomicOverlaps(const Pair&)>& method) {
  std::vector<double> errors;
  for (const Row& row : rows) {
    const double error = std::abs(method(row.pair)[static_cast<std::size_t>(row.m)] - row.overlap);
    errors.push_back(std::isfinite(error) ? error : HUGE_VAL);
  }
  double sum = 0.0;
  constexpr int repeats = 20;
  const std::clock_t start = std::clock();  // processor time, other programs apart
  for (int repeat = 0; repeat < repeats; ++repeat) {
    for (const Row& row : rows) sum += method(row.pair)[0];
  }
  const double seconds = static_cast<double>(std::clock() - start) / CLOCKS_PER_SEC;
  std::sort(errors.begin(), errors.end());
  const auto above = static_cast<std::size_t>(
      errors.end() - std::upper_bound(errors.begin(), errors.end(), 1e-13));
  std::printf("%-34s %10.1e %10.1e %8zu %10.0f%s\n", name, errors.back(), errors[errors.size() / 2],
              above, 1e9 * seconds / repeats / static_cast<double>(rows.size()),
              std::isnan(sum) ? "  (NaN)" : "");
}

}  // namespace

int main() {
  const std::vector<Row> rows = reference_rows();
  const Rule few = gauss_legendre(24), many = gauss_legendre(64);
  std::printf("%zu overlaps\n%-34s %10s %10s %8s %10s\n", rows.size(), "method", "worst", "median",
              "> 1e-13", "ns/pair");
  measure("sums of A_i B_j", rows, by_sums);
  measure("Laguerre by Legendre, 24 points", rows,
          [&](const Pair& p) { return by_quadrature(p, few); });
  measure("Laguerre by Legendre, 64 points", rows,
          [&](const Pair& p) { return by_quadrature(p, many); });
  measure("irrepwise", rows, by_program);
}
