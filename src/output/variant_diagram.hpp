// The level diagram of a comparison: variants side by side, lines between matched levels.
#pragma once

#include <optional>
#include <vector>

#include "figure/level_diagram.hpp"
#include "output/compare_result.hpp"

namespace irrepwise {

/// Matches with less in common are not drawn: too little to say that one level became the other.
inline constexpr double least_drawn_overlap = 0.3;

struct VariantDiagramChoice {
  std::vector<int> variants;  // indices, in the order of the columns; empty: all
  std::optional<double> from_ev = {};
  std::optional<double> to_ev = {};
};

/// A column for each variant; links join levels of neighbours that are matched (`match_levels`, the
/// comparison's own matching where the reference is one of the two). Those that follow the
/// reference's HOMO and LUMO, as the comparison matches them, are marked, those of the d block
/// strong. Frontier and d block bear labels, with parent labels; with three variants or fewer all
/// levels do. By default the energies hold the d block and the frontier of every variant.
///
/// The diagram owns all it shows. @see level_diagram_figure
/// @throws Error  for more than `most_columns` variants
[[nodiscard]] LevelDiagram variant_diagram(const Comparison& comparison,
                                           const VariantDiagramChoice& choice = {});

}  // namespace irrepwise
