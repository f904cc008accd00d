// SALCs as tables for people.
#pragma once

#include <vector>

#include "analysis/symmetry_result.hpp"
#include "output/table.hpp"

namespace irrepwise {

/// A table for each set and part: a column for each atom where they are few, otherwise a table for
/// each irrep with a column for each partner. Exact coefficients as such, others to four decimals.
/// Single atoms are left out: their orbitals are the SALCs.
[[nodiscard]] std::vector<Table> salc_tables(const SymmetryResult& result);

/// @returns  "1/√6", "-0.3717", and "·" for zero
[[nodiscard]] std::string coefficient_text(double value);

}  // namespace irrepwise
