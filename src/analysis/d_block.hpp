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
  std::string parent_label;  // "t2g": the irrep of the parent whose d orbitals it stands for; empty
                             // where there is no parent
  double parent_weight = 0.0;  // the part of the metal d part that belongs to it, 0 to 1
};

/// Mean energy of the levels of one parent label, weighted by the d share that belongs to it and by
/// degeneracy. Where σ bonds make them antibonding and ligand levels near in energy take part of
/// the d orbitals, every antibonding level counts that has a quarter of the largest share or more.
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

/// For each irrep of the parent that d functions span, as many levels as it has orbitals: those
/// with most of the metal's d orbitals of that irrep, each level once. Where donors bind by σ (eg
/// in an octahedron) the d orbital is shared between bonding and antibonding levels; bonding ones,
/// by the overlap population of the metal's d with s and p of the donors along the lines to them,
/// are left out, unless hardly any d is elsewhere. Of levels that share a d orbital by π, one
/// nearer to H_ii of the d shell goes before another. No irrep of the molecule gives more levels
/// than d combinations.
///
/// The parent is the group of the polyhedron that the donor sites are nearest to, laid over them as
/// well as it goes; a ring with three other donors counts as three places opposite to them; a
/// single donor makes it C∞v. The metal d part of a level, turned to the parent's frame, is
/// projected on the parent's irreps.
///
/// @param metal  has a d shell
/// @source  derived by us; labels as in the character tables
[[nodiscard]] DBlock find_d_block(const MolecularSymmetry& symmetry, const Basis& basis,
                                  const Levels& levels, const Populations& populations, int metal);

}  // namespace irrepwise
