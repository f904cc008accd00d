// A table as LaTeX.
#pragma once

#include <string>

#include "output/table.hpp"

namespace irrepwise {

/// A `table` environment that needs the packages array and booktabs, or for more rows than a page
/// holds a `longtable`; numbers align at the decimal point, columns that wrap are paragraphs.
[[nodiscard]] std::string table_latex(const Table& table);

}  // namespace irrepwise
