// The orthogonal operations that a molecule has within a tolerance, before any frame is chosen.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "molecule/molecule.hpp"

namespace irrepwise {

/// How the atoms lie about their centroid.
enum class Shape { SingleAtom, Linear, General };

/// @returns  Linear where no atom is farther than the tolerance from the best line
[[nodiscard]] Shape molecular_shape(const Molecule& molecule, double tolerance_angstrom);

/// @returns  unit vector along the best line through the centroid
[[nodiscard]] Eigen::Vector3d best_line(const Molecule& molecule);

/// An operation about the centroid that takes every atom to within the tolerance of one of its
/// element, fitted to the atoms (least squares).
struct HeldOperation {
  Eigen::Matrix3d matrix;
  std::vector<int> images;    // [atom] -> atom it lands on
  double displacement = 0.0;  // Å, largest distance between an image and its atom
};

/// All operations that hold, the identity first: one non-collinear pair of atoms is mapped onto
/// every congruent pair; each mapping gives one proper and one improper candidate. Complete for
/// every finite group, without special cases for axes. The set need not be closed.
///
/// @param molecule  of Shape::General
/// @param kinds     as in `SymmetryOptions`
/// @source          derived by us
[[nodiscard]] std::vector<HeldOperation> find_held_operations(const Molecule& molecule,
                                                              const std::vector<int>& kinds,
                                                              double tolerance_angstrom);

/// @returns  whether the two may be images of each other: same element, same kind
[[nodiscard]] bool are_alike(const Molecule& molecule, const std::vector<int>& kinds, int atom_a,
                             int atom_b);

/// Products of operations by what they do to one pair of atoms and their handedness, which tells
/// operations of a non-linear molecule apart exactly.
/// @returns  [g * size + h]: index of g after h, or -1 where it is not in the list
[[nodiscard]] std::vector<int> partial_products(const Molecule& molecule,
                                                const std::vector<HeldOperation>& operations);

}  // namespace irrepwise
