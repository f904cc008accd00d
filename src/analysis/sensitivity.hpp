// How levels change with the parameters: H_ii, exponents and K.
#pragma once

#include <string>
#include <vector>

#include <Eigen/Core>

#include "hueckel/levels.hpp"

namespace irrepwise {

enum class ParameterKind { HIi, Exponent, K };

/// One number of the parameter set, or K: what the atoms that share it have in common.
struct Parameter {
  ParameterKind kind = ParameterKind::HIi;
  std::string name;         // "Pt 5d H_ii", "Pt 5d exponent 2", "Cl4 3p H_ii", "K"
  std::string unit;         // "eV", "1/bohr", or none
  double value = 0.0;       // in force
  std::vector<int> shells;  // indices in the basis; empty for K
  int term = 0;             // which exponent of the contraction
};

/// Every parameter in use, in the order of the basis, K last. Atoms of one element share theirs,
/// unless an override makes some unlike: those are named by their first atom.
[[nodiscard]] std::vector<Parameter> parameters_in_use(const Molecule& molecule, const Basis& basis,
                                                       const Levels& levels);

/// dε/dp = c^T (dH/dp - ε dS/dp) c, the mean over the partners of a degenerate level.
///
/// @param wanted  indices of levels
/// @returns       `n_parameters x n_wanted`; eV per unit of the parameter
/// @source        Hellmann-Feynman with a metric; the derivatives of H and S are derived by us
[[nodiscard]] Eigen::MatrixXd level_slopes(const MolecularSymmetry& symmetry, const Basis& basis,
                                           const Levels& levels,
                                           const std::vector<Parameter>& parameters,
                                           const std::vector<int>& wanted);

/// The same basis with one parameter changed by `change`; K is none of its parameters.
/// @throws Error  for an H_ii that is not negative or an exponent out of range
[[nodiscard]] Basis with_changed(const Basis& basis, const Parameter& parameter, double change);

}  // namespace irrepwise
