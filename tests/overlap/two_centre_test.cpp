#include "overlap/two_centre.hpp"

#include <algorithm>
#include <cmath>
#include <random>

#include <boost/math/constants/constants.hpp>
#include <boost/math/quadrature/gauss.hpp>

#include <doctest/doctest.h>

#include "core/constants.hpp"
#include "harmonics/real_harmonics.hpp"

using irrepwise::ContractedRadial, irrepwise::diatomic_overlaps, irrepwise::DiatomicOverlaps,
    irrepwise::SlaterRadial;

namespace {

ContractedRadial single(int n, double zeta) { return ContractedRadial({{{n, zeta}, 1.0}}); }

// By definition: the two functions multiplied point by point, in the half plane y = 0, x >= 0.
// Panels of 30 Gauss points in xi and eta, no expansion and no special function. The integral over
// phi is 2 pi for m = 0 and pi otherwise.
double overlap_by_quadrature(const SlaterRadial& a, int l_a, const SlaterRadial& b, int l_b, int m,
                             double distance) {
  using Rule = boost::math::quadrature::gauss<double, 30>;
  constexpr double pi = boost::math::constants::pi<double>();
  const double alpha = distance * (a.zeta() + b.zeta()) / 2;
  const double beta = distance * (a.zeta() - b.zeta()) / 2;
  const auto radial = [](const SlaterRadial& f, double r) {
    return std::pow(2 * f.zeta(), f.n() + 0.5) / std::sqrt(std::tgamma(2 * f.n() + 1)) *
           std::pow(r, f.n() - 1) * std::exp(-f.zeta() * r);
  };
  // The function with cos(m phi): z alone, xz, x2-y2, x(x2-3y2); see the conventions.
  const auto component = [](int l, int order) {
    const int places[4][4] = {{0}, {2, 0}, {0, 3, 1}, {0, 1, 3, 5}};
    return places[l][order];
  };
  const auto at = [&](double xi, double eta) {
    const double r_a = distance * (xi + eta) / 2, r_b = distance * (xi - eta) / 2;
    const double z = distance * (1 + xi * eta) / 2;
    const double x = distance / 2 * std::sqrt((xi * xi - 1) * (1 - eta * eta));
    const Eigen::Vector3d to_a(x / r_a, 0, z / r_a), to_b(x / r_b, 0, (z - distance) / r_b);
    const double volume = std::pow(distance / 2, 3) * (xi * xi - eta * eta) * (m == 0 ? 2 : 1) * pi;
    return volume * radial(a, r_a) * radial(b, r_b) *
           irrepwise::real_harmonics(l_a, to_a)(component(l_a, m)) *
           irrepwise::real_harmonics(l_b, to_b)(component(l_b, m));
  };
  const auto over_panels = [](const auto& f, double low, double high, double step) {
    double sum = 0.0;
    for (double from = low; from < high; from += step) {
      sum += Rule::integrate(f, from, std::min(from + step, high));
    }
    return sum;
  };
  const double eta_step = std::min(2.0, 5.0 / std::max(std::abs(beta), 1.0));
  return over_panels(
      [&](double xi) {
        return over_panels([&](double eta) { return at(xi, eta); }, -1.0, 1.0, eta_step);
      },
      1.0, 1.0 + 90.0 / alpha, 8.0 / alpha);
}

}  // namespace

TEST_CASE("two 1s functions of one exponent overlap by e^-p (1 + p + p^2/3)") {
  // p = zeta R; closed form, any quantum chemistry textbook.
  for (const double p : {0.1, 0.5, 1.0, 1.4, 3.0, 10.0, 50.0}) {
    const double expected = std::exp(-p) * (1 + p + p * p / 3);
    CAPTURE(p);
    CHECK(std::abs(diatomic_overlaps(single(1, 1), 0, single(1, 1), 0, p)[0] - expected) <= 4e-16);
    CHECK(std::abs(diatomic_overlaps(single(1, 2), 0, single(1, 2), 0, p / 2)[0] - expected) <=
          4e-16);
  }
}

TEST_CASE("two hydrogen atoms 1.4 bohr apart have the textbook overlap 0.7529") {
  const double found = diatomic_overlaps(single(1, 1), 0, single(1, 1), 0, 1.4)[0];
  CHECK(std::abs(found - 0.7529) <= 5e-5);
}

TEST_CASE("carbon 2s and hydrogen 1s in methane overlap as worked in a textbook") {
  // Lowe and Peterson, Quantum Chemistry, ch. 10: 0.5133 for C-H 1.1 A (from memory).
  const double distance = 1.1 / irrepwise::bohr_in_angstrom;
  const double found = diatomic_overlaps(single(2, 1.625), 0, single(1, 1.2), 0, distance)[0];
  CHECK(std::abs(found - 0.5133) <= 1e-4);
}

TEST_CASE("random pairs agree with quadrature of the functions themselves") {
  std::mt19937 random(4);
  std::uniform_real_distribution<double> unit;
  for (int i = 0; i < 60; ++i) {
    const int l_a = i % 4, l_b = (i / 4) % 4;
    const int n_a = l_a + 1 + static_cast<int>(unit(random) * (7 - l_a));
    const int n_b = l_b + 1 + static_cast<int>(unit(random) * (7 - l_b));
    const SlaterRadial a(n_a, 0.5 * std::pow(40.0, unit(random)));
    const SlaterRadial b(n_b, 0.5 * std::pow(40.0, unit(random)));
    const double distance = 0.5 + 5 * unit(random);
    const DiatomicOverlaps found = diatomic_overlaps(ContractedRadial({{a, 1.0}}), l_a,
                                                     ContractedRadial({{b, 1.0}}), l_b, distance);
    for (int m = 0; m <= std::min(l_a, l_b); ++m) {
      const double expected = overlap_by_quadrature(a, l_a, b, l_b, m, distance);
      CAPTURE(n_a);
      CAPTURE(l_a);
      CAPTURE(a.zeta());
      CAPTURE(n_b);
      CAPTURE(l_b);
      CAPTURE(b.zeta());
      CAPTURE(distance);
      CAPTURE(m);
      CHECK(std::abs(found[static_cast<std::size_t>(m)] - expected) <= 2e-13);  // the quadrature's
    }
  }
}

