// A table as a value inside a JSON document. Not installed: JSON stays out of public headers.
#pragma once

#include "output/json_text.hpp"
#include "output/table.hpp"

namespace irrepwise {

/// As `table_json`.
[[nodiscard]] Json table_json_value(const Table& table);

}  // namespace irrepwise
