// What a user writes to supply an element that a parameter set lacks.
#pragma once

#include <string>

namespace irrepwise {

/// @param atomic_number  1 to 118
/// @returns  lines of YAML, the last without its end, with the valence shells and electrons of the
/// free atom by its place in the
///           periodic table, and "..." where the user's numbers go
/// @source   the order of filling of shells (common practice); noble gas core outside, filled
/// (n-1)d
///           of the p block and (n-2)f of the d block inside the core
[[nodiscard]] std::string parameter_template(int atomic_number);

}  // namespace irrepwise
