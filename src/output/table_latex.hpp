// A table as LaTeX.
#pragma once

#include <string>
#include <string_view>

#include "output/table.hpp"

namespace irrepwise {

/// A `table` environment that needs the package booktabs; numbers align at the decimal point,
/// columns that wrap are paragraphs.
[[nodiscard]] std::string table_latex(const Table& table);

/// Plain words as LaTeX: its special characters escaped, the few letters beyond ASCII that we use
/// ourselves written as commands, other UTF-8 as it is.
[[nodiscard]] std::string latex_text(std::string_view text);

/// @param ascii  "2e1g", "E1\"", "sigmag+"
/// @returns      "$2e_{1g}$", "$E_{1}''$", "$\Sigma_{g}^{+}$"
[[nodiscard]] std::string latex_label(const std::string& ascii);

}  // namespace irrepwise
