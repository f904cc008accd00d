// How the columns of a table are set on a page of LaTeX: how wide, how large, in how many parts.
#pragma once

#include <cstddef>
#include <string>
#include <vector>

#include "output/table.hpp"

namespace irrepwise {

struct LatexColumn {
  std::size_t index = 0;  // in the table
  std::string kind;       // "l", "r", or a paragraph of some width
};

struct LatexPart {
  std::string size;  // "", "\\small" or "\\footnotesize"
  std::vector<LatexColumn> columns;
};

/// Columns that wrap become paragraphs of the width that is left; where that does not help the
/// letters become smaller, and then the table is broken, the first column repeated in each part.
/// Widths are estimated from the number of letters, for a line of 16 cm and letters of 10 pt.
[[nodiscard]] std::vector<LatexPart> latex_parts(const Table& table);

}  // namespace irrepwise
