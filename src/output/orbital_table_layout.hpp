// Tables for people from orbital coefficients: grouped by atoms, small entries blank, broken by
// whole levels where they would be too wide.
#pragma once

#include <string>
#include <vector>

#include "output/orbital_table.hpp"
#include "output/table.hpp"

namespace irrepwise {

struct OrbitalTableLayout {
  double threshold = 0.05;  // smaller entries are blank: in size, or in per cent for shares
  int width = 100;          // columns of text that a table may fill; one level may fill more
  std::string source;       // what the legend calls the geometry: "square.xyz"
};

/// Energies, electrons and frontier marks on top of the columns, then a part for each set of
/// equivalent atoms. Over SALCs a table for each irrep. Rows without entries are left out, and the
/// notes say what the blanks amount to. The first table has the legend, all have a caption.
[[nodiscard]] std::vector<Table> orbital_tables(const LevelsResult& result,
                                                const OrbitalTable& table,
                                                const OrbitalTableLayout& layout);

}  // namespace irrepwise
