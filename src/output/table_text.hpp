// A table as plain text in fixed-width letters.
#pragma once

#include <string>
#include <vector>

#include "output/table.hpp"

namespace irrepwise {

/// Numbers align at the decimal point. Where the table is wider than the width, columns that wrap
/// become narrower first, then columns are dropped by priority (and named in a note), and only the
/// columns of priority 0 may run over.
///
/// @param width  columns of the terminal
/// @returns      lines without trailing spaces, each ended by a line feed
[[nodiscard]] std::string table_text(const Table& table, int width);

/// Columns of text that the table would fill if nothing were dropped or broken, one entry for each
/// of its columns, the space between them included.
[[nodiscard]] std::vector<int> text_widths(const Table& table);

}  // namespace irrepwise
