// Columns of a comparison that tell how strongly the metal binds its donors.
#pragma once

#include <functional>
#include <optional>
#include <string>
#include <vector>

#include "output/compare_result.hpp"

namespace irrepwise {

struct BondColumn {
  std::string key;    // "bond_N", "bond_N_like", "bond_varied"
  std::string title;  // "M–N", "M–N trans N", "M–varied"
  bool shown = true;  // false where other columns tell people more
  std::function<std::optional<double>(const VariantResult&)> mean;  // overlap population
};

/// First that of the bonds that vary, where some do, in each variant those to one element. Then for
/// each element, in the order in which the variants have it, the mean over its donors; where one
/// variant has several types of bond to the element, a column for each type follows, told apart by
/// no more than differs: bridging, the ligand, what stands opposite, short and long. A mean that
/// has types, and what only varied bonds stand in, are not shown.
[[nodiscard]] std::vector<BondColumn> bond_columns(const Comparison& comparison);

/// What the titles of the columns shown mean, in a sentence or more.
[[nodiscard]] std::string bond_words(const std::vector<std::string>& titles);

}  // namespace irrepwise
