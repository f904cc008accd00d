// The result of `compare` as JSON and CSV, for programs.
#pragma once

#include <string>

#include "output/compare_columns.hpp"
#include "output/compare_result.hpp"

namespace irrepwise {

/// Keys in fixed order, numbers with every digit of a double; README.md lists the keys.
[[nodiscard]] std::string compare_json(const Comparison& comparison);

/// The summary alone.
/// @throws Error  as `summary_table`
[[nodiscard]] std::string compare_csv(const Comparison& comparison, const SummaryChoice& choice);

}  // namespace irrepwise
