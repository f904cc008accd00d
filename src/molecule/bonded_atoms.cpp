#include "molecule/bonded_atoms.hpp"

namespace irrepwise {

std::vector<int> bonded_atoms(const Molecule& molecule, int atom) {
  std::vector<int> bonded;
  for (int other = 0; other < molecule.size(); ++other) {
    if (other != atom && are_bonded(molecule, atom, other)) bonded.push_back(other);
  }
  return bonded;
}

}  // namespace irrepwise
