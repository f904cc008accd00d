// A table as JSON.
#pragma once

#include <string>

#include "output/table.hpp"

namespace irrepwise {

/// `caption`, `columns` (`key`, `header`, `unit`), `rows` (objects by key; numbers in full, labels
/// in ASCII, null for an empty cell), `notes`. Separators have no place in it.
[[nodiscard]] std::string table_json(const Table& table);

}  // namespace irrepwise
