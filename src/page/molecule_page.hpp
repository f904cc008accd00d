// The page of one molecule: all that `levels`, `symmetry` and `draw` say of it in one HTML file.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "analysis/symmetry_result.hpp"
#include "output/levels_result.hpp"
#include "page/provenance.hpp"

namespace irrepwise {

struct PageOptions {
  std::optional<double> from_ev;  // window of the level diagram; by default around the frontier
  std::optional<double> to_ev;
  int threads = 1;  // changes no byte
  std::vector<int> variants =
      {};  // of a comparison: those in the diagram, by index; empty: the first
};

/// @param symmetry  of the same molecule with the same options
/// @throws Error    as `level_diagram_figure` for a window without levels
[[nodiscard]] std::string molecule_page(const LevelsResult& result, const SymmetryResult& symmetry,
                                        const Provenance& provenance, const PageOptions& options);

}  // namespace irrepwise
