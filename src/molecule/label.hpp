// What stands for an element in an input: a symbol, an atomic number, or an atom's label.
#pragma once

#include <string>
#include <string_view>

namespace irrepwise {

/// Accepts a symbol in any case ("Fe", "FE"), an atomic number ("26"), and a label: a symbol with a
/// number behind it ("Fe1", "C12A", "H1'"). The letters before the first digit must be the symbol.
/// Two capitals at the start of a label that can be read as one element or another ("CA1": carbon
/// or calcium; "CO2": carbon or cobalt) are refused.
///
/// @returns       1 to 118
/// @throws Error  unknown (with the nearest symbol) or ambiguous
[[nodiscard]] int atomic_number_of_label(std::string_view label);

/// @returns  "; did you mean 'Pt'?" for a symbol with the same first letter, otherwise empty
[[nodiscard]] std::string symbol_hint(std::string_view word);

}  // namespace irrepwise
