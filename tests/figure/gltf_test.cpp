#include "figure/gltf.hpp"

#include <cstring>

#include <doctest/doctest.h>
#include <nlohmann/json.hpp>

#include "figure/orbital_scene.hpp"
#include "figure/single_orbital.hpp"

using namespace irrepwise;

namespace {

std::uint32_t number_at(const std::string& bytes, std::size_t at) {
  std::uint32_t value = 0;
  for (std::size_t i = 0; i < 4; ++i) {
    value |= std::uint32_t(static_cast<unsigned char>(bytes[at + i])) << (8 * i);
  }
  return value;
}

}  // namespace

TEST_CASE("a glb file has the two chunks of glTF 2.0, and its accessors hold the meshes") {
  // Khronos glTF 2.0, section 4.4: header, JSON chunk, BIN chunk, each a multiple of 4 bytes.
  const Molecule molecule({{1, {0, 0, 0}}}, 0);
  const OrbitalField field = single_orbital(2, 1, 1.6, 2);
  const OrbitalGrid grid = sample(field);
  const Scene scene = orbital_scene(molecule, field, grid, 0, 0.5).scene;
  const std::string bytes = glb_bytes(scene, {{"orbital", "1pu:3"}});
  CHECK(bytes == glb_bytes(scene, {{"orbital", "1pu:3"}}));
  REQUIRE(bytes.size() > 28);
  CHECK(bytes.substr(0, 4) == "glTF");
  CHECK(number_at(bytes, 4) == 2);
  CHECK(number_at(bytes, 8) == bytes.size());
  const std::size_t json_size = number_at(bytes, 12);
  CHECK(json_size % 4 == 0);
  CHECK(bytes.substr(16, 4) == "JSON");
  const std::size_t binary = 20 + json_size;
  CHECK(bytes.substr(binary + 4, 4) == std::string("BIN\0", 4));
  CHECK(number_at(bytes, binary) == bytes.size() - binary - 8);
  const auto json = nlohmann::json::parse(bytes.substr(20, json_size));
  CHECK(json["asset"]["version"] == "2.0");
  CHECK(json["scenes"][0]["extras"]["orbital"] == "1pu:3");
  CHECK(json["buffers"][0]["byteLength"] == number_at(bytes, binary));
  REQUIRE(json["meshes"].size() == 3);  // two phases, one ball, no bonds
  CHECK(json["materials"][0]["name"] == "positive phase");
  CHECK(json["materials"][1]["name"] == "negative phase");
  for (std::size_t m = 0; m < 3; ++m) {
    const auto& primitive = json["meshes"][m]["primitives"][0];
    const Mesh& mesh = scene.bodies[m].mesh;
    const auto& position =
        json["accessors"][primitive["attributes"]["POSITION"].get<std::size_t>()];
    CHECK(position["count"] == mesh.vertices.size());
    const auto& view = json["bufferViews"][position["bufferView"].get<std::size_t>()];
    const std::uint32_t bits = number_at(bytes, binary + 8 + view["byteOffset"].get<std::size_t>());
    float first = 0.0f;
    std::memcpy(&first, &bits, 4);
    CHECK(first == mesh.vertices[0].x());
    const auto& indices = json["accessors"][primitive["indices"].get<std::size_t>()];
    CHECK(indices["count"] == 3 * mesh.triangles.size());
  }
}
