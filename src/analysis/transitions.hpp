// What symmetry says of the frontier levels: transitions between them, terms of an open shell.
#pragma once

#include <vector>

#include "hueckel/levels.hpp"
#include "symmetry/selection.hpp"
#include "symmetry/terms.hpp"

namespace irrepwise {

struct Transition {
  int from = 0;  // indices of levels
  int to = 0;
  TransitionRule rule;
};

/// From each of the highest levels that hold electrons to each of the lowest that can take one.
/// @param most  so many levels on either side
[[nodiscard]] std::vector<Transition> frontier_transitions(const PointGroup& group,
                                                           const Levels& levels, int most = 4);

/// The levels that are neither empty nor full.
/// @returns  empty for a closed shell
/// @throws Error  where a level holds a fraction of an electron
[[nodiscard]] std::vector<OpenLevel> open_levels(const PointGroup& group, const Levels& levels);

/// A term of lowest energy by Hund's first rule, and what its degeneracy does to the molecule.
struct GroundTerm {
  Term term;
  TermDistortion distortion;
};
[[nodiscard]] std::vector<GroundTerm> ground_terms(const MolecularSymmetry& symmetry,
                                                   const std::vector<Term>& terms);

}  // namespace irrepwise
