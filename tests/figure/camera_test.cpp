#include "figure/camera.hpp"

#include <cmath>

#include <Eigen/Geometry>

#include <doctest/doctest.h>

#include "figure/orbital_sheets.hpp"
#include "figure/render.hpp"
#include "figure/single_orbital.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

TEST_CASE("a camera is a right-handed frame with z upright") {
  for (const Eigen::Vector3d& from :
       {Eigen::Vector3d(1, 0.4, 0.3), Eigen::Vector3d(-1, 2, -0.7), Eigen::Vector3d(0, 0, 1)}) {
    const Camera camera = camera_from(from);
    CHECK((camera.right.cross(camera.up) - camera.towards).norm() < 1e-12);
    CHECK(std::abs(camera.right.z()) < 1e-12);
  }
  CHECK(camera_words(camera_from({0, 0, -2})) == "seen from −z");
}

TEST_CASE(
    "the camera chosen for a p orbital sees both lobes side by side, not one behind the other") {
  const Molecule molecule({{1, {0, 0, 0}}}, 0);
  for (int component = 0; component < 3; ++component) {
    const OrbitalField field = single_orbital(2, 1, 1.6, component);
    const OrbitalGrid grid = sample(field);
    const Scene scenes[] = {orbital_scene(molecule, field, grid, 0, 0.5).scene};
    const Camera camera = best_camera(scenes);
    CAPTURE(component);
    CHECK(std::abs(camera.towards(component)) < 0.6);
  }
}

TEST_CASE(
    "the picture of one partner, seen from where an operation takes the eye, is the picture "
    "of the other") {
  const Run r = run(test_molecule("tetrachloroplatinate(II)").molecule);
  const Molecule& molecule = r.symmetry.molecule;
  // The partners of an E_k of D4h with odd k are taken into each other by the fourth turn about z.
  for (std::size_t level = 0; level < r.levels.levels.size(); ++level) {
    if (r.levels.levels[level].degeneracy != 2) continue;
    const Eigen::MatrixXd c =
        level_orbitals(r.symmetry, r.basis, r.levels, static_cast<int>(level));
    const Eigen::Matrix3d turn =
        Eigen::AngleAxisd(std::acos(0.0), Eigen::Vector3d::UnitZ()).toRotationMatrix();
    const Camera eye = camera_from({0.8, 0.45, 0.5});
    const Camera turned = camera_from(turn * eye.towards);
    Raster pictures[2];
    for (int partner = 0; partner < 2; ++partner) {
      const OrbitalField field(molecule, r.basis, c.col(partner));
      const OrbitalGrid grid = sample(field);
      const OrbitalScene scene = orbital_scene(molecule, field, grid, 0, 0.5);
      pictures[partner] = surface_picture(scene, partner == 0 ? eye : turned, 80);
    }
    // The second partner may come out with its phases exchanged: only shapes are compared.
    double difference = 0.0;
    double covered = 0.0;
    for (std::size_t i = 3; i < pictures[0].rgba.size(); i += 4) {
      difference += std::abs(pictures[0].rgba[i] - pictures[1].rgba[i]) / 255.0;
      covered += pictures[0].rgba[i] / 255.0;
    }
    CHECK(covered > 500.0);  // pixels
    CHECK(difference / covered < 0.01);
    return;
  }
  FAIL("no degenerate level");
}

TEST_CASE("a ball fills the circle of its radius, and nothing else is painted") {
  const Molecule molecule({{1, {0, 0, 0}}}, 0);
  const OrbitalField field = single_orbital(1, 0, 1.3, 0);
  const OrbitalGrid grid = sample(field);
  const OrbitalScene scene = orbital_scene(molecule, field, grid, 0, 0.5);
  const Camera camera = camera_from({0, -1, 0});
  const Frame frame{{0, 0, 0}, 2.0};
  const Raster raster = rendered(scene.scene, camera, frame, 200);
  double covered = 0.0;
  for (std::size_t i = 3; i < raster.rgba.size(); i += 4) covered += raster.rgba[i] > 0 ? 1.0 : 0.0;
  double radius = 0.0;
  for (const auto& v : scene.scene.bodies[0].mesh.vertices) {
    radius = std::max(radius, static_cast<double>(v.norm()));
  }
  const double expected = std::acos(-1.0) * std::pow(radius * 50.0, 2);  // 50 px per Å
  CHECK(std::abs(covered / expected - 1.0) < 0.05);
}
