// How often each irrep occurs in a representation.
#pragma once

#include <string>
#include <vector>

namespace irrepwise {

struct IrrepCount {
  std::string label;  // ASCII, capital, as in `Irrep`
  int dimension = 1;
  int count = 0;

  friend bool operator==(const IrrepCount&, const IrrepCount&) = default;
};

/// Only irreps that do occur, in the order of the character table.
using Reduction = std::vector<IrrepCount>;

/// @returns  "A1g + 2Eg + T2g", ASCII; "0" for nothing
[[nodiscard]] std::string reduction_text(const Reduction& reduction);

/// @returns  sum of count times dimension
[[nodiscard]] int total_dimension(const Reduction& reduction);

/// @returns  how often the irrep of that very label occurs
[[nodiscard]] int count_of(const Reduction& reduction, const std::string& label);

}  // namespace irrepwise
