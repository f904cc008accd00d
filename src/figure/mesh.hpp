// Triangle meshes with normals, and scenes made of them: what the renderer and glTF read.
#pragma once

#include <array>
#include <cstdint>
#include <string>
#include <vector>

#include <Eigen/Core>

#include "figure/figure.hpp"

namespace irrepwise {

/// Triangles wound counter-clockwise seen from outside.
struct Mesh {
  std::vector<Eigen::Vector3f> vertices;  // Å
  std::vector<Eigen::Vector3f> normals;   // per vertex, unit, outwards
  std::vector<std::array<std::uint32_t, 3>> triangles;
};

/// One body of one colour.
struct SceneBody {
  std::string name;  // "positive phase", "C", "bonds"
  Mesh mesh;
  Colour colour;
  double opacity = 1.0;
};

struct Scene {
  std::vector<SceneBody> bodies;
};

}  // namespace irrepwise
