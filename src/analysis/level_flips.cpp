#include "analysis/level_flips.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <variant>

#include "hueckel/blocks.hpp"
#include "hueckel/eigenproblem.hpp"

namespace irrepwise {
namespace {

constexpr double worth_solving_ev = 1.0;  // larger changes are robust whatever the exact one is
constexpr std::size_t most_solved = 3;    // of the parameters that flip soonest
constexpr double change_tolerance_ev = 1e-4;
constexpr double smallest_slope = 1e-9;  // eV per unit: below it a parameter does not matter

const Level& at(const Levels& levels, int index) {
  return levels.levels[static_cast<std::size_t>(index)];
}

// The nearest level in the direction of `step`, among those with the wanted filling, whose irrep is
// another one.
std::optional<int> other_irrep(const Levels& levels, int from, int step, bool occupied) {
  for (int i = from + step; i >= 0 && i < static_cast<int>(levels.levels.size()); i += step) {
    if (at(levels, i).irrep != at(levels, from).irrep &&
        (at(levels, i).occupation > 0.0) == occupied) {
      return i;
    }
  }
  return {};
}

// Solves the two irreps again with other H_ii; overlaps do not change with them.
class Resolver {
 public:
  Resolver(const MolecularSymmetry& symmetry, const Basis& basis, const Levels& levels)
      : basis_(basis), levels_(levels), rule_(make_rule(levels.rule, levels.k, basis)) {
    overlaps_ = off_site_blocks(symmetry, basis, levels.salcs);
    const OverlapMap map = rule_.map();
    mapped_ = map ? off_site_blocks(symmetry, basis, levels.salcs, map) : overlaps_;
  }

  [[nodiscard]] double energy_ev(const Basis& changed, const Level& level) const {
    const auto irrep = static_cast<std::size_t>(level.irrep);
    const SymmetryBlock hamiltonian =
        hamiltonian_block(mapped_[irrep], levels_.salcs.by_irrep[irrep], changed, rule_);
    return std::visit(
        [&](const auto& off_site) {
          using Matrix = std::decay_t<decltype(off_site)>;
          const Matrix overlap = off_site + Matrix::Identity(off_site.rows(), off_site.cols());
          return solve_generalised(std::get<Matrix>(hamiltonian), overlap).energies[level.column];
        },
        overlaps_[irrep]);
  }

  // How far apart the two are once the parameter is changed, in the order they have now.
  [[nodiscard]] double gap_ev(const Parameter& parameter, double change,
                              const LevelFlip& flip) const {
    const Basis changed = with_changed(basis_, parameter, change);
    return energy_ev(changed, at(levels_, flip.upper)) -
           energy_ev(changed, at(levels_, flip.lower));
  }

