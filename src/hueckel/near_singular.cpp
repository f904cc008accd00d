#include "hueckel/near_singular.hpp"

#include <algorithm>
#include <map>
#include <utility>
#include <vector>

#include <fmt/format.h>
#include <Eigen/Eigenvalues>

#include "core/text.hpp"

namespace irrepwise {
namespace {

constexpr std::size_t most_atoms = 4;

std::string set_name(const MolecularSymmetry& symmetry, const EquivalentAtoms& set) {
  std::vector<std::string> names;
  for (int atom : set.atoms) names.push_back(atom_name(symmetry.molecule, atom));
  if (names.size() > most_atoms) {
    names.resize(most_atoms);
    return fmt::format("{} …", fmt::join(names, ", "));
  }
  return joined(names);
}

template <typename Matrix>
SmallestOverlap smallest(const Matrix& block, const MolecularSymmetry& symmetry, const Basis& basis,
                         const std::vector<Salc>& salcs, const std::vector<EquivalentAtoms>& sets) {
  const Eigen::SelfAdjointEigenSolver<Matrix> solver(block);
  SmallestOverlap result{solver.eigenvalues()[0], {}};
  std::map<std::pair<int, int>, double> weights;  // (set, shell) -> weight
  for (std::size_t i = 0; i < salcs.size(); ++i) {
    weights[{salcs[i].set, salcs[i].shell}] +=
        std::norm(solver.eigenvectors()(static_cast<Eigen::Index>(i), 0));
  }
  std::vector<std::pair<double, std::pair<int, int>>> ordered;
  for (const auto& [key, weight] : weights) ordered.emplace_back(-weight, key);
  std::sort(ordered.begin(), ordered.end());
  std::vector<std::string> parts;
  double explained = 0.0;
  for (const auto& [weight, key] : ordered) {
    const Shell& shell = basis.shells[key.second];
    parts.push_back(fmt::format("{}{} of {}", shell.n(), shell_letter(shell.l),
                                set_name(symmetry, sets[key.first])));
    explained -= weight;
    if (explained > 0.9 || parts.size() == 3) break;
  }
  result.behind = joined(parts);
  return result;
}

}  // namespace

SmallestOverlap smallest_overlap(const SymmetryBlock& block, const MolecularSymmetry& symmetry,
                                 const Basis& basis, const SalcBasis& salcs, int irrep) {
  return std::visit(
      [&](const auto& matrix) {
        return smallest(matrix, symmetry, basis, salcs.by_irrep[irrep], salcs.sets);
      },
      block);
}

}  // namespace irrepwise
