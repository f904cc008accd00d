// The page of a comparison: what `compare` says, with the levels of every variant to be looked at.
#pragma once

#include <string>

#include "output/compare_result.hpp"
#include "page/molecule_page.hpp"

namespace irrepwise {

/// The diagram shows the variants chosen, or as many of the first as it holds; the tables have all.
/// @throws Error  as `level_diagram_figure`
[[nodiscard]] std::string comparison_page(const Comparison& comparison,
                                          const Provenance& provenance, const PageOptions& options);

}  // namespace irrepwise
