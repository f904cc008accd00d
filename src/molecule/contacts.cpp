#include "molecule/contacts.hpp"

#include <algorithm>
#include <array>
#include <cassert>
#include <cstddef>
#include <limits>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "core/constants.hpp"
#include "molecule/element.hpp"
#include "molecule/molecule.hpp"
#include "molecule/pairs.hpp"

namespace irrepwise {
namespace {

// Bonds of all orders lie between 0.66 (a quadruple bond of chromium) and 1.25 times the sum of the
// radii (common practice); coordinates converted from bohr twice fall below 0.6. Two metals are
// held at 1.2 and more by ligands that bridge them, without a bond.
constexpr double longest_bond = 1.25;
constexpr double longest_bond_of_metals = 1.15;
constexpr double shortest_bond = 0.6;
constexpr double bond_without_radius_angstrom = 3.0;

const Atom& atom_at(const Molecule& molecule, int index) {
  assert(index >= 0 && index < molecule.size());
  return molecule.atoms()[static_cast<std::size_t>(index)];
}

// All elements but hydrogen, the p block on and beyond the line from boron to polonium, and the
// noble gases.
bool is_metal(int atomic_number) {
  constexpr std::array<std::pair<int, int>, 6> metals = {
      {{3, 4}, {11, 13}, {19, 31}, {37, 50}, {55, 83}, {87, max_atomic_number - 2}}};
  return std::any_of(metals.begin(), metals.end(), [&](const std::pair<int, int>& range) {
    return atomic_number >= range.first && atomic_number <= range.second;
  });
}

// As a multiple of the sum of the radii.
double longest_bond_between(const Molecule& molecule, int a, int b) {
  const bool metals =
      is_metal(atom_at(molecule, a).atomic_number) && is_metal(atom_at(molecule, b).atomic_number);
  return metals ? longest_bond_of_metals : longest_bond;
}

// The distance as a multiple of the sum of the radii; nothing for elements without a radius.
std::optional<double> relative(const Molecule& molecule, const NearPair& pair) {
  const auto a = covalent_radius_angstrom(atom_at(molecule, pair.a).atomic_number);
  const auto b = covalent_radius_angstrom(atom_at(molecule, pair.b).atomic_number);
  if (!a || !b) return std::nullopt;
  return pair.distance_angstrom / (*a + *b);
}

// No two atoms of the molecule farther apart than this are bonded.
double longest_bond_of(const Molecule& molecule) {
  double largest_radius = 0.0;
  for (const Atom& atom : molecule.atoms()) {
    largest_radius =
        std::max(largest_radius, covalent_radius_angstrom(atom.atomic_number).value_or(0.0));
  }
  return std::max(2.0 * largest_radius * longest_bond, bond_without_radius_angstrom);
}

// Per atom the smallest relative distance to any other, infinity where none is near.
std::vector<double> nearest_contacts(const Molecule& molecule, const std::vector<NearPair>& pairs) {
  std::vector<double> nearest(static_cast<std::size_t>(molecule.size()),
                              std::numeric_limits<double>::infinity());
  for (const NearPair& pair : pairs) {
    const std::optional<double> ratio = relative(molecule, pair);
    if (!ratio) continue;
    for (const int atom : {pair.a, pair.b}) {
      double& smallest = nearest[static_cast<std::size_t>(atom)];
      smallest = std::min(smallest, *ratio);
    }
  }
  return nearest;
}

std::vector<std::string> close_contacts(const Molecule& molecule,
                                        const std::vector<NearPair>& pairs) {
  constexpr std::size_t most_listed = 5;
  std::vector<std::string> warnings;
  std::size_t n_close = 0;
  for (const NearPair& pair : pairs) {
    const std::optional<double> ratio = relative(molecule, pair);
    if (!ratio || *ratio >= shortest_bond) continue;
    if (++n_close > most_listed) continue;
    warnings.push_back(fmt::format(
        "{} and {} are {:.3f} Å apart, only {:.0f} % of the sum of their covalent radii",
        atom_name(molecule, pair.a), atom_name(molecule, pair.b), pair.distance_angstrom,
        100.0 * *ratio));
  }
  if (n_close > most_listed) {
    warnings.push_back(fmt::format("{} more pairs of atoms are as close", n_close - most_listed));
  }
  return warnings;
}

// Whether every atom would have a neighbour at the length of a bond if the numbers were bohr.
bool all_bonded_in_bohr(const Molecule& molecule) {
  const double cutoff_angstrom = longest_bond_of(molecule) / bohr_in_angstrom;
  const std::vector<double> nearest =
      nearest_contacts(molecule, near_pairs(molecule.atoms(), cutoff_angstrom));
  return std::all_of(nearest.begin(), nearest.end(), [](double ratio) {
    const double in_bohr = ratio * bohr_in_angstrom;
    return in_bohr >= shortest_bond && in_bohr <= longest_bond;
  });
}

}  // namespace

bool are_bonded(const Molecule& molecule, int atom_a, int atom_b) {
  const NearPair pair{
      atom_a, atom_b,
      (atom_at(molecule, atom_a).position - atom_at(molecule, atom_b).position).norm()};
  if (const std::optional<double> ratio = relative(molecule, pair)) {
    return *ratio <= longest_bond_between(molecule, atom_a, atom_b);
  }
  return pair.distance_angstrom < bond_without_radius_angstrom;
}

std::string bond_criterion(const Molecule& molecule) {
  const auto n_metals =
      std::count_if(molecule.atoms().begin(), molecule.atoms().end(),
                    [](const Atom& atom) { return is_metal(atom.atomic_number); });
  if (n_metals < 2) return {};
  return fmt::format(
      "A bond is a distance of at most {} times the sum of the covalent radii, between two metals "
      "of at most {} times.",
      longest_bond, longest_bond_of_metals);
}

std::vector<std::string> geometry_warnings(const Molecule& molecule) {
  if (molecule.size() < 2) return {};
  const std::vector<NearPair> pairs = near_pairs(molecule.atoms(), longest_bond_of(molecule));
  const std::vector<double> nearest = nearest_contacts(molecule, pairs);
  const bool all_short = std::all_of(nearest.begin(), nearest.end(),
                                     [](double ratio) { return ratio < shortest_bond; });
  if (all_short) {
    return {
        "every contact is far shorter than a bond: the coordinates look as if they were converted "
        "from bohr twice; they are read in Å"};
  }
  const bool nothing_bonded = std::none_of(pairs.begin(), pairs.end(), [&](const NearPair& pair) {
    return are_bonded(molecule, pair.a, pair.b);
  });
  if (!nothing_bonded) return close_contacts(molecule, pairs);
  if (all_bonded_in_bohr(molecule)) {
    return {
        "no two atoms are near enough for a bond, but all would be if the coordinates were in "
        "bohr; they are read in Å"};
  }
  return {"no two atoms are near enough for a bond; check the coordinates and their unit (Å)"};
}

}  // namespace irrepwise
