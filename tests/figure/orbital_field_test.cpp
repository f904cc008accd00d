#include "figure/orbital_field.hpp"

#include <cmath>
#include <numbers>

#include <doctest/doctest.h>

#include "core/constants.hpp"
#include "figure/single_orbital.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

TEST_CASE("a 1s function is sqrt(zeta^3/pi) exp(-zeta r), everywhere and on its atom") {
  // Closed form of the normalised 1s function (any textbook of quantum chemistry).
  const double zeta = 1.3;
  const OrbitalField field = single_orbital(1, 0, zeta, 0, {0.3, -0.2, 1.0});
  const double peak = std::sqrt(zeta * zeta * zeta / std::numbers::pi);
  CHECK(std::abs(field.value({0.3, -0.2, 1.0}, 0) - peak) < 1e-14);
  const double r = std::sqrt(0.3 * 0.3 + 0.2 * 0.2 + 1.0) / bohr_in_angstrom;
  CHECK(std::abs(field.value({0, 0, 0}, 0) - peak * std::exp(-zeta * r)) < 1e-14);
}

TEST_CASE("a 2pz function is sqrt(zeta^5/pi) z exp(-zeta r), positive along positive z") {
  const double zeta = 1.625;
  const OrbitalField field = single_orbital(2, 1, zeta, 2);
  const Eigen::Vector3d point(0.4, -0.1, 0.7);
  const Eigen::Vector3d r = point / bohr_in_angstrom;
  const double expected =
      std::sqrt(std::pow(zeta, 5) / std::numbers::pi) * r.z() * std::exp(-zeta * r.norm());
  CHECK(std::abs(field.value(point, 0) - expected) < 1e-14);
  CHECK(field.value({0, 0, 0}, 0) == 0.0);
}

TEST_CASE("an orbital of a molecule is the sum of its Slater functions, written out") {
  // The second way: each function as N r^(n-1) exp(-zeta r) times a Cartesian polynomial.
  const Run r = run(test_molecule("tetrachloroplatinate(II)").molecule);
  const int level = *r.levels.frontier.homo;
  const Eigen::MatrixXd c = level_orbitals(r.symmetry, r.basis, r.levels, level);
  const OrbitalField field(r.symmetry.molecule, r.basis, c);
  const Eigen::Vector3d point(0.31, 0.77, -0.42);
  double expected = 0.0;
  const double pi = std::numbers::pi;
  for (const Shell& shell : r.basis.shells) {
    const Eigen::Vector3d d =
        (point - r.symmetry.molecule.atoms()[std::size_t(shell.atom)].position) / bohr_in_angstrom;
    const double x = d.x(), y = d.y(), z = d.z(), s = d.norm();
    double radial = 0.0;
    for (const auto& term : shell.radial.terms()) {
      const int n = term.function.n();
      const double zeta = term.function.zeta();
      double factorial = 1.0;
      for (int k = 2; k <= 2 * n; ++k) factorial *= k;
      radial += term.coefficient * std::pow(2 * zeta, n + 0.5) / std::sqrt(factorial) *
                std::pow(s, n - 1) * std::exp(-zeta * s);
    }
    std::vector<double> y_lm;
    if (shell.l == 0) y_lm = {std::sqrt(1 / (4 * pi))};
    if (shell.l == 1) {
      const double f = std::sqrt(3 / (4 * pi)) / s;
      y_lm = {f * x, f * y, f * z};
    }
    if (shell.l == 2) {
      const double f = std::sqrt(15 / (4 * pi)) / (s * s);
      y_lm = {f * (3 * z * z - s * s) / (2 * std::sqrt(3.0)), f * (x * x - y * y) / 2, f * x * y,
              f * x * z, f * y * z};
    }
    for (int m = 0; m < shell.size(); ++m) {
      expected += c(shell.first_orbital + m, 0) * radial * y_lm[std::size_t(m)];
    }
  }
  CHECK(std::abs(expected) > 1e-3);  // the point lies on no node
  CHECK(std::abs(field.value(point, 0) - expected) < 1e-9);
}

TEST_CASE(
    "partners turn into each other by the matrices of their irrep, and their summed density "
    "is totally symmetric") {
  // psi_j(g^-1 r) = sum_i psi_i(r) D_ij(g): the definition of a basis of an irrep.
  for (const char* name : {"tetrachloroplatinate(II)", "borazine", "methyl cation", "allene"}) {
    const Run r = run(test_molecule(name).molecule);
    const PointGroup& group = r.symmetry.group;
    const Eigen::Vector3d point(0.37, 0.81, 0.55);
    for (std::size_t level = 0; level < r.levels.levels.size(); ++level) {
      if (r.levels.levels[level].degeneracy == 1) continue;
      const OrbitalField field(
          r.symmetry.molecule, r.basis,
          level_orbitals(r.symmetry, r.basis, r.levels, static_cast<int>(level)));
      const Irrep& irrep = group.irreps()[std::size_t(r.levels.levels[level].irrep)];
      const Eigen::VectorXd here = field.values(point);
      for (int g = 0; g < group.order(); ++g) {
        const auto at = std::size_t(g);
        const Eigen::VectorXd there = field.values(group.operations()[at].transpose() * point);
        const double worst = (there - irrep.matrices[at].transpose() * here).cwiseAbs().maxCoeff();
        CAPTURE(name);
        CAPTURE(g);
        CHECK(worst < 1e-7);
        CHECK(std::abs(there.squaredNorm() - here.squaredNorm()) < 1e-7);
      }
    }
  }
}
