// The metal of a complex, and what is bound to it.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "basis/basis.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

/// One place at a metal: a donor atom, or several that are bonded to each other and bind side by
/// side (the five carbons of a cyclopentadienyl ring).
struct DonorSite {
  std::vector<int> atoms;                               // ascending
  Eigen::Vector3d direction = Eigen::Vector3d::Zero();  // unit vector from the metal to their
                                                        // centroid
};

/// Atoms of the d and f blocks with a d shell in the basis.
[[nodiscard]] std::vector<int> metal_atoms(const Molecule& molecule, const Basis& basis);

/// Bonded atoms outside the d and f blocks, by covalent radii; in the order of their first atoms.
[[nodiscard]] std::vector<DonorSite> donor_sites(const Molecule& molecule, int metal);

}  // namespace irrepwise
