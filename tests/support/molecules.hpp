// The corpus: molecules of every family of point groups, their groups known by construction.
#pragma once

#include <string>
#include <vector>

#include "molecule/molecule.hpp"

struct TestMolecule {
  std::string name;
  irrepwise::Molecule molecule;
  std::string point_group;  // Schoenflies, "D4h", "S8", "Cinfv", "Kh"
};

/// Real molecules by usual bond lengths and angles (common practice, from memory; idealised), and
/// synthetic clusters for the rare groups, whose atoms stand at general positions so that no higher
/// symmetry holds even at 0.05 Å. Only elements of the published parameter set.
[[nodiscard]] const std::vector<TestMolecule>& test_molecules();

/// @throws std::out_of_range  where no test molecule has the name
[[nodiscard]] const TestMolecule& test_molecule(const std::string& name);

/// CH4 in Td.
[[nodiscard]] irrepwise::Molecule methane(double ch_angstrom);

enum class EthaneForm { Staggered, Eclipsed };

/// C2H6 with tetrahedral angles, the C-C bond along z and its middle at the origin.
[[nodiscard]] irrepwise::Molecule ethane(double cc_angstrom, double ch_angstrom, EthaneForm form);
