#include "hueckel/levels.hpp"

#include <algorithm>
#include <cmath>
#include <complex>

#include <fmt/format.h>

#include "core/error.hpp"
#include "hueckel/blocks.hpp"
#include "hueckel/eigenproblem.hpp"
#include "hueckel/near_singular.hpp"
#include "hueckel/occupation.hpp"
#include "salc/expansion.hpp"

namespace irrepwise {
namespace {

constexpr double accidental_degeneracy_ev = 1e-6;
constexpr double same_energy_ev = 1e-8;  // below it the order of levels is that of the irreps
constexpr double phase_tie = 1e-6;

// Index of the coefficient that fixes the phase: the first within `phase_tie` of the largest.
Eigen::Index leading(const Eigen::VectorXd& magnitudes) {
  const double largest = magnitudes.maxCoeff();
  for (Eigen::Index i = 0; i < magnitudes.size(); ++i) {
    if (magnitudes[i] >= largest - phase_tie) return i;
  }
  return 0;
}

// The factor that makes the leading coefficient positive; for a complex pair, real and positive,
// where the coefficients are first partner plus i times second.
double phase_factor(const Eigen::MatrixXd& partners, double) {
  const Eigen::VectorXd first = partners.col(0);
  return first[leading(first.cwiseAbs())] < 0.0 ? -1.0 : 1.0;
}
std::complex<double> phase_factor(const Eigen::MatrixXd& partners, const std::complex<double>&) {
  const Eigen::Index i = leading(partners.rowwise().norm());
  const std::complex<double> value(partners(i, 0), partners(i, 1));
  return std::conj(value) / std::abs(value);
}

template <typename Matrix>
LevelVectors with_phases(const MolecularSymmetry& symmetry, const Basis& basis,
                         const SalcBasis& salcs, int irrep, const Matrix& overlap, Matrix vectors) {
  for (Eigen::Index k = 0; k < vectors.cols(); ++k) {
    const Eigen::MatrixXd partners = expanded(symmetry, basis, salcs, irrep, vectors.col(k));
    vectors.col(k) *= phase_factor(partners, typename Matrix::Scalar());
  }
  Matrix times_overlap = overlap * vectors;
  return {std::move(vectors), std::move(times_overlap)};
}

std::string irrep_label(const MolecularSymmetry& symmetry, int irrep) {
  return level_label(symmetry.group.irreps()[irrep].label);
}

// A block whose overlap cannot be trusted is an error, one that is close to that a warning.
void judge_overlap(const HueckelBlock& block, const MolecularSymmetry& symmetry, const Basis& basis,
                   int irrep, bool positive, Levels& result) {
  const SmallestOverlap smallest =
      smallest_overlap(block.overlap, symmetry, basis, result.salcs, irrep);
  if (!positive || smallest.eigenvalue <= 1e-12) {
    throw Error(
        fmt::format("the overlap of {} is not positive definite (smallest eigenvalue {:.1e}), "
                    "through {}; atoms "
                    "stand too close, or exponents are too small",
                    irrep_label(symmetry, irrep), smallest.eigenvalue, smallest.behind));
  }
  if (smallest.eigenvalue < near_singular_overlap) {
    result.warnings.push_back(
        fmt::format("the overlap of {} is nearly singular (smallest eigenvalue {:.1e}), through "
                    "{}; its highest "
                    "levels cannot be trusted",
                    irrep_label(symmetry, irrep), smallest.eigenvalue, smallest.behind));
  }
}

void solve_irrep(const HueckelBlock& block, const MolecularSymmetry& symmetry, const Basis& basis,
                 int irrep, Levels& result) {
  std::visit(
      [&](const auto& overlap) {
        using Matrix = std::decay_t<decltype(overlap)>;
        auto pairs = solve_generalised(std::get<Matrix>(block.hamiltonian_ev), overlap);
        // The estimate is cheap, the smallest eigenvalue itself is not.
        if (!pairs.positive || pairs.smallest_overlap < 1e3 * near_singular_overlap) {
          judge_overlap(block, symmetry, basis, irrep, pairs.positive, result);
        }
        for (Eigen::Index k = 0; k < pairs.energies.size(); ++k) {
          Level level;
          level.irrep = irrep;
          level.number = static_cast<int>(k) + 1;
          level.column = static_cast<int>(k);
          level.energy_ev = pairs.energies[k];
          level.degeneracy = symmetry.group.irreps()[irrep].dimension;
          result.levels.push_back(level);
        }
        result.vectors.push_back(with_phases<Matrix>(symmetry, basis, result.salcs, irrep, overlap,
                                                     std::move(pairs.vectors)));
      },
      block.overlap);
}

// Ascending energy; levels that agree to rounding in the order of the irreps, so that turning the
// molecule does not change the order.
void sort_levels(std::vector<Level>& levels) {
  std::sort(levels.begin(), levels.end(),
            [](const Level& a, const Level& b) { return a.energy_ev < b.energy_ev; });
  for (std::size_t first = 0; first < levels.size();) {
    std::size_t last = first + 1;
    while (last < levels.size() &&
           levels[last].energy_ev - levels[last - 1].energy_ev < same_energy_ev) {
      ++last;
    }
    std::sort(levels.begin() + static_cast<std::ptrdiff_t>(first),
              levels.begin() + static_cast<std::ptrdiff_t>(last),
              [](const Level& a, const Level& b) {
                return a.irrep != b.irrep ? a.irrep < b.irrep : a.number < b.number;
              });
    first = last;
  }
}

// In a subgroup levels coincide because the whole group says so: that is no accident.
void note_accidents(const MolecularSymmetry& symmetry, Levels& result) {
  if (!symmetry.full_group.empty()) return;
  for (std::size_t i = 0; i + 1 < result.levels.size(); ++i) {
    const Level &a = result.levels[i], &b = result.levels[i + 1];
    const bool near = std::abs(b.energy_ev - a.energy_ev) < accidental_degeneracy_ev;
    if (near && a.irrep != b.irrep) {
      result.warnings.push_back(fmt::format("{} and {} are accidentally degenerate at {:.3f} eV",
                                            level_name(symmetry.group, a),
                                            level_name(symmetry.group, b), a.energy_ev));
    }
  }
}

}  // namespace

std::string level_name(const PointGroup& group, const Level& level) {
  return fmt::format("{}{}", level.number, level_label(group.irreps()[level.irrep].label));
}

Eigen::MatrixXd level_orbitals(const MolecularSymmetry& symmetry, const Basis& basis,
                               const Levels& levels, int level) {
  const Level& which = levels.levels[level];
  return std::visit(
      [&](const auto& coefficients) {
        return expanded(symmetry, basis, levels.salcs, which.irrep, coefficients.col(which.column));
      },
      levels.vectors[which.irrep].coefficients);
}

Levels solve_levels(const MolecularSymmetry& symmetry, const Basis& basis,
                    const HueckelOptions& options) {
  const OffDiagonalRule rule = make_rule(options.rule, options.k, basis);
  Levels result;
  result.rule = rule.rule;
  if (rule.rule != Rule::Cusachs) result.k = rule.k;
  result.electrons = basis.electrons(symmetry.molecule.charge());
  result.salcs = make_salcs(symmetry, basis);
  const std::vector<HueckelBlock> blocks = hueckel_blocks(symmetry, basis, result.salcs, rule);
  for (std::size_t irrep = 0; irrep < blocks.size(); ++irrep) {
    solve_irrep(blocks[irrep], symmetry, basis, static_cast<int>(irrep), result);
  }
  sort_levels(result.levels);
  occupy(result.levels, symmetry.group, result.electrons, options);
  note_accidents(symmetry, result);
  result.frontier = find_frontier(result.levels);
  for (const Level& level : result.levels) {
    result.sum_of_occupied_ev += level.occupation * level.energy_ev;
  }
  return result;
}

}  // namespace irrepwise
