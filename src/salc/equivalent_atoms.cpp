#include "salc/equivalent_atoms.hpp"

#include "symmetry/identify.hpp"

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

Schoenflies site_symbol(const PointGroup& group, const EquivalentAtoms& set) {
  if (static_cast<int>(set.site_group.size()) == group.order()) return group.symbol();
  // An atom off the centre of a linear molecule keeps the turns and the mirrors through the axis.
  if (!group.symbol().is_finite()) return {Family::Cinfv, 1};
  PartialTable table{group.order(), {}};
  for (int g = 0; g < group.order(); ++g) {
    for (int h = 0; h < group.order(); ++h) table.products.push_back(group.product(g, h));
  }
  return identify_group(table, group.operations(), set.site_group);
}

}  // namespace irrepwise
