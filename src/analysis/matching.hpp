// Which level of one molecule is which of another: by symmetry and by what they are made of.
#pragma once

#include <string>
#include <utility>
#include <vector>

#include <Eigen/Core>

#include "analysis/shared_atoms.hpp"
#include "hueckel/levels.hpp"

namespace irrepwise {

/// A molecule with its orbitals written out once, so that many others can be matched with it.
struct MatchReference {
  const MolecularSymmetry& symmetry;
  const Basis& basis;
  const Levels& levels;
  Eigen::MatrixXd orbitals_times_overlap;  // S C, `n_orbitals x n_orbitals`, partners side by side
};

[[nodiscard]] MatchReference make_match_reference(const MolecularSymmetry& symmetry,
                                                  const Basis& basis, const Levels& levels);

struct LevelMatch {
  int reference = 0;  // index of the level in the reference
  int variant = 0;
  std::string irrep;     // what the two have in common, in the common group: "b2", "a1 + b1"
  double overlap = 0.0;  // the part of the smaller level that lies in the other, 0 to 1
};

struct Matching {
  std::string common_group;
  int shared_atoms = 0;
  std::vector<std::pair<int, int>> atoms;  // those shared: the reference's, then the variant's
  int replaced_donors = 0;                 // of other elements in the same places
  std::vector<LevelMatch> matches;         // by the reference's level, then the variant's
};

/// Below this two levels have too little in common to be called the same.
inline constexpr double least_match = 0.1;

/// Pairs levels, those that overlap most first; a degenerate level may meet several, as many
/// orbitals as it has. Only levels that share an irrep of the common subgroup are paired. The
/// overlap is that of the orbitals on the shared atoms and on donors that replace each other, taken
/// with the reference's overlap integrals.
[[nodiscard]] Matching match_levels(const MatchReference& reference,
                                    const MolecularSymmetry& symmetry, const Basis& basis,
                                    const Levels& levels);

}  // namespace irrepwise
