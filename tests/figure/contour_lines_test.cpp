#include "figure/contour_lines.hpp"

#include <cmath>
#include <numbers>

#include <doctest/doctest.h>

#include "core/constants.hpp"
#include "figure/single_orbital.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

TEST_CASE("the contours of a 1s orbital are circles of the radius that its formula gives") {
  const double zeta = 1.3;
  const OrbitalField field = single_orbital(1, 0, zeta, 0);
  const ContourMap map = contour_map(field, 0, axes_plane("xz"), contour_levels());
  REQUIRE(map.contours.size() == 6);  // no negative ones; psi(0) = 0.836 lies above every level
  for (const Contour& contour : map.contours) {
    REQUIRE(contour.lines.size() == 1);
    const double radius =
        std::log(std::sqrt(std::pow(zeta, 3) / std::numbers::pi) / contour.level) / zeta *
        bohr_in_angstrom;
    for (const Point2& p : contour.lines[0]) {
      CHECK(std::abs(std::hypot(p.x, p.y) - radius) < 1e-6);
    }
  }
}

TEST_CASE("every vertex of a contour of a molecular orbital has the value of its level") {
  const Run r = run(test_molecule("formaldehyde").molecule);
  const Eigen::MatrixXd c =
      level_orbitals(r.symmetry, r.basis, r.levels, *r.levels.frontier.homo).leftCols(1);
  const OrbitalField field(r.symmetry.molecule, r.basis, c);
  const Plane plane = telling_plane(r.symmetry.molecule, field, 0);
  const ContourMap map = contour_map(field, 0, plane, contour_levels());
  bool positive = false;
  bool negative = false;
  for (const Contour& contour : map.contours) {
    (contour.level > 0.0 ? positive : negative) = true;
    for (const std::vector<Point2>& line : contour.lines) {
      for (const Point2& p : line) {
        const double value = field.value(plane.point(p.x, p.y), 0);
        CHECK(std::abs(value / contour.level - 1.0) < 1e-6);
      }
    }
  }
  CHECK(positive);
  CHECK(negative);
}

TEST_CASE(
    "the contours of a p orbital in a plane with its axis mirror each other, and a plane in "
    "which it vanishes has none") {
  const OrbitalField field = single_orbital(2, 1, 1.6, 2);
  const ContourMap map = contour_map(field, 0, axes_plane("yz"), contour_levels());
  double above = 0.0;
  double below = 0.0;
  for (const Contour& contour : map.contours) {
    for (const std::vector<Point2>& line : contour.lines) {
      double area = 0.0;
      for (std::size_t i = 0; i < line.size(); ++i) {
        const Point2& p = line[i];
        const Point2& q = line[(i + 1) % line.size()];
        area += 0.5 * (p.x * q.y - q.x * p.y);
      }
      (contour.level > 0.0 ? above : below) += std::abs(area);
    }
  }
  CHECK(above > 1.0);  // Å^2
  CHECK(std::abs(above / below - 1.0) < 1e-4);
  CHECK(contour_map(field, 0, axes_plane("xy"), contour_levels()).contours.empty());
}