TEST_CASE("m beyond the smaller l has no overlap") {
  const DiatomicOverlaps pd = diatomic_overlaps(single(2, 1.5), 1, single(3, 2.0), 2, 3.0);
  CHECK(pd[1] != 0.0);
  CHECK(pd[2] == 0.0);
  CHECK(pd[3] == 0.0);
}

TEST_CASE("where two centres meet the overlap becomes the one-centre overlap") {
  // At R = 1e-5 bohr what is left differs by terms of order R for |l_a - l_b| = 1, R^2 otherwise.
  for (int l_a = 0; l_a <= 3; ++l_a) {
    for (int l_b = 0; l_b <= 3; ++l_b) {
      const SlaterRadial a(l_a + 2, 1.3), b(l_b + 1, 0.8);
      const DiatomicOverlaps found = diatomic_overlaps(ContractedRadial({{a, 1.0}}), l_a,
                                                       ContractedRadial({{b, 1.0}}), l_b, 1e-5);
      for (int m = 0; m <= std::min(l_a, l_b); ++m) {
        const double expected = l_a == l_b ? one_centre_overlap(a, b) : 0.0;
        CAPTURE(l_a);
        CAPTURE(l_b);
        CAPTURE(m);
        CHECK(std::abs(found[static_cast<std::size_t>(m)] - expected) <=
              (std::abs(l_a - l_b) == 1 ? 1e-5 : 1e-9));
      }
    }
  }
}

TEST_CASE("exchanging the two shells changes the sign by (-1)^(l_a + l_b)") {
  std::mt19937 random(11);
  std::uniform_real_distribution<double> unit;
  for (int i = 0; i < 400; ++i) {
    const int l_a = i % 4, l_b = (i / 4) % 4;
    const double zeta_a = 0.5 + 5 * unit(random);
    const double zeta_b = i % 3 == 0 ? zeta_a : 0.5 + 5 * unit(random);  // also equal exponents
    const ContractedRadial a = single(l_a + 1 + i % 3, zeta_a), b = single(l_b + 1, zeta_b);
    const double distance = 0.5 + 6 * unit(random);
    const DiatomicOverlaps there = diatomic_overlaps(a, l_a, b, l_b, distance);
    const DiatomicOverlaps back = diatomic_overlaps(b, l_b, a, l_a, distance);
    const double sign = (l_a + l_b) % 2 == 0 ? 1.0 : -1.0;
    for (std::size_t m = 0; m < there.size(); ++m) {
      CHECK(std::abs(there[m] - sign * back[m]) <= 4e-15);
      if (zeta_a != zeta_b) CHECK(there[m] == sign * back[m]);
    }
  }
}

TEST_CASE("the overlap of contracted shells is the weighted sum over their functions") {
  const ContractedRadial a({{{3, 5.35}, 0.5505}, {{3, 2.0}, 0.6260}});
  const ContractedRadial b({{{3, 4.5}, 0.44}, {{3, 1.7}, 0.72}});
  const DiatomicOverlaps found = diatomic_overlaps(a, 2, b, 2, 4.4);
  for (std::size_t m = 0; m <= 2; ++m) {
    double expected = 0.0;
    for (const ContractedRadial::Term& f : a.terms()) {
      for (const ContractedRadial::Term& g : b.terms()) {
        const double part = diatomic_overlaps(ContractedRadial({{f.function, 1.0}}), 2,
                                              ContractedRadial({{g.function, 1.0}}), 2, 4.4)[m];
        expected += f.coefficient * g.coefficient * part;
      }
    }
    CHECK(std::abs(found[m] - expected) <= 1e-15);
    CHECK(std::abs(expected) > 1e-4);  // a zero would prove nothing
  }
}

TEST_CASE("two functions split in halves of one exponent are the single function again") {
  // c1 + c2 = 1 with equal exponents is R itself, whatever the split.
  const ContractedRadial split({{{2, 1.625}, 0.25}, {{2, 1.625}, 0.75}});
  const DiatomicOverlaps expected =
      diatomic_overlaps(single(2, 1.625), 1, single(2, 2.275), 1, 2.6);
  const DiatomicOverlaps found = diatomic_overlaps(split, 1, single(2, 2.275), 1, 2.6);
  for (std::size_t m = 0; m < 2; ++m) CHECK(std::abs(found[m] - expected[m]) <= 1e-15);
}

TEST_CASE("far apart the overlap falls to zero, never to NaN") {
  for (const double zeta_a : {0.001, 0.5, 20.0, 1000.0}) {
    for (const double zeta_b : {0.001, 0.5, 20.0, 1000.0}) {
      for (double distance = 0.1; distance < 1e9; distance *= 1.7) {
        for (int l = 0; l <= 3; ++l) {
          const DiatomicOverlaps found =
              diatomic_overlaps(single(7, zeta_a), l, single(l + 1, zeta_b), l, distance);
          for (const double overlap : found) {
            CHECK((std::isfinite(overlap) && std::abs(overlap) <= 1 + 1e-14));
          }
          if (distance * std::min(zeta_a, zeta_b) > 1000) CHECK(found == DiatomicOverlaps{});
        }
      }
    }
  }
}
