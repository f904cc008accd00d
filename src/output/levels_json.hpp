// The result of `levels` as JSON and CSV, for programs.
#pragma once

#include <string>

#include "output/levels_result.hpp"

namespace irrepwise {

struct LevelsJsonParts {
  bool matrices = false;      // S and H over atomic orbitals of the input frame
  bool coefficients = false;  // of every partner, over atomic orbitals of the input frame
};

/// Keys in fixed order, numbers with every digit of a double, never NaN; README.md lists the keys.
/// Compositions leave out shares smaller than 1e-4 in size.
[[nodiscard]] std::string levels_json(const LevelsResult& result,
                                      const LevelsJsonParts& parts = {});

/// A row for each level in order of energy; after the level's own columns, the share of each shell
/// on each set of equivalent atoms.
[[nodiscard]] std::string levels_csv(const LevelsResult& result);

}  // namespace irrepwise
