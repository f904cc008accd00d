// The levels with most metal d character, and what they would be called in the ideal polyhedron.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include <Eigen/Core>

#include "analysis/nearest_polyhedron.hpp"
#include "analysis/populations.hpp"

namespace irrepwise {

struct DLevel {
  int level = 0;
  double d_share = 0.0;      // Mulliken's, of all metals equivalent to this one; mean over partners
  std::string parent_label;  // "t2g": the irrep of the parent that its metal d part has most of;
                             // empty where there is no parent
  double parent_weight = 0.0;  // the part of the metal d part that belongs to it, 0 to 1
};

/// Mean energy of the levels of one parent label, weighted by the d share that belongs to it and by
/// degeneracy. Where σ donors span it and ligand levels near in energy take part of the d orbitals,
/// every level above the d energy counts that has a quarter of the largest share or more.
struct ParentMean {
  std::string label;
  double energy_ev = 0.0;
};

struct DBlock {
  int metal = 0;                       // index of the atom
  std::string parent_group;            // "Oh", "Dinfh"; empty for no donors or more than nine
  std::optional<PolyhedronFit> shape;  // of the donor sites, two or more
  std::vector<DLevel> levels;          // ascending energy
  std::vector<ParentMean> means;       // ascending energy: splittings are their differences
};

/// For each irrep of the parent that d functions span, as many levels as it has orbitals, each with
/// the largest weight in that irrep: those with the largest d share. Where σ donors span the irrep
/// as well (eg in an octahedron) the d orbital is shared between bonding and antibonding levels:
/// the d block is the antibonding part, so there levels above H_ii of the d shell come first,
/// unless the part above is less than a quarter of that below. No irrep of the molecule gives more
/// levels than d combinations.
///
/// The parent is the group of the polyhedron that the donor sites are nearest to, laid over them as
/// well as it goes; a single donor makes it C∞v. The metal d part of a level, turned to the
/// parent's frame, is projected on the parent's irreps.
///
/// @param metal  has a d shell
/// @source  derived by us; labels as in the character tables
[[nodiscard]] DBlock find_d_block(const MolecularSymmetry& symmetry, const Basis& basis,
                                  const Levels& levels, const Populations& populations, int metal);

}  // namespace irrepwise
