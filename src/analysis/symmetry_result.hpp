// What symmetry says of a molecule: its group and ladder, sets, reductions, selection rules.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "analysis/transitions.hpp"
#include "hueckel/levels.hpp"
#include "molecule/molecule.hpp"
#include "salc/salc_table.hpp"
#include "symmetry/descent.hpp"
#include "symmetry/ladder.hpp"
#include "symmetry/molecular_symmetry.hpp"
#include "symmetry/products.hpp"
#include "symmetry/relabelled.hpp"
#include "symmetry/terms.hpp"
#include "symmetry/vibrations.hpp"

namespace irrepwise {

/// The terms of one configuration.
struct TermsAnswer {
  std::string configuration;  // "t2g^2", ASCII
  std::vector<Term> terms;    // as from `find_terms`
};

/// Irreps in one embedding of a subgroup.
struct DescentAnswer {
  Embedding embedding;
  std::vector<std::vector<int>> times;  // [irrep of the group][irrep of the subgroup]
};

/// What was asked of the group itself, with a molecule or without.
struct GroupAnswers {
  std::vector<ProductAnswer> products;
  std::vector<TermsAnswer> terms;
  std::vector<DescentAnswer> descents;
};

/// @throws Error  for unknown irreps, with the nearest name
[[nodiscard]] std::vector<ProductAnswer> answer_products(const PointGroup& group,
                                                         const std::vector<std::string>& questions);
[[nodiscard]] std::vector<TermsAnswer> answer_terms(const PointGroup& group,
                                                    const std::vector<std::string>& configurations);

/// All ways to each subgroup, or the one that is named.
/// @throws Error  for unknown groups and ways, with the nearest name
[[nodiscard]] std::vector<DescentAnswer> answer_descents(const PointGroup& group,
                                                         const std::vector<std::string>& subgroups);

/// What needs the valence orbitals.
struct OrbitalSymmetry {
  Basis basis;
  std::vector<OrbitalReduction> reductions;
  std::vector<SalcFunction> salcs;  // where asked for
};

/// What needs the levels.
struct FrontierSymmetry {
  Levels levels;
  std::vector<Transition> transitions;
  std::vector<OpenLevel> open;  // empty for a closed shell
  std::vector<Term> terms;      // of the open shell
  std::vector<GroundTerm> ground;
};

struct SymmetryResult {
  Molecule molecule;  // as read, in the input frame
  MolecularSymmetry symmetry;
  double limit_angstrom = 0.5;
  std::vector<Rung> ladder;
  AxisEffect axis_effect;  // against the axes of the conventions
  bool user_axes = false;
  std::vector<EquivalentAtoms> sets;
  std::vector<std::optional<LocalFrames>> frames;
  std::optional<int> central_atom;
  std::optional<OrbitalSymmetry> orbitals;  // nothing where parameters are lacking
  std::optional<FrontierSymmetry> frontier;
  DisplacementIrreps displacements;
  GroupAnswers answers;
};

/// All but SALCs, frontier and answers, which are for those who ask.
/// @param basis   nothing where parameters are lacking
/// @throws Error  as `find_symmetry`
[[nodiscard]] SymmetryResult symmetry_of(const Molecule& molecule, const SymmetryOptions& options,
                                         const std::optional<Basis>& basis);

[[nodiscard]] FrontierSymmetry frontier_symmetry(const MolecularSymmetry& symmetry, Levels levels);

/// @returns  counts by irrep of the group as a reduction
[[nodiscard]] Reduction reduction_of(const PointGroup& group, const std::vector<int>& times);

/// What each irrep connects: the orbitals and parts of each set in which it occurs.
struct BondingIrrep {
  int irrep = 0;
  std::vector<std::vector<std::string>> parts;  // by set: "5dxz", "σ", "3s"; empty where absent
  bool can_bond = false;  // occurs on the central atom and around it; without one, on two sets
};
[[nodiscard]] std::vector<BondingIrrep> bonding_by_irrep(const SymmetryResult& result);

}  // namespace irrepwise
