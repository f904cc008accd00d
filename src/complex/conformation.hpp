// Twists and hands of the ligands: the conformation of highest symmetry.
#pragma once

#include <vector>

#include "complex/assembly.hpp"

namespace irrepwise {

/// Of all subgroups of the skeleton's group (metals, donors and directions of the ligands), from
/// the largest down, the first under which the ligands can stand so that each operation takes one
/// onto another, without clash: the ligand that represents a set of equivalent ones tries twists in
/// steps of 15°, the others are its images. What the group leaves open is settled by the widest
/// contacts. Twists and hands that were requested are kept.
///
/// @param metals  atomic numbers of the centres
/// @returns       a pose for each site
/// @throws Error  where every conformation tried has a clash: names the two ligands
[[nodiscard]] std::vector<Pose> most_symmetric_poses(const Assembly& assembly,
                                                     const std::vector<int>& metals);

}  // namespace irrepwise
