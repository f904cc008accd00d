#include "hueckel/dense.hpp"

#include "core/constants.hpp"
#include "hueckel/rules.hpp"
#include "overlap/diatomic_frame.hpp"
#include "overlap/two_centre.hpp"

namespace irrepwise {
namespace {

// Off-site part of S after the map, zero within an atom.
Eigen::MatrixXd off_site(const Molecule& molecule, const Basis& basis, const OverlapMap& map) {
  Eigen::MatrixXd matrix = Eigen::MatrixXd::Zero(basis.n_orbitals, basis.n_orbitals);
  for (int a = 0; a < molecule.size(); ++a) {
    for (int b = a + 1; b < molecule.size(); ++b) {
      const Eigen::Vector3d displacement =
          (molecule.atoms()[b].position - molecule.atoms()[a].position) / bohr_in_angstrom;
      const DiatomicFrame frame(displacement, max_l);
      for (int i = basis.first_shell[a]; i < basis.first_shell[a + 1]; ++i) {
        for (int j = basis.first_shell[b]; j < basis.first_shell[b + 1]; ++j) {
          const Shell &shell_a = basis.shells[i], &shell_b = basis.shells[j];
          DiatomicOverlaps overlaps = diatomic_overlaps(shell_a.radial, shell_a.l, shell_b.radial,
                                                        shell_b.l, displacement.norm());
          if (map) {
            for (double& overlap : overlaps) overlap = map(overlap);
          }
          const OverlapBlock block = frame.block(overlaps, shell_a.l, shell_b.l);
          matrix.block(shell_a.first_orbital, shell_b.first_orbital, block.rows(), block.cols()) =
              block;
          matrix.block(shell_b.first_orbital, shell_a.first_orbital, block.cols(), block.rows()) =
              block.transpose();
        }
      }
    }
  }
  return matrix;
}

}  // namespace

Eigen::MatrixXd dense_overlap(const Molecule& molecule, const Basis& basis) {
  Eigen::MatrixXd overlap = off_site(molecule, basis, {});
  overlap.diagonal().setOnes();
  return overlap;
}

DenseMatrices dense_matrices(const Molecule& molecule, const Basis& basis, Rule rule_name,
                             std::optional<double> k) {
  const OffDiagonalRule rule = make_rule(rule_name, k, basis);
  DenseMatrices matrices{dense_overlap(molecule, basis), {}};
  Eigen::MatrixXd& h = matrices.hamiltonian_ev;
  h = rule.map() ? off_site(molecule, basis, rule.map()) : matrices.overlap;
  for (const Shell& a : basis.shells) {
    for (const Shell& b : basis.shells) {
      auto block = h.block(a.first_orbital, b.first_orbital, a.size(), b.size());
      if (a.atom == b.atom) {
        block.setZero();
      } else {
        block *= rule.factor(a.h_ii_ev, b.h_ii_ev);
      }
    }
    h.diagonal().segment(a.first_orbital, a.size()).setConstant(a.h_ii_ev);
  }
  return matrices;
}

}  // namespace irrepwise
