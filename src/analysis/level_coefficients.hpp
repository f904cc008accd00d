// The orbitals of a level over other functions than those of the basis: over each atom's own frame
// and over SALCs; and what each function's share is.
#pragma once

#include <optional>
#include <vector>

#include <Eigen/Core>

#include "hueckel/levels.hpp"
#include "salc/local_frames.hpp"
#include "salc/salc_table.hpp"

namespace irrepwise {

/// The orbitals of one level and S times them, over the same functions, a column for each partner.
/// Over any orthogonal change of the basis the two keep their meaning: c^T S c = 1.
struct LevelCoefficients {
  Eigen::MatrixXd coefficients;   // `n_functions x degeneracy`
  Eigen::MatrixXd times_overlap;  // the same shape

  /// Mulliken's share of each function in each partner: c_i (S c)_i; columns sum to 1.
  [[nodiscard]] Eigen::MatrixXd shares() const { return coefficients.cwiseProduct(times_overlap); }
};

/// Over the basis, in the standard frame. S times an orbital has the orbital's symmetry, so it
/// expands in the same SALCs and needs no overlap matrix over atomic orbitals.
[[nodiscard]] LevelCoefficients level_coefficients(const MolecularSymmetry& symmetry,
                                                   const Basis& basis, const Levels& levels,
                                                   int level);

/// Each shell turned to the frame of its atom; atoms without one keep the standard frame.
/// @param frames  by set of `sets`
[[nodiscard]] LevelCoefficients in_local_frames(
    LevelCoefficients standard, const Basis& basis, const std::vector<EquivalentAtoms>& sets,
    const std::vector<std::optional<LocalFrames>>& frames);

/// Over SALCs: the projection of every partner on every SALC given, which is exact where they are
/// all SALCs of the level's irrep. For an irrep that is no complex pair only SALCs of the same
/// partner contribute, with the same coefficient for every partner.
///
/// @param basis_frame  over the basis, in the frames in which the SALCs are written
/// @returns            `n_salcs x degeneracy`, rows in the order of the SALCs
[[nodiscard]] LevelCoefficients over_salcs(const LevelCoefficients& basis_frame, const Basis& basis,
                                           const std::vector<EquivalentAtoms>& sets,
                                           const std::vector<SalcFunction>& salcs);

/// A SALC over the basis, in the frames in which it is written.
/// @returns  `n_orbitals`
[[nodiscard]] Eigen::VectorXd salc_vector(const SalcFunction& salc, const Basis& basis,
                                          const std::vector<EquivalentAtoms>& sets);

}  // namespace irrepwise
