// Which of the frames that suit a group the conventions choose.
#pragma once

#include <optional>
#include <vector>

#include <Eigen/Core>

#include "molecule/molecule.hpp"
#include "symmetry/options.hpp"
#include "symmetry/schoenflies.hpp"

namespace irrepwise {

/// A frame and how well it meets the rules that tell inequivalent axes apart: compared from the
/// first entry on, more is better.
struct FrameChoice {
  Eigen::Matrix3d rotation;  // from the input frame to the frame chosen
  std::vector<double> merit;
};

/// Directions the user asked for, unit vectors in the input frame.
struct WantedAxes {
  std::optional<Eigen::Vector3d> z;
  std::optional<Eigen::Vector3d> x;
};

/// @param origin   Å, input frame; where directions given by one atom start
/// @throws Error   for a null vector, atoms that are not there or span nothing, or x along z
[[nodiscard]] WantedAxes wanted_axes(const SymmetryOptions& options, const Molecule& molecule,
                                     const Eigen::Vector3d& origin);

/// Of all turns that keep the group standard, those that follow the conventions (or the wish) best,
/// and of these the one nearest to the input frame (largest trace).
///
/// @param molecule  exactly symmetric, in a frame in which `symbol` is standard, the centre of the
///                  group at the origin
/// @param rotation  from the input frame to the frame of `molecule`
/// @throws Error    where the wish is no axis that the group can have there
[[nodiscard]] FrameChoice choose_frame(const Schoenflies& symbol, const Molecule& molecule,
                                       const Eigen::Matrix3d& rotation, const WantedAxes& wanted);

/// @returns  all proper turns that keep a finite group with fixed axes in its standard form
[[nodiscard]] std::vector<Eigen::Matrix3d> standard_turns(const Schoenflies& symbol);

/// @returns  whether the group leaves its x axis free: one axis or one plane and nothing else
[[nodiscard]] bool turns_freely(Family family);

/// @returns  whether the merit of a is better than that of b beyond rounding
[[nodiscard]] bool better_merit(const std::vector<double>& a, const std::vector<double>& b);

}  // namespace irrepwise
