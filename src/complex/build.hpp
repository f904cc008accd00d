// From what the user says of a complex to its atoms, its group and its electrons.
#pragma once

#include <string>
#include <vector>

#include "complex/electron_count.hpp"
#include "complex/spec.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

/// A ligand in the finished complex.
struct BuiltLigand {
  std::string name;
  int charge = 0;
  std::vector<int> centres;                // from 0: one, or both for a bridge
  std::vector<int> vertices;               // from 1: of that centre, or one of each for a bridge
  std::vector<int> atoms;                  // indices in the molecule, in the order of the library
  std::vector<double> distances_angstrom;  // metal to donors, for each tooth or each metal
  int denticity = 1;
  int hapticity = 1;
  int electrons = 0;           // to each metal
  double twist_degrees = 0.0;  // from the reference direction; 0 where it changes nothing
  double bite_degrees = 0.0;   // of a chelate
  bool turns = false;
  bool mirrored = false;
};

struct BuiltCentre {
  int atom = 0;            // index in the molecule
  std::string polyhedron;  // "OC-6"
  ElectronCount electrons;
};

/// The metals come first in the molecule, then the ligands in the order of the request, then the
/// bridges.
struct BuiltComplex {
  Molecule molecule;
  std::vector<BuiltCentre> centres;
  std::vector<BuiltLigand> ligands;
  std::string point_group;              // as found from the coordinates
  double largest_shift_angstrom = 0.0;  // of an atom, by which rounding was made good
  std::string how;                      // a line that says how it was made
};

/// @throws Error  as `assemble` and `most_symmetric_poses`; an oxidation state that is missing or
///                contradicts the charge; each with its place
[[nodiscard]] BuiltComplex build_complex(const ComplexSpec& complex);

}  // namespace irrepwise
