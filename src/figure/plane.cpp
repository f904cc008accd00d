#include "figure/plane.hpp"

#include <algorithm>
#include <cmath>
#include <vector>

#include <Eigen/Geometry>

#include <fmt/format.h>

#include "core/error.hpp"

namespace irrepwise {
namespace {

constexpr const char* axis_names[] = {"x", "y", "z"};

std::string signed_angstrom(double value) {
  return fmt::format("{}{:.2f} Å", value < 0.0 ? "−" : "", std::abs(value));
}

// z, or y, is upright as far as the plane allows.
Plane upright_plane(const Eigen::Vector3d& origin, Eigen::Vector3d normal, std::string words) {
  normal.normalize();
  // One of the two normals, so that neither rounding nor the order of atoms mirrors the drawing.
  for (int axis : {1, 0, 2}) {
    if (std::abs(normal(axis)) < 1e-6) continue;
    const bool wrong = axis == 1 ? normal(axis) > 0.0 : normal(axis) < 0.0;
    if (wrong) normal = -normal;
    break;
  }
  const Eigen::Vector3d upright =
      std::abs(normal.z()) > 0.9 ? Eigen::Vector3d::UnitY() : Eigen::Vector3d::UnitZ();
  if (normal.z() < -0.9) normal = -normal;
  Plane plane;
  plane.origin = origin;
  plane.up = (upright - upright.dot(normal) * normal).normalized();
  plane.right = plane.up.cross(normal);
  plane.words = std::move(words);
  return plane;
}

double half_width(const Plane& plane, const OrbitalField& field) {
  double half = 1.0;
  for (const OrbitalField::Centre& centre : field.centres()) {
    const Eigen::Vector3d r = centre.position_angstrom - plane.origin;
    half = std::max({half, std::abs(plane.right.dot(r)), std::abs(plane.up.dot(r))});
  }
  return half + 1.5;
}

// Integral of psi^2 over the plane, coarsely.
double density_in(const Plane& plane, const OrbitalField& field, int orbital) {
  const double half = half_width(plane, field);
  const int steps = std::clamp(static_cast<int>(half / 0.2), 12, 32);
  const double h = half / steps;
  double sum = 0.0;
  for (int i = -steps; i <= steps; ++i) {
    for (int j = -steps; j <= steps; ++j) {
      const double value = field.value(plane.point(i * h, j * h), orbital);
      sum += value * value;
    }
  }
  return sum * h * h;
}

std::vector<Plane> diagonal_planes() {
  const double s = std::sqrt(0.5);
  const struct {
    Eigen::Vector3d normal;
    const char* words;
  } list[] = {{{s, -s, 0}, "plane of z and x + y"}, {{s, s, 0}, "plane of z and x − y"},
              {{s, 0, -s}, "plane of y and x + z"}, {{s, 0, s}, "plane of y and x − z"},
              {{0, s, -s}, "plane of x and y + z"}, {{0, s, s}, "plane of x and y − z"}};
  std::vector<Plane> planes;
  for (const auto& [normal, words] : list) {
    planes.push_back(upright_plane(Eigen::Vector3d::Zero(), normal, words));
  }
  return planes;
}

// Planes of an atom and two of its neighbours, the heaviest atoms first; not too many.
std::vector<Plane> bond_planes(const Molecule& molecule) {
  constexpr std::size_t enough = 12;
  std::vector<int> order(static_cast<std::size_t>(molecule.size()));
  for (std::size_t i = 0; i < order.size(); ++i) order[i] = static_cast<int>(i);
  std::stable_sort(order.begin(), order.end(), [&](int a, int b) {
    return molecule.atoms()[static_cast<std::size_t>(a)].atomic_number >
           molecule.atoms()[static_cast<std::size_t>(b)].atomic_number;
  });
  std::vector<Plane> planes;
  for (const int centre : order) {
    std::vector<int> neighbours;
    for (const int other : order) {
      if (other != centre && are_bonded(molecule, centre, other)) neighbours.push_back(other);
      if (neighbours.size() == 4) break;
    }
    for (std::size_t i = 0; i < neighbours.size(); ++i) {
      for (std::size_t j = i + 1; j < neighbours.size(); ++j) {
        try {
          Plane plane = atoms_plane(molecule, {centre, neighbours[i], neighbours[j]});
          const bool known = std::any_of(planes.begin(), planes.end(), [&](const Plane& p) {
            return std::abs(p.normal().dot(plane.normal())) > 0.9999 &&
                   std::abs(p.normal().dot(plane.origin - p.origin)) < 1e-3;
          });
          if (!known) planes.push_back(std::move(plane));
        } catch (const Error&) {  // on a line: no plane of theirs
        }
        if (planes.size() == enough) return planes;
      }
    }
  }
  return planes;
}

}  // namespace

Eigen::Vector3d Plane::normal() const { return right.cross(up); }

Plane axes_plane(const std::string& name, double offset_angstrom) {
  std::string letters = name;
  std::sort(letters.begin(), letters.end());
  int third = 0;
  if (letters == "xy") {
    third = 2;
  } else if (letters == "xz") {
    third = 1;
  } else if (letters != "yz") {
    throw Error(fmt::format(
        "'{}' is no plane; expected xy, xz, yz or three atoms such as Pt1,Cl2,Cl3", name));
  }
  const Eigen::Vector3d normal = Eigen::Vector3d::Unit(third);
  const std::string words = offset_angstrom == 0.0
                                ? "plane " + letters
                                : fmt::format("plane parallel to {} at {} = {}", letters,
                                              axis_names[third], signed_angstrom(offset_angstrom));
  return upright_plane(offset_angstrom * normal, normal, words);
}

Plane atoms_plane(const Molecule& molecule, const std::array<int, 3>& atoms) {
  const auto position = [&](int i) -> const Eigen::Vector3d& {
    return molecule.atoms()[static_cast<std::size_t>(atoms[static_cast<std::size_t>(i)])].position;
  };
  const Eigen::Vector3d a = position(1) - position(0);
  const Eigen::Vector3d b = position(2) - position(0);
  const Eigen::Vector3d normal = a.cross(b);
  const std::string names =
      fmt::format("{}, {} and {}", atom_name(molecule, atoms[0]), atom_name(molecule, atoms[1]),
                  atom_name(molecule, atoms[2]));
  constexpr double least_sine = 0.02;  // about one degree
  if (normal.norm() < least_sine * a.norm() * b.norm()) {
    throw Error(
        fmt::format("{} lie on a line and give no plane; choose three atoms that do not", names));
  }
  // The foot of the origin keeps the drawing centred on the molecule.
  const Eigen::Vector3d unit = normal.normalized();
  return upright_plane(unit.dot(position(0)) * unit, unit, "plane through " + names);
}

Plane telling_plane(const Molecule& molecule, const OrbitalField& field, int orbital) {
  std::vector<Plane> planes = {axes_plane("xy"), axes_plane("xz"), axes_plane("yz")};
  for (Plane& plane : diagonal_planes()) planes.push_back(std::move(plane));
  for (Plane& plane : bond_planes(molecule)) planes.push_back(std::move(plane));
  for (const char* name : {"xy", "xz", "yz"}) planes.push_back(axes_plane(name, 0.5));
  double most = -1.0;
  const Plane* best = nullptr;
  for (const Plane& plane : planes) {
    const double density = density_in(plane, field, orbital);
    if (density > 1.05 * most) {  // a plain plane wins over one that shows hardly more
      most = density;
      best = &plane;
    }
  }
  return *best;
}

}  // namespace irrepwise
