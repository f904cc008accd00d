#include "analysis/level_coefficients.hpp"

#include <variant>

#include "harmonics/real_harmonics.hpp"
#include "salc/expansion.hpp"

namespace irrepwise {
namespace {

void turn_to_frame(Eigen::MatrixXd& rows_by_orbital, const Basis& basis, int atom,
                   const Eigen::Matrix3d& frame) {
  for (int s = basis.first_shell[atom]; s < basis.first_shell[atom + 1]; ++s) {
    const Shell& shell = basis.shells[s];
    auto rows = rows_by_orbital.middleRows(shell.first_orbital, shell.size());
    rows = (harmonic_rotation(shell.l, frame).transpose() * rows).eval();
  }
}

}  // namespace

LevelCoefficients level_coefficients(const MolecularSymmetry& symmetry, const Basis& basis,
                                     const Levels& levels, int level) {
  const Level& which = levels.levels[level];
  const LevelVectors& vectors = levels.vectors[which.irrep];
  const auto expand = [&](const auto& matrix) {
    return expanded(symmetry, basis, levels.salcs, which.irrep, matrix.col(which.column));
  };
  return {std::visit(expand, vectors.coefficients), std::visit(expand, vectors.times_overlap)};
}

LevelCoefficients in_local_frames(LevelCoefficients standard, const Basis& basis,
                                  const std::vector<EquivalentAtoms>& sets,
                                  const std::vector<std::optional<LocalFrames>>& frames) {
  for (std::size_t s = 0; s < sets.size(); ++s) {
    if (!frames[s]) continue;
    for (std::size_t i = 0; i < sets[s].atoms.size(); ++i) {
      const Eigen::Matrix3d& frame = frames[s]->frames[i];
      turn_to_frame(standard.coefficients, basis, sets[s].atoms[i], frame);
      turn_to_frame(standard.times_overlap, basis, sets[s].atoms[i], frame);
    }
  }
  return standard;
}

Eigen::VectorXd salc_vector(const SalcFunction& salc, const Basis& basis,
                            const std::vector<EquivalentAtoms>& sets) {
  Eigen::VectorXd vector = Eigen::VectorXd::Zero(basis.n_orbitals);
  const EquivalentAtoms& set = sets[salc.set];
  const int in_atom = salc.shell - basis.first_shell[set.representative()];
  for (int i = 0; i < set.size(); ++i) {
    const int first = basis.shells[basis.first_shell[set.atoms[i]] + in_atom].first_orbital;
    for (std::size_t c = 0; c < salc.components.size(); ++c) {
      vector[first + salc.components[c]] = salc.coefficients(i, static_cast<Eigen::Index>(c));
    }
  }
  return vector;
}

LevelCoefficients over_salcs(const LevelCoefficients& basis_frame, const Basis& basis,
                             const std::vector<EquivalentAtoms>& sets,
                             const std::vector<SalcFunction>& salcs) {
  const auto n = static_cast<Eigen::Index>(salcs.size());
  const Eigen::Index degeneracy = basis_frame.coefficients.cols();
  LevelCoefficients out{Eigen::MatrixXd(n, degeneracy), Eigen::MatrixXd(n, degeneracy)};
  for (Eigen::Index k = 0; k < n; ++k) {
    const Eigen::VectorXd salc = salc_vector(salcs[static_cast<std::size_t>(k)], basis, sets);
    out.coefficients.row(k) = salc.transpose() * basis_frame.coefficients;
    out.times_overlap.row(k) = salc.transpose() * basis_frame.times_overlap;
  }
  return out;
}

}  // namespace irrepwise
