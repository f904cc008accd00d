// Orbital coefficients for programs: one table that is never broken, as JSON or CSV.
#pragma once

#include <string>

#include "output/orbital_table.hpp"

namespace irrepwise {

struct OrbitalTableData {
  double threshold =
      0.0;             // entries below are empty; with more than 0, rows without any are left out
  std::string source;  // the geometry's file
};

/// Columns `quantity`, `set`, `atom` (over SALCs `irrep`), `orbital` (over SALCs `number`, and
/// `partner` of a complex pair), then one for each orbital. `quantity` is `energy_ev`, `occupation`
/// (of the whole level), `degeneracy`, then `coefficient` or `share_percent`.
[[nodiscard]] std::string orbital_table_csv(const LevelsResult& result, const OrbitalTable& table,
                                            const OrbitalTableData& data);

/// README.md lists the keys.
[[nodiscard]] std::string orbital_table_json(const LevelsResult& result, const OrbitalTable& table,
                                             const OrbitalTableData& data);

}  // namespace irrepwise
