// Molecular orbitals as functions in space, from the Slater functions themselves.
#pragma once

#include <vector>

#include <Eigen/Core>

#include "basis/basis.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

/// psi_k(r) = sum_i c_ik R_i(|r - r_A|) Y_i(r - r_A), for one orbital or several.
class OrbitalField {
 public:
  /// @param molecule  whose frame is that of the points
  /// @param orbitals  coefficients, `n_orbitals x n`, in the order of the basis
  OrbitalField(const Molecule& molecule, const Basis& basis,
               const Eigen::Ref<const Eigen::MatrixXd>& orbitals);

  [[nodiscard]] int count() const noexcept { return count_; }

  /// @param point_angstrom  anywhere, also on an atom
  /// @returns               bohr^(-3/2), one value per orbital
  [[nodiscard]] Eigen::VectorXd values(const Eigen::Vector3d& point_angstrom) const;

  /// The same for one orbital.
  [[nodiscard]] double value(const Eigen::Vector3d& point_angstrom, int orbital) const;

  /// What one atom adds to every orbital.
  struct Centre {
    Eigen::Vector3d position_angstrom;
    double reach_angstrom = 0.0;    // beyond it no orbital changes by more than 1e-7 bohr^(-3/2)
    double density_angstrom = 0.0;  // beyond it lies less than 2e-4 of what the atom's shells hold
  };
  [[nodiscard]] const std::vector<Centre>& centres() const noexcept { return centres_; }

  /// Adds the share of one atom to the values at a point.
  void add(int centre, const Eigen::Vector3d& point_angstrom, double* values) const;

 private:
  struct Term {
    double weight;  // coefficient of the contraction times the norm of the function
    int power;      // n - 1
    double zeta;    // 1/bohr
  };
  struct FieldShell {
    int l;
    int first_term;
    int end_term;
    std::vector<double> coefficients;  // 2l + 1 for each orbital
  };

  void add_some(int centre, const Eigen::Vector3d& point_angstrom, int first, int end,
                double* values) const;

  int count_ = 0;
  std::vector<Centre> centres_;
  std::vector<int> first_shell_;  // per centre, and one past the end
  std::vector<FieldShell> shells_;
  std::vector<Term> terms_;
};

}  // namespace irrepwise
