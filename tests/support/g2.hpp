// The molecules of the G2/97 set, tests/reference/g2.txt: geometries that nobody here made.
#pragma once

#include <string>
#include <vector>

#include "molecule/molecule.hpp"

struct G2Molecule {
  std::string name;
  irrepwise::Molecule molecule;
  std::string point_group;     // published, Schoenflies; see the header of the file
  int unpaired_electrons = 0;  // as published
  std::string note;            // why the group is not the one that the source states; mostly empty
};

/// @throws irrepwise::Error  with file and line where the file is not as its header says
[[nodiscard]] std::vector<G2Molecule> read_g2();
