// Sentences below a caption, so that a table or figure stands alone in somebody's report.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "output/levels_result.hpp"
#include "salc/local_frames.hpp"

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

/// What local frames look at, for "z of an atom points to …": the central atom, the centre or, in a
/// complex without a central atom, each donor's own metal.
/// @param frames  by set
[[nodiscard]] std::string frame_goal_words(const Molecule& molecule,
                                           const std::vector<std::optional<LocalFrames>>& frames,
                                           const std::optional<int>& central_atom);

/// How local frames go on beyond the donor atoms, and where they look otherwise: of atoms that bind
/// side-on along the normal. Each sentence begins with a space; empty where there is nothing to
/// say.
[[nodiscard]] std::string further_frame_sentences(
    const std::vector<std::optional<LocalFrames>>& frames);

}  // namespace irrepwise
