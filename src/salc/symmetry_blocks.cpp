#include "salc/symmetry_blocks.hpp"

#include <array>
#include <complex>

#include "core/constants.hpp"
#include "harmonics/real_harmonics.hpp"
#include "overlap/diatomic_frame.hpp"
#include "overlap/two_centre.hpp"

namespace irrepwise {
namespace {

// SALCs of one irrep that belong to one shell of one set: they are contiguous.
struct Span {
  int first = 0;
  int count = 0;
};

Span find_span(const std::vector<Salc>& salcs, int set, int shell) {
  Span span;
  for (std::size_t i = 0; i < salcs.size(); ++i) {
    if (salcs[i].set != set || salcs[i].shell != shell) continue;
    if (span.count == 0) span.first = static_cast<int>(i);
    ++span.count;
  }
  return span;
}

// Invariants as columns of coefficients over (partner, orbital), partner slowest: real irreps keep
// all partners, complex pairs one complex row.
Eigen::MatrixXd flattened(const std::vector<Salc>& salcs, Span span, Eigen::Index rows) {
  Eigen::MatrixXd columns(rows, span.count);
  for (int i = 0; i < span.count; ++i) {
    const Eigen::MatrixXd& x = salcs[span.first + i].representative;
    for (Eigen::Index r = 0; r < x.rows(); ++r) {
      for (Eigen::Index p = 0; p < x.cols(); ++p) columns(r * x.cols() + p, i) = x(r, p);
    }
  }
  return columns;
}
Eigen::MatrixXcd complex_row(const std::vector<Salc>& salcs, Span span, Eigen::Index rows) {
  Eigen::MatrixXcd columns(rows, span.count);
  for (int i = 0; i < span.count; ++i) {
    const Eigen::MatrixXd& x = salcs[span.first + i].representative;
    for (Eigen::Index p = 0; p < rows; ++p) {
      columns(p, i) = std::complex(x(0, p), x(1, p)) / std::sqrt(2.0);
    }
  }
  return columns;
}

// The overlaps of one shell of a representative with one shell of all atoms of another set, each
// already turned back to the representative's own orbitals: S(a, b) D_l(g_b).
using TurnedOverlaps = std::vector<Eigen::MatrixXd>;

template <typename Matrix>
void put(Matrix& block, Span rows, Span columns, const Matrix& part) {
  block.block(rows.first, columns.first, rows.count, columns.count) = part;
  block.block(columns.first, rows.first, columns.count, rows.count) = part.adjoint();
}

class BlockBuilder {
 public:
  BlockBuilder(const MolecularSymmetry& symmetry, const Basis& basis, const SalcBasis& salcs,
               const OverlapMap& map)
      : symmetry_(symmetry), basis_(basis), salcs_(salcs), map_(map) {
    int largest_l = 0;
    for (const Shell& shell : basis.shells) largest_l = std::max(largest_l, shell.l);
    for (const Eigen::Matrix3d& g : symmetry.group.operations()) {
      rotations_.emplace_back();
      for (int l = 0; l <= largest_l; ++l) rotations_.back()[l] = harmonic_rotation(l, g);
    }
    for (std::size_t i = 0; i < salcs.by_irrep.size(); ++i) {
      const auto size = static_cast<Eigen::Index>(salcs.by_irrep[i].size());
      if (symmetry.group.irreps()[i].complex_pair) {
        blocks_.emplace_back(Eigen::MatrixXcd(Eigen::MatrixXcd::Zero(size, size)));
      } else {
        blocks_.emplace_back(Eigen::MatrixXd(Eigen::MatrixXd::Zero(size, size)));
      }
    }
  }

  std::vector<SymmetryBlock> build() {
    for (int a = 0; a < static_cast<int>(salcs_.sets.size()); ++a) {
      for (int b = a; b < static_cast<int>(salcs_.sets.size()); ++b) add_sets(a, b);
    }
    return std::move(blocks_);
  }

