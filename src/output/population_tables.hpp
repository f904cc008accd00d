// Tables of charges, gross populations and overlap populations.
#pragma once

#include <vector>

#include "output/equivalence.hpp"
#include "output/levels_result.hpp"
#include "output/table.hpp"

namespace irrepwise {

enum class Grouping { Equivalent, Single };

/// Net charge and gross populations by orbital type, a row for each set of equivalent atoms or for
/// each atom.
[[nodiscard]] Table charge_table(const LevelsResult& result, const std::vector<AtomSet>& sets,
                                 Grouping grouping);

/// Bonds, equivalent ones once and counted; with `Single` every pair of atoms.
[[nodiscard]] Table overlap_population_table(const LevelsResult& result, Grouping grouping);

}  // namespace irrepwise
