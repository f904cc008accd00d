// Off-diagonal rules: H between orbitals of different atoms from their overlap.
#pragma once

#include "basis/basis.hpp"
#include "hueckel/options.hpp"
#include "salc/symmetry_blocks.hpp"

namespace irrepwise {

/// A rule with its constant: H_ij = factor(H_ii, H_jj) * map(S_ij), S_ij in the diatomic frame.
///   weighted:            ½ K' (H_ii + H_jj), K' = K + Δ² + (1 - K) Δ⁴, Δ = (H_ii - H_jj)/(H_ii +
///   H_jj) wolfsberg-helmholz:  ½ K (H_ii + H_jj) geometric-mean:      -K √(H_ii H_jj) cusachs: ½
///   (H_ii + H_jj), map(S) = S (2 - |S|)
///
/// @source  Ammeter et al., J. Am. Chem. Soc. 100, 3686 (1978); Wolfsberg and Helmholz, J. Chem.
///          Phys. 20, 837 (1952); Ballhausen and Gray, Inorg. Chem. 1, 111 (1962); Cusachs, J.
///          Chem. Phys. 43, S157 (1965)
struct OffDiagonalRule {
  Rule rule = Rule::Weighted;
  double k = 1.75;  // not used by `cusachs`

  /// @returns  eV
  [[nodiscard]] double factor(double h_i_ev, double h_j_ev) const;

  /// @returns  empty where the overlap itself enters
  [[nodiscard]] OverlapMap map() const;
};

/// @throws Error  for a K that is not positive, or given with `cusachs`, or an H_ii that is not
///                negative
[[nodiscard]] OffDiagonalRule make_rule(Rule rule, std::optional<double> k, const Basis& basis);

}  // namespace irrepwise
