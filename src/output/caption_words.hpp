// Sentences below a caption, so that a table or figure stands alone in somebody's report.
#pragma once

#include <string>

#include "output/levels_result.hpp"

namespace irrepwise {

/// "Dinfh" -> "D∞h"
[[nodiscard]] std::string readable_group(std::string symbol);

/// "Geometry: square.xyz, Cl4Pt 2−, D4h."
/// @param source  the file, without its folders
[[nodiscard]] std::string geometry_sentence(const LevelsResult& result, const std::string& source);

/// "Extended Hückel, weighted rule, K = 1.75, parameters: published."
[[nodiscard]] std::string method_sentence(const LevelsResult& result);

/// "Axes: z = C4 through Pt1; x = C2' through Cl2 and Cl4.", with a note on the frame where there
/// are no words for it.
[[nodiscard]] std::string axes_sentence(const LevelsResult& result);

}  // namespace irrepwise
