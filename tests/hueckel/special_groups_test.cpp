// Single atoms, linear molecules and pairs of complex conjugate irreps, by closed forms.
#include <algorithm>
#include <cmath>
#include <complex>
#include <numbers>
#include <string>
#include <vector>

#include <doctest/doctest.h>
#include <Eigen/Eigenvalues>
#include <Eigen/Geometry>

#include "core/constants.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

double closed_form_1s(double p) { return std::exp(-p) * (1 + p + p * p / 3); }

constexpr double hydrogen_h = -13.6;
constexpr double hydrogen_zeta = 1.3;

ParameterSet hydrogen() {
  return ParameterSet(
      "hydrogen",
      {{1,
        {1, {{1, 0, hydrogen_h, ContractedRadial({{SlaterRadial(1, hydrogen_zeta), 1.0}}), ""}}}}});
}

std::string names(const Run& r) {
  std::string text;
  for (const Level& level : r.levels.levels) {
    text += (text.empty() ? "" : " ") + level_name(r.symmetry.group, level);
  }
  return text;
}

}  // namespace

TEST_CASE("the levels of a single atom are its shells, labelled by l") {
  for (const char* name : {"helium atom", "carbon atom", "iron(II) ion", "uranium(IV) ion"}) {
    CAPTURE(name);
    const Run r = run(test_molecule(name).molecule);
    CHECK(r.symmetry.group.symbol().name() == "Kh");
    REQUIRE(r.levels.levels.size() == r.basis.shells.size());
    const std::string labels[] = {"sg", "pu", "dg", "fu"};
    std::vector<Shell> shells = r.basis.shells;
    std::stable_sort(shells.begin(), shells.end(),
                     [](const Shell& a, const Shell& b) { return a.h_ii_ev < b.h_ii_ev; });
    for (std::size_t k = 0; k < shells.size(); ++k) {
      const Level& level = r.levels.levels[k];
      CHECK(level.energy_ev == doctest::Approx(shells[k].h_ii_ev).epsilon(1e-14));
      CHECK(level.degeneracy == shells[k].size());
      CHECK(level_name(r.symmetry.group, level) == "1" + labels[shells[k].l]);
    }
  }
}

TEST_CASE("the levels of H2 are those of the two-level problem in closed form") {
  // E± = (h ± K h S) / (1 ± S), S = <1s|1s> in closed form.
  const double distance = 0.74;
  const Molecule molecule({{1, {0, 0, 0}}, {1, {0, 0, distance}}}, 0);
  const double s = closed_form_1s(hydrogen_zeta * distance / bohr_in_angstrom);
  const Run r = run(molecule, {}, {}, hydrogen());
  CHECK(names(r) == "1sigmag+ 1sigmau+");
  CHECK(r.levels.levels[0].energy_ev ==
        doctest::Approx(hydrogen_h * (1 + 1.75 * s) / (1 + s)).epsilon(1e-13));
  CHECK(r.levels.levels[1].energy_ev ==
        doctest::Approx(hydrogen_h * (1 - 1.75 * s) / (1 - s)).epsilon(1e-13));
}

TEST_CASE("linear molecules have the levels that their axis allows") {
  // s and p of two atoms: 2s and 2pz give two g and two u of sigma, 2px and 2py one pi of each. The
  // order in N2 is that of the trade: pi below its antibonding partner, the highest sigma on top.
  const Run n2 = run(test_molecule("dinitrogen").molecule);
  CHECK(n2.symmetry.group.symbol().name() == "Dinfh");
  std::vector<std::string> labels;
  for (const Level& level : n2.levels.levels)
    labels.push_back(level_name(n2.symmetry.group, level));
  std::sort(labels.begin(), labels.end());
  CHECK(labels ==
        std::vector<std::string>{"1pig", "1piu", "1sigmag+", "1sigmau+", "2sigmag+", "2sigmau+"});
  CHECK(level_name(n2.symmetry.group, n2.levels.levels.back()) == "2sigmau+");
  CHECK(level_name(n2.symmetry.group, n2.levels.levels[*n2.levels.frontier.lumo]) == "1pig");
}

TEST_CASE("a pair of complex conjugate irreps has the levels of its Bloch sums") {
  // Two rings of four hydrogens, one twisted and lifted: C4. In E the phases of the Bloch sums are
  // i^k, so H and S are complex 2 x 2, written here from the closed form of the overlap alone.
  const double inner = 1.2, outer = 1.9, twist = 0.4, lift = 0.8;
  const auto ring = [](double radius, double angle, double height, int k) {
    const double phi = angle + k * std::numbers::pi / 2;
    return Eigen::Vector3d(radius * std::cos(phi), radius * std::sin(phi), height);
  };
  std::vector<Atom> atoms;
  for (int k = 0; k < 4; ++k) atoms.push_back({1, ring(inner, 0, 0, k)});
  for (int k = 0; k < 4; ++k) atoms.push_back({1, ring(outer, twist, lift, k)});
  const Molecule molecule(atoms, 0);

  Eigen::Matrix2cd s = Eigen::Matrix2cd::Zero();
  for (int i = 0; i < 2; ++i) {
    for (int j = 0; j < 2; ++j) {
      std::complex<double> phase = 1;
      for (int k = 0; k < 4; ++k, phase *= std::complex(0.0, 1.0)) {
        const double distance = (atoms[4 * i].position - atoms[4 * j + k].position).norm();
        s(i, j) += phase * closed_form_1s(hydrogen_zeta * distance / bohr_in_angstrom);
      }
    }
  }
  const Eigen::Matrix2cd unit = Eigen::Matrix2cd::Identity();
  const Eigen::Matrix2cd h = hydrogen_h * (1.75 * (s - unit) + unit);
  const Eigen::Matrix2cd root =
      Eigen::SelfAdjointEigenSolver<Eigen::Matrix2cd>(s).operatorInverseSqrt();
  const Eigen::Vector2d expected =
      Eigen::SelfAdjointEigenSolver<Eigen::Matrix2cd>(root * h * root).eigenvalues();

  const Run r = run(molecule, {}, {}, hydrogen());
  CHECK(r.symmetry.group.symbol().name() == "C4");
  std::vector<double> found;
  for (const Level& level : r.levels.levels) {
    if (r.symmetry.group.irreps()[level.irrep].label != "E") continue;
    CHECK(level.degeneracy == 2);
    found.push_back(level.energy_ev);
  }
  REQUIRE(found.size() == 2);
  CHECK(std::abs(found[0] - expected[0]) < 1e-10);
  CHECK(std::abs(found[1] - expected[1]) < 1e-10);
  CHECK(names(r).find("2e") != std::string::npos);
}
