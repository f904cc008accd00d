#include "salc/salc_basis.hpp"

#include <array>
#include <cmath>
#include <stdexcept>

#include "harmonics/real_harmonics.hpp"
#include "salc/projection.hpp"

namespace irrepwise {
namespace {

// A single atom: the irreps are those of the sphere, and the shell of the same l is the SALC.
std::vector<Eigen::MatrixXd> spherical_invariants(int irrep_l, int l) {
  if (irrep_l != l) return {};
  return {Eigen::MatrixXd::Identity(2 * l + 1, 2 * l + 1)};
}

constexpr double nothing = 1e-14;

// Rounding leaves 1e-17 where theory has 0; zeros keep SALCs sparse and readable.
Eigen::MatrixXd tidy(const Eigen::MatrixXd& x) {
  return x.unaryExpr([](double value) { return std::abs(value) < nothing ? 0.0 : value; });
}

}  // namespace

SalcBasis make_salcs(const MolecularSymmetry& symmetry, const Basis& basis) {
  SalcBasis salcs;
  salcs.sets = equivalent_atoms(symmetry);
  const auto& irreps = symmetry.group.irreps();
  salcs.by_irrep.resize(irreps.size());
  const bool spherical = symmetry.group.symbol().family == Family::Kh;
  int orbitals = 0;
  for (std::size_t s = 0; s < salcs.sets.size(); ++s) {
    const EquivalentAtoms& set = salcs.sets[s];
    const int first = basis.first_shell[set.representative()];
    const int last = basis.first_shell[set.representative() + 1];
    std::array<SiteFunctions, max_l + 1> functions;
    for (int shell = first; shell < last; ++shell) {
      const int l = basis.shells[shell].l;
      if (functions[l].rotations.empty()) functions[l] = whole_shell(symmetry.group, set, l);
    }
    for (std::size_t i = 0; i < irreps.size(); ++i) {
      const Irrep& irrep = irreps[i];
      const double scale = std::sqrt(static_cast<double>(irrep.dimension) / set.size());
      for (int shell = first; shell < last; ++shell) {
        const int l = basis.shells[shell].l;
        const std::vector<Eigen::MatrixXd> found =
            spherical
                ? spherical_invariants(static_cast<int>(i), l)
                : site_invariants(irrep, set, functions[l], multiplicity(irrep, set, functions[l]));
        for (const Eigen::MatrixXd& x : found) {
          salcs.by_irrep[i].push_back({static_cast<int>(s), shell, tidy(scale * x.normalized())});
          orbitals += irrep.dimension;
        }
      }
    }
  }
  if (orbitals != basis.n_orbitals) {
    throw std::logic_error("the SALCs are not as many as the orbitals");
  }
  return salcs;
}

Eigen::MatrixXd salc_on_atom(const MolecularSymmetry& symmetry, const SalcBasis& salcs, int irrep,
                             const Eigen::MatrixXd& representative, int set, int position, int l) {
  const int g = salcs.sets[set].from_representative[position];
  return symmetry.group.irreps()[irrep].matrices[g] * representative *
         harmonic_rotation(l, symmetry.group.operations()[g]).transpose();
}

}  // namespace irrepwise
