// One Slater function on one atom: orbitals whose values and volumes have closed forms.
#pragma once

#include "basis/basis.hpp"
#include "figure/orbital_field.hpp"
#include "molecule/molecule.hpp"

/// A hydrogen atom at the given place whose only shell is n, l with one exponent (1/bohr), and the
/// orbital that is the given component of it.
inline irrepwise::OrbitalField single_orbital(int n, int l, double zeta, int component,
                                              const Eigen::Vector3d& place = {0, 0, 0}) {
  using namespace irrepwise;
  const Molecule molecule({{1, place}}, 0);
  Basis basis;
  basis.shells.push_back({0, l, -13.6, ContractedRadial({{SlaterRadial(n, zeta), 1.0}}), 0});
  basis.first_shell = {0, 1};
  basis.valence_electrons = {1};
  basis.n_orbitals = 2 * l + 1;
  const Eigen::MatrixXd orbital = Eigen::MatrixXd::Identity(2 * l + 1, 2 * l + 1).col(component);
  return OrbitalField(molecule, basis, orbital);
}
