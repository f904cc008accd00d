// Names of orbitals, groups and axes among words, for writers that typeset them.
#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

namespace irrepwise {

enum class Notation { Orbital, Symmetry };

/// Words as they are, or with `below` the name of an orbital ("5d" and "x2-y2", "3p" and "πx", "5d"
/// and "(xz,yz)") or of a group or an axis: "C" and "4h", "C" and "2" with a prime.
struct NotationRun {
  std::string text;
  std::string below = {};  // empty for plain words
  Notation notation = Notation::Orbital;
  std::string primes = {};  // ' or " behind an axis
};

/// Takes words apart, in order; the texts put together, with what stands below and the primes, are
/// the words. An orbital is a number from 1 to 7, a letter of a shell, and functions of that shell
/// by the conventions or of a local frame. A group is one by its letters (C4h, D3, Td, C∞v); "C4"
/// and "S4", which may be atoms, are axes or groups where the words around them say so: "z = C4",
/// "subgroup of C4", "C4 at tolerance". A name stands alone, not inside a word.
[[nodiscard]] std::vector<NotationRun> notation_runs(std::string_view words);

/// Powers of what stands below: "x(x2-3y2)" has a 2 above the second x and the y, and a 3 that is a
/// factor.
/// @returns  whether the figure at this place is an exponent
[[nodiscard]] bool is_exponent(std::string_view below, std::size_t at);

}  // namespace irrepwise
