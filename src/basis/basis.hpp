// The orbitals of a molecule: shells in the order of the atoms.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "basis/parameter_set.hpp"
#include "basis/shell.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

/// A change of parameters for one atom, one element or one of their shells.
struct ParameterOverride {
  std::optional<int> atom;           // index from 0; otherwise all atoms of the element
  std::optional<int> atomic_number;  // used where `atom` is absent
  std::optional<int> l;              // which shell; required for h_ii_ev and radial
  std::optional<double> h_ii_ev;
  std::optional<ContractedRadial> radial;
  std::optional<int> valence_electrons;
};

/// Atoms in input order, shells in the order of the parameter set, orbitals in the order of the
/// conventions.
struct Basis {
  std::vector<Shell> shells;
  std::vector<int> first_shell;        // per atom, and one past the end: n_atoms + 1
  std::vector<int> valence_electrons;  // per atom
  int n_orbitals = 0;

  /// @returns  the electrons of the neutral molecule minus its charge
  [[nodiscard]] int electrons(int charge) const;
};

/// @throws Error  for an element without parameters (named, with the YAML that supplies it), an
///                override of an atom or shell that is not there, or more shells than make sense
[[nodiscard]] Basis make_basis(const Molecule& molecule, const ParameterSet& parameters,
                               const std::vector<ParameterOverride>& overrides = {});

/// @returns  "Pt1 5dx2-y2" for one orbital of the basis
[[nodiscard]] std::string orbital_title(const Molecule& molecule, const Basis& basis, int orbital);

}  // namespace irrepwise
