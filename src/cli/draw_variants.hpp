// Variants side by side: the part of `draw` that takes several molecules.
#pragma once

#include "cli/compared.hpp"
#include "cli/draw_kind.hpp"
#include "figure/figure.hpp"

namespace irrepwise::cli {

/// @throws Error  for a variant that is not there, one named twice, or too many for one diagram
[[nodiscard]] Figure variants_figure(const Comparison& comparison, const DrawOptions& options);

}  // namespace irrepwise::cli
