#include "symmetry/ladder.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <limits>

#include <fmt/format.h>

#include "symmetry/approached_groups.hpp"
#include "symmetry/held_operations.hpp"

namespace irrepwise {
namespace {

constexpr double exact_angstrom = 1e-6;  // below it a displacement is rounding of the input

// A hair above the displacement, so that a search at this tolerance accepts it whatever the last
// bit of its own displacement.
double reached(double displacement) {
  return displacement <= exact_angstrom ? 0.0 : displacement * (1.0 + 1e-9);
}

// The rungs below the tolerance at which the structure counts as linear: of all groups that hold,
// the largest is in force; of equally large ones the one that holds best, which came first.
std::vector<Rung> general_rungs(const Molecule& molecule, const std::vector<int>& kinds,
                                double limit) {
  const ApproachedGroups approached = approached_groups(molecule, kinds, limit);
  std::vector<Rung> rungs;
  std::size_t largest = 0;
  for (const ApproachedGroup& group : approached.groups) {
    if (group.operations.size() <= largest) continue;
    largest = group.operations.size();
    const double tolerance = reached(group.tolerance_angstrom);
    if (!rungs.empty() && rungs.back().tolerance_angstrom == tolerance) rungs.pop_back();
    rungs.push_back({symbol_of(approached, group), tolerance});
  }
  return rungs;
}

}  // namespace

LinearTolerances linear_tolerances(const Molecule& molecule, const std::vector<int>& kinds) {
  Eigen::Matrix3Xd positions = molecule.positions();
  positions.colwise() -= positions.rowwise().mean().eval();
  const Eigen::Vector3d line = best_line(molecule);
  LinearTolerances tolerances;
  const auto height = [&](int atom) { return line.dot(positions.col(atom)); };
  std::vector<int> reversed;
  for (int i = 0; i < molecule.size(); ++i) {
    const double off = (positions.col(i) - height(i) * line).norm();
    tolerances.line_angstrom = std::max(tolerances.line_angstrom, off);
    int nearest = -1;
    for (int j = 0; j < molecule.size(); ++j) {
      if (!are_alike(molecule, kinds, i, j)) continue;
      if (nearest < 0 || std::abs(height(i) + height(j)) < std::abs(height(i) + height(nearest))) {
        nearest = j;
      }
    }
    reversed.push_back(nearest);
  }
  for (int i = 0; i < molecule.size(); ++i) {
    const double miss = reversed[reversed[i]] == i ? std::abs(height(i) + height(reversed[i]))
                                                   : std::numeric_limits<double>::infinity();
    tolerances.centre_angstrom = std::max(tolerances.centre_angstrom, miss);
  }
  return tolerances;
}

std::vector<Rung> symmetry_ladder(const Molecule& molecule, const SymmetryOptions& options) {
  if (molecule.size() == 1) return {{{Family::Kh, 1}, 0.0}};
  const double limit = options.limit_angstrom;
  const LinearTolerances linear = linear_tolerances(molecule, options.kinds);
  const double line = reached(linear.line_angstrom);
  const double centre = std::max(line, reached(linear.centre_angstrom));
  std::vector<Rung> rungs;
  if (line > 0.0) rungs = general_rungs(molecule, options.kinds, limit);
  if (line > limit) return rungs;
  std::erase_if(rungs, [&](const Rung& rung) { return rung.tolerance_angstrom >= line; });
  if (centre > line) rungs.push_back({{Family::Cinfv, 1}, line});
  if (centre <= limit) rungs.push_back({{Family::Dinfh, 1}, centre});
  return rungs;
}

std::string ladder_words(const std::vector<Rung>& ladder) {
  std::string words;
  for (const Rung& rung : ladder) {
    if (!words.empty()) words += " → ";
    words += rung.group.name();
    if (rung.tolerance_angstrom > 0.0) {
      words += fmt::format(" at {:.4f} Å", std::ceil(rung.tolerance_angstrom * 1e4) / 1e4);
    }
  }
  return words;
}

}  // namespace irrepwise
