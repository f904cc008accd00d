#include "analysis/symmetry_result.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

#include "harmonics/real_harmonics.hpp"

namespace irrepwise {
namespace {

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
    projector +=
        group.irreps()[irrep].characters[g] * harmonic_rotation(shell.l, group.operations()[g]);
  }
  std::vector<std::string> names;
  for (int m = 0; m < shell.size(); ++m) {
    if (std::abs(projector(m, m)) > 1e-6)
      names.push_back(salc_orbital_name(shell, m, OrbitalFrame::Standard));
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
        row.parts[set].push_back(part_name(reduction.part));
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

SymmetryResult symmetry_of(const Molecule& molecule, const SymmetryOptions& options,
                           const std::optional<Basis>& basis) {
  MolecularSymmetry symmetry = find_symmetry(molecule, options);
  std::vector<EquivalentAtoms> sets = equivalent_atoms(symmetry);
  auto frames = frames_of_sets(symmetry, sets);
  DisplacementIrreps displacements = displacement_irreps(symmetry);
  SymmetryResult result{molecule,
                        std::move(symmetry),
                        options.limit_angstrom,
                        symmetry_ladder(molecule, options),
                        {},
                        options.z || options.x,
                        std::move(sets),
                        std::move(frames),
                        {},
                        {},
                        {},
                        std::move(displacements),
                        {}};
  if (result.user_axes) {
    SymmetryOptions by_convention = options;
    by_convention.z.reset();
    by_convention.x.reset();
    result.axis_effect = axis_effect(find_symmetry(molecule, by_convention), result.symmetry);
  }
  if (const auto centre = find_centre(result.symmetry)) result.central_atom = centre->atom;
  if (basis) {
    result.orbitals = OrbitalSymmetry{
        *basis, orbital_reductions(result.symmetry, *basis, result.sets, result.frames), {}};
  }
  return result;
}

FrontierSymmetry frontier_symmetry(const MolecularSymmetry& symmetry, Levels levels) {
  FrontierSymmetry frontier{std::move(levels), {}, {}, {}, {}};
  frontier.transitions = frontier_transitions(symmetry.group, frontier.levels);
  frontier.open = open_levels(symmetry.group, frontier.levels);
  if (!frontier.open.empty()) {
    frontier.terms = find_terms(symmetry.group, frontier.open);
    frontier.ground = ground_terms(symmetry, frontier.terms);
  }
  return frontier;
}

std::vector<ProductAnswer> answer_products(const PointGroup& group,
                                           const std::vector<std::string>& questions) {
  std::vector<ProductAnswer> answers;
  for (const std::string& question : questions) answers.push_back(answer_product(group, question));
  return answers;
}

std::vector<TermsAnswer> answer_terms(const PointGroup& group,
                                      const std::vector<std::string>& configurations) {
  std::vector<TermsAnswer> answers;
  for (const std::string& configuration : configurations) {
    answers.push_back(
        {configuration, find_terms(group, parse_configuration(group, configuration))});
  }
  return answers;
}

std::vector<DescentAnswer> answer_descents(const PointGroup& group,
                                           const std::vector<std::string>& subgroups) {
  std::vector<DescentAnswer> answers;
  for (const std::string& name : subgroups) {
    std::vector<Embedding> ways;
    if (name.find('(') == std::string::npos) ways = embeddings(group, parse_schoenflies(name));
    if (ways.empty()) ways.push_back(find_embedding(group, name));  // or says why there is none
    for (Embedding& way : ways) {
      auto times = correlate(group, way);
      answers.push_back({std::move(way), std::move(times)});
    }
  }
  return answers;
}

}  // namespace irrepwise
