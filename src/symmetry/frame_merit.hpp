// The rules of the conventions that tell inequivalent axes and planes apart.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "molecule/molecule.hpp"
#include "symmetry/schoenflies.hpp"

namespace irrepwise {

/// How well a frame meets the rules; compared from the first entry on, more is better.
///   Dn, Dnh, even n > 2: atoms on x, their atomic numbers, nearness of the others to x;
///   Cnv, even n > 2: the same for the plane xz; C2v: for the plane yz;
///   D2, D2h: x across the plane of a planar D2h molecule; then z, then y by atoms on the axis,
///   bonds that cross it, and small moment of inertia (atomic numbers as weights);
///   empty elsewhere.
///
/// @param molecule  exactly symmetric
/// @param frame     rotation from the molecule's frame to the one judged
[[nodiscard]] std::vector<double> frame_merit(const Schoenflies& symbol, const Molecule& molecule,
                                              const Eigen::Matrix3d& frame);

}  // namespace irrepwise
