// S and H of every irrep in the SALC basis.
#pragma once

#include <vector>

#include "hueckel/rules.hpp"
#include "salc/symmetry_blocks.hpp"

namespace irrepwise {

struct HueckelBlock {
  SymmetryBlock overlap;
  SymmetryBlock hamiltonian_ev;
};

/// H needs no pass of its own: between two shells it is a number from the rule times the block of
/// S; within one atom it is H_ii on the diagonal and 0 elsewhere.
///
/// @returns  per irrep, both of the same shape and type
[[nodiscard]] std::vector<HueckelBlock> hueckel_blocks(const MolecularSymmetry& symmetry,
                                                       const Basis& basis, const SalcBasis& salcs,
                                                       const OffDiagonalRule& rule);

/// H of one irrep from what the rule makes of the overlaps, as `off_site_blocks` gives it: for
/// those who solve again with other H_ii and keep the overlaps.
[[nodiscard]] SymmetryBlock hamiltonian_block(const SymmetryBlock& mapped_off_site,
                                              const std::vector<Salc>& salcs, const Basis& basis,
                                              const OffDiagonalRule& rule);

}  // namespace irrepwise
