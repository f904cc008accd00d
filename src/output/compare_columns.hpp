// The summary of a comparison: a row for each variant, columns that can be picked and sorted by.
#pragma once

#include <string>
#include <vector>

#include "output/compare_result.hpp"
#include "output/table.hpp"

namespace irrepwise {

struct SummaryChoice {
  std::vector<std::string> columns;  // keys, in the order wanted; empty: all
  std::string sort_by;               // key; empty: in the order given
  bool descending = false;
  bool differences = false;  // add a column of differences from the reference for each
                             // number, its key with `delta_` before it
};

/// The summary is written whole for programs, and in two parts for people where there is a metal,
/// so that each fits the page. Columns that were picked stay together.
enum class SummaryPart { Whole, Frontier, Metal };

[[nodiscard]] std::vector<SummaryPart> summary_parts(const Comparison& comparison,
                                                     const SummaryChoice& choice);

/// @throws Error  for a key that is no column, with the nearest and the list of all
void check_columns(const Comparison& comparison, const std::vector<std::string>& keys);

/// Energies in eV. Bonds are those from the metal, by type (`bond_columns`): mean overlap
/// population. Rows without a value for the column sorted by come last.
///
/// @throws Error  for a key that is no column, with the nearest and the list of all
[[nodiscard]] Table summary_table(const Comparison& comparison, const SummaryChoice& choice,
                                  SummaryPart part);

/// Numbers only, each minus the reference's; the reference itself is left out.
[[nodiscard]] Table difference_table(const Comparison& comparison, const SummaryChoice& choice,
                                     SummaryPart part);

}  // namespace irrepwise
