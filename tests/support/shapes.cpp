#include "support/shapes.hpp"

#include <charconv>
#include <cmath>
#include <numbers>
#include <optional>
#include <stdexcept>

#include <Eigen/Geometry>

#include "molecule/element.hpp"

namespace shapes {
namespace {

using Eigen::Matrix3d;
using Eigen::Vector3d;

const Vector3d x_axis = Vector3d::UnitX();
const Vector3d y_axis = Vector3d::UnitY();
const Vector3d z_axis = Vector3d::UnitZ();

double radians(double degrees) { return degrees * std::numbers::pi / 180.0; }

Matrix3d rotation_reflection(int order) { return mirror(z_axis) * turn(z_axis, 360.0 / order); }

Generators cubic_or_icosahedral(std::string_view symbol) {
  const Matrix3d threefold = turn(Vector3d::Ones(), 120.0);
  const Matrix3d inversion = -Matrix3d::Identity();
  if (symbol == "T") return {turn(z_axis, 180.0), threefold};
  if (symbol == "Td") return {rotation_reflection(4), threefold};
  if (symbol == "Th") return {turn(z_axis, 180.0), threefold, inversion};
  if (symbol == "O") return {turn(z_axis, 90.0), threefold};
  if (symbol == "Oh") return {turn(z_axis, 90.0), threefold, inversion};
  const Matrix3d fivefold = turn(Vector3d(0.0, 1.0, std::numbers::phi), 72.0);
  if (symbol == "I") return {threefold, fivefold};
  return {threefold, fivefold, inversion};
}

}  // namespace

Matrix3d turn(const Vector3d& axis, double degrees) {
  return Eigen::AngleAxisd(radians(degrees), axis.normalized()).toRotationMatrix();
}

Matrix3d mirror(const Vector3d& normal) {
  const Vector3d n = normal.normalized();
  return Matrix3d::Identity() - 2.0 * n * n.transpose();
}

Generators generators(std::string_view symbol) {
  if (symbol == "C1") return {};
  if (symbol == "Cs") return {mirror(z_axis)};
  if (symbol == "Ci") return {-Matrix3d::Identity()};
  if (symbol.front() == 'T' || symbol.front() == 'O' || symbol.front() == 'I') {
    return cubic_or_icosahedral(symbol);
  }
  int n = 0;
  const char* end = symbol.data() + symbol.size();
  const char* rest = std::from_chars(symbol.data() + 1, end, n).ptr;
  const std::string_view tail(rest, static_cast<std::size_t>(end - rest));
  if (symbol.front() == 'S') return {rotation_reflection(n)};
  if (tail == "d") return {rotation_reflection(2 * n), mirror(y_axis)};
  Generators result = {turn(z_axis, 360.0 / n)};
  if (symbol.front() == 'D') result.push_back(turn(x_axis, 180.0));
  if (tail == "v") result.push_back(mirror(y_axis));
  if (tail == "h") result.push_back(mirror(z_axis));
  return result;
}

std::vector<Vector3d> orbit(const Generators& generators, const Vector3d& point) {
  constexpr double same_point_angstrom = 1e-6;
  constexpr std::size_t largest_group = 120;  // of those here: Ih
  std::vector<Vector3d> images = {point};
  for (std::size_t done = 0; done < images.size(); ++done) {
    for (const Matrix3d& g : generators) {
      const Vector3d image = g * images[done];
      bool known = false;
      for (const Vector3d& other : images) {
        known = known || (image - other).norm() < same_point_angstrom;
      }
      if (!known) images.push_back(image);
      if (images.size() > largest_group)
        throw std::logic_error("the generators make no finite group");
    }
  }
  return images;
}

Vector3d ring(double radius, double degrees, double height) {
  return {radius * std::cos(radians(degrees)), radius * std::sin(radians(degrees)), height};
}

double polygon_radius(int corners, double side) {
  return side / (2.0 * std::sin(std::numbers::pi / corners));
}

Vector3d bond_end(const Vector3d& apex, const Vector3d& axis, double length, double degrees,
                  const Vector3d& side, double azimuth_degrees) {
  const Vector3d along = axis.normalized();
  const Vector3d across = (side - side.dot(along) * along).normalized();
  const Vector3d turned = turn(along, azimuth_degrees) * across;
  return apex + length * (std::cos(radians(degrees)) * along + std::sin(radians(degrees)) * turned);
}

std::pair<Vector3d, Vector3d> two_bond_ends(const Vector3d& centre, const Vector3d& neighbour_a,
                                            const Vector3d& neighbour_b, double length,
                                            double degrees) {
  const Vector3d a = (neighbour_a - centre).normalized();
  const Vector3d b = (neighbour_b - centre).normalized();
  const Vector3d away = -(a + b).normalized();
  const Vector3d across = a.cross(b).normalized();
  const double half = radians(degrees / 2.0);
  return {centre + length * (std::cos(half) * away + std::sin(half) * across),
          centre + length * (std::cos(half) * away - std::sin(half) * across)};
}

irrepwise::Molecule from_orbits(const Generators& generators, const std::vector<Seed>& seeds,
                                int charge, const std::string& title) {
  std::vector<irrepwise::Atom> atoms;
  for (const Seed& seed : seeds) {
    const std::optional<int> number = irrepwise::atomic_number(seed.element);
    for (const Vector3d& position : orbit(generators, seed.position)) {
      atoms.push_back({number.value(), position});
    }
  }
  return {std::move(atoms), charge, title};
}

}  // namespace shapes