 private:
  void add_sets(int set_a, int set_b) {
    const EquivalentAtoms& a = salcs_.sets[set_a];
    const EquivalentAtoms& b = salcs_.sets[set_b];
    const int first_a = basis_.first_shell[a.representative()];
    const int count_a = basis_.first_shell[a.representative() + 1] - first_a;
    const int first_b = basis_.first_shell[b.representative()];
    const int count_b = basis_.first_shell[b.representative() + 1] - first_b;

    std::vector<TurnedOverlaps> turned(static_cast<std::size_t>(count_a * count_b));
    for (int position = 0; position < b.size(); ++position) {
      if (b.atoms[position] == a.representative()) continue;
      const Eigen::Vector3d displacement =
          (symmetry_.molecule.atoms()[b.atoms[position]].position -
           symmetry_.molecule.atoms()[a.representative()].position) /
          bohr_in_angstrom;
      const int g = b.from_representative[position];
      int largest_l = 0;
      for (int i = 0; i < count_a; ++i)
        largest_l = std::max(largest_l, basis_.shells[first_a + i].l);
      for (int j = 0; j < count_b; ++j)
        largest_l = std::max(largest_l, basis_.shells[first_b + j].l);
      const DiatomicFrame frame(displacement, largest_l);
      const double distance = displacement.norm();
      for (int i = 0; i < count_a; ++i) {
        for (int j = 0; j < count_b; ++j) {
          const Shell &shell_a = basis_.shells[first_a + i], &shell_b = basis_.shells[first_b + j];
          DiatomicOverlaps overlaps =
              diatomic_overlaps(shell_a.radial, shell_a.l, shell_b.radial, shell_b.l, distance);
          if (map_) {
            for (double& overlap : overlaps) overlap = map_(overlap);
          }
          turned[i * count_b + j].push_back(frame.block(overlaps, shell_a.l, shell_b.l) *
                                            rotations_[g][shell_b.l]);
        }
      }
    }
    std::vector<int> operations;
    for (int position = 0; position < b.size(); ++position) {
      if (b.atoms[position] != a.representative()) {
        operations.push_back(b.from_representative[position]);
      }
    }
    if (operations.empty()) return;
    for (std::size_t irrep = 0; irrep < blocks_.size(); ++irrep) {
      for (int i = 0; i < count_a; ++i) {
        for (int j = 0; j < count_b; ++j) {
          add_shells(static_cast<int>(irrep), set_a, first_a + i, set_b, first_b + j, operations,
                     turned[i * count_b + j]);
        }
      }
    }
  }

  void add_shells(int irrep_index, int set_a, int shell_a, int set_b, int shell_b,
                  const std::vector<int>& operations, const TurnedOverlaps& turned) {
    const std::vector<Salc>& salcs = salcs_.by_irrep[irrep_index];
    const Span rows = find_span(salcs, set_a, shell_a), columns = find_span(salcs, set_b, shell_b);
    if (rows.count == 0 || columns.count == 0) return;
    const Irrep& irrep = symmetry_.group.irreps()[irrep_index];
    const Eigen::Index ma = turned.front().rows(), mb = turned.front().cols();
    const double atoms = salcs_.sets[set_a].size();
    if (irrep.complex_pair) {
      Eigen::MatrixXcd k = Eigen::MatrixXcd::Zero(ma, mb);
      for (std::size_t b = 0; b < operations.size(); ++b) {
        const Eigen::MatrixXd& d = irrep.matrices[operations[b]];
        k += std::complex(d(0, 0), d(1, 0)) * turned[b];
      }
      put<Eigen::MatrixXcd>(
          std::get<Eigen::MatrixXcd>(blocks_[irrep_index]), rows, columns,
          atoms * complex_row(salcs, rows, ma).adjoint() * k * complex_row(salcs, columns, mb));
      return;
    }
    const Eigen::Index d = irrep.dimension;
    Eigen::MatrixXd k = Eigen::MatrixXd::Zero(d * ma, d * mb);
    for (std::size_t b = 0; b < operations.size(); ++b) {
      const Eigen::MatrixXd& matrix = irrep.matrices[operations[b]];
      for (Eigen::Index r = 0; r < d; ++r) {
        for (Eigen::Index s = 0; s < d; ++s) {
          if (matrix(r, s) != 0.0) k.block(r * ma, s * mb, ma, mb) += matrix(r, s) * turned[b];
        }
      }
    }
    put<Eigen::MatrixXd>(std::get<Eigen::MatrixXd>(blocks_[irrep_index]), rows, columns,
                         (atoms / static_cast<double>(d)) *
                             flattened(salcs, rows, d * ma).transpose() * k *
                             flattened(salcs, columns, d * mb));
  }

  const MolecularSymmetry& symmetry_;
  const Basis& basis_;
  const SalcBasis& salcs_;
  const OverlapMap& map_;
  std::vector<std::array<Eigen::MatrixXd, max_l + 1>> rotations_;  // [operation][l]
  std::vector<SymmetryBlock> blocks_;
};

}  // namespace

std::vector<SymmetryBlock> off_site_blocks(const MolecularSymmetry& symmetry, const Basis& basis,
                                           const SalcBasis& salcs, const OverlapMap& map) {
  return BlockBuilder(symmetry, basis, salcs, map).build();
}

}  // namespace irrepwise
