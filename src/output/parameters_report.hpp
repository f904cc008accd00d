// A parameter set, whole or for some elements, in every format.
#pragma once

#include <string>
#include <vector>

#include "basis/parameter_set.hpp"
#include "output/report.hpp"

namespace irrepwise {

/// @param elements  atomic numbers that the set holds; rows come in this order
[[nodiscard]] Report parameters_report(const ParameterSet& parameters,
                                       const std::vector<int>& elements);
[[nodiscard]] std::string parameters_csv(const ParameterSet& parameters,
                                         const std::vector<int>& elements);
[[nodiscard]] std::string parameters_json(const ParameterSet& parameters,
                                          const std::vector<int>& elements);

/// A parameter file that reads back as the same numbers, to be changed and given to --parameters.
[[nodiscard]] std::string parameters_yaml(const ParameterSet& parameters,
                                          const std::vector<int>& elements);

}  // namespace irrepwise
