// Variants side by side: which of them a diagram shows, and the diagram of `draw`.
#pragma once

#include <string>
#include <vector>

#include "cli/compared.hpp"
#include "cli/draw_kind.hpp"
#include "figure/figure.hpp"

namespace irrepwise::cli {

/// @param names   those of `--variants`, in the order of the columns
/// @returns       their indices
/// @throws Error  for a variant that is not there, one named twice, or too many for one diagram
[[nodiscard]] std::vector<int> chosen_variants(const Comparison& comparison,
                                               const std::vector<std::string>& names);

/// @throws Error  as `chosen_variants`
[[nodiscard]] Figure variants_figure(const Comparison& comparison, const DrawOptions& options);

}  // namespace irrepwise::cli
