#include "hueckel/blocks.hpp"

namespace irrepwise {
namespace {

template <typename Matrix>
Matrix hamiltonian(const Matrix& mapped, const std::vector<Salc>& salcs, const Basis& basis,
                   const OffDiagonalRule& rule) {
  Matrix h = mapped;
  for (Eigen::Index j = 0; j < h.cols(); ++j) {
    const double h_j = basis.shells[salcs[static_cast<std::size_t>(j)].shell].h_ii_ev;
    for (Eigen::Index i = 0; i < h.rows(); ++i) {
      h(i, j) *= rule.factor(basis.shells[salcs[static_cast<std::size_t>(i)].shell].h_ii_ev, h_j);
    }
    h(j, j) += h_j;
  }
  return h;
}

}  // namespace

SymmetryBlock hamiltonian_block(const SymmetryBlock& mapped_off_site,
                                const std::vector<Salc>& salcs, const Basis& basis,
                                const OffDiagonalRule& rule) {
  return std::visit(
      [&](const auto& mapped) { return SymmetryBlock(hamiltonian(mapped, salcs, basis, rule)); },
      mapped_off_site);
}

std::vector<HueckelBlock> hueckel_blocks(const MolecularSymmetry& symmetry, const Basis& basis,
                                         const SalcBasis& salcs, const OffDiagonalRule& rule) {
  const std::vector<SymmetryBlock> overlaps = off_site_blocks(symmetry, basis, salcs);
  const OverlapMap map = rule.map();
  const std::vector<SymmetryBlock> mapped =
      map ? off_site_blocks(symmetry, basis, salcs, map) : overlaps;
  std::vector<HueckelBlock> blocks;
  for (std::size_t irrep = 0; irrep < overlaps.size(); ++irrep) {
    blocks.push_back(std::visit(
        [&](const auto& off_site) {
          using Matrix = std::decay_t<decltype(off_site)>;
          const Matrix& for_h = std::get<Matrix>(mapped[irrep]);
          return HueckelBlock{Matrix(off_site + Matrix::Identity(off_site.rows(), off_site.cols())),
                              hamiltonian(for_h, salcs.by_irrep[irrep], basis, rule)};
        },
        overlaps[irrep]));
  }
  return blocks;
}

}  // namespace irrepwise
