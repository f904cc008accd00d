// The terms, with spin, of electrons in open levels.
#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "symmetry/point_group.hpp"

namespace irrepwise {

struct OpenLevel {
  std::string label;  // irrep, any case
  int electrons = 0;
};

struct Term {
  int multiplicity = 1;  // 2S + 1
  std::string irrep;     // as in the character table
  int dimension = 1;
  int count = 1;  // how many terms of this kind

  friend bool operator==(const Term&, const Term&) = default;
};

/// @param text    "t2g^2", "t2g^4 eg^2", "piu^3", "p^2" (Kh); without an exponent one electron
/// @throws Error  as `parse_factors`, or where a level is given twice
[[nodiscard]] std::vector<OpenLevel> parse_configuration(const PointGroup& group,
                                                         std::string_view text);

/// All terms that the Pauli principle allows. The determinants with N_up electrons of one spin and
/// N_down of the other in a level span Λ^N_up(V) ⊗ Λ^N_down(V); levels multiply, M_S adds, and the
/// terms of spin S are what M_S = S has more than M_S = S + 1.
///
/// @returns  by falling multiplicity, then falling dimension (Kh, linear: falling l, |m|), then in
///           the order of the character table; sum of (2S+1) dimension count = number of
///           determinants
/// @throws Error   for an unknown irrep, or more electrons than a level holds
/// @source         derived by us from the Slater determinants
[[nodiscard]] std::vector<Term> find_terms(const PointGroup& group,
                                           const std::vector<OpenLevel>& levels);

/// Terms of the highest multiplicity; for linear molecules and single atoms of these the ones of
/// highest |m| or l: Hund's rules, as far as symmetry alone carries them.
[[nodiscard]] std::vector<Term> lowest_terms(const PointGroup& group,
                                             const std::vector<Term>& terms);

/// @returns  "3T1g", "2 1Eg" where it occurs twice; ASCII
[[nodiscard]] std::string term_text(const Term& term);

}  // namespace irrepwise
