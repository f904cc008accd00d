#include "salc/salc_basis.hpp"

#include <array>
#include <cassert>
#include <cmath>
#include <stdexcept>

#include <Eigen/QR>

#include "harmonics/real_harmonics.hpp"

namespace irrepwise {
namespace {

// D_l of the site group's operations, for the l in use.
using SiteRotations = std::vector<std::array<Eigen::MatrixXd, max_l + 1>>;

SiteRotations site_rotations(const MolecularSymmetry& symmetry, const EquivalentAtoms& set,
                             int largest_l) {
  SiteRotations rotations;
  for (int g : set.site_group) {
    rotations.emplace_back();
    for (int l = 0; l <= largest_l; ++l) {
      rotations.back()[l] = harmonic_rotation(l, symmetry.group.operations()[g]);
    }
  }
  return rotations;
}

// Theory demands a whole number; anything else is a mistake of ours, not of the input.
int whole(double value) {
  const double rounded = std::round(value);
  if (std::abs(value - rounded) > 1e-6) {
    throw std::logic_error("an irrep occurs a fractional number of times");
  }
  return static_cast<int>(rounded);
}

// How often the irrep occurs in the shell on the set; for a pair of conjugates, each of the two.
int multiplicity(const Irrep& irrep, const EquivalentAtoms& set, const SiteRotations& rotations,
                 int l) {
  double sum = 0.0;
  for (std::size_t h = 0; h < set.site_group.size(); ++h) {
    sum += irrep.characters[set.site_group[h]] * rotations[h][l].trace();
  }
  const double order = static_cast<double>(set.site_group.size());
  return whole(sum / order / (irrep.complex_pair ? 2.0 : 1.0));
}

// The multiplication by i in the real form of a pair of complex conjugate irreps.
Eigen::MatrixXd times_i(const Eigen::MatrixXd& rows) {
  Eigen::MatrixXd result(2, rows.cols());
  result.row(0) = -rows.row(1);
  result.row(1) = rows.row(0);
  return result;
}

// Orthonormal invariants of the site group, chosen so that each keeps as few orbitals as may be:
// the projections of single orbitals, the longest first, each freed of those taken before.
std::vector<Eigen::MatrixXd> invariants(const Irrep& irrep, const EquivalentAtoms& set,
                                        const SiteRotations& rotations, int l, int wanted) {
  const Eigen::Index d = irrep.dimension, m = 2 * l + 1;
  const auto project = [&](const Eigen::MatrixXd& x) {
    Eigen::MatrixXd sum = Eigen::MatrixXd::Zero(d, m);
    for (std::size_t h = 0; h < set.site_group.size(); ++h) {
      sum += irrep.matrices[set.site_group[h]] * x * rotations[h][l].transpose();
    }
    return Eigen::MatrixXd(sum / static_cast<double>(set.site_group.size()));
  };
  std::vector<Eigen::MatrixXd> projected;
  for (Eigen::Index r = 0; r < d; ++r) {
    for (Eigen::Index p = 0; p < m; ++p) {
      Eigen::MatrixXd unit = Eigen::MatrixXd::Zero(d, m);
      unit(r, p) = 1.0;
      projected.push_back(project(unit));
    }
  }
  std::vector<Eigen::MatrixXd> chosen;
  while (static_cast<int>(chosen.size()) < wanted) {
    const Eigen::MatrixXd* longest = &projected.front();
    for (const Eigen::MatrixXd& candidate : projected) {
      if (candidate.norm() > longest->norm() + 1e-9) longest = &candidate;
    }
    if (longest->norm() < 1e-6) throw std::logic_error("too few invariants of a site group");
    const Eigen::MatrixXd unit = longest->normalized();
    chosen.push_back(unit);
    std::vector<Eigen::MatrixXd> taken = {unit};
    if (irrep.complex_pair) taken.push_back(times_i(unit));
    for (Eigen::MatrixXd& candidate : projected) {
      for (const Eigen::MatrixXd& done : taken) {
        candidate -= done.cwiseProduct(candidate).sum() * done;
      }
    }
  }
  return chosen;
}

// A single atom: the irreps are those of the sphere, and the shell of the same l is the SALC.
std::vector<Eigen::MatrixXd> spherical_invariants(int irrep_l, int l) {
  if (irrep_l != l) return {};
  return {Eigen::MatrixXd::Identity(2 * l + 1, 2 * l + 1)};
}

// Rounding leaves 1e-17 where theory has 0; zeros keep SALCs sparse and readable.
Eigen::MatrixXd tidy(const Eigen::MatrixXd& x) {
  return x.unaryExpr([](double value) { return std::abs(value) < 1e-14 ? 0.0 : value; });
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
    int largest_l = 0;
    for (int shell = first; shell < last; ++shell) {
      largest_l = std::max(largest_l, basis.shells[shell].l);
    }
    const SiteRotations rotations = site_rotations(symmetry, set, largest_l);
    for (std::size_t i = 0; i < irreps.size(); ++i) {
      const Irrep& irrep = irreps[i];
      const double scale = std::sqrt(static_cast<double>(irrep.dimension) / set.size());
      for (int shell = first; shell < last; ++shell) {
        const int l = basis.shells[shell].l;
        const std::vector<Eigen::MatrixXd> found =
            spherical ? spherical_invariants(static_cast<int>(i), l)
                      : invariants(irrep, set, rotations, l, multiplicity(irrep, set, rotations, l));
        for (const Eigen::MatrixXd& x : found) {
          salcs.by_irrep[i].push_back(
              {static_cast<int>(s), shell, tidy(scale * x.normalized())});
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
