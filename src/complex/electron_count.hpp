// Electrons at a metal by the counting of closed-shell ligands.
#pragma once

#include <string>

namespace irrepwise {

/// Electrons of one metal: what its oxidation state leaves it, and what the ligands give.
struct ElectronCount {
  int oxidation = 0;
  int metal = 0;     // d electrons of a transition metal, f of a lanthanide or actinide
  char shell = 'd';  // 'd', 'f', or 'p' for other elements, where `metal` counts s and p
  int donated = 0;   // by the ligands, bridges included
  int total = 0;
  int other_metal = 0;  // of the total: one for each bond to the other metal that was stated
};

/// Valence electrons of the neutral atom: group number for s, p and d blocks (group - 10 for the p
/// block), electrons outside the noble-gas core for lanthanides and actinides.
/// @param atomic_number  1 to 118
/// @source  common practice
[[nodiscard]] int valence_electrons(int atomic_number);

/// @returns  "+2", "0", "-1"
[[nodiscard]] std::string signed_number(int number);

/// @param donated      electrons that the ligands give
/// @param other_metal  order of the bond to another metal, which gives one for each
/// @throws Error   an oxidation state that takes more electrons than there are, or leaves more than
///                 the shells hold
[[nodiscard]] ElectronCount count_electrons(int atomic_number, int oxidation, int donated,
                                            int other_metal = 0);

}  // namespace irrepwise
