#include "salc/equivalent_atoms.hpp"

namespace irrepwise {

std::vector<EquivalentAtoms> equivalent_atoms(const MolecularSymmetry& symmetry) {
  const int n_atoms = symmetry.molecule.size();
  std::vector<bool> done(static_cast<std::size_t>(n_atoms), false);
  std::vector<EquivalentAtoms> sets;
  for (int representative = 0; representative < n_atoms; ++representative) {
    if (done[representative]) continue;
    EquivalentAtoms set;
    std::vector<int> operation_to(static_cast<std::size_t>(n_atoms), -1);
    for (int g = 0; g < symmetry.group.order(); ++g) {
      const int image = symmetry.images[g][representative];
      if (image == representative) set.site_group.push_back(g);
      if (operation_to[image] < 0) operation_to[image] = g;
    }
    for (int atom = 0; atom < n_atoms; ++atom) {
      if (operation_to[atom] < 0) continue;
      done[atom] = true;
      set.atoms.push_back(atom);
      set.from_representative.push_back(operation_to[atom]);
    }
    sets.push_back(std::move(set));
  }
  return sets;
}

}  // namespace irrepwise
