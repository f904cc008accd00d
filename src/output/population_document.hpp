// Populations as tables of their own: with captions that stand alone, and for programs.
#pragma once

#include <string>
#include <vector>

#include "output/levels_result.hpp"
#include "output/population_tables.hpp"
#include "output/table.hpp"

namespace irrepwise {

/// Charges with gross populations by orbital type, and overlap populations.
/// @param source  what the legend calls the geometry
[[nodiscard]] std::vector<Table> population_tables(const LevelsResult& result, Grouping grouping,
                                                   const std::string& source);

/// Rows of `quantity`, `atom`, `other_atom`, `orbital_type`, `value`: for every atom its `charge`,
/// `gross_population` and that of each type; for every pair `overlap_population` and
/// `distance_angstrom`, with `bonded` 1 or 0.
[[nodiscard]] std::string populations_csv(const LevelsResult& result);

/// `atoms` (`atom`, `element`, `charge`, `gross_population`, `by_type`) and `pairs` (`atoms`,
/// `distance_angstrom`, `overlap_population`, `bonded`), every one of them.
[[nodiscard]] std::string populations_json(const LevelsResult& result, const std::string& source);

}  // namespace irrepwise
