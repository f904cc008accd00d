// Typesetting of labels: "2e1g" as 2e with a subscript, "1a2\"" with its primes.
#pragma once

#include <string>

#include "figure/figure.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

/// @param ascii  label of an irrep or a level: "2e1g", "A1\"", "1sigmag", "piu"
[[nodiscard]] RichText label_text(const std::string& ascii);

[[nodiscard]] RichText plain_text(const std::string& text);

/// @returns  signs of Unicode that stand below or above, as in "Cl₄Pt²⁻", set as scripts, since few
///           fonts have them all
[[nodiscard]] RichText heading_text(const std::string& text);

/// @returns  the formula in Hill order with its numbers below and its charge above the line
[[nodiscard]] RichText formula_text(const Molecule& molecule);

/// @param symbol  "D4h", "Dinfh"
/// @returns       D with 4h or ∞h below the line
[[nodiscard]] RichText group_text(const std::string& symbol);

/// @returns  "-11.304 eV" with a true minus sign
[[nodiscard]] std::string energy_words(double energy_ev, int digits = 3);

/// @returns  both, one after the other
[[nodiscard]] RichText operator+(RichText first, const RichText& second);

}  // namespace irrepwise
