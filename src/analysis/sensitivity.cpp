#include "analysis/sensitivity.hpp"

#include <algorithm>
#include <array>
#include <cassert>
#include <map>
#include <utility>

#include <fmt/format.h>

#include "basis/atom_kinds.hpp"
#include "core/constants.hpp"
#include "core/error.hpp"
#include "hueckel/rule_slopes.hpp"
#include "molecule/element.hpp"
#include "overlap/diatomic_frame.hpp"
#include "overlap/exponent_slopes.hpp"
#include "overlap/two_centre.hpp"

namespace irrepwise {
namespace {

// Where the slopes of each shell's own parameters go: a row of the result, or -1.
struct ShellRows {
  std::vector<int> h_ii;
  std::vector<std::array<int, 2>> exponents;
  int k = -1;
};

ShellRows rows_of(const std::vector<Parameter>& parameters, const Basis& basis) {
  ShellRows rows{std::vector<int>(basis.shells.size(), -1),
                 std::vector<std::array<int, 2>>(basis.shells.size(), {-1, -1}), -1};
  for (std::size_t p = 0; p < parameters.size(); ++p) {
    const Parameter& parameter = parameters[p];
    const int row = static_cast<int>(p);
    if (parameter.kind == ParameterKind::K) rows.k = row;
    for (const int shell : parameter.shells) {
      const auto at = static_cast<std::size_t>(shell);
      if (parameter.kind == ParameterKind::HIi) rows.h_ii[at] = row;
      if (parameter.kind == ParameterKind::Exponent) {
        rows.exponents[at][static_cast<std::size_t>(parameter.term)] = row;
      }
    }
  }
  return rows;
}

// For each |m|, the sum of c_i c_j over the pairs of orbitals that overlap by it, so that
// c^T S c over the two shells is the sum of these times the overlaps in the diatomic frame.
DiatomicOverlaps diatomic_weights(const DiatomicFrame& frame, const Eigen::MatrixXd& orbitals,
                                  const Shell& a, const Shell& b) {
  const Eigen::MatrixXd density = orbitals.middleRows(a.first_orbital, a.size()) *
                                  orbitals.middleRows(b.first_orbital, b.size()).transpose() /
                                  static_cast<double>(orbitals.cols());
  DiatomicOverlaps weights{};
  for (int m = 0; m <= std::min(a.l, b.l); ++m) {
    DiatomicOverlaps unit{};
    unit[static_cast<std::size_t>(m)] = 1.0;
    weights[static_cast<std::size_t>(m)] = density.cwiseProduct(frame.block(unit, a.l, b.l)).sum();
  }
  return weights;
}

double weighted(const DiatomicOverlaps& weights, const DiatomicOverlaps& values) {
  double sum = 0.0;
  for (std::size_t m = 0; m < weights.size(); ++m) sum += weights[m] * values[m];
  return sum;
}

// All that does not depend on the level, for one pair of shells on different atoms.
struct PairSlopes {
  DiatomicOverlaps mapped;  // what the rule makes of the overlaps
  FactorSlopes factor;
  double factor_ev;
  std::vector<std::pair<int, DiatomicOverlaps>> exponents;  // row, dS/dζ
  DiatomicOverlaps map_slopes;
};

PairSlopes pair_slopes(const Basis& basis, const OffDiagonalRule& rule, const ShellRows& rows,
                       int i, int j, double distance_bohr) {
  const Shell& a = basis.shells[static_cast<std::size_t>(i)];
  const Shell& b = basis.shells[static_cast<std::size_t>(j)];
  PairSlopes slopes;
  slopes.factor = factor_slopes(rule, a.h_ii_ev, b.h_ii_ev);
  slopes.factor_ev = rule.factor(a.h_ii_ev, b.h_ii_ev);
  slopes.mapped = diatomic_overlaps(a.radial, a.l, b.radial, b.l, distance_bohr);
  const OverlapMap map = rule.map();
  for (std::size_t m = 0; m < slopes.mapped.size(); ++m) {
    slopes.map_slopes[m] = map_slope(rule, slopes.mapped[m]);
    if (map) slopes.mapped[m] = map(slopes.mapped[m]);
  }
  const auto add = [&](const std::vector<DiatomicOverlaps>& found, int shell, double sign) {
    for (std::size_t term = 0; term < found.size(); ++term) {
      DiatomicOverlaps slope = found[term];
      for (double& value : slope) value *= sign;
      slopes.exponents.emplace_back(rows.exponents[static_cast<std::size_t>(shell)][term], slope);
    }
  };
  add(exponent_slopes(a.radial, a.l, b.radial, b.l, distance_bohr), i, 1.0);
  add(exponent_slopes(b.radial, b.l, a.radial, a.l, distance_bohr), j,
      (a.l + b.l) % 2 == 0 ? 1.0 : -1.0);
  return slopes;
}

// H and S hold each pair of orbitals twice.
constexpr double both_ways = 2.0;

void add_pair(const PairSlopes& pair, const ShellRows& rows, int i, int j,
              const DiatomicOverlaps& weights, double energy_ev,
              Eigen::Ref<Eigen::VectorXd> slopes) {
  const double mapped = both_ways * weighted(weights, pair.mapped);
  slopes[rows.h_ii[static_cast<std::size_t>(i)]] += mapped * pair.factor.by_first;
  slopes[rows.h_ii[static_cast<std::size_t>(j)]] += mapped * pair.factor.by_second;
  if (rows.k >= 0) slopes[rows.k] += mapped * pair.factor.by_k_ev;
  for (const auto& [row, overlap_slopes] : pair.exponents) {
    for (std::size_t m = 0; m < weights.size(); ++m) {
      slopes[row] += both_ways * weights[m] * overlap_slopes[m] *
                     (pair.factor_ev * pair.map_slopes[m] - energy_ev);
    }
  }
}

std::string owner_name(const Molecule& molecule, const std::vector<int>& kinds, int atom) {
  const int z = molecule.atoms()[static_cast<std::size_t>(atom)].atomic_number;
  for (int other = 0; other < molecule.size(); ++other) {
    const auto at = static_cast<std::size_t>(other);
    if (molecule.atoms()[at].atomic_number == z &&
        kinds[at] != kinds[static_cast<std::size_t>(atom)]) {
      return atom_name(molecule, atom);
    }
  }
  return std::string(element_symbol(z));
}

}  // namespace

std::vector<Parameter> parameters_in_use(const Molecule& molecule, const Basis& basis,
                                         const Levels& levels) {
  const std::vector<int> kinds = atom_kinds(basis);
  std::vector<Parameter> parameters;
  for (int atom = 0; atom < molecule.size(); ++atom) {
    const int z = molecule.atoms()[static_cast<std::size_t>(atom)].atomic_number;
    const auto alike = [&](int other) {
      return kinds[static_cast<std::size_t>(other)] == kinds[static_cast<std::size_t>(atom)] &&
             molecule.atoms()[static_cast<std::size_t>(other)].atomic_number == z;
    };
    int first = 0;
    while (!alike(first)) ++first;
    if (first != atom) continue;
    const std::string owner = owner_name(molecule, kinds, atom);
    const int begin = basis.first_shell[static_cast<std::size_t>(atom)];
    const int end = basis.first_shell[static_cast<std::size_t>(atom) + 1];
    for (int s = begin; s < end; ++s) {
      const Shell& shell = basis.shells[static_cast<std::size_t>(s)];
      std::vector<int> shells;
      for (int other = atom; other < molecule.size(); ++other) {
        if (alike(other)) {
          shells.push_back(basis.first_shell[static_cast<std::size_t>(other)] + s - begin);
        }
      }
      const std::string name = fmt::format("{} {}{}", owner, shell.n(), shell_letter(shell.l));
      parameters.push_back({ParameterKind::HIi, name + " H_ii", "eV", shell.h_ii_ev, shells, 0});
      const auto terms = shell.radial.terms();
      for (std::size_t term = 0; term < terms.size(); ++term) {
        const std::string number = terms.size() > 1 ? fmt::format(" {}", term + 1) : "";
        parameters.push_back({ParameterKind::Exponent, fmt::format("{} exponent{}", name, number),
                              "1/bohr", terms[term].function.zeta(), shells,
                              static_cast<int>(term)});
      }
    }
  }
  if (levels.k) parameters.push_back({ParameterKind::K, "K", "", *levels.k, {}, 0});
  return parameters;
}

Eigen::MatrixXd level_slopes(const MolecularSymmetry& symmetry, const Basis& basis,
                             const Levels& levels, const std::vector<Parameter>& parameters,
                             const std::vector<int>& wanted) {
  const OffDiagonalRule rule = make_rule(levels.rule, levels.k, basis);
  const ShellRows rows = rows_of(parameters, basis);
  Eigen::MatrixXd slopes = Eigen::MatrixXd::Zero(static_cast<Eigen::Index>(parameters.size()),
                                                 static_cast<Eigen::Index>(wanted.size()));
  std::vector<Eigen::MatrixXd> orbitals;
  for (std::size_t k = 0; k < wanted.size(); ++k) {
    orbitals.push_back(level_orbitals(symmetry, basis, levels, wanted[k]));
    for (std::size_t s = 0; s < basis.shells.size(); ++s) {
      const Shell& shell = basis.shells[s];
      slopes(rows.h_ii[s], static_cast<Eigen::Index>(k)) +=
          orbitals[k].middleRows(shell.first_orbital, shell.size()).squaredNorm() /
          static_cast<double>(orbitals[k].cols());
    }
  }
  const std::vector<Atom>& atoms = symmetry.molecule.atoms();
  for (std::size_t a = 0; a < atoms.size(); ++a) {
    for (std::size_t b = a + 1; b < atoms.size(); ++b) {
      const Eigen::Vector3d displacement =
          (atoms[b].position - atoms[a].position) / bohr_in_angstrom;
      const DiatomicFrame frame(displacement, max_l);
      for (int i = basis.first_shell[a]; i < basis.first_shell[a + 1]; ++i) {
        for (int j = basis.first_shell[b]; j < basis.first_shell[b + 1]; ++j) {
          const PairSlopes pair = pair_slopes(basis, rule, rows, i, j, displacement.norm());
          for (std::size_t k = 0; k < wanted.size(); ++k) {
            const DiatomicOverlaps weights =
                diatomic_weights(frame, orbitals[k], basis.shells[static_cast<std::size_t>(i)],
                                 basis.shells[static_cast<std::size_t>(j)]);
            add_pair(pair, rows, i, j, weights,
                     levels.levels[static_cast<std::size_t>(wanted[k])].energy_ev,
                     slopes.col(static_cast<Eigen::Index>(k)));
          }
        }
      }
    }
  }
  return slopes;
}

Basis with_changed(const Basis& basis, const Parameter& parameter, double change) {
  assert(parameter.kind != ParameterKind::K);
  Basis changed = basis;
  for (const int index : parameter.shells) {
    Shell& shell = changed.shells[static_cast<std::size_t>(index)];
    if (parameter.kind == ParameterKind::HIi) {
      shell.h_ii_ev += change;
      if (!(shell.h_ii_ev < 0.0)) {
        throw Error(
            fmt::format("{}: a change by {} eV leaves no bound level", parameter.name, change));
      }
      continue;
    }
    std::vector<ContractedRadial::Term> terms(shell.radial.terms().begin(),
                                              shell.radial.terms().end());
    SlaterRadial& function = terms[static_cast<std::size_t>(parameter.term)].function;
    function = SlaterRadial(function.n(), function.zeta() + change);
    shell.radial = ContractedRadial(std::move(terms));
  }
  return changed;
}

}  // namespace irrepwise
