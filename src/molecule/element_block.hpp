// Where an element stands in the periodic table.
#pragma once

namespace irrepwise {

/// @returns  whether it is of groups 3 to 12, a lanthanide or an actinide
[[nodiscard]] bool is_d_or_f_block(int atomic_number);

/// @returns  whether it is a metal; of the p block Al, Ga, In, Sn, Tl, Pb, Bi and the elements
///           below them up to 116
[[nodiscard]] bool is_metal(int atomic_number);

}  // namespace irrepwise
