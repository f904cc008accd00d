#include <iostream>

#include <hueckel/levels.hpp>

using namespace irrepwise;

int main() {
  const Molecule h2({{1, {0.0, 0.0, 0.0}}, {1, {0.0, 0.0, 0.74}}}, 0);
  const MolecularSymmetry symmetry = find_symmetry(h2);
  const Levels levels = solve_levels(symmetry, make_basis(h2, published_parameters()));
  const Level& homo = levels.levels[static_cast<std::size_t>(levels.frontier.homo.value())];
  std::cout << symmetry.group.symbol().name() << ' ' << level_name(symmetry.group, homo) << '\n';
}
