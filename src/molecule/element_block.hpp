// Where an element stands in the periodic table.
#pragma once

namespace irrepwise {

/// @returns  whether it is of groups 3 to 12, a lanthanide or an actinide
[[nodiscard]] bool is_d_or_f_block(int atomic_number);

}  // namespace irrepwise
