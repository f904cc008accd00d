// The plane in which the bonds of an atom lie, if they do.
#pragma once

#include <optional>
#include <vector>

#include <Eigen/Core>

#include "molecule/molecule.hpp"

namespace irrepwise {

/// Bonds that turn less than this from one another are one straight line, so that a carbonyl bent
/// a little by its crystal counts as straight.
inline constexpr double straight_within_degrees = 15.0;

/// Bonds that rise less than this from a plane lie in it.
inline constexpr double flat_within_degrees = 10.0;

/// @returns  whether two directions are the same or opposite within `straight_within_degrees`
[[nodiscard]] bool is_straight(const Eigen::Vector3d& a, const Eigen::Vector3d& b);

/// The mean normal of the planes that directions span two by two.
/// @param directions  unit vectors
/// @returns  a unit vector, of either sign; nothing where all are one line
[[nodiscard]] std::optional<Eigen::Vector3d> common_normal(
    const std::vector<Eigen::Vector3d>& directions);

/// @returns  the unit normal, of either sign; nothing for fewer than two bonds, for a straight line
///           and for bonds that lie in no plane
[[nodiscard]] std::optional<Eigen::Vector3d> bond_plane_normal(const Molecule& molecule, int atom);

}  // namespace irrepwise
