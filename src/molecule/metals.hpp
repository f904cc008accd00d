// Which elements are metals.
#pragma once

#include <vector>

#include "molecule/molecule.hpp"

namespace irrepwise {

/// Groups 3 to 12 with the lanthanides and actinides.
[[nodiscard]] bool is_d_or_f_block(int atomic_number);

/// The d and f blocks, groups 1 and 2 without hydrogen, and Al, Ga, In, Tl, Nh, Sn, Pb, Fl, Bi, Mc,
/// Po, Lv of the p block. B, Si, Ge, As, Sb, Te are none.
[[nodiscard]] bool is_metal(int atomic_number);

/// Atoms of the d and f blocks, also those that have no d shell in a basis, such as zinc.
/// @returns  ascending
[[nodiscard]] std::vector<int> centre_atoms(const Molecule& molecule);

/// The atoms around which a complex is built: those of the d and f blocks, of which a ligand may
/// carry main-group metals; without any, all metals.
/// @returns  ascending
[[nodiscard]] std::vector<int> metals_of_complex(const Molecule& molecule);

}  // namespace irrepwise
