#include "hueckel/rules.hpp"

#include <cmath>

#include <fmt/format.h>

#include "core/error.hpp"

namespace irrepwise {

double OffDiagonalRule::factor(double h_i_ev, double h_j_ev) const {
  const double mean = 0.5 * (h_i_ev + h_j_ev);
  switch (rule) {
    case Rule::Weighted: {
      const double delta = (h_i_ev - h_j_ev) / (h_i_ev + h_j_ev);
      const double square = delta * delta;
      return (k + square + (1.0 - k) * square * square) * mean;
    }
    case Rule::WolfsbergHelmholz:
      return k * mean;
    case Rule::GeometricMean:
      return -k * std::sqrt(h_i_ev * h_j_ev);
    case Rule::Cusachs:
      return mean;
  }
  return 0.0;
}

OverlapMap OffDiagonalRule::map() const {
  if (rule != Rule::Cusachs) return {};
  return [](double overlap) { return overlap * (2.0 - std::abs(overlap)); };
}

OffDiagonalRule make_rule(Rule rule, std::optional<double> k, const Basis& basis) {
  if (rule == Rule::Cusachs && k) {
    throw Error("the rule cusachs has no K; leave K out or choose another rule");
  }
  if (k && !(*k > 0.0 && *k <= 10.0)) {
    throw Error(fmt::format("K = {}, expected more than 0 and at most 10 (usual: 1.75)", *k));
  }
  for (const Shell& shell : basis.shells) {
    if (!(shell.h_ii_ev < 0.0)) {
      throw Error(fmt::format("atom {}: H_ii of shell {}{} = {} eV, expected a negative energy",
                              shell.atom + 1, shell.n(), shell_letter(shell.l), shell.h_ii_ev));
    }
  }
  return {rule, k.value_or(default_k(rule).value_or(1.0))};
}

}  // namespace irrepwise
