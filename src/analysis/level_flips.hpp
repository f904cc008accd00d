// How little of a parameter's change puts two frontier levels in the other order.
#pragma once

#include <optional>
#include <vector>

#include <Eigen/Core>

#include "analysis/sensitivity.hpp"
#include "hueckel/levels.hpp"

namespace irrepwise {

/// An order that turns for less than this change of one H_ii is fragile.
inline constexpr double fragile_below_ev = 0.3;

/// Levels nearer than this have no order worth the name. A choice of ours.
inline constexpr double coincide_below_ev = 1e-3;

/// Two neighbours in energy of different irreps, which may cross.
struct LevelFlip {
  int upper = 0;  // indices of levels
  int lower = 0;
  double gap_ev = 0.0;
  std::optional<int> parameter;     // the H_ii whose change does it soonest; absent where the two
                                    // coincide
  double first_order_ev = 0.0;      // change of that H_ii, from the slopes
  std::optional<double> change_ev;  // the same by solving again; absent where it was not tried (it
                                    // is large) or the levels do not meet; 0 where they coincide
  std::optional<int> other;         // the exponent or K that does it soonest
  double other_relative = 0.0;      // its change as a share of its value, first order
  bool fragile = false;

  [[nodiscard]] bool coincide() const { return gap_ev < coincide_below_ev; }
};

struct Robustness {
  std::vector<Parameter> parameters;
  Eigen::MatrixXd slopes;  // `n_parameters x 3`: of HOMO, LUMO and gap; zero where one is missing
  std::optional<LevelFlip> occupied;  // the HOMO and the next level below it of another irrep
  std::optional<LevelFlip> empty;     // the LUMO and the next level above it of another irrep

  [[nodiscard]] bool fragile() const {
    return (occupied && occupied->fragile) || (empty && empty->fragile);
  }
};

/// Changes below 1 eV by first order are computed again with the H_ii so changed, until the two
/// levels meet to 1e-4 eV of the parameter.
[[nodiscard]] Robustness find_robustness(const MolecularSymmetry& symmetry, const Basis& basis,
                                         const Levels& levels);

}  // namespace irrepwise
