#include "figure/isosurface.hpp"

#include <cmath>
#include <map>
#include <numbers>

#include <Eigen/Geometry>

#include <doctest/doctest.h>

#include "core/constants.hpp"
#include "figure/single_orbital.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

// How often each edge occurs in one direction minus the other, and how many there are.
struct Edges {
  bool closed = true;  // each edge once in each direction
  int count = 0;
};

Edges edges_of(const Mesh& mesh) {
  std::map<std::pair<std::uint32_t, std::uint32_t>, int> seen;
  for (const auto& t : mesh.triangles) {
    for (std::size_t i = 0; i < 3; ++i) ++seen[{t[i], t[(i + 1) % 3]}];
  }
  Edges edges;
  for (const auto& [edge, times] : seen) {
    const auto back = seen.find({edge.second, edge.first});
    if (times != 1 || back == seen.end() || back->second != 1) edges.closed = false;
    if (edge.first < edge.second) ++edges.count;
  }
  return edges;
}

double volume(const Mesh& mesh) {
  double sum = 0.0;
  for (const auto& t : mesh.triangles) {
    const Eigen::Vector3d a = mesh.vertices[t[0]].cast<double>();
    const Eigen::Vector3d b = mesh.vertices[t[1]].cast<double>();
    const Eigen::Vector3d c = mesh.vertices[t[2]].cast<double>();
    sum += a.dot(b.cross(c)) / 6.0;
  }
  return sum;
}

}  // namespace

TEST_CASE("the surface of a 1s orbital is a sphere, closed and wound outwards") {
  const double zeta = 1.3;
  const OrbitalField field = single_orbital(1, 0, zeta, 0);
  const OrbitalGrid grid = sample(field, 0.15);
  const double isovalue = 0.1;
  // psi(r) = isovalue, solved for r.
  const double radius = std::log(std::sqrt(std::pow(zeta, 3) / std::numbers::pi) / isovalue) /
                        zeta * bohr_in_angstrom;
  const Mesh mesh = isosurface(field, grid, 0, isovalue);
  REQUIRE(mesh.triangles.size() > 100);
  for (std::size_t v = 0; v < mesh.vertices.size(); ++v) {
    CHECK(std::abs(mesh.vertices[v].norm() - radius) < 2e-6);
    CHECK(mesh.normals[v].dot(mesh.vertices[v].normalized()) > 0.9f);
  }
  const Edges edges = edges_of(mesh);
  CHECK(edges.closed);
  // Euler: V - E + F = 2 for a sphere.
  CHECK(static_cast<int>(mesh.vertices.size()) - edges.count +
            static_cast<int>(mesh.triangles.size()) ==
        2);
  const double exact = 4.0 / 3.0 * std::numbers::pi * std::pow(radius, 3);
  CHECK(volume(mesh) > 0.95 * exact);  // flat triangles inside a sphere: somewhat less
  CHECK(volume(mesh) < exact);
}

TEST_CASE("a lobe smaller than a cell of the grid is as round as a large one") {
  const double zeta = 1.3;
  const OrbitalField field = single_orbital(1, 0, zeta, 0);
  const OrbitalGrid grid = sample(field, 0.15);
  const double radius = 0.12;  // Å; the grid has a point at its centre and none else inside
  const double isovalue =
      std::sqrt(std::pow(zeta, 3) / std::numbers::pi) * std::exp(-zeta * radius / bohr_in_angstrom);
  const Mesh mesh = isosurface(field, grid, 0, isovalue);
  CHECK(edges_of(mesh).closed);
  const double exact = 4.0 / 3.0 * std::numbers::pi * std::pow(radius, 3);
  CHECK(volume(mesh) > 0.9 * exact);  // 0.5 where the grid's own points make it
  CHECK(volume(mesh) < exact);
}

TEST_CASE("two lobes near each other, one large and one small, are both there once") {
  // p lobes of unequal size: 2s on the same centre adds to one and takes from the other.
  const Molecule molecule({{1, {0, 0, 0}}}, 0);
  Basis basis;
  basis.shells.push_back({0, 0, -13.6, ContractedRadial({{SlaterRadial(2, 1.6), 1.0}}), 0});
  basis.shells.push_back({0, 1, -13.6, ContractedRadial({{SlaterRadial(2, 1.6), 1.0}}), 1});
  basis.first_shell = {0, 2};
  basis.valence_electrons = {1};
  basis.n_orbitals = 4;
  Eigen::MatrixXd mixed = Eigen::MatrixXd::Zero(4, 1);
  mixed(0, 0) = 0.6;
  mixed(3, 0) = 0.8;
  const OrbitalField field(molecule, basis, mixed);
  const OrbitalGrid grid = sample(field, 0.15);
  for (const double isovalue : {0.05, 0.1, 0.15, 0.2, 0.25, -0.02, -0.04, -0.06}) {
    const Mesh mesh = isosurface(field, grid, 0, isovalue);
    CAPTURE(isovalue);
    CHECK(edges_of(mesh).closed);
    if (mesh.triangles.empty()) continue;
    // The volume is that of the points with a larger value, counted on a finer grid; a surface that
    // is there twice would have twice as much.
    const OrbitalGrid fine = sample(field, 0.04);
    double counted = 0.0;
    for (const double value : fine.values[0]) {
      counted += value / isovalue >= 1.0 ? std::pow(0.04, 3) : 0.0;
    }
    CHECK(std::abs(volume(mesh) / counted - 1.0) < 0.1);
  }
}

TEST_CASE("vertices of both phases lie on the isovalue of a molecular orbital") {
  const Run r = run(test_molecule("permanganate").molecule);
  const Eigen::MatrixXd c =
      level_orbitals(r.symmetry, r.basis, r.levels, *r.levels.frontier.homo).leftCols(1);
  const OrbitalField field(r.symmetry.molecule, r.basis, c);
  const OrbitalGrid grid = sample(field);
  const double isovalue = enclosing_isovalue(field, grid, 0, 0.5);
  for (const double phase : {1.0, -1.0}) {
    const Mesh mesh = isosurface(field, grid, 0, phase * isovalue);
    REQUIRE(!mesh.vertices.empty());
    double worst = 0.0;
    for (const Eigen::Vector3f& v : mesh.vertices) {
      worst = std::max(worst, std::abs(field.value(v.cast<double>(), 0) / isovalue - phase));
    }
    CHECK(worst < 1e-5);
    CHECK(edges_of(mesh).closed);
  }
}

TEST_CASE("the two lobes of a p orbital are mirror images") {
  const OrbitalField field = single_orbital(2, 1, 1.6, 2);
  const OrbitalGrid grid = sample(field);
  const Mesh above = isosurface(field, grid, 0, 0.05);
  const Mesh below = isosurface(field, grid, 0, -0.05);
  CHECK(std::abs(volume(above) / volume(below) - 1.0) < 0.01);
  for (const Eigen::Vector3f& v : above.vertices) CHECK(v.z() > 0.0f);
  for (const Eigen::Vector3f& v : below.vertices) CHECK(v.z() < 0.0f);
}
