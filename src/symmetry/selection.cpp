#include "symmetry/selection.hpp"

#include <algorithm>

#include "symmetry/character_table.hpp"
#include "symmetry/functions.hpp"
#include "symmetry/products.hpp"

namespace irrepwise {

TransitionRule transition_rule(const PointGroup& group, const std::string& from,
                               const std::string& to) {
  const Reduction product = direct_product(group, from, to);
  const std::vector<std::vector<FunctionSet>> functions = assign_functions(group);
  TransitionRule rule;
  for (std::size_t i = 0; i < functions.size(); ++i) {
    if (count_of(product, group.irreps()[i].label) == 0) continue;
    for (const FunctionSet& set : functions[i]) {
      if (set.kind == FunctionKind::Linear) {
        rule.dipole_axes.insert(rule.dipole_axes.end(), set.functions.begin(), set.functions.end());
      }
      if (set.kind == FunctionKind::Quadratic) rule.two_photon = true;
    }
  }
  std::sort(rule.dipole_axes.begin(), rule.dipole_axes.end());
  return rule;
}

TermDistortion term_distortion(const PointGroup& group, const std::string& term,
                               const Reduction& vibrations) {
  const std::string label = table_label(group, term);
  const Reduction square = symmetric_power(group, label, 2);
  if (total_dimension(square) == 1) return {};
  if (!group.symbol().is_finite()) {
    if (group.symbol().family == Family::Kh) return {DistortionKind::Atom, {}};
    TermDistortion distortion{DistortionKind::RennerTeller, {}};
    for (const IrrepCount& mode : vibrations) {
      if (mode.dimension == 2) distortion.modes.push_back(mode);
    }
    return distortion;
  }
  TermDistortion distortion{DistortionKind::JahnTeller, {}};
  const std::string& totally_symmetric = group.irreps().front().label;
  for (const IrrepCount& mode : vibrations) {
    if (mode.label != totally_symmetric && count_of(square, mode.label) > 0) {
      distortion.modes.push_back(mode);
    }
  }
  return distortion;
}

}  // namespace irrepwise
