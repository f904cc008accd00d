// Writes a scene as glTF 2.0 binary (Khronos Group; ISO/IEC 12113), for general 3-D viewers.
#pragma once

#include <string>
#include <utility>
#include <vector>

#include "figure/mesh.hpp"

namespace irrepwise {

/// One mesh and one material per body, with the body's name; lengths in Å. glTF has y upwards: the
/// root node turns z there, the vertices stay in the frame of the scene.
///
/// @param facts  names and values kept in the scene's extras: label, energy, isovalue
/// @returns      the bytes of a .glb file; bodies without triangles are left out
[[nodiscard]] std::string glb_bytes(const Scene& scene,
                                    const std::vector<std::pair<std::string, std::string>>& facts);

}  // namespace irrepwise
