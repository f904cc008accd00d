// Draws a scene of meshes into pixels, on the processor, with antialiasing.
#pragma once

#include "figure/camera.hpp"
#include "figure/mesh.hpp"
#include "figure/raster.hpp"

namespace irrepwise {

/// What part of space a picture shows.
struct Frame {
  Eigen::Vector3d centre = Eigen::Vector3d::Zero();  // Å
  double half_width = 1.0;  // Å, from the middle of the picture to its side
};

/// @returns  around every vertex of the scene as the camera sees it, with a small margin
[[nodiscard]] Frame frame_of(const Scene& scene, const Camera& camera);

/// Light from the upper left of the camera; edges darker, so that shapes part in grey print.
/// Bodies with an opacity below 1 let through what is behind their nearest surface, but never
/// each other.
/// @param size_px  of the square picture
/// @returns        transparent where nothing is
[[nodiscard]] Raster rendered(const Scene& scene, const Camera& camera, const Frame& frame,
                              int size_px);

}  // namespace irrepwise
