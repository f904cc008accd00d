#include "salc/expansion.hpp"

#include <complex>

namespace irrepwise {
namespace {

// The coefficient times the partner matrix; for a complex pair the two rows are the real and the
// imaginary part, and the coefficient turns them into each other.
Eigen::MatrixXd scaled(double coefficient, const Eigen::MatrixXd& x) { return coefficient * x; }
Eigen::MatrixXd scaled(const std::complex<double>& coefficient, const Eigen::MatrixXd& x) {
  Eigen::MatrixXd result(2, x.cols());
  result.row(0) = coefficient.real() * x.row(0) - coefficient.imag() * x.row(1);
  result.row(1) = coefficient.imag() * x.row(0) + coefficient.real() * x.row(1);
  return result;
}

template <typename Column>
Eigen::MatrixXd expand(const MolecularSymmetry& symmetry, const Basis& basis,
                       const SalcBasis& salcs, int irrep, const Column& column) {
  const int dimension = symmetry.group.irreps()[irrep].dimension;
  Eigen::MatrixXd orbitals = Eigen::MatrixXd::Zero(basis.n_orbitals, dimension);
  const std::vector<Salc>& list = salcs.by_irrep[irrep];
  for (std::size_t i = 0; i < list.size();) {
    // SALCs of one shell of one set stand together: sum them on the representative, then spread.
    const Salc& first = list[i];
    Eigen::MatrixXd sum = scaled(column[static_cast<Eigen::Index>(i)], first.representative);
    std::size_t next = i + 1;
    for (; next < list.size() && list[next].set == first.set && list[next].shell == first.shell;
         ++next) {
      sum += scaled(column[static_cast<Eigen::Index>(next)], list[next].representative);
    }
    i = next;
    const EquivalentAtoms& set = salcs.sets[first.set];
    const int shell_in_atom = first.shell - basis.first_shell[set.representative()];
    for (int position = 0; position < set.size(); ++position) {
      const Shell& shell = basis.shells[basis.first_shell[set.atoms[position]] + shell_in_atom];
      orbitals.middleRows(shell.first_orbital, shell.size()) =
          salc_on_atom(symmetry, salcs, irrep, sum, first.set, position, shell.l).transpose();
    }
  }
  return orbitals;
}

}  // namespace

Eigen::MatrixXd expanded(const MolecularSymmetry& symmetry, const Basis& basis,
                         const SalcBasis& salcs, int irrep,
                         const Eigen::Ref<const Eigen::VectorXd>& column) {
  return expand(symmetry, basis, salcs, irrep, column);
}

Eigen::MatrixXd expanded(const MolecularSymmetry& symmetry, const Basis& basis,
                         const SalcBasis& salcs, int irrep,
                         const Eigen::Ref<const Eigen::VectorXcd>& column) {
  return expand(symmetry, basis, salcs, irrep, column);
}

}  // namespace irrepwise
