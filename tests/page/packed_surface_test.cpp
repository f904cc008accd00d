#include "page/packed_surface.hpp"

#include <cmath>
#include <cstdint>
#include <cstring>
#include <string>
#include <vector>

#include <doctest/doctest.h>

using namespace irrepwise;

namespace {

// RFC 4648 read by its alphabet, not by the writer's code.
std::string unpacked(const std::string& text) {
  const std::string letters = "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789+/";
  std::string bytes;
  std::uint32_t bits = 0;
  int n = 0;
  for (const char c : text) {
    if (c == '=') break;
    bits = bits << 6 | static_cast<std::uint32_t>(letters.find(c));
    n += 6;
    if (n >= 8) {
      n -= 8;
      bytes += static_cast<char>(bits >> n & 0xff);
    }
  }
  return bytes;
}

template <typename Integer>
std::vector<Integer> numbers(const std::string& base64) {
  const std::string bytes = unpacked(base64);
  std::vector<Integer> out(bytes.size() / sizeof(Integer));
  std::memcpy(out.data(), bytes.data(), out.size() * sizeof(Integer));  // little-endian, as we run
  return out;
}

// A strip of triangles far from the origin, longer than wide.
Mesh strip(std::size_t vertices) {
  Mesh mesh;
  for (std::size_t i = 0; i < vertices; ++i) {
    const float t = static_cast<float>(i) / static_cast<float>(vertices);
    mesh.vertices.emplace_back(5.0F + 3.0F * t, -2.0F + 0.1F * std::sin(40.0F * t), 0.5F);
    mesh.normals.emplace_back(std::sin(t), 0.0F, std::cos(t));
    const auto corner = static_cast<std::uint32_t>(i);
    if (i >= 2) mesh.triangles.push_back({corner - 2, corner - 1, corner});
  }
  return mesh;
}

template <typename Index>
void check_against(const Mesh& mesh, const PackedSurface& surface) {
  const auto places = numbers<std::int16_t>(surface.places);
  const auto normals = numbers<std::int8_t>(surface.normals);
  const auto triangles = numbers<Index>(surface.triangles);
  REQUIRE(places.size() == 3 * mesh.vertices.size());
  REQUIRE(normals.size() == 3 * mesh.normals.size());
  REQUIRE(triangles.size() == 3 * mesh.triangles.size());
  double worst_place = 0.0;
  double worst_normal = 0.0;
  for (std::size_t i = 0; i < mesh.vertices.size(); ++i) {
    for (std::size_t axis = 0; axis < 3; ++axis) {
      const auto a = static_cast<Eigen::Index>(axis);
      const double place = surface.middle[axis] + surface.scale * places[3 * i + axis];
      worst_place = std::max(worst_place, std::abs(place - double(mesh.vertices[i](a))));
      worst_normal = std::max(worst_normal,
                              std::abs(normals[3 * i + axis] / 127.0 - double(mesh.normals[i](a))));
    }
  }
  CHECK(worst_place <= 0.5 * 3.0 / 65534 * 1.01);  // half a step of the longest side, 3 Å
  CHECK(worst_normal <= 0.5 / 127.0 * 1.01);
  bool same = true;
  for (std::size_t i = 0; i < triangles.size(); ++i) {
    same = same && triangles[i] == mesh.triangles[i / 3][i % 3];
  }
  CHECK(same);
}

}  // namespace

TEST_CASE("a packed surface unpacks to the same mesh within half a step") {
  const Mesh mesh = strip(100);
  const PackedSurface surface = packed(mesh);
  CHECK_FALSE(surface.wide);
  check_against<std::uint16_t>(mesh, surface);
}

TEST_CASE("more vertices than 16 bits count get indices of 32 bits") {
  const Mesh mesh = strip(70'000);
  const PackedSurface surface = packed(mesh);
  CHECK(surface.wide);
  check_against<std::uint32_t>(mesh, surface);
}
