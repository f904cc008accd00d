// A symmetry label taken apart, for writers that typeset it.
#pragma once

#include <string>

namespace irrepwise {

/// "2e1g": number 2, letter e, below 1g. "1a2\"": below 2, primes ″. "Sigmag+": letter Σ, below g,
/// above +. Letters in UTF-8; a level's σ has no sign above, as in `readable_label`.
struct LabelParts {
  std::string number;  // of the level within its irrep; empty for irreps
  std::string letter;
  std::string below;
  std::string above;  // "+" or "-"
  int primes = 0;
};

/// @param ascii  label of an irrep or a level
[[nodiscard]] LabelParts label_parts(const std::string& ascii);

}  // namespace irrepwise
