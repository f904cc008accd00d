// What every JSON document of `table` starts with. Not installed: JSON stays out of public headers.
#pragma once

#include <string>

#include "output/json_text.hpp"
#include "output/levels_result.hpp"

namespace irrepwise {

/// `schema`, `title`, `geometry`, `formula`, `charge`, `point_group`, `axes`, `method`.
[[nodiscard]] Json table_document(const LevelsResult& result, const std::string& source);

}  // namespace irrepwise
