#include "molecule/metals.hpp"

#include <algorithm>
#include <array>
#include <cstddef>

namespace irrepwise {
namespace {

constexpr std::array<int, 12> s_block = {3, 4, 11, 12, 19, 20, 37, 38, 55, 56, 87, 88};
constexpr std::array<int, 12> p_block_metals = {13, 31, 49, 50, 81, 82, 83, 84, 113, 114, 115, 116};

template <typename Accepts>
std::vector<int> atoms_with(const Molecule& molecule, Accepts accepts) {
  std::vector<int> atoms;
  for (int atom = 0; atom < molecule.size(); ++atom) {
    const int z = molecule.atoms()[static_cast<std::size_t>(atom)].atomic_number;
    if (accepts(z)) atoms.push_back(atom);
  }
  return atoms;
}

}  // namespace

bool is_d_or_f_block(int atomic_number) {
  const int z = atomic_number;
  return (z >= 21 && z <= 30) || (z >= 39 && z <= 48) || (z >= 57 && z <= 80) ||
         (z >= 89 && z <= 112);
}

bool is_metal(int atomic_number) {
  const int z = atomic_number;
  return is_d_or_f_block(z) || std::find(s_block.begin(), s_block.end(), z) != s_block.end() ||
         std::find(p_block_metals.begin(), p_block_metals.end(), z) != p_block_metals.end();
}

std::vector<int> centre_atoms(const Molecule& molecule) {
  return atoms_with(molecule, is_d_or_f_block);
}

std::vector<int> metals_of_complex(const Molecule& molecule) {
  std::vector<int> metals = centre_atoms(molecule);
  return metals.empty() ? atoms_with(molecule, is_metal) : metals;
}

}  // namespace irrepwise
