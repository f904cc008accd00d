#include "figure/plane.hpp"

#include <cmath>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "figure/single_orbital.hpp"
#include "support/molecules.hpp"

using namespace irrepwise;

TEST_CASE("planes of the axes have the axes as their directions, right-handed towards the eye") {
  const Plane xz = axes_plane("xz");
  CHECK(xz.right == Eigen::Vector3d::UnitX());
  CHECK(xz.up == Eigen::Vector3d::UnitZ());
  const Plane xy = axes_plane("yx", 0.5);
  CHECK(xy.right == Eigen::Vector3d::UnitX());
  CHECK(xy.up == Eigen::Vector3d::UnitY());
  CHECK(xy.point(1.0, 2.0) == Eigen::Vector3d(1.0, 2.0, 0.5));
  CHECK(xy.words == "plane parallel to xy at z = 0.50 Å");
  const Plane yz = axes_plane("yz");
  CHECK(yz.right == Eigen::Vector3d::UnitY());
  CHECK(yz.up == Eigen::Vector3d::UnitZ());
}

TEST_CASE("a plane by atoms holds them all; atoms on a line give none") {
  const Molecule molecule({{8, {0, 0, 0.1}}, {1, {0.8, 0.1, -0.5}}, {1, {-0.7, 0.2, -0.4}}}, 0);
  const Plane plane = atoms_plane(molecule, {0, 1, 2});
  for (const Atom& atom : molecule.atoms()) {
    CHECK(std::abs(plane.normal().dot(atom.position - plane.origin)) < 1e-12);
  }
  CHECK(std::abs(plane.right.dot(plane.up)) < 1e-12);
  const Molecule line({{6, {0, 0, 0}}, {8, {0, 0, 1.16}}, {8, {0, 0, -1.16}}}, 0);
  CHECK_THROWS_WITH_AS(
      static_cast<void>(atoms_plane(line, {0, 1, 2})),
      "C1, O2 and O3 lie on a line and give no plane; choose three atoms that do not", Error);
  CHECK_THROWS_WITH_AS(static_cast<void>(axes_plane("xx")),
                       "'xx' is no plane; expected xy, xz, yz or three atoms such as Pt1,Cl2,Cl3",
                       Error);
}

TEST_CASE("the plane with most to show of a p orbital holds its axis") {
  const Molecule molecule({{1, {0, 0, 0}}}, 0);
  for (int component = 0; component < 3; ++component) {
    const Plane plane = telling_plane(molecule, single_orbital(2, 1, 1.6, component), 0);
    CHECK(std::abs(plane.normal()(component)) < 1e-12);
  }
}
