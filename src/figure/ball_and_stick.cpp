#include "figure/ball_and_stick.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <numbers>

#include <Eigen/Geometry>

#include "molecule/element.hpp"
#include "molecule/pairs.hpp"

namespace irrepwise {
namespace {

void append(Mesh& to, const Mesh& more) {
  const auto shift = static_cast<std::uint32_t>(to.vertices.size());
  to.vertices.insert(to.vertices.end(), more.vertices.begin(), more.vertices.end());
  to.normals.insert(to.normals.end(), more.normals.begin(), more.normals.end());
  for (const auto& t : more.triangles) {
    to.triangles.push_back({t[0] + shift, t[1] + shift, t[2] + shift});
  }
}

// Rings of latitude; the poles are rings of radius zero.
Mesh ball(const Eigen::Vector3d& centre, double radius) {
  constexpr int rings = 14;
  constexpr int sectors = 24;
  Mesh mesh;
  for (int i = 0; i <= rings; ++i) {
    const double theta = std::numbers::pi * i / rings;
    for (int j = 0; j < sectors; ++j) {
      const double phi = 2.0 * std::numbers::pi * j / sectors;
      const Eigen::Vector3d n(std::sin(theta) * std::cos(phi), std::sin(theta) * std::sin(phi),
                              std::cos(theta));
      mesh.vertices.push_back((centre + radius * n).cast<float>());
      mesh.normals.push_back(n.cast<float>());
    }
  }
  for (std::uint32_t i = 0; i < rings; ++i) {
    for (std::uint32_t j = 0; j < sectors; ++j) {
      const std::uint32_t a = i * sectors + j;
      const std::uint32_t b = i * sectors + (j + 1) % sectors;
      if (i > 0) mesh.triangles.push_back({a, a + sectors, b});
      if (i + 1 < rings) mesh.triangles.push_back({b, a + sectors, b + sectors});
    }
  }
  return mesh;
}

Mesh stick(const Eigen::Vector3d& from, const Eigen::Vector3d& to) {
  constexpr int sectors = 14;
  const Eigen::Vector3d axis = (to - from).normalized();
  const Eigen::Vector3d u = axis.unitOrthogonal();
  const Eigen::Vector3d v = axis.cross(u);
  Mesh mesh;
  for (int j = 0; j < sectors; ++j) {
    const double phi = 2.0 * std::numbers::pi * j / sectors;
    const Eigen::Vector3d n = std::cos(phi) * u + std::sin(phi) * v;
    for (const Eigen::Vector3d* end : {&from, &to}) {
      mesh.vertices.push_back((*end + stick_radius_angstrom * n).cast<float>());
      mesh.normals.push_back(n.cast<float>());
    }
  }
  for (std::uint32_t j = 0; j < sectors; ++j) {
    const std::uint32_t a = 2 * j;
    const std::uint32_t b = 2 * ((j + 1) % sectors);
    mesh.triangles.push_back({a, b, a + 1});
    mesh.triangles.push_back({b, b + 1, a + 1});
  }
  return mesh;
}

bool is_nonmetal(int z) {
  return z <= 2 || (z >= 5 && z <= 10) || (z >= 14 && z <= 18) || (z >= 32 && z <= 36) ||
         (z >= 52 && z <= 54) || z >= 85;
}

}  // namespace

double ball_radius_angstrom(int atomic_number) {
  return 0.11 + 0.13 * covalent_radius_angstrom(atomic_number).value_or(1.5);
}

Colour element_colour(int atomic_number) {
  switch (atomic_number) {
    case 1:
      return {0xea, 0xec, 0xee};
    case 5:
      return {0xd9, 0xa8, 0x9c};
    case 6:
      return {0x4a, 0x4f, 0x55};
    case 7:
      return {0x46, 0x5f, 0xa8};
    case 8:
      return {0xb8, 0x3a, 0x34};
    case 9:
      return {0x9c, 0xcf, 0x8e};
    case 14:
      return {0xb9, 0xa9, 0x8d};
    case 15:
      return {0xc2, 0x74, 0x3a};
    case 16:
      return {0xcf, 0xb8, 0x3e};
    case 17:
      return {0x4f, 0x9d, 0x57};
    case 35:
      return {0x8c, 0x4a, 0x32};
    case 53:
      return {0x6d, 0x3f, 0x83};
    default:
      return is_nonmetal(atomic_number) ? Colour{0x8f, 0x86, 0x7b} : Colour{0x9d, 0x9a, 0xb4};
  }
}

std::vector<SceneBody> ball_and_stick(const Molecule& molecule) {
  std::map<int, Mesh> balls;
  for (const Atom& atom : molecule.atoms()) {
    append(balls[atom.atomic_number],
           ball(atom.position, ball_radius_angstrom(atom.atomic_number)));
  }
  std::vector<SceneBody> bodies;
  for (auto& [element, mesh] : balls) {
    bodies.push_back(
        {std::string(element_symbol(element)), std::move(mesh), element_colour(element), 1.0});
  }
  Mesh sticks;
  constexpr double longest_bond_angstrom = 6.5;  // beyond any sum of radii that counts as a bond
  for (const NearPair& pair : near_pairs(molecule.atoms(), longest_bond_angstrom)) {
    if (!are_bonded(molecule, pair.a, pair.b)) continue;
    append(sticks, stick(molecule.atoms()[static_cast<std::size_t>(pair.a)].position,
                         molecule.atoms()[static_cast<std::size_t>(pair.b)].position));
  }
  if (!sticks.triangles.empty()) bodies.push_back({"bonds", std::move(sticks), stick_colour, 1.0});
  return bodies;
}

}  // namespace irrepwise
