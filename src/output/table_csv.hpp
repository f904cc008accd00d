// A table as comma-separated values.
#pragma once

#include <string>

#include "output/table.hpp"

namespace irrepwise {

/// A header of the columns' keys, then the rows; separators, caption and notes have no place in it.
/// Every number reads back as the same double.
///
/// @source  RFC 4180: quotes only where needed, lines end in CR LF
[[nodiscard]] std::string table_csv(const Table& table);

}  // namespace irrepwise
