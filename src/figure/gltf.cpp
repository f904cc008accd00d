#include "figure/gltf.hpp"

#include <bit>
#include <cmath>
#include <cstdint>
#include <type_traits>

#include <nlohmann/json.hpp>

namespace irrepwise {
namespace {

using Json = nlohmann::ordered_json;

// glTF is little-endian whatever the machine.
template <typename T>
void put(std::string& bytes, T value) {
  const auto bits = std::bit_cast<std::uint32_t>(value);
  for (int shift = 0; shift < 32; shift += 8) bytes += static_cast<char>(bits >> shift & 0xFFu);
}

constexpr int array_buffer = 34962;  // glTF 2.0, bufferView.target
constexpr int element_array_buffer = 34963;
constexpr int type_float = 5126;  // accessor.componentType
constexpr int type_unsigned_int = 5125;

class Writer {
 public:
  void add(const SceneBody& body) {
    const int number = static_cast<int>(json_["meshes"].size());
    const Mesh& mesh = body.mesh;
    Json attributes = {{"POSITION", vectors(mesh.vertices, true)},
                       {"NORMAL", vectors(mesh.normals, false)}};
    const int indices = triangles(mesh);
    json_["meshes"].push_back({{"name", body.name},
                               {"primitives", Json::array({{{"attributes", attributes},
                                                            {"indices", indices},
                                                            {"material", number}}})}});
    json_["materials"].push_back(material(body));
    json_["nodes"].push_back({{"name", body.name}, {"mesh", number}});
  }

  std::string file(const Json& extras) {
    Json root = {{"asset", {{"version", "2.0"}, {"generator", "irrepwise"}}}, {"scene", 0}};
    Json children = Json::array();
    for (std::size_t i = 0; i < json_["nodes"].size(); ++i) children.push_back(i);
    Json nodes = json_["nodes"];
    // A quarter turn about -x takes z to y.
    const double half = std::sqrt(0.5);
    nodes.push_back(
        {{"name", "orbital"}, {"rotation", {-half, 0.0, 0.0, half}}, {"children", children}});
    root["scenes"] = Json::array({{{"nodes", {nodes.size() - 1}}, {"extras", extras}}});
    root["nodes"] = nodes;
    for (const char* key : {"meshes", "materials", "accessors", "bufferViews"}) {
      root[key] = json_[key];
    }
    root["buffers"] = Json::array({{{"byteLength", binary_.size()}}});
    std::string text = root.dump();
    text.resize((text.size() + 3) / 4 * 4, ' ');
    std::string bytes = "glTF";
    put(bytes, std::uint32_t{2});
    put(bytes, static_cast<std::uint32_t>(12 + 8 + text.size() + 8 + binary_.size()));
    put(bytes, static_cast<std::uint32_t>(text.size()));
    bytes += "JSON" + text;
    put(bytes, static_cast<std::uint32_t>(binary_.size()));  // a multiple of 4 as it is
    bytes += std::string("BIN\0", 4) + binary_;
    return bytes;
  }

 private:
  int view(std::size_t start, int target) {
    json_["bufferViews"].push_back({{"buffer", 0},
                                    {"byteOffset", start},
                                    {"byteLength", binary_.size() - start},
                                    {"target", target}});
    return static_cast<int>(json_["bufferViews"].size()) - 1;
  }

  int vectors(const std::vector<Eigen::Vector3f>& list, bool with_bounds) {
    const std::size_t start = binary_.size();
    Eigen::Vector3f low = list.front();
    Eigen::Vector3f high = list.front();
    for (const Eigen::Vector3f& v : list) {
      for (int i = 0; i < 3; ++i) put(binary_, v(i));
      low = low.cwiseMin(v);
      high = high.cwiseMax(v);
    }
    Json accessor = {{"bufferView", view(start, array_buffer)},
                     {"componentType", type_float},
                     {"count", list.size()},
                     {"type", "VEC3"}};
    if (with_bounds) {
      accessor["min"] = {low.x(), low.y(), low.z()};
      accessor["max"] = {high.x(), high.y(), high.z()};
    }
    json_["accessors"].push_back(accessor);
    return static_cast<int>(json_["accessors"].size()) - 1;
  }

  int triangles(const Mesh& mesh) {
    const std::size_t start = binary_.size();
    for (const auto& t : mesh.triangles) {
      for (const std::uint32_t corner : t) put(binary_, corner);
    }
    json_["accessors"].push_back({{"bufferView", view(start, element_array_buffer)},
                                  {"componentType", type_unsigned_int},
                                  {"count", 3 * mesh.triangles.size()},
                                  {"type", "SCALAR"}});
    return static_cast<int>(json_["accessors"].size()) - 1;
  }

  // Colours of glTF are linear; ours are sRGB (IEC 61966-2-1).
  static double linear(std::uint8_t channel) {
    const double v = channel / 255.0;
    const double value = v <= 0.04045 ? v / 12.92 : std::pow((v + 0.055) / 1.055, 2.4);
    return std::round(1e6 * value) / 1e6;
  }

  static Json material(const SceneBody& body) {
    Json out = {{"name", body.name},
                {"pbrMetallicRoughness",
                 {{"baseColorFactor",
                   {linear(body.colour.red), linear(body.colour.green), linear(body.colour.blue),
                    body.opacity}},
                  {"metallicFactor", 0.0},
                  {"roughnessFactor", 0.55}}}};
    if (body.opacity < 1.0) out["alphaMode"] = "BLEND";
    return out;
  }

  Json json_ = {{"meshes", Json::array()},
                {"materials", Json::array()},
                {"nodes", Json::array()},
                {"accessors", Json::array()},
                {"bufferViews", Json::array()}};
  std::string binary_;
};

}  // namespace

std::string glb_bytes(const Scene& scene,
                      const std::vector<std::pair<std::string, std::string>>& facts) {
  Writer writer;
  for (const SceneBody& body : scene.bodies) {
    if (!body.mesh.triangles.empty()) writer.add(body);
  }
  Json extras = Json::object();
  for (const auto& [name, value] : facts) extras[name] = value;
  return writer.file(extras);
}

}  // namespace irrepwise
