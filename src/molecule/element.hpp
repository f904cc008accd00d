// Chemical elements: symbols, and the covalent radii that decide what counts as bonded.
#pragma once

#include <optional>
#include <string_view>

namespace irrepwise {

inline constexpr int max_atomic_number = 118;

/// @param symbol  "Fe", any case
/// @returns       1 to 118, or nothing where no element has that symbol
[[nodiscard]] std::optional<int> atomic_number(std::string_view symbol);

/// @param atomic_number  1 to 118
[[nodiscard]] std::string_view element_symbol(int atomic_number);

/// Single-bond covalent radius, Å; sp3 for carbon, low spin for Mn, Fe, Co.
/// @returns  nothing above Z = 96
/// @source   Cordero et al., Dalton Trans. 2008, 2832, doi:10.1039/b801115j (from memory)
[[nodiscard]] std::optional<double> covalent_radius_angstrom(int atomic_number);

}  // namespace irrepwise
