// From where a scene is seen, without perspective.
#pragma once

#include <span>
#include <string>

#include <Eigen/Core>

#include "figure/mesh.hpp"

namespace irrepwise {

/// Orthographic: a point r appears at (right.r, up.r), nearer ones have larger towards.r.
struct Camera {
  Eigen::Vector3d right = Eigen::Vector3d::UnitX();
  Eigen::Vector3d up = Eigen::Vector3d::UnitZ();
  Eigen::Vector3d towards = -Eigen::Vector3d::UnitY();  // from the molecule to the eye
};

/// @param towards  not zero; z is drawn upright, or y where the eye is on the z axis
[[nodiscard]] Camera camera_from(const Eigen::Vector3d& towards);

/// The camera among about two hundred around the molecule from which most of the lobes of both
/// phases is seen, none behind another, and the molecule beside them; the same for every scene.
/// @param scenes  with bodies called "positive phase" and "negative phase"
[[nodiscard]] Camera best_camera(std::span<const Scene> scenes);

/// @returns  "seen along −z", "seen from (0.5, −0.8, 0.3)": where the eye is
[[nodiscard]] std::string camera_words(const Camera& camera);

}  // namespace irrepwise
