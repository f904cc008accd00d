// The report of `compare` for people.
#pragma once

#include "output/compare_columns.hpp"
#include "output/compare_result.hpp"
#include "output/report.hpp"

namespace irrepwise {

struct CompareParts {
  SummaryChoice summary;
  bool differences = false;  // a table of differences from the reference
  bool slopes = false;       // the derivatives by every parameter, a table for each variant
};

/// Summary, d block, frontier levels matched with the reference's, and how robust their order is.
///
/// @throws Error  as `summary_table`
[[nodiscard]] Report compare_report(const Comparison& comparison, const CompareParts& parts);

}  // namespace irrepwise
