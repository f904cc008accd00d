// Surfaces in few bytes, for a page that carries them: positions to 16 bits, normals to 8.
#pragma once

#include <array>
#include <cstddef>
#include <string>

#include "figure/mesh.hpp"

namespace irrepwise {

/// Numbers are little-endian, in base64 (RFC 4648).
struct PackedSurface {
  std::array<double, 3> middle = {0.0, 0.0, 0.0};  // Å
  double scale = 1.0;                              // Å per step: position = middle + scale * place
  std::string places;                              // three int16 per vertex
  std::string normals;                             // three int8 per vertex, 127 for 1
  std::string triangles;                           // three indices each, uint16, or uint32
  bool wide = false;                               // whether the indices are uint32

  [[nodiscard]] std::size_t bytes() const {
    return places.size() + normals.size() + triangles.size();
  }
};

/// @param mesh    with at least one vertex
/// @accuracy      positions within 1/131068 of the longest side of the box around the mesh
[[nodiscard]] PackedSurface packed(const Mesh& mesh);

}  // namespace irrepwise
