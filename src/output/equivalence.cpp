#include "output/equivalence.hpp"

#include <algorithm>
#include <map>
#include <set>

#include <fmt/format.h>

#include "molecule/element.hpp"

namespace irrepwise {

std::vector<AtomSet> atom_sets(const MolecularSymmetry& symmetry) {
  const Molecule& molecule = symmetry.molecule;
  std::vector<AtomSet> sets;
  std::vector<bool> seen(static_cast<std::size_t>(molecule.size()), false);
  std::map<int, int> sets_of_element;
  for (int atom = 0; atom < molecule.size(); ++atom) {
    if (seen[static_cast<std::size_t>(atom)]) continue;
    std::set<int> members;
    for (const std::vector<int>& image : symmetry.images) {
      members.insert(image[static_cast<std::size_t>(atom)]);
    }
    for (const int member : members) seen[static_cast<std::size_t>(member)] = true;
    sets.push_back({{members.begin(), members.end()}, {}});
    ++sets_of_element[molecule.atoms()[static_cast<std::size_t>(atom)].atomic_number];
  }
  for (AtomSet& set : sets) {
    const int first = set.atoms.front();
    const int element = molecule.atoms()[static_cast<std::size_t>(first)].atomic_number;
    set.name = sets_of_element[element] == 1 ? std::string(element_symbol(element))
               : set.atoms.size() == 1
                   ? atom_name(molecule, first)
                   : fmt::format("{}×{}", atom_name(molecule, first), set.atoms.size());
  }
  return sets;
}

std::vector<int> set_of_atom(const std::vector<AtomSet>& sets, int n_atoms) {
  std::vector<int> of_atom(static_cast<std::size_t>(n_atoms), 0);
  for (std::size_t i = 0; i < sets.size(); ++i) {
    for (const int atom : sets[i].atoms) {
      of_atom[static_cast<std::size_t>(atom)] = static_cast<int>(i);
    }
  }
  return of_atom;
}

std::pair<int, int> first_equivalent_pair(const MolecularSymmetry& symmetry, int a, int b) {
  std::pair<int, int> first = std::minmax(a, b);
  for (const std::vector<int>& image : symmetry.images) {
    first = std::min<std::pair<int, int>>(
        first, std::minmax(image[static_cast<std::size_t>(a)], image[static_cast<std::size_t>(b)]));
  }
  return first;
}

std::string atom_list(const Molecule& molecule, const std::vector<int>& atoms) {
  const auto element = [&](std::size_t i) {
    return molecule.atoms()[static_cast<std::size_t>(atoms[i])].atomic_number;
  };
  std::string text;
  for (std::size_t i = 0; i < atoms.size(); ++i) {
    std::size_t last = i;
    while (last + 1 < atoms.size() && atoms[last + 1] == atoms[last] + 1 &&
           element(last + 1) == element(i)) {
      ++last;
    }
    if (!text.empty()) text += ", ";
    text += atom_name(molecule, atoms[i]);
    if (last >= i + 2) {
      text += "–" + atom_name(molecule, atoms[last]);
      i = last;
    }
  }
  return text;
}

}  // namespace irrepwise
