// The frame of a pair of atoms, z along the line between them, and the way back to the molecule's.
#pragma once

#include <array>

#include <Eigen/Core>

#include "harmonics/real_harmonics.hpp"

namespace irrepwise {

/// sigma, pi, delta, phi: integrals for |m| = 0 to 3 between two shells in the diatomic frame; zero
/// beyond the smaller l.
using DiatomicOverlaps = std::array<double, 4>;

/// Integrals between two shells in the molecular frame, `(2 l_a + 1) x (2 l_b + 1)`.
using OverlapBlock = HarmonicMatrix;

/// Made once for a pair of atoms, then used for all their shells.
class DiatomicFrame {
 public:
  /// @param direction  from the first atom to the second, any length but zero
  /// @param largest_l  of the shells to come, 0 to 3
  DiatomicFrame(const Eigen::Vector3d& direction, int largest_l);

  /// Integrals that vanish between different m, turned into the molecular frame: overlaps, or what
  /// a rule makes of them |m| by |m|.
  ///
  /// @param l_a, l_b  at most `largest_l`
  /// @returns         `(2 l_a + 1) x (2 l_b + 1)`, orders and phases of the conventions
  /// @accuracy        4e-15 of the largest integral
  [[nodiscard]] OverlapBlock block(const DiatomicOverlaps& overlaps, int l_a, int l_b) const;

 private:
  std::array<HarmonicMatrix, 4> rotations_;  // by l; those beyond largest_l are empty
};

}  // namespace irrepwise
