#include "salc/equivalent_atoms.hpp"

#include <algorithm>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "support/molecules.hpp"

using namespace irrepwise;

TEST_CASE("sets of equivalent atoms part the atoms, and size times site group is the order") {
  // Orbit and stabiliser (elementary group theory); a linear group stands by its nodes.
  for (const TestMolecule& test : test_molecules()) {
    CAPTURE(test.name);
    const MolecularSymmetry symmetry = find_symmetry(test.molecule);
    std::vector<int> seen(static_cast<std::size_t>(symmetry.molecule.size()), 0);
    for (const EquivalentAtoms& set : equivalent_atoms(symmetry)) {
      CHECK(std::is_sorted(set.atoms.begin(), set.atoms.end()));
      CHECK(set.size() * static_cast<int>(set.site_group.size()) == symmetry.group.order());
      for (int position = 0; position < set.size(); ++position) {
        ++seen[set.atoms[position]];
        CHECK(symmetry.images[set.from_representative[position]][set.representative()] ==
              set.atoms[position]);
        CHECK(symmetry.molecule.atoms()[set.atoms[position]].atomic_number ==
              symmetry.molecule.atoms()[set.representative()].atomic_number);
      }
      for (int g : set.site_group) {
        CHECK(symmetry.images[g][set.representative()] == set.representative());
      }
    }
    CHECK(std::all_of(seen.begin(), seen.end(), [](int times) { return times == 1; }));
  }
}

TEST_CASE("well-known molecules have the sets that chemists name") {
  // Common practice: axial and equatorial fluorines of PF5, the sixty carbons of C60, three kinds
  // of carbon in naphthalene and two of hydrogen.
  const auto sizes = [](const char* name) {
    std::vector<int> found;
    for (const EquivalentAtoms& set :
         equivalent_atoms(find_symmetry(test_molecule(name).molecule))) {
      found.push_back(set.size());
    }
    std::sort(found.begin(), found.end());
    return found;
  };
  CHECK(sizes("phosphorus pentafluoride") == std::vector<int>{1, 2, 3});
  CHECK(sizes("buckminsterfullerene") == std::vector<int>{60});
  CHECK(sizes("naphthalene") == std::vector<int>{2, 4, 4, 4, 4});
  CHECK(sizes("benzene") == std::vector<int>{6, 6});
  CHECK(sizes("bromochlorofluoromethane") == std::vector<int>{1, 1, 1, 1, 1});
}
