#include "figure/camera.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numbers>
#include <vector>

#include <Eigen/Geometry>

#include <fmt/format.h>

namespace irrepwise {
namespace {

constexpr int cells = 40;  // of the small picture by which a view is judged
enum class Kind : signed char { Nothing, Molecule, Positive, Negative };

struct Speck {
  Eigen::Vector3d at;
  Kind kind;
};

Kind kind_of(const SceneBody& body) {
  if (body.name == "positive phase") return Kind::Positive;
  if (body.name == "negative phase") return Kind::Negative;
  return Kind::Molecule;
}

// The middle of every triangle stands for it, thinned out where there are very many.
std::vector<Speck> specks_of(const Scene& scene) {
  constexpr std::size_t enough = 6000;
  std::vector<Speck> specks;
  for (const SceneBody& body : scene.bodies) {
    const std::size_t step = 1 + body.mesh.triangles.size() / enough;
    for (std::size_t t = 0; t < body.mesh.triangles.size(); t += step) {
      const auto& corners = body.mesh.triangles[t];
      const Eigen::Vector3f middle =
          (body.mesh.vertices[corners[0]] + body.mesh.vertices[corners[1]] +
           body.mesh.vertices[corners[2]]) /
          3.0f;
      specks.push_back({middle.cast<double>(), kind_of(body)});
    }
  }
  return specks;
}

double seen(const std::vector<Speck>& specks, const Camera& camera, const Eigen::Vector3d& centre,
            double radius) {
  std::vector<double> depth(cells * cells, -std::numeric_limits<double>::infinity());
  std::vector<Kind> kind(cells * cells, Kind::Nothing);
  for (const Speck& speck : specks) {
    const Eigen::Vector3d r = (speck.at - centre) / radius;
    const int x =
        std::clamp(static_cast<int>((0.5 + 0.5 * camera.right.dot(r)) * cells), 0, cells - 1);
    const int y =
        std::clamp(static_cast<int>((0.5 + 0.5 * camera.up.dot(r)) * cells), 0, cells - 1);
    const auto cell = static_cast<std::size_t>(y * cells + x);
    const double d = camera.towards.dot(r);
    if (d > depth[cell]) {
      depth[cell] = d;
      kind[cell] = speck.kind;
    }
  }
  double count[4] = {0.0, 0.0, 0.0, 0.0};
  for (const Kind k : kind) count[static_cast<int>(k)] += 1.0;
  const double positive = count[static_cast<int>(Kind::Positive)];
  const double negative = count[static_cast<int>(Kind::Negative)];
  // The geometric mean asks for both phases; an orbital of one phase is judged by its area.
  return positive + negative + 2.0 * std::sqrt(positive * negative) +
         0.5 * count[static_cast<int>(Kind::Molecule)];
}

}  // namespace

Camera camera_from(const Eigen::Vector3d& towards) {
  Camera camera;
  camera.towards = towards.normalized();
  const bool on_z = std::abs(camera.towards.z()) > 0.999;
  const Eigen::Vector3d upright = on_z ? Eigen::Vector3d::UnitY() : Eigen::Vector3d::UnitZ();
  camera.up = (upright - upright.dot(camera.towards) * camera.towards).normalized();
  camera.right = camera.up.cross(camera.towards);
  return camera;
}

Camera best_camera(std::span<const Scene> scenes) {
  std::vector<std::vector<Speck>> all;
  Eigen::Vector3d low = Eigen::Vector3d::Constant(1e9);
  Eigen::Vector3d high = -low;
  for (const Scene& scene : scenes) {
    all.push_back(specks_of(scene));
    for (const Speck& speck : all.back()) {
      low = low.cwiseMin(speck.at);
      high = high.cwiseMax(speck.at);
    }
  }
  const Eigen::Vector3d centre = 0.5 * (low + high);
  const double radius = std::max(1e-6, 0.5 * (high - low).norm());
  Camera best;
  double best_score = -1.0;
  // Rings of elevation, turned by odd angles so that no view hides equivalent atoms exactly behind
  // each other; views from somewhat above come first and win ties.
  for (const double elevation : {28.0, 15.0, 42.0, -20.0, 60.0, 80.0}) {
    const int steps = elevation < 60.0 ? 24 : 12;
    for (int step = 0; step < steps; ++step) {
      const double azimuth = (-67.0 + 360.0 * step / steps) * std::numbers::pi / 180.0;
      const double e = elevation * std::numbers::pi / 180.0;
      const Camera camera = camera_from(
          {std::cos(e) * std::cos(azimuth), std::cos(e) * std::sin(azimuth), std::sin(e)});
      double score = 0.0;
      for (const std::vector<Speck>& specks : all) score += seen(specks, camera, centre, radius);
      if (score > best_score * 1.01) {  // rounding must not decide between equals
        best_score = score;
        best = camera;
      }
    }
  }
  return best;
}

std::string camera_words(const Camera& camera) {
  constexpr const char* names[] = {"x", "y", "z"};
  for (int axis = 0; axis < 3; ++axis) {
    if (std::abs(camera.towards(axis)) > 0.99999) {
      return fmt::format("seen from {}{}", camera.towards(axis) < 0.0 ? "−" : "", names[axis]);
    }
  }
  std::string words = "seen from (";
  for (int axis = 0; axis < 3; ++axis) {
    const double value = std::round(100.0 * camera.towards(axis)) / 100.0;
    words += fmt::format("{}{}{:.2f}", axis == 0 ? "" : ",\u00A0", value < 0.0 ? "−" : "",
                         std::abs(value));
  }
  return words + ")";
}

}  // namespace irrepwise
