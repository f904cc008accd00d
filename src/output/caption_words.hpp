// Sentences below a caption, so that a table or figure stands alone in somebody's report.
#pragma once

#include <string>

#include "output/levels_result.hpp"

namespace irrepwise {

/// "Dinfh" -> "D∞h"
[[nodiscard]] std::string readable_group(std::string symbol);

/// "Cl₄Pt²⁻": the formula in Hill order with its charge, in signs that stand below and above.
[[nodiscard]] std::string readable_formula(const Molecule& molecule);

/// "Geometry: square.xyz, Cl₄Pt²⁻, D4h."
/// @param source  the file, without its folders
[[nodiscard]] std::string geometry_sentence(const LevelsResult& result, const std::string& source);

/// "Extended Hückel, weighted rule, K = 1.75, parameters: published."
[[nodiscard]] std::string method_sentence(const LevelsResult& result);

/// "Axes: z = C4 through Pt1; x = C2' through Cl2 and Cl4.", with a note on the frame where there
/// are no words for it.
[[nodiscard]] std::string axes_sentence(const LevelsResult& result);

/// How local frames go on beyond the donor atoms.
[[nodiscard]] std::string outer_frame_sentence();

}  // namespace irrepwise
