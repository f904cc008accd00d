#include "output/symmetry_result.hpp"

#include <algorithm>
#include <cmath>

#include "harmonics/real_harmonics.hpp"
#include "output/levels_result.hpp"

namespace irrepwise {
namespace {

const char* part_letter(Part part) {
  switch (part) {
    case Part::Shell: return "";
    case Part::Sigma: return "σ";
    case Part::Pi: return "π";
    case Part::PiInPlane: return "π in plane";
    case Part::PiOutOfPlane: return "π out of plane";
    case Part::Delta: return "δ";
    case Part::Phi: return "φ";
  }
  return "";
}

// The orbitals of a single atom's shell that take part in an irrep; those of its representative.
std::vector<std::string> orbitals_in_irrep(const SymmetryResult& result, const Basis& basis,
                                           const OrbitalReduction& reduction, int irrep) {
  const Shell& shell = basis.shells[reduction.shells.front()];
  const auto& set = result.sets[reduction.set];
  const PointGroup& group = result.symmetry.group;
  if (group.symbol().family == Family::Kh) {
    return {std::to_string(shell.n()) + shell_letter(shell.l)};
  }
  // The projector on the irrep: (dimension/order) sum over operations of χ(g) D_l(g).
  HarmonicMatrix projector = HarmonicMatrix::Zero(shell.size(), shell.size());
  for (std::size_t h = 0; h < set.site_group.size(); ++h) {
    const int g = set.site_group[h];
    projector += group.irreps()[irrep].characters[g] *
                 harmonic_rotation(shell.l, group.operations()[g]);
  }
  std::vector<std::string> names;
  for (int m = 0; m < shell.size(); ++m) {
    if (std::abs(projector(m, m)) > 1e-6) names.push_back(shell_orbital_name(shell, m));
  }
  return names;
}

}  // namespace

Reduction reduction_of(const PointGroup& group, const std::vector<int>& times) {
  Reduction reduction;
  for (std::size_t i = 0; i < times.size(); ++i) {
    if (times[i] > 0) {
      reduction.push_back({group.irreps()[i].label, group.irreps()[i].dimension, times[i]});
    }
  }
  return reduction;
}

std::vector<BondingIrrep> bonding_by_irrep(const SymmetryResult& result) {
  std::vector<BondingIrrep> list;
  if (!result.orbitals) return list;
  const Basis& basis = result.orbitals->basis;
  for (int irrep = 0; irrep < static_cast<int>(result.symmetry.group.irreps().size()); ++irrep) {
    BondingIrrep row{irrep, std::vector<std::vector<std::string>>(result.sets.size()), false};
    for (const OrbitalReduction& reduction : result.orbitals->reductions) {
      const auto set = static_cast<std::size_t>(reduction.set);
      const bool has_parts = result.frames[set].has_value();
      if (reduction.times[irrep] == 0 || has_parts == (reduction.part == Part::Shell)) continue;
      const Shell& shell = basis.shells[reduction.shells.front()];
      if (reduction.part != Part::Shell) {
        row.parts[set].push_back(part_letter(reduction.part));
      } else if (result.sets[set].size() == 1) {
        for (std::string& name : orbitals_in_irrep(result, basis, reduction, irrep)) {
          row.parts[set].push_back(std::move(name));
        }
      } else {
        row.parts[set].push_back(std::to_string(shell.n()) + shell_letter(shell.l));
      }
    }
    const auto sets_with = std::count_if(row.parts.begin(), row.parts.end(),
                                         [](const auto& parts) { return !parts.empty(); });
    if (sets_with == 0) continue;
    row.can_bond = sets_with > 1;
    for (std::size_t s = 0; s < result.sets.size(); ++s) {
      const bool central = result.central_atom == result.sets[s].representative();
      if (central && row.parts[s].empty()) row.can_bond = false;
    }
    list.push_back(std::move(row));
  }
  return list;
}

GroupAnswers answer_group(const PointGroup& group, const std::vector<std::string>& products,
                          const std::vector<std::string>& configurations,
                          const std::vector<std::string>& subgroups) {
  GroupAnswers answers;
  for (const std::string& question : products) {
    answers.products.push_back(answer_product(group, question));
  }
  for (const std::string& configuration : configurations) {
    answers.terms.push_back(
        {configuration, find_terms(group, parse_configuration(group, configuration))});
  }
  for (const std::string& name : subgroups) {
    std::vector<Embedding> ways;
    if (name.find('(') == std::string::npos) ways = embeddings(group, parse_schoenflies(name));
    if (ways.empty()) ways.push_back(find_embedding(group, name));  // or says why there is none
    for (Embedding& way : ways) {
      auto times = correlate(group, way);
      answers.descents.push_back({std::move(way), std::move(times)});
    }
  }
  return answers;
}

}  // namespace irrepwise
