// Oxidation states, charges of ligands, and the charge of the whole.
#pragma once

#include <vector>

#include "complex/assembly.hpp"
#include "complex/spec.hpp"

namespace irrepwise {

struct Charges {
  std::vector<int> oxidation;  // one for each centre
  int total = 0;
};

/// From the oxidation states, or from the charge where one is not given.
/// @throws Error  neither is given; both are and contradict each other; two metals that share an
/// odd
///                sum of oxidation states
[[nodiscard]] Charges settle_charges(const ComplexSpec& complex, const Assembly& assembly);

}  // namespace irrepwise
