// Planes through a molecule, for contour drawings.
#pragma once

#include <array>
#include <string>

#include <Eigen/Core>

#include "figure/orbital_field.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

struct Plane {
  Eigen::Vector3d origin = Eigen::Vector3d::Zero();  // Å
  Eigen::Vector3d right = Eigen::Vector3d::UnitX();  // unit, perpendicular to `up`
  Eigen::Vector3d up = Eigen::Vector3d::UnitY();
  std::string words;  // "plane xz", "plane parallel to xy at z = 0.50 Å"

  [[nodiscard]] Eigen::Vector3d normal() const;
  [[nodiscard]] Eigen::Vector3d point(double x, double y) const {
    return origin + x * right + y * up;
  }
};

/// @param name             "xy", "xz" or "yz", the letters in either order
/// @param offset_angstrom  along the third axis
/// @throws Error           for another name
[[nodiscard]] Plane axes_plane(const std::string& name, double offset_angstrom = 0.0);

/// @param atoms   three different ones, indices from 0
/// @throws Error  where they lie on a line
[[nodiscard]] Plane atoms_plane(const Molecule& molecule, const std::array<int, 3>& atoms);

/// The plane in which most of an orbital's density lies, among those of the axes, their diagonals,
/// planes of bonded atoms, and planes beside a plane in which the orbital has a node. The first of
/// equals, in this order.
[[nodiscard]] Plane telling_plane(const Molecule& molecule, const OrbitalField& field, int orbital);

}  // namespace irrepwise