 private:
  const Basis& basis_;
  const Levels& levels_;
  OffDiagonalRule rule_;
  std::vector<SymmetryBlock> overlaps_;
  std::vector<SymmetryBlock> mapped_;
};

// The change nearest to zero, on the side where the slopes expect it, at which the levels meet;
// looked for up to twice as far as they say.
std::optional<double> meeting_change(const Resolver& resolver, const Parameter& parameter,
                                     double first_order, const LevelFlip& flip) {
  // A change towards zero must leave the H_ii negative.
  const double limit =
      first_order > 0.0 ? std::min(2.0 * first_order, -0.9 * parameter.value) : 2.0 * first_order;
  constexpr int steps = 4;
  double near = 0.0;
  for (int step = 1; step <= steps; ++step) {
    double far = limit * step / steps;
    if (resolver.gap_ev(parameter, far, flip) > 0.0) {
      near = far;
      continue;
    }
    while (std::abs(far - near) > change_tolerance_ev) {
      const double middle = 0.5 * (near + far);
      (resolver.gap_ev(parameter, middle, flip) > 0.0 ? near : far) = middle;
    }
    return 0.5 * (near + far);
  }
  return {};
}

// What one parameter must change by, first order, to bring the two levels together.
double first_order_change(double gap_ev, double slope_of_gap) {
  return std::abs(slope_of_gap) < smallest_slope ? std::numeric_limits<double>::infinity()
                                                 : -gap_ev / slope_of_gap;
}

void judge(LevelFlip& flip, const std::vector<Parameter>& parameters,
           const Eigen::VectorXd& slope_of_gap, const Resolver& resolver) {
  if (flip.coincide()) {  // no order to lose, and slopes of nothing
    flip.change_ev = 0.0;
    flip.fragile = true;
    return;
  }
  std::vector<std::size_t> order;
  double soonest_other = std::numeric_limits<double>::infinity();
  for (std::size_t p = 0; p < parameters.size(); ++p) {
    if (parameters[p].kind == ParameterKind::HIi) {
      order.push_back(p);
      continue;
    }
    const double relative =
        first_order_change(flip.gap_ev, slope_of_gap[static_cast<Eigen::Index>(p)]) /
        parameters[p].value;
    if (std::abs(relative) < soonest_other) {
      soonest_other = std::abs(relative);
      flip.other = static_cast<int>(p);
      flip.other_relative = relative;
    }
  }
  const auto change = [&](std::size_t p) {
    return first_order_change(flip.gap_ev, slope_of_gap[static_cast<Eigen::Index>(p)]);
  };
  std::stable_sort(order.begin(), order.end(), [&](std::size_t p, std::size_t q) {
    return std::abs(change(p)) < std::abs(change(q));
  });
  flip.parameter = static_cast<int>(order.front());
  flip.first_order_ev = change(order.front());
  for (std::size_t i = 0; i < std::min(most_solved, order.size()); ++i) {
    const double expected = change(order[i]);
    if (!(std::abs(expected) < worth_solving_ev)) break;
    const std::optional<double> found =
        meeting_change(resolver, parameters[order[i]], expected, flip);
    if (found && (!flip.change_ev || std::abs(*found) < std::abs(*flip.change_ev))) {
      flip.parameter = static_cast<int>(order[i]);
      flip.first_order_ev = expected;
      flip.change_ev = found;
    }
  }
  flip.fragile = flip.change_ev && std::abs(*flip.change_ev) < fragile_below_ev;
}

}  // namespace

Robustness find_robustness(const MolecularSymmetry& symmetry, const Basis& basis,
                           const Levels& levels) {
  Robustness result;
  result.parameters = parameters_in_use(symmetry.molecule, basis, levels);
  const auto n_parameters = static_cast<Eigen::Index>(result.parameters.size());
  result.slopes = Eigen::MatrixXd::Zero(n_parameters, 3);
  const std::optional<int> homo = levels.frontier.homo, lumo = levels.frontier.lumo;
  std::vector<int> wanted;
  const auto want = [&](const std::optional<int>& level) {
    if (level) wanted.push_back(*level);
    return static_cast<Eigen::Index>(wanted.size()) - 1;
  };
  const Eigen::Index homo_column = want(homo), lumo_column = want(lumo);
  const std::optional<int> below = homo ? other_irrep(levels, *homo, -1, true) : std::nullopt;
  const std::optional<int> above = lumo ? other_irrep(levels, *lumo, 1, false) : std::nullopt;
  const Eigen::Index below_column = want(below), above_column = want(above);
  const Eigen::MatrixXd slopes = level_slopes(symmetry, basis, levels, result.parameters, wanted);

  if (homo) result.slopes.col(0) = slopes.col(homo_column);
  if (lumo) result.slopes.col(1) = slopes.col(lumo_column);
  if (homo && lumo) result.slopes.col(2) = result.slopes.col(1) - result.slopes.col(0);
  if (!below && !above) return result;
  const Resolver resolver(symmetry, basis, levels);
  const auto flip = [&](int upper, int lower, Eigen::Index upper_column,
                        Eigen::Index lower_column) {
    LevelFlip found;
    found.upper = upper;
    found.lower = lower;
    found.gap_ev = at(levels, upper).energy_ev - at(levels, lower).energy_ev;
    judge(found, result.parameters, slopes.col(upper_column) - slopes.col(lower_column), resolver);
    return found;
  };
  if (below) result.occupied = flip(*homo, *below, homo_column, below_column);
  if (above) result.empty = flip(*above, *lumo, above_column, lumo_column);
  return result;
}

}  // namespace irrepwise
