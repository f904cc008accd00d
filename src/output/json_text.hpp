// JSON as our commands write it. Not installed: JSON stays out of public headers.
#pragma once

#include <string>

#include <nlohmann/json.hpp>

namespace irrepwise {

using Json = nlohmann::ordered_json;

/// @returns       the value, a negative zero as zero
/// @throws Error  for NaN and infinity, which JSON cannot say and no result may be
[[nodiscard]] double finite_number(double value);

/// A line for each key of the document, each element of a list of lists or objects; what is inside
/// those stands on one line, so that a person can find things and a matrix has a line for each row.
/// Text that is not UTF-8 gets replacement characters.
[[nodiscard]] std::string json_text(const Json& document);

}  // namespace irrepwise
