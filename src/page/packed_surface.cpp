#include "page/packed_surface.hpp"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <cstdint>
#include <limits>

#include "figure/svg.hpp"

namespace irrepwise {
namespace {

constexpr double largest_place = 32767.0;

template <typename Integer>
void append(std::string& bytes, Integer value) {
  for (std::size_t i = 0; i < sizeof(Integer); ++i) {
    bytes += static_cast<char>(static_cast<std::uint64_t>(value) >> (8 * i) & 0xff);
  }
}

}  // namespace

PackedSurface packed(const Mesh& mesh) {
  assert(!mesh.vertices.empty());
  Eigen::Vector3f low = mesh.vertices.front();
  Eigen::Vector3f high = low;
  for (const Eigen::Vector3f& vertex : mesh.vertices) {
    low = low.cwiseMin(vertex);
    high = high.cwiseMax(vertex);
  }
  PackedSurface out;
  const Eigen::Vector3d middle = 0.5 * (low + high).cast<double>();
  out.middle = {middle.x(), middle.y(), middle.z()};
  out.scale = std::max(1e-6, 0.5 * double((high - low).maxCoeff())) / largest_place;

  std::string places;
  for (const Eigen::Vector3f& vertex : mesh.vertices) {
    const Eigen::Vector3d place = (vertex.cast<double>() - middle) / out.scale;
    for (int axis = 0; axis < 3; ++axis) {
      const double step = std::clamp(std::round(place(axis)), -largest_place, largest_place);
      append(places, static_cast<std::int16_t>(step));
    }
  }
  std::string normals;
  for (const Eigen::Vector3f& normal : mesh.normals) {
    for (int axis = 0; axis < 3; ++axis) {
      append(normals, static_cast<std::int8_t>(std::lround(127.0F * normal(axis))));
    }
  }
  out.wide = mesh.vertices.size() > std::numeric_limits<std::uint16_t>::max();
  std::string triangles;
  for (const auto& triangle : mesh.triangles) {
    for (const std::uint32_t corner : triangle) {
      if (out.wide) {
        append(triangles, corner);
      } else {
        append(triangles, static_cast<std::uint16_t>(corner));
      }
    }
  }
  out.places = base64(places);
  out.normals = base64(normals);
  out.triangles = base64(triangles);
  return out;
}

}  // namespace irrepwise
