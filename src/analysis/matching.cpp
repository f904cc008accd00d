#include "analysis/matching.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <cstddef>

#include "analysis/common_symmetry.hpp"
#include "harmonics/real_harmonics.hpp"
#include "hueckel/dense.hpp"

namespace irrepwise {
namespace {

// Every orbital of every level, partners side by side.
Eigen::MatrixXd all_orbitals(const MolecularSymmetry& symmetry, const Basis& basis,
                             const Levels& levels) {
  Eigen::MatrixXd columns(basis.n_orbitals, basis.n_orbitals);
  Eigen::Index next = 0;
  for (int k = 0; k < static_cast<int>(levels.levels.size()); ++k) {
    const Eigen::MatrixXd partners = level_orbitals(symmetry, basis, levels, k);
    columns.middleCols(next, partners.cols()) = partners;
    next += partners.cols();
  }
  return columns;
}

// The rows of shared shells, turned into the reference's frame and put in its order; what the
// variant has beside them is left out. Shells meet by l: a metal of another row keeps its d shell,
// and a donor that replaces another its s and p, which tell bonding from antibonding, of p only the
// part along the bond where the ligands are not both single atoms.
Eigen::MatrixXd in_reference(const MatchReference& reference, const SharedAtoms& shared,
                             const Basis& basis, const Eigen::MatrixXd& orbitals) {
  std::array<Eigen::MatrixXd, max_l + 1> turns;
  for (int l = 0; l <= max_l; ++l) {
    turns[static_cast<std::size_t>(l)] = harmonic_rotation(l, shared.turn);
  }
  Eigen::MatrixXd rows = Eigen::MatrixXd::Zero(reference.basis.n_orbitals, orbitals.cols());
  const auto put = [&](int ours, int theirs, const ReplacedDonor* replaced) {
    const auto a = static_cast<std::size_t>(ours), b = static_cast<std::size_t>(theirs);
    for (int i = reference.basis.first_shell[a]; i < reference.basis.first_shell[a + 1]; ++i) {
      const Shell& to = reference.basis.shells[static_cast<std::size_t>(i)];
      for (int j = basis.first_shell[b]; j < basis.first_shell[b + 1]; ++j) {
        const Shell& from = basis.shells[static_cast<std::size_t>(j)];
        if (from.l != to.l || (replaced && to.l > 1)) continue;
        Eigen::MatrixXd turned = turns[static_cast<std::size_t>(to.l)] *
                                 orbitals.middleRows(from.first_orbital, from.size());
        if (replaced && replaced->sigma_only && to.l == 1) {
          turned = (replaced->direction * replaced->direction.transpose() * turned).eval();
        }
        rows.middleRows(to.first_orbital, to.size()) = turned;
      }
    }
  };
  for (const auto& [ours, theirs] : shared.atoms) put(ours, theirs, nullptr);
  for (const ReplacedDonor& pair : shared.replaced_donors) put(pair.first, pair.second, &pair);
  return rows;
}

std::string shared_irreps(const CommonSymmetry& common, int of_first, int of_second) {
  std::string text;
  for (std::size_t i = 0; i < common.group.irreps().size(); ++i) {
    if (common.first[static_cast<std::size_t>(of_first)][i] == 0 ||
        common.second[static_cast<std::size_t>(of_second)][i] == 0) {
      continue;
    }
    text += (text.empty() ? "" : " + ") + level_label(common.group.irreps()[i].label);
  }
  return text;
}

std::vector<LevelMatch> candidates(const CommonSymmetry& common, const Levels& first,
                                   const Levels& second, const Eigen::MatrixXd& overlaps) {
  std::vector<LevelMatch> found;
  Eigen::Index row = 0;
  for (std::size_t i = 0; i < first.levels.size(); row += first.levels[i].degeneracy, ++i) {
    const Level& a = first.levels[i];
    Eigen::Index column = 0;
    for (std::size_t j = 0; j < second.levels.size(); column += second.levels[j].degeneracy, ++j) {
      const Level& b = second.levels[j];
      const double overlap = overlaps.block(row, column, a.degeneracy, b.degeneracy).squaredNorm() /
                             std::min(a.degeneracy, b.degeneracy);
      if (overlap < least_match) continue;
      std::string irreps = shared_irreps(common, a.irrep, b.irrep);
      if (irreps.empty()) continue;
      found.push_back(
          {static_cast<int>(i), static_cast<int>(j), std::move(irreps), std::min(overlap, 1.0)});
    }
  }
  return found;
}

}  // namespace

MatchReference make_match_reference(const MolecularSymmetry& symmetry, const Basis& basis,
                                    const Levels& levels) {
  return {symmetry, basis, levels,
          dense_overlap(symmetry.molecule, basis) * all_orbitals(symmetry, basis, levels)};
}

Matching match_levels(const MatchReference& reference, const MolecularSymmetry& symmetry,
                      const Basis& basis, const Levels& levels) {
  const SharedAtoms shared = find_shared_atoms(reference.symmetry, symmetry);
  const CommonSymmetry common =
      common_symmetry(reference.symmetry.group, symmetry.group, shared.turn);
  const Eigen::MatrixXd overlaps =
      reference.orbitals_times_overlap.transpose() *
      in_reference(reference, shared, basis, all_orbitals(symmetry, basis, levels));
  std::vector<LevelMatch> found = candidates(common, reference.levels, levels, overlaps);
  // Rounding must not decide between levels that overlap equally.
  const auto key = [](const LevelMatch& match) { return std::llround(match.overlap * 1e8); };
  std::stable_sort(found.begin(), found.end(),
                   [&](const LevelMatch& a, const LevelMatch& b) { return key(a) > key(b); });
  std::vector<int> free_reference, free_variant;
  for (const Level& level : reference.levels.levels) free_reference.push_back(level.degeneracy);
  for (const Level& level : levels.levels) free_variant.push_back(level.degeneracy);

  Matching matching;
  matching.common_group = common.group.symbol().name();
  matching.shared_atoms = static_cast<int>(shared.atoms.size());
  matching.atoms = shared.atoms;
  matching.replaced_donors = static_cast<int>(shared.replaced_donors.size());
  for (LevelMatch& match : found) {
    int& ours = free_reference[static_cast<std::size_t>(match.reference)];
    int& theirs = free_variant[static_cast<std::size_t>(match.variant)];
    const int taken = std::min(ours, theirs);
    if (taken == 0) continue;
    ours -= taken;
    theirs -= taken;
    matching.matches.push_back(std::move(match));
  }
  std::sort(matching.matches.begin(), matching.matches.end(),
            [](const LevelMatch& a, const LevelMatch& b) {
              return a.reference != b.reference ? a.reference < b.reference : a.variant < b.variant;
            });
  return matching;
}

}  // namespace irrepwise
